import type { FluidModel, ResidualDerivatives, Root } from "../eos/fluid-model";
import { createResidualDerivatives } from "../eos/residual-derivatives";

/** Scratch for one phase inside a flash: composition, molar volume, ln φ and its composition derivatives. */
export interface PhaseWork {
  readonly composition: Float64Array;
  readonly lnPhi: Float64Array;
  /** ∂ ln φ_i/∂n_j at constant T and p for one mole of phase, row-major, symmetric. */
  readonly lnPhiByMoles: Float64Array;
  readonly derivatives: ResidualDerivatives;
  molarVolume: number;
}

export function createPhaseWork(count: number): PhaseWork {
  return {
    composition: new Float64Array(count),
    lnPhi: new Float64Array(count),
    lnPhiByMoles: new Float64Array(count * count),
    derivatives: createResidualDerivatives(count),
    molarVolume: 0,
  };
}

/**
 * ln φ of the phase's composition at (T, p); order 2 adds the composition derivatives
 *
 *   ∂ ln φ_i/∂n_j = F_ij + 1 + p_i p_j/(R T p_V),   p_i = R T/V − R T F_iV,   one mole in all
 *
 * Source   Michelsen and Mollerup (2007), chapter 1, eq. 60 to 63 rearranged.
 */
export function evaluateLnPhi(model: FluidModel, phase: PhaseWork, T: number, p: number, root: Root, order: 1 | 2): void {
  const { residual, gasConstantJPerMolK: R } = model;
  const { composition, lnPhi, lnPhiByMoles, derivatives: F } = phase;
  const count = composition.length;
  residual.setComposition(composition);
  const v = residual.volumeAtPressure(T, p, root);
  residual.evaluate(T, v, order, F);
  phase.molarVolume = v;
  const lnZ = Math.log((p * v) / (R * T));
  for (let i = 0; i < count; i++) lnPhi[i] = F.Fn[i]! - lnZ;
  if (order === 1) return;
  const invV = 1 / v;
  const stiffness = -1 / (invV * invV + F.FVV); // R T/p_V
  for (let i = 0; i < count; i++) {
    const pull = stiffness * (invV - F.FnV[i]!);
    for (let j = 0; j <= i; j++) {
      const value = F.Fnn[i * count + j]! + 1 + pull * (invV - F.FnV[j]!);
      lnPhiByMoles[i * count + j] = value;
      lnPhiByMoles[j * count + i] = value;
    }
  }
}
