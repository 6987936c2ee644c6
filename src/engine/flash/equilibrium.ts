import type { PhaseState } from "../eos/fluid-model";

export type PhaseKind = "vapour" | "liquid" | "supercritical";

export interface EquilibriumPhase {
  kind: PhaseKind;
  moleFraction: number;
  composition: Float64Array;
  state: PhaseState;
  lnFugacityCoefficients: Float64Array;
}

/**
 * The answer of every flash. `phases` holds one phase, or two or three with the lightest first; a third is liquid water beside a
 * hydrocarbon liquid, or a second such liquid. Overall molar properties are the mole-weighted sums. `vapourMoleFraction` is 1 for a
 * vapour or supercritical fluid, 0 for a liquid. `phase` is "two-phase" for three phases too: the word of the result format.
 *
 * An `Equilibrium` is also the seed of the next flash near by (`flashUV(…, seed)`): it changes the cost, not the answer.
 */
export interface Equilibrium {
  temperatureK: number;
  pressurePa: number;
  molarVolumeM3PerMol: number;
  internalEnergyJPerMol: number;
  enthalpyJPerMol: number;
  entropyJPerMolK: number;
  vapourMoleFraction: number;
  phase: PhaseKind | "two-phase";
  phases: EquilibriumPhase[];
  /** Set when the answer is known to leave a phase out: one of its phases would split again. `verifyPhases` makes the same test. */
  missingPhase?: boolean;
}
