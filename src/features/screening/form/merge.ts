/**
 * Two saves of one draft brought together, line by line. What only one side changed is taken from that side; what both changed
 * differently is a conflict, and the person chooses.
 */
import type { DraftDocument } from "@/contracts/draft";
import { compositionKey } from "@/contracts/draft-differences";
import type { LineKey } from "@/contracts/lines/line";

export type Choice = "mine" | "theirs";
export type Merge = {
  /** Every line settled but the conflicts, which hold mine for now. */
  merged: DraftDocument;
  conflicts: LineKey[];
  /** Lines taken over from the other save. */
  taken: LineKey[];
};

/** Equal in content; the order of keys says nothing, as a database keeps its own. */
export const same = (a: unknown, b: unknown): boolean => JSON.stringify(a, inOrder) === JSON.stringify(b, inOrder);

const inOrder = (_key: string, value: unknown): unknown =>
  typeof value === "object" && value !== null && !Array.isArray(value)
    ? Object.fromEntries(Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1)))
    : value;

/**
 * base     the draft as last known to both
 * mine     as it stands in this tab
 * theirs   as it was saved meanwhile
 * sent     what this tab sent without hearing whether it arrived: a line saved in just these words is no other's work
 */
export function mergeDrafts(
  base: DraftDocument,
  mine: DraftDocument,
  theirs: DraftDocument,
  sent: readonly DraftDocument[] = [],
): Merge {
  const lines: DraftDocument["lines"] = {};
  const conflicts: LineKey[] = [];
  const taken: LineKey[] = [];

  for (const key of new Set([...Object.keys(base.lines), ...Object.keys(mine.lines), ...Object.keys(theirs.lines)])) {
    const side = settle(
      key,
      base.lines[key],
      mine.lines[key],
      theirs.lines[key],
      sent.map(({ lines }) => lines[key]),
    );
    const value = side === "theirs" ? theirs.lines[key] : mine.lines[key];
    if (value) lines[key] = value;
  }
  const compositionSide = settle(
    compositionKey,
    base.composition,
    mine.composition,
    theirs.composition,
    sent.map(({ composition }) => composition),
  );
  return {
    merged: {
      ...mine,
      cases: mergeCases(base.cases, mine.cases, theirs.cases),
      lines,
      composition: compositionSide === "theirs" ? theirs.composition : mine.composition,
    },
    conflicts,
    taken,
  };

  function settle(key: LineKey, before: unknown, ours: unknown, other: unknown, ownWords: unknown[]): Choice {
    if (same(ours, other) || same(other, before) || ownWords.some((own) => same(own, other))) return "mine";
    if (same(ours, before)) {
      taken.push(key);
      return "theirs";
    }
    conflicts.push(key);
    return "mine";
  }
}

/** Cases added on either side are there; one that either side removed is gone, as long as one is left. */
function mergeCases(base: Cases, mine: Cases, theirs: Cases): Cases {
  const has = (cases: Cases, letter: string) => cases.some((one) => one.letter === letter);
  const all = [...mine, ...theirs.filter(({ letter }) => !has(mine, letter))].sort((a, b) => (a.letter < b.letter ? -1 : 1));
  const kept = all.filter(({ letter }) => !has(base, letter) || (has(mine, letter) && has(theirs, letter)));
  return kept.length > 0 ? kept : mine;
}

type Cases = DraftDocument["cases"];

/** The merged draft with the choices made at the conflicts. */
export function applyChoices(merge: Merge, theirs: DraftDocument, choices: Record<LineKey, Choice>): DraftDocument {
  const lines = { ...merge.merged.lines };
  let { composition } = merge.merged;
  for (const key of merge.conflicts) {
    if (choices[key] !== "theirs") continue;
    const value = theirs.lines[key];
    if (key === compositionKey) composition = theirs.composition;
    else if (value) lines[key] = value;
    else delete lines[key];
  }
  return { ...merge.merged, lines, composition };
}
