import type { EquationId, FluidSpec } from "@/engine/cases/fluid-spec";
import { equationIds } from "@/engine/cases/fluid-spec";
import { withInitials, type DraftDocument } from "./draft";
import { compositionSum, moleFractions } from "./draft-composition";
import { compositionSlackPercent } from "./draft-to-case";

/**
 * The fluid of a draft, whether or not the rest of its lines are there.
 *
 * Returns  nothing while the composition can't be used: empty, a figure that is no number, or a sum too far from 100
 */
export function draftFluid(given: DraftDocument): FluidSpec | undefined {
  const draft = withInitials(given);
  const { rows } = draft.composition;
  const sum = compositionSum(draft);
  const doubled = rows.some((row, at) => rows.findIndex(({ id }) => id === row.id) !== at);
  if (doubled || rows.some(({ molePercent }) => molePercent === null) || !(Math.abs(sum - 100) <= compositionSlackPercent))
    return undefined;
  const equation = equationIds.find((id) => id === draft.lines["3.02"]?.typed) satisfies EquationId | undefined;
  if (!equation) return undefined;
  return {
    components: moleFractions(draft),
    equation,
    interaction: draft.lines["3.03"]?.typed === "none" ? "none" : "library",
  };
}
