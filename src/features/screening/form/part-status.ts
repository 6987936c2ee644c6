/** How far each part of the form is, for the part list and the buttons. */
import type { PartState } from "@/components/parts/part-sign";
import { askedKeysOf, type DraftDocument } from "@/contracts/draft";
import type { CaseFromDraft } from "@/contracts/draft-to-case";
import type { LineKey } from "@/contracts/lines/line";
import { parseLineKey } from "@/contracts/lines/registry";
import { parts, type PartNumber } from "@/contracts/lines/parts";

export type PartStatus = { part: PartNumber; state: PartState; note: string; firstOpen?: LineKey };

/** Keys that stand in the way of a part, in the order of the form. */
const ofPart = (keys: readonly LineKey[], part: PartNumber) => keys.filter((key) => parseLineKey(key)?.line.part === part);

export function partStatuses(draft: DraftDocument, letter: string, made: CaseFromDraft): PartStatus[] {
  const asked = askedKeysOf(draft, letter).filter(({ line }) => line.kind !== "derived");
  return parts.map(({ part }) => {
    const total = asked.filter(({ line }) => line.part === part).length;
    const toFix = ofPart(
      made.problems.map((problem) => problem.line),
      part,
    );
    const missing = ofPart(made.missing, part);
    const unsourced = ofPart(made.withoutSource, part);
    const firstOpen = toFix[0] ?? missing[0] ?? unsourced[0];
    return { part, ...wordsFor(total, toFix.length, missing.length, unsourced.length), ...(firstOpen ? { firstOpen } : {}) };
  });
}

function wordsFor(total: number, toFix: number, missing: number, unsourced: number): Pick<PartStatus, "state" | "note"> {
  if (toFix > 0) return { state: "to-fix", note: `${count(toFix, "line")} to fix` };
  if (missing === total && total > 0) return { state: "untouched", note: `${count(total, "line")} to fill` };
  if (missing > 0) return { state: "started", note: `${total - missing} of ${total} settled` };
  if (unsourced > 0) return { state: "without-source", note: `${unsourced} without source` };
  return { state: "settled", note: `${total} of ${total} settled` };
}

const count = (n: number, noun: string) => `${n} ${noun}${n === 1 ? "" : "s"}`;

/** The line a button waits for: in the first case that has one, first what is wrong, then what is missing. */
export const firstInTheWay = (cases: readonly { made: CaseFromDraft }[]): LineKey | undefined =>
  cases.flatMap(({ made }) => made.problems[0]?.line ?? made.missing[0] ?? [])[0];
