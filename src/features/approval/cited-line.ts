import type { LineKey } from "@/contracts/lines/line";
import { lineKey, lines, parseLineKey } from "@/contracts/lines/registry";
import type { RecordContent } from "@/contracts/record-content";

/**
 * The line that a person means by a number: "4.03", "a5.02", or "7.02" where the record has one case only, and "2.04" for the first item.
 * Undefined when there is no such line, or when the case is not said and there are several.
 */
export function citedLine(text: string, content: Pick<RecordContent, "cases">): LineKey | undefined {
  const written = text.trim().toUpperCase();
  if (parseLineKey(written))
    return content.cases.some(({ letter }) => !/^[A-Z]/.test(written) || written.startsWith(letter)) ? written : undefined;
  const line = lines.find(({ no }) => no === written.replace(/^[A-Z]/, ""));
  if (!line) return undefined;
  const letter = /^[A-Z]/.exec(written)?.[0] ?? (content.cases.length === 1 ? content.cases[0]?.letter : undefined);
  if (!letter || !content.cases.some((one) => one.letter === letter)) return undefined;
  const key = lineKey(line, letter);
  return parseLineKey(key) ? key : undefined;
}

/** What a line is called: as the record has it, else as the form does. */
export const labelOfLine = (key: LineKey, content: Pick<RecordContent, "lines">): string =>
  content.lines.find(({ line }) => line === key)?.label ?? parseLineKey(key)?.line.label ?? "–";
