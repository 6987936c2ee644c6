/** Amounts of a draft's composition as they enter the case. */
import type { DraftDocument } from "./draft";

export const compositionSum = (draft: DraftDocument): number =>
  draft.composition.rows.reduce((sum, row) => sum + (row.molePercent ?? 0), 0);

/** Mole fractions as they enter the case: zero rows left out, the rest divided by their sum. */
export function moleFractions(draft: DraftDocument): { id: string; moleFraction: number }[] {
  const sum = compositionSum(draft);
  return draft.composition.rows.flatMap(({ id, molePercent }) => (molePercent ? [{ id, moleFraction: molePercent / sum }] : []));
}
