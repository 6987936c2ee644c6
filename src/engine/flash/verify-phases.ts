import type { FluidModel } from "../eos/fluid-model";
import type { Equilibrium } from "./equilibrium";

/**
 * Is this equilibrium the whole truth? Tests the phase of an equilibrium for a further split, by a route that shares nothing
 * with the Newton that found it. For accepted steps of a run and for final answers; too dear for a right-hand side.
 *
 * Returns  "sound"; "unstable" when a one-phase answer would split; "third-phase" when a two-phase one would
 * Throws   EngineError "no-convergence" when the test itself fails: a failed test is no verdict
 */
export function verifyPhases(model: FluidModel, state: Equilibrium): "sound" | "unstable" | "third-phase" {
  const phase = state.phases.at(-1)!;
  const test = model.stability(state.temperatureK, state.pressurePa, phase.composition);
  if (test.tangentPlaneDistance > -1e-7) return "sound";
  return state.phases.length === 1 ? "unstable" : "third-phase";
}
