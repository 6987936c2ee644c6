import type { FluidModel } from "../eos/fluid-model";
import { solveLinear } from "./linear-solve";
import { createPhaseWork, evaluateLnPhi, type PhaseWork } from "./phase-work";

/**
 * Two phases at a fixed vapour fraction β, in the unknowns ln K_i, ln T, ln p: the equations of a phase-envelope point.
 *
 *   ln K_i + ln φ_i(y) − ln φ_i(x) = 0,   Σ (y_i − x_i) = 0,   one unknown specified
 *   x_i = z_i/(1 − β + β K_i),  y_i = K_i x_i
 *
 * Source   Michelsen, Fluid Phase Equilib. 4 (1980) 1-10.
 */
export interface SaturationPoint {
  readonly lnK: Float64Array;
  lnT: number;
  lnP: number;
}

export interface SaturationWork {
  readonly vapour: PhaseWork;
  readonly liquid: PhaseWork;
  /** Jacobian of the last evaluation, row-major (n + 2)², spoiled by a solve. */
  readonly jacobian: Float64Array;
  readonly residual: Float64Array;
  readonly byT: { vapour: Float64Array; liquid: Float64Array };
  readonly byP: { vapour: Float64Array; liquid: Float64Array };
}

export function createSaturationWork(count: number): SaturationWork {
  const size = count + 2;
  const pair = () => ({ vapour: new Float64Array(count), liquid: new Float64Array(count) });
  return {
    vapour: createPhaseWork(count),
    liquid: createPhaseWork(count),
    jacobian: new Float64Array(size * size),
    residual: new Float64Array(size),
    byT: pair(),
    byP: pair(),
  };
}

/** Fills residual (n + 1 equations; the last is left to the specification) and Jacobian; returns the largest residual. */
export function evaluateSaturation(
  model: FluidModel,
  z: ArrayLike<number>,
  beta: number,
  point: SaturationPoint,
  work: SaturationWork,
): number {
  const { vapour, liquid, jacobian, residual, byT, byP } = work;
  const { lnK } = point;
  const count = z.length;
  const size = count + 2;
  const T = Math.exp(point.lnT);
  const p = Math.exp(point.lnP);
  let sumV = 0;
  let sumL = 0;
  for (let i = 0; i < count; i++) {
    const K = Math.exp(lnK[i]!);
    const x = z[i]! / (1 - beta + beta * K);
    liquid.composition[i] = x;
    vapour.composition[i] = K * x;
    sumL += x;
    sumV += K * x;
  }
  const difference = sumV - sumL;
  // ln φ is a function of the mole fractions: the sums must be 1 before it is asked.
  for (let i = 0; i < count; i++) {
    liquid.composition[i] = liquid.composition[i]! / sumL;
    vapour.composition[i] = vapour.composition[i]! / sumV;
  }
  evaluateLnPhi(model, vapour, T, p, "stable", 2);
  temperatureAndPressure(model, vapour, T, p, byT.vapour, byP.vapour);
  evaluateLnPhi(model, liquid, T, p, "stable", 2);
  temperatureAndPressure(model, liquid, T, p, byT.liquid, byP.liquid);

  jacobian.fill(0);
  let error = Math.abs(difference);
  for (let i = 0; i < count; i++) {
    const row = i * size;
    if (!(z[i]! > 0)) {
      jacobian[row + i] = 1;
      residual[i] = 0;
      continue;
    }
    const value = lnK[i]! + vapour.lnPhi[i]! - liquid.lnPhi[i]!;
    residual[i] = value;
    error = Math.max(error, Math.abs(value));
    for (let j = 0; j < count; j++) {
      if (!(z[j]! > 0)) continue;
      const K = Math.exp(lnK[j]!);
      const denominator = 1 - beta + beta * K;
      const byLnK = (z[j]! * K) / (denominator * denominator);
      const ofY = (1 - beta) * byLnK; // ∂Y_j/∂ln K_j before normalisation
      const ofX = -beta * byLnK;
      jacobian[row + j] = (ofY * vapour.lnPhiByMoles[i * count + j]!) / sumV - (ofX * liquid.lnPhiByMoles[i * count + j]!) / sumL;
    }
    jacobian[row + i] = jacobian[row + i]! + 1;
    jacobian[row + count] = T * (byT.vapour[i]! - byT.liquid[i]!);
    jacobian[row + count + 1] = p * (byP.vapour[i]! - byP.liquid[i]!);
  }
  const last = count * size;
  for (let j = 0; j < count; j++) {
    if (!(z[j]! > 0)) continue;
    const K = Math.exp(lnK[j]!);
    const denominator = 1 - beta + beta * K;
    jacobian[last + j] = (z[j]! * K) / (denominator * denominator);
  }
  residual[count] = difference;
  return error;
}

