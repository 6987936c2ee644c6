import type { FluidModel, ResidualDerivatives, Root } from "../eos/fluid-model";
import { createResidualDerivatives } from "../eos/residual-derivatives";
import { referencePressurePa } from "../gas-constant";
import { solveBordered, solveLinear } from "./linear-solve";

/** Two phases of one mole of feed, as the unknowns of the volume-based Newton. */
export interface TwoPhaseVolumes {
  temperatureK: number;
  pressurePa: number;
  /** Moles of each component in the lighter and the denser phase. */
  readonly v: Float64Array;
  readonly l: Float64Array;
  vapourVolume: number;
  liquidVolume: number;
}

export type VolumeTarget =
  | { hold: "energy"; value: number; molarVolume: number }
  | { hold: "entropy"; value: number; molarVolume: number }
  | { hold: "temperature"; value: number; molarVolume: number };

const maximumIterations = 30;

/**
 * Equilibrium of two phases at given overall volume and internal energy (or entropy, or temperature) of one mole of feed, by
 * simultaneous Newton in the vapour's mole numbers, the vapour's volume and T, with analytic second derivatives of A/(R T).
 *
 *   μ_i^v = μ_i^l,  p^v = p^l,  U^v + U^l = U    (S^v + S^l = S)
 *
 * Source   Michelsen, State function based flash specifications, Fluid Phase Equilib. 158-160 (1999) 617-626; the
 *          volume-based unknowns as in Castier, Fluid Phase Equilib. 276 (2009) 7-17.
 * state    in: the guess; out: the answer
 * Returns  true when converged to two mechanically stable phases of positive pressure; false otherwise, with `state` spoiled
 */
