import type { Remark } from "@/contracts/requests";
import type { RecordContent } from "@/contracts/record-content";
import { citedLine } from "./cited-line";
import { missingAcknowledgements } from "./missing-words";

export type Choice = "countersign" | "return";
export type RemarkDraft = { key: number; line: string; text: string };

export type DecisionDraft = { choice: Choice | null; conditions: string[]; remarks: RemarkDraft[]; password: string };

/** What an approver has still to do before the decision can be sent, in one sentence; null when nothing. */
export function missingFor(
  { choice, conditions, remarks, password }: DecisionDraft,
  content: RecordContent,
  acknowledged: ReadonlySet<string>,
): string | null {
  if (choice === null) return "Choose what you decide.";
  if (choice === "return") {
    const begun = remarks.filter(isBegun);
    if (begun.length === 0) return "A return needs at least one remark.";
    const unknown = begun.find(({ line }) => citedLine(line, content) === undefined);
    if (unknown)
      return unknown.line.trim() === ""
        ? "A remark needs the number of its line."
        : `There is no line ${unknown.line.trim()} in this record.`;
    const empty = begun.find(({ text }) => text.trim() === "");
    if (empty) return `The remark on line ${empty.line.trim()} has no words.`;
  } else {
    if (conditions.some((text) => text.trim() === "")) return "A condition has no words. Write it, or remove it.";
    const unticked = missingAcknowledgements(content.cautions, acknowledged);
    if (unticked) return unticked;
  }
  return password === "" ? "Type your password." : null;
}

/** Remarks as they are sent: complete ones, each under the full number of its line. */
export const remarksToSend = (remarks: readonly RemarkDraft[], content: RecordContent): Remark[] =>
  remarks.filter(isBegun).flatMap(({ line, text }) => {
    const key = citedLine(line, content);
    return key ? [{ line: key, text: text.trim() }] : [];
  });

export const conditionsToSend = ({ conditions }: Pick<DecisionDraft, "conditions">): string[] =>
  conditions.map((text) => text.trim());

const isBegun = ({ line, text }: RemarkDraft): boolean => line.trim() !== "" || text.trim() !== "";
