/**
 * The one registry of citable lines. Numbers never move between revisions or releases: a retired number stays retired.
 * To add a line, give it a free number in its part's file; form, draft, record and log find it by itself.
 */
import type { Line, LineKey, LineNo } from "./line";
import { scopeLines } from "./part-1-scope";
import { inventoryLines } from "./part-2-inventory";
import { fluidLines } from "./part-3-fluid";
import { steelLines } from "./part-4-steel";
import { releaseLines } from "./part-5-release";
import { heatLines } from "./part-6-heat";
import { limitLines } from "./part-7-limits";
import { partByNumber, type PartNumber } from "./parts";

export const lines: readonly Line[] = [
  ...scopeLines,
  ...inventoryLines,
  ...fluidLines,
  ...steelLines,
  ...releaseLines,
  ...heatLines,
  ...limitLines,
];

const byNo = new Map(lines.map((line) => [line.no, line]));

export function lineByNo(no: LineNo): Line {
  const line = byNo.get(no);
  if (!line) throw new RangeError(`there is no line ${no}`);
  return line;
}

export const linesOfPart = (part: PartNumber): Line[] => lines.filter((line) => line.part === part);

/** Key under which a line's value is kept: "4.03", "A5.02", "2.04-1". */
export function lineKey(line: Line, letter: string, item = 1): LineKey {
  const cased = partByNumber(line.part).perCase ? `${letter}${line.no}` : line.no;
  return line.perItem ? `${cased}-${item}` : cased;
}

const keyForm = /^([A-Z])?(\d\.\d{2})(?:-(\d+))?$/;

/** Takes a key apart. Undefined when no such line exists, so a draft with an unknown key is refused by name. */
export function parseLineKey(key: LineKey): { line: Line; letter?: string; item?: number } | undefined {
  const match = keyForm.exec(key);
  const line = match && byNo.get(match[2] as LineNo);
  if (!match || !line) return undefined;
  if (partByNumber(line.part).perCase !== Boolean(match[1]) || Boolean(line.perItem) !== Boolean(match[3])) return undefined;
  return { line, ...(match[1] ? { letter: match[1] } : {}), ...(match[3] ? { item: Number(match[3]) } : {}) };
}