export function solveAtVolume(model: FluidModel, z: ArrayLike<number>, target: VolumeTarget, state: TwoPhaseVolumes): boolean {
  const count = z.length;
  const work = volumeWork(count);
  const { light, dense, matrix, step, kept, factor, column, scale, cp0, h0, s0, index } = work;
  const { residual, gasConstantJPerMolK: R, idealHelmholtz } = model;
  const [coldest, hottest] = model.temperatureRangeK;
  let active = 0;
  for (let i = 0; i < count; i++) if (z[i]! > 0) index[active++] = i;
  const size = active + 2;
  const rowV = active;
  const rowT = active + 1;
  let previous = Infinity;
  let idealAt = Number.NaN;

  for (let iteration = 0; iteration < maximumIterations; iteration++) {
    const { v, l, temperatureK: T, vapourVolume: Vv, liquidVolume: Vl } = state;
    if (!(T > coldest && T < hottest)) return false;
    residual.setComposition(v);
    if (!(Vv > residual.minimumVolume())) return false;
    residual.evaluate(T, Vv, 2, light);
    residual.setComposition(l);
    if (!(Vl > residual.minimumVolume())) return false;
    residual.evaluate(T, Vl, 2, dense);
    if (T !== idealAt) {
      idealHelmholtz.evaluate(T, cp0, h0, s0);
      idealAt = T;
    }

    let nv = 0;
    let nl = 0;
    let cp = 0;
    let h = 0;
    for (let k = 0; k < active; k++) {
      const i = index[k]!;
      nv += v[i]!;
      nl += l[i]!;
      cp += z[i]! * cp0[i]!;
      h += z[i]! * h0[i]!;
    }
    const pv = nv / Vv - light.FV; // p/(R T) of each phase
    const pl = nl / Vl - dense.FV;
    const cv = cp - R - R * T * (2 * (light.FT + dense.FT) + T * (light.FTT + dense.FTT));

    let error = 0;
    for (let k = 0; k < active; k++) {
      const i = index[k]!;
      scale[k] = Math.sqrt((v[i]! * l[i]!) / z[i]!);
      const gap = light.Fn[i]! + Math.log(v[i]! / Vv) - dense.Fn[i]! - Math.log(l[i]! / Vl);
      step[k] = -scale[k]! * gap;
      error = Math.max(error, Math.abs(gap));
    }
    const scaleV = 1 / Math.sqrt(nv / (Vv * Vv) + nl / (Vl * Vl));
    scale[rowV] = scaleV;
    step[rowV] = scaleV * (pv - pl);
    const pressureError = Math.abs(pv - pl) / Math.max(Math.abs(pv), 1e-6 * Math.abs(pl), 1e-300);

    let balance = 0;
    if (target.hold === "energy") {
      const U = h - R * T - R * T * T * (light.FT + dense.FT);
      balance = (target.value - U) / (R * T);
    } else if (target.hold === "entropy") {
      balance = (target.value - entropy(work, state, active, R)) / R;
    } else {
      balance = (target.value - T) / T;
    }
    error = Math.max(error, pressureError, Math.abs(balance));

    // Symmetric block in (v, Vv): Hessian of A/(R T); last row and column: temperature, as T·d ln-type unknown.
    for (let a = 0; a < active; a++) {
      const i = index[a]!;
      for (let b = 0; b <= a; b++) {
        const j = index[b]!;
        const value = scale[a]! * scale[b]! * (light.Fnn[i * count + j]! + dense.Fnn[i * count + j]!);
        matrix[a * size + b] = value;
        matrix[b * size + a] = value;
      }
      matrix[a * size + a] = matrix[a * size + a]! + 1; // scale² (1/v + 1/l) = 1
      const withV = scale[a]! * scaleV * (light.FnV[i]! - 1 / Vv + dense.FnV[i]! - 1 / Vl);
      matrix[a * size + rowV] = withV;
      matrix[rowV * size + a] = withV;
      const withT = scale[a]! * T * (light.FnT[i]! - dense.FnT[i]!);
      matrix[a * size + rowT] = withT;
      matrix[rowT * size + a] = target.hold === "temperature" ? 0 : -withT;
    }
    matrix[rowV * size + rowV] = 1 + scaleV * scaleV * (light.FVV + dense.FVV);
    const withT = scaleV * T * (light.FTV - dense.FTV);
    matrix[rowV * size + rowT] = withT;
    matrix[rowT * size + rowV] = target.hold === "temperature" ? 0 : -withT;
    matrix[rowT * size + rowT] = target.hold === "temperature" ? 1 : cv / R;
    step[rowT] = balance;
    if (target.hold === "entropy") addEntropyTerms(work, active, size, scaleV, pv - pl);

    const settled = error < 1e-13 || (error < 1e-10 && error >= 0.5 * previous);
    const stable = pv > 0 && pl > 0 && nv / (Vv * Vv) + light.FVV > 0 && nl / (Vl * Vl) + dense.FVV > 0;
    if (settled) {
      state.pressurePa = R * T * pv;
      return stable && distinct(state, nv, nl) && onRightRoots(model, work, state, active === 1);
    }
    previous = error;
    kept.set(step);
    if (!solveBordered(matrix, step, size - 1, factor, column)) {
      step.set(kept);
      if (!solveLinear(matrix, step, size)) return false;
    }

    let length = 1;
    for (let k = 0; k < active; k++) {
      const i = index[k]!;
      const change = scale[k]! * step[k]!;
      if (!Number.isFinite(change)) return false;
      if (change < 0) length = Math.min(length, (0.9 * v[i]!) / -change);
      else if (change > 0) length = Math.min(length, (0.9 * l[i]!) / change);
    }
    const changeT = step[rowT]! * T;
    const changeV = scaleV * step[rowV]!;
    if (!Number.isFinite(changeT) || !Number.isFinite(changeV)) return false;
    if (Math.abs(changeT) > 0.15 * T) length = Math.min(length, (0.15 * T) / Math.abs(changeT));
    if (error > smallStep) length = volumeLimit(work, model, state, active, length, changeV);
    if (!(length > 1e-6)) return false;

    for (let k = 0; k < active; k++) {
      const i = index[k]!;
      const change = length * scale[k]! * step[k]!;
      if (v[i]! < l[i]!) {
        v[i] = v[i]! + change;
        l[i] = z[i]! - v[i]!;
      } else {
        l[i] = l[i]! - change;
        v[i] = z[i]! - l[i]!;
      }
    }
    state.temperatureK = T + length * changeT;
    // The smaller volume carries the digits: of a last drop, v − V^v would be round-off.
    if (Vv < Vl) {
      state.vapourVolume = Vv + length * changeV;
      state.liquidVolume = target.molarVolume - state.vapourVolume;
    } else {
      state.liquidVolume = Vl - length * changeV;
      state.vapourVolume = target.molarVolume - state.liquidVolume;
    }
  }
  return false;
}

/** Below this residual a step is too short to carry a phase past its smallest volume. */
const smallStep = 1e-2;

/** Shortens the step until both phases stay above their smallest possible volume. */
function volumeLimit(
  work: VolumeWork,
  model: FluidModel,
  state: TwoPhaseVolumes,
  active: number,
  length: number,
  changeV: number,
): number {
  const { trial, scale, step, index } = work;
  const { residual } = model;
  const { v, l, vapourVolume, liquidVolume } = state;
  let shortened = length;
  for (let attempt = 0; attempt < 20; attempt++) {
    trial.fill(0);
    for (let k = 0; k < active; k++) trial[index[k]!] = v[index[k]!]! + shortened * scale[k]! * step[k]!;
    residual.setComposition(trial);
    const fitsVapour = vapourVolume + shortened * changeV > 1.0001 * residual.minimumVolume();
    for (let k = 0; k < active; k++) trial[index[k]!] = l[index[k]!]! - shortened * scale[k]! * step[k]!;
    residual.setComposition(trial);
    const fitsLiquid = liquidVolume - shortened * changeV > 1.0001 * residual.minimumVolume();
    if (fitsVapour && fitsLiquid) return shortened;
    shortened *= 0.6;
  }
  return 0;
}

