/** Line by line, what two drafts say differently: for a conflict of two saves, and for what changed since the revision before. */
import type { DraftDocument, LineValue } from "./draft";
import type { LineKey } from "./lines/line";
import { lines, parseLineKey } from "./lines/registry";

export type LineDifference = { line: LineKey; before: string; after: string };

/** Key of the composition as a whole. */
export const compositionKey: LineKey = "3.01";

/**
 * Lines that differ in what was typed, its unit, or its source; in registry order.
 *
 * before, after   each as words, an en dash where the line is empty
 */
export function draftDifferences(before: DraftDocument, after: DraftDocument): LineDifference[] {
  const keys = [...new Set([...Object.keys(before.lines), ...Object.keys(after.lines)])].sort(byRegistry);
  const found = keys.flatMap((line) => {
    const [one, other] = [words(before.lines[line]), words(after.lines[line])];
    return one === other ? [] : [{ line, before: one, after: other }];
  });
  const [one, other] = [compositionWords(before), compositionWords(after)];
  return one === other ? found : [...found, { line: compositionKey, before: one, after: other }];
}

function words(value: LineValue | undefined): string {
  if (!value) return "–";
  const typed = value.typed.trim() === "" ? (value.si === null ? "–" : `${value.si} (as given)`) : value.typed.trim();
  const unit = value.unit && typed !== "–" ? ` ${value.unit}` : "";
  const source = value.source ? `, ${value.source.kind}: ${value.source.note.trim()}` : "";
  return `${typed}${unit}${source}`;
}

function compositionWords({ composition }: DraftDocument): string {
  if (composition.rows.length === 0) return "–";
  const rows = composition.rows.map(({ id, typed }) => `${id} ${typed.trim() || "–"}`).join(", ");
  const source = composition.source ? `, ${composition.source.kind}: ${composition.source.note.trim()}` : "";
  return `${rows}${composition.normalised ? ", normalised" : ""}${source}`;
}

const order = new Map(lines.map(({ no }, at) => [no, at]));

function byRegistry(a: LineKey, b: LineKey): number {
  const [one, other] = [parseLineKey(a), parseLineKey(b)];
  const byLine = (order.get(one?.line.no ?? "1.00") ?? 0) - (order.get(other?.line.no ?? "1.00") ?? 0);
  return byLine || a.localeCompare(b, "en", { numeric: true });
}