/** ∂ ln φ_i/∂T and ∂ ln φ_i/∂p at constant composition, from the derivatives that `evaluateLnPhi` left (order 2). */
function temperatureAndPressure(
  model: FluidModel,
  phase: PhaseWork,
  T: number,
  p: number,
  byT: Float64Array,
  byP: Float64Array,
): void {
  const { derivatives: F, molarVolume: v } = phase;
  const R = model.gasConstantJPerMolK;
  const pT = R / v - R * F.FV - R * T * F.FTV;
  const pV = -(R * T) / (v * v) - R * T * F.FVV;
  for (let i = 0; i < byT.length; i++) {
    const partialVolume = -(R * T * (1 / v - F.FnV[i]!)) / pV;
    byT[i] = F.FnT[i]! + 1 / T - (partialVolume * pT) / (R * T);
    byP[i] = partialVolume / (R * T) - 1 / p;
  }
}

/**
 * Newton to the point where one unknown (0…n−1: ln K_i, n: ln T, n + 1: ln p) has the given value.
 *
 * Returns  the number of iterations, or -1 when it did not converge or fell to the trivial solution
 */
export function solveSaturation(
  model: FluidModel,
  z: ArrayLike<number>,
  beta: number,
  point: SaturationPoint,
  specified: number,
  value: number,
  work: SaturationWork,
  maximumIterations = 30,
): number {
  const count = z.length;
  const size = count + 2;
  const { jacobian, residual } = work;
  let previous = Infinity;
  for (let iteration = 1; iteration <= maximumIterations; iteration++) {
    let error = evaluateSaturation(model, z, beta, point, work);
    const gap = read(point, specified, count) - value;
    residual[count + 1] = gap;
    jacobian[(count + 1) * size + specified] = 1;
    error = Math.max(error, Math.abs(gap));
    if (!Number.isFinite(error)) return -1;
    if (error < 1e-12 || (error < 1e-10 && error >= 0.5 * previous)) return isTrivial(point, z) ? -1 : iteration;
    previous = error;
    if (!solveLinear(jacobian, residual, size)) return -1;
    let largest = 0;
    for (let k = 0; k < size; k++) {
      const weight = k < count ? 1 : 4; // a step of 0.25 in ln T or ln p counts as one in ln K
      largest = Math.max(largest, weight * Math.abs(residual[k]!));
    }
    if (!Number.isFinite(largest)) return -1;
    const length = largest > 2 ? 2 / largest : 1;
    for (let i = 0; i < count; i++) if (z[i]! > 0) point.lnK[i] = point.lnK[i]! - length * residual[i]!;
    point.lnT -= length * residual[count]!;
    point.lnP -= length * residual[count + 1]!;
    const T = Math.exp(point.lnT);
    if (!(T > model.temperatureRangeK[0] && T < model.temperatureRangeK[1]) || Math.abs(point.lnP) > 60) return -1;
  }
  return -1;
}

function read(point: SaturationPoint, index: number, count: number): number {
  return index < count ? point.lnK[index]! : index === count ? point.lnT : point.lnP;
}

function isTrivial(point: SaturationPoint, z: ArrayLike<number>): boolean {
  for (let i = 0; i < z.length; i++) if (z[i]! > 0 && Math.abs(point.lnK[i]!) > 1e-4) return false;
  return true;
}
