/**
 * Speed of sound of two phases in equilibrium, from the second derivatives of the Helmholtz energy with the exchange between the phases relaxed.
 *
 *   Ā(T, V) = min over y of A(T, V, y),  y = moles and volume of the lighter phase
 *   Ā_VV = A_VV − a_V H⁻¹ a_V,  Ā_VT = A_VT − a_V H⁻¹ a_T,  Ā_TT = A_TT − a_T H⁻¹ a_T,   H = A_yy
 *   M c² = V² (Ā_VV − Ā_VT²/Ā_TT)   per mole of the whole
 *
 * Source   Michelsen and Mollerup, Thermodynamic Models, 2nd ed. (2007), chapter 14 (isochoric flash), Schur complement of its matrix
 * Returns  M c² [J/mol], or undefined where the matrix is not positive definite (no stable pair of phases)
 */
import type { FluidModel, ResidualDerivatives } from "../eos/fluid-model";
import { createResidualDerivatives } from "../eos/residual-derivatives";
import type { Equilibrium } from "../flash/equilibrium";

type Work = {
  light: ResidualDerivatives;
  dense: ResidualDerivatives;
  v: Float64Array;
  l: Float64Array;
  H: Float64Array;
  aV: Float64Array;
  aT: Float64Array;
};

const works = new Map<number, Work>();
function workFor(count: number): Work {
  let work = works.get(count);
  if (!work) {
    const size = count + 1;
    work = {
      light: createResidualDerivatives(count),
      dense: createResidualDerivatives(count),
      v: new Float64Array(count),
      l: new Float64Array(count),
      H: new Float64Array(size * size),
      aV: new Float64Array(size),
      aT: new Float64Array(size),
    };
    works.set(count, work);
  }
  return work;
}

export function equilibriumSoundTerm(
  model: FluidModel,
  { temperatureK: T, molarVolumeM3PerMol: V, phases }: Equilibrium,
): number | undefined {
  const [vapour, liquid] = phases;
  if (!vapour || !liquid) return undefined;
  const count = vapour.composition.length;
  const { light, dense, v, l, H, aV, aT } = workFor(count);
  const [nv, nl] = [vapour.moleFraction, liquid.moleFraction];
  const Vv = nv * vapour.state.molarVolumeM3PerMol;
  const Vl = nl * liquid.state.molarVolumeM3PerMol;
  for (let i = 0; i < count; i++) {
    v[i] = nv * vapour.composition[i]!;
    l[i] = nl * liquid.composition[i]!;
  }
  const { residual, gasConstantJPerMolK: R } = model;
  residual.setComposition(v);
  residual.evaluate(T, Vv, 2, light);
  residual.setComposition(l);
  residual.evaluate(T, Vl, 2, dense);

  // All over R T, so that H has no units; components that are absent are left out.
  let size = 0;
  const active: number[] = [];
  for (let i = 0; i < count; i++) if (v[i]! > 0 && l[i]! > 0) active.push(i);
  size = active.length + 1;
  const last = size - 1;
  for (let a = 0; a < last; a++) {
    const i = active[a]!;
    for (let b = 0; b <= a; b++) {
      const j = active[b]!;
      H[a * size + b] = light.Fnn[i * count + j]! + dense.Fnn[i * count + j]! + (a === b ? 1 / v[i]! + 1 / l[i]! : 0);
    }
    H[last * size + a] = light.FnV[i]! - 1 / Vv + dense.FnV[i]! - 1 / Vl;
    aV[a] = -(dense.FnV[i]! - 1 / Vl);
    aT[a] = light.FnT[i]! - dense.FnT[i]!;
  }
  const denseVV = nl / (Vl * Vl) + dense.FVV;
  H[last * size + last] = nv / (Vv * Vv) + light.FVV + denseVV;
  aV[last] = -denseVV;
  aT[last] = light.FTV - dense.FTV;
  if (!forwardSolve(H, size, aV, aT)) return undefined;

  const RT = R * T;
  let vv = 0;
  let vt = 0;
  let tt = 0;
  for (let a = 0; a < size; a++) {
    vv += aV[a]! * aV[a]!;
    vt += aV[a]! * aT[a]!;
    tt += aT[a]! * aT[a]!;
  }
  const pressureSlope = R * (nl / Vl - dense.FV) - RT * dense.FTV;
  const AVV = RT * (denseVV - vv);
  const AVT = -pressureSlope - RT * vt;
  const ATT = -(nv * vapour.state.heatCapacityVJPerMolK + nl * liquid.state.heatCapacityVJPerMolK) / T - RT * tt;
  const term = V * V * (AVV - (AVT * AVT) / ATT);
  return term > 0 ? term : undefined;
}

/** Cholesky of the lower triangle of H in place, and both right sides taken through the forward half: then x·x = a H⁻¹ a. */
function forwardSolve(H: Float64Array, size: number, first: Float64Array, second: Float64Array): boolean {
  for (let a = 0; a < size; a++) {
    for (let b = 0; b <= a; b++) {
      let sum = H[a * size + b]!;
      for (let k = 0; k < b; k++) sum -= H[a * size + k]! * H[b * size + k]!;
      if (a === b) {
        if (!(sum > 0)) return false;
        H[a * size + a] = Math.sqrt(sum);
      } else H[a * size + b] = sum / H[b * size + b]!;
    }
    let f = first[a]!;
    let s = second[a]!;
    for (let k = 0; k < a; k++) {
      f -= H[a * size + k]! * first[k]!;
      s -= H[a * size + k]! * second[k]!;
    }
    first[a] = f / H[a * size + a]!;
    second[a] = s / H[a * size + a]!;
  }
  return true;
}
