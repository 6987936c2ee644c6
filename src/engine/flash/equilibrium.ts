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
 * The answer of every flash. `phases` holds one phase, or two with the vapour first. Overall molar properties are the
 * mole-weighted sums. `vapourMoleFraction` is 1 for a vapour or supercritical fluid, 0 for a liquid.
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
  /**
   * Set when one of the two phases would split again: a third phase (free water, a second liquid) exists and is not in the
   * answer. `verifyPhases` makes the same test for an equilibrium from any flash.
   */
  thirdPhase?: boolean;
}
