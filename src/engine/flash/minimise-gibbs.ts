import type { FluidModel } from "../eos/fluid-model";
import { solvePositiveDefinite } from "./linear-solve";
import { evaluateLnPhi } from "./phase-work";
import type { TwoPhaseOutcome, TwoPhaseWork } from "./two-phase-pt";

const maximumIterations = 80;
/** Largest difference of ln fugacity at convergence. */
const equalFugacity = 1e-11;
/** Round-off of the Gibbs energy of one mole over R T. */
const gibbsNoise = 1e-13;

/**
 * Descends from the mole numbers in `work` to a minimum of the Gibbs energy of two phases at (T, p), each phase on its root of
 * lowest Gibbs energy: Newton in v_i scaled by √(v_i l_i/z_i), damped where the Hessian is not positive definite, and cut back
 * where the energy does not fall. It therefore cannot end above the energy it started from.
 *
 * firstDamping   added to the scaled Hessian (unit diagonal at infinite dilution) where it is indefinite: little near a critical
 *                point, where the curvature itself is little; more where water makes it wild
 *
 * Source   Michelsen, Fluid Phase Equilib. 9 (1982) 21-40; Michelsen and Mollerup (2007), chapter 10.
 */
export function minimiseGibbs(
  model: FluidModel,
  T: number,
  p: number,
  z: ArrayLike<number>,
  work: TwoPhaseWork,
  firstDamping = 1e-9,
): TwoPhaseOutcome {
  const { vapour, liquid, lnK, v, l, savedV, savedL, scale, step, gradient } = work;
  const count = z.length;
  let accepted = Infinity;
  let previousError = Infinity;
  let length = 1;

  for (let iteration = 0; iteration < maximumIterations; iteration++) {
    let V = 0;
    let L = 0;
    for (let i = 0; i < count; i++) {
      V += v[i]!;
      L += l[i]!;
    }
    if (!(V > 1e-15 && L > 1e-15)) return "one-phase";
    for (let i = 0; i < count; i++) {
      vapour.composition[i] = v[i]! / V;
      liquid.composition[i] = l[i]! / L;
    }
    evaluateLnPhi(model, vapour, T, p, "stable", 2);
    evaluateLnPhi(model, liquid, T, p, "stable", 2);

    let error = 0;
    let distinct = 0;
    let gibbs = 0;
    for (let i = 0; i < count; i++) {
      if (!(z[i]! > 0)) continue;
      const inVapour = Math.log(vapour.composition[i]!) + vapour.lnPhi[i]!;
      const inLiquid = Math.log(liquid.composition[i]!) + liquid.lnPhi[i]!;
      gibbs += v[i]! * inVapour + l[i]! * inLiquid;
      gradient[i] = inVapour - inLiquid;
      error = Math.max(error, Math.abs(gradient[i]!));
      lnK[i] = Math.log((v[i]! * L) / (l[i]! * V));
      distinct = Math.max(distinct, Math.abs(lnK[i]!));
    }
    if (distinct < 1e-7) return "one-phase";
    work.beta = V;
    work.gibbs = gibbs;
    if (error < equalFugacity || (error < 1e-10 && error >= 0.5 * previousError)) return "converged";

    if (gibbs > accepted + gibbsNoise && error > 1e-7) {
      length *= 0.3;
      if (length < 1e-8) return "failed";
      advance(z, work, length);
      continue;
    }
    accepted = gibbs;
    previousError = error;
    savedV.set(v);
    savedL.set(l);
    for (let i = 0; i < count; i++) scale[i] = z[i]! > 0 ? Math.sqrt((v[i]! * l[i]!) / z[i]!) : 0;
    let damping = 0;
    while (!solveStep(work, count, 1 / V, 1 / L, damping)) {
      damping = damping === 0 ? firstDamping : damping * 10;
      if (damping > 1e12) return "failed";
    }
    length = 1;
    for (let i = 0; i < count; i++) {
      const change = scale[i]! * step[i]!;
      if (change < 0) length = Math.min(length, (0.9 * v[i]!) / -change);
      else if (change > 0) length = Math.min(length, (0.9 * l[i]!) / change);
    }
    advance(z, work, length);
  }
  return "failed";
}

/** Mole numbers `length` along the step from the saved ones; the smaller of each pair carries the digits. */
function advance(z: ArrayLike<number>, work: TwoPhaseWork, length: number): void {
  const { v, l, savedV, savedL, scale, step } = work;
  for (let i = 0; i < z.length; i++) {
    if (!(z[i]! > 0)) continue;
    const change = length * scale[i]! * step[i]!;
    if (savedV[i]! < savedL[i]!) {
      v[i] = savedV[i]! + change;
      l[i] = z[i]! - v[i]!;
    } else {
      l[i] = savedL[i]! - change;
      v[i] = z[i]! - l[i]!;
    }
  }
}

/** Newton direction in scaled variables; false when the damped Hessian is not positive definite. */
function solveStep(work: TwoPhaseWork, count: number, perV: number, perL: number, damping: number): boolean {
  const { vapour, liquid, scale, step, gradient, hessian } = work;
  for (let i = 0; i < count; i++) {
    for (let j = 0; j <= i; j++) {
      const curvature = (vapour.lnPhiByMoles[i * count + j]! - 1) * perV + (liquid.lnPhiByMoles[i * count + j]! - 1) * perL;
      hessian[i * count + j] = scale[i]! * scale[j]! * curvature;
    }
    hessian[i * count + i] = hessian[i * count + i]! + 1 + damping;
    step[i] = -scale[i]! * gradient[i]!;
  }
  return solvePositiveDefinite(hessian, step, count);
}
