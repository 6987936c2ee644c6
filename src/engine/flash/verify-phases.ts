import type { FluidModel } from "../eos/fluid-model";
import type { Equilibrium } from "./equilibrium";
import { testStability } from "./stability";

/**
 * Is this equilibrium the whole truth? Tests one phase of an equilibrium for a further split, by a route that shares nothing
 * with the Newton that found it. For accepted steps of a run and for final answers; too dear for a right-hand side.
 *
 * Returns  "sound"; "unstable" when a one-phase answer would split; "third-phase" when an answer of two or three phases leaves one out
 * Throws   EngineError "no-convergence" when the test itself fails: a failed test is no verdict
 */
export function verifyPhases(model: FluidModel, state: Equilibrium): "sound" | "unstable" | "third-phase" {
  const composition = mostMixed(state.phases.map((phase) => phase.composition));
  const searches = furtherSearches(model, composition);
  const test = testStability(model, state.temperatureK, state.pressurePa, composition, { searches });
  if (test.tangentPlaneDistance > -1e-7) return "sound";
  return state.phases.length === 1 ? "unstable" : "third-phase";
}

/**
 * Phases in equilibrium share one tangent plane, so any of them may be tested. Best is the one whose scarcest component, against its
 * richest phase, is least scarce:
 * what is all but absent from a phase (a heavy hydrocarbon from water) cannot be looked for there.
 */
export function mostMixed<Composition extends ArrayLike<number>>(compositions: readonly Composition[]): Composition {
  let best = compositions[0]!;
  let most = -1;
  for (const composition of compositions) {
    let scarcest = Infinity;
    for (let i = 0; i < composition.length; i++) {
      let richest = 0;
      for (const other of compositions) richest = Math.max(richest, other[i]!);
      if (richest > 0) scarcest = Math.min(scarcest, composition[i]! / richest);
    }
    if (scarcest > most) {
      most = scarcest;
      best = composition;
    }
  }
  return best;
}

const badMixers = new Set(["water", "methanol", "ammonia", "hydrogen_chloride", "sulfur_dioxide", "ethylene_oxide"]);

/** How many nearly pure phases to look for beside two: all of them in fluids that mix badly, where a third may be rich in anything. */
export function furtherSearches(model: FluidModel, z: ArrayLike<number>): number | undefined {
  return model.componentIds.some((id, i) => z[i]! > 0 && badMixers.has(id)) ? z.length : undefined;
}