function entropy(work: VolumeWork, state: TwoPhaseVolumes, active: number, R: number): number {
  const { light, dense, s0, index } = work;
  const { v, l, temperatureK: T, vapourVolume, liquidVolume } = state;
  let S = -R * (light.F + dense.F + T * (light.FT + dense.FT));
  const thermal = (R * T) / referencePressurePa;
  for (let k = 0; k < active; k++) {
    const i = index[k]!;
    S += v[i]! * (s0[i]! - R * Math.log((v[i]! * thermal) / vapourVolume));
    S += l[i]! * (s0[i]! - R * Math.log((l[i]! * thermal) / liquidVolume));
  }
  return S;
}

/** ∂S/∂v_i and ∂S/∂V carry −R (μ^v − μ^l)/(R T) and R (p^v − p^l)/(R T), which vanish only at the solution. */
function addEntropyTerms(work: VolumeWork, active: number, size: number, scaleV: number, pressureGap: number): void {
  const { matrix, step } = work;
  const rowT = active + 1;
  for (let k = 0; k < active; k++) matrix[rowT * size + k] = matrix[rowT * size + k]! + step[k]!;
  matrix[rowT * size + active] = matrix[rowT * size + active]! + scaleV * pressureGap;
}

/** A root may lie this far above another in G/(R T) before it counts as the wrong one: azeotropes hold two roots that are equal. */
const equalRoots = 1e-8;

/**
 * Is each phase on its root of lowest Gibbs energy? A supersaturated vapour meets every condition of equilibrium with free water, say, and
 * is none. A pure fluid has its two roots equal; there it is asked that they be the outer ones, because reference equations have false,
 * stable-looking branches between them.
 */
function onRightRoots(model: FluidModel, work: VolumeWork, { v, l, ...state }: TwoPhaseVolumes, isPure: boolean): boolean {
  const { residual } = model;
  if (isPure) {
    if (!residual.hasFalseBranches) return true;
    const moles = (amounts: Float64Array) => amounts.reduce((sum, amount) => sum + amount, 0);
    if (residual.isSaturation?.(state.temperatureK, state.vapourVolume / moles(v), state.liquidVolume / moles(l))) return true;
  }
  return (
    isOnRightRoot(model, work, v, state.vapourVolume, state, isPure) &&
    isOnRightRoot(model, work, l, state.liquidVolume, state, isPure)
  );
}

function isOnRightRoot(
  model: FluidModel,
  { trial, light: F }: VolumeWork,
  moles: Float64Array,
  volume: number,
  { temperatureK: T, pressurePa: p }: { temperatureK: number; pressurePa: number },
  isPure: boolean,
): boolean {
  const { residual, gasConstantJPerMolK: R } = model;
  let total = 0;
  for (let i = 0; i < moles.length; i++) total += moles[i]!;
  for (let i = 0; i < moles.length; i++) trial[i] = moles[i]! / total;
  residual.setComposition(trial);
  const own = volume / total;
  const is = (root: Root) => Math.abs(residual.volumeAtPressure(T, p, root) / own - 1) < 1e-5;
  if (isPure) return is("liquid") || is("vapour");
  const stable = residual.volumeAtPressure(T, p, "stable");
  if (Math.abs(stable / own - 1) < 1e-5) return true;
  const gibbs = (molarVolume: number) => {
    residual.evaluate(T, molarVolume, 0, F);
    const Z = (p * molarVolume) / (R * T);
    return F.F + Z - Math.log(Z);
  };
  return gibbs(own) - gibbs(stable) < equalRoots && (!residual.hasFalseBranches || is("liquid") || is("vapour"));
}

function distinct(state: TwoPhaseVolumes, nv: number, nl: number): boolean {
  const light = state.vapourVolume / nv;
  const dense = state.liquidVolume / nl;
  let apart = Math.abs(light / dense - 1);
  for (let i = 0; i < state.v.length; i++) {
    if (state.v[i]! > 0) apart = Math.max(apart, Math.abs((state.v[i]! * nl) / (state.l[i]! * nv) - 1));
  }
  return apart > 1e-6;
}

interface VolumeWork {
  light: ResidualDerivatives;
  dense: ResidualDerivatives;
  matrix: Float64Array;
  factor: Float64Array;
  column: Float64Array;
  step: Float64Array;
  kept: Float64Array;
  scale: Float64Array;
  trial: Float64Array;
  cp0: Float64Array;
  h0: Float64Array;
  s0: Float64Array;
  index: Int32Array;
}

const works = new Map<number, VolumeWork>();

function volumeWork(count: number): VolumeWork {
  let work = works.get(count);
  if (!work) {
    work = {
      light: createResidualDerivatives(count),
      dense: createResidualDerivatives(count),
      matrix: new Float64Array((count + 2) ** 2),
      factor: new Float64Array((count + 1) ** 2),
      column: new Float64Array(count + 1),
      step: new Float64Array(count + 2),
      kept: new Float64Array(count + 2),
      scale: new Float64Array(count + 2),
      trial: new Float64Array(count),
      cp0: new Float64Array(count),
      h0: new Float64Array(count),
      s0: new Float64Array(count),
      index: new Int32Array(count),
    };
    works.set(count, work);
  }
  return work;
}
