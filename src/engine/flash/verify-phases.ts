import type { FluidModel } from "../eos/fluid-model";
import type { Equilibrium } from "./equilibrium";

/**
 * Is this equilibrium the whole truth? Tests one phase of an equilibrium for a further split, by a route that shares nothing
 * with the Newton that found it. For accepted steps of a run and for final answers; too dear for a right-hand side.
 *
 * Returns  "sound"; "unstable" when a one-phase answer would split; "third-phase" when an answer of two or three phases leaves one out
 * Throws   EngineError "no-convergence" when the test itself fails: a failed test is no verdict
 */
export function verifyPhases(model: FluidModel, state: Equilibrium): "sound" | "unstable" | "third-phase" {
  const composition = mostMixed(state.phases.map((phase) => phase.composition));
  const test = model.stability(state.temperatureK, state.pressurePa, composition);
  if (test.tangentPlaneDistance > -1e-7) return "sound";
  return state.phases.length === 1 ? "unstable" : "third-phase";
}

/**
 * Phases in equilibrium share one tangent plane, so any of them may be tested. Best is the one whose scarcest component is least scarce:
 * what is all but absent from a phase (a heavy hydrocarbon from water) cannot be looked for there.
 */
export function mostMixed<Composition extends ArrayLike<number>>(compositions: readonly Composition[]): Composition {
  let best = compositions[0]!;
  let most = -1;
  for (const composition of compositions) {
    let scarcest = Infinity;
    for (let i = 0; i < composition.length; i++) if (composition[i]! > 0) scarcest = Math.min(scarcest, composition[i]!);
    if (scarcest > most) {
      most = scarcest;
      best = composition;
    }
  }
  return best;
}
