import type { FluidModel } from "../eos/fluid-model";
import { solvePositiveDefinite } from "./linear-solve";
import { createPhaseWork, evaluateLnPhi, type PhaseWork } from "./phase-work";
import { rachfordRice } from "./rachford-rice";

export interface TwoPhaseWork {
  readonly vapour: PhaseWork;
  readonly liquid: PhaseWork;
  /** In: the first guess. Out: the answer. */
  readonly lnK: Float64Array;
  readonly K: Float64Array;
  /** Moles of each component in vapour and liquid, of one mole of feed. */
  readonly v: Float64Array;
  readonly l: Float64Array;
  readonly scale: Float64Array;
  readonly step: Float64Array;
  readonly hessian: Float64Array;
  beta: number;
}

export type TwoPhaseOutcome = "converged" | "one-phase" | "failed";

const substitutions = 30;
const newtonSteps = 40;
/** Largest difference of ln fugacity at convergence. */
const equalFugacity = 1e-11;

/**
 * Two phases of feed z at (T, p) from a first guess of ln K: accelerated successive substitution, then Newton on the Gibbs
 * energy in the vapour's mole numbers, scaled by √(v_i l_i/z_i).
 *
 * Source   Michelsen, Fluid Phase Equilib. 9 (1982) 21-40; acceleration by the dominant eigenvalue, Orbach and Crowe,
 *          Can. J. Chem. Eng. 49 (1971) 509.
 * Returns  "converged" with both phases and beta filled; "one-phase" when the compositions meet or a phase vanishes;
 *          "failed" when the iterations ran out
 */
export function solveTwoPhase(
  model: FluidModel,
  T: number,
  p: number,
  z: ArrayLike<number>,
  work: TwoPhaseWork,
): TwoPhaseOutcome {
  const { vapour, liquid, lnK, step } = work;
  const count = z.length;
  let before = 0;

  for (let iteration = 0; iteration < substitutions; iteration++) {
    split(z, work);
    evaluateLnPhi(model, vapour, T, p, "stable", 1);
    evaluateLnPhi(model, liquid, T, p, "stable", 1);
    let along = 0;
    let error = 0;
    let distinct = 0;
    for (let i = 0; i < count; i++) {
      if (!(z[i]! > 0)) continue;
      const change = liquid.lnPhi[i]! - vapour.lnPhi[i]! - lnK[i]!;
      along += step[i]! * change;
      error += change * change;
      step[i] = change;
      lnK[i] = lnK[i]! + change;
      distinct = Math.max(distinct, Math.abs(lnK[i]!));
    }
    if (distinct < 1e-5) return "one-phase";
    const inside = work.beta > 0 && work.beta < 1;
    if (error < 1e-18 && !inside) return "one-phase";
    if (inside && iteration >= 2 && error < 1e-4) break;
    const lambda = iteration > 0 ? along / before : 0;
    if (iteration % 4 === 3 && lambda > 0 && lambda < 0.97) {
      for (let i = 0; i < count; i++) if (z[i]! > 0) lnK[i] = lnK[i]! + (step[i]! * lambda) / (1 - lambda);
    }
    before = error;
  }
  split(z, work);
  if (!(work.beta > 0 && work.beta < 1)) return "one-phase";
  return newton(model, T, p, z, work);
}

/**
 * Compositions and β for the current ln K. Where the K-values ask for β outside [0, 1], the feed stands for one phase and the
 * other is its trial phase: the next substitution is then one of the stability test, which brings an unstable feed back inside.
 */
function split(z: ArrayLike<number>, work: TwoPhaseWork): void {
  const { lnK, K, vapour, liquid, v, l } = work;
  const count = z.length;
  let vapourSum = 0; // Σ z K > 1 and Σ z/K > 1 together: 0 < β < 1
  let liquidSum = 0;
  for (let i = 0; i < count; i++) {
    if (!(z[i]! > 0)) continue;
    K[i] = Math.exp(lnK[i]!);
    vapourSum += z[i]! * K[i]!;
    liquidSum += z[i]! / K[i]!;
  }
  if (vapourSum > 1 && liquidSum > 1) {
    const beta = rachfordRice(z, K, work.beta);
    work.beta = beta;
    for (let i = 0; i < count; i++) {
      const x = z[i]! > 0 ? z[i]! / (1 + beta * (K[i]! - 1)) : 0;
      liquid.composition[i] = x;
      vapour.composition[i] = z[i]! > 0 ? K[i]! * x : 0;
      v[i] = beta * vapour.composition[i]!;
      l[i] = (1 - beta) * x;
    }
    return;
  }
  const bubble = vapourSum <= 1;
  work.beta = bubble ? 0 : 1;
  for (let i = 0; i < count; i++) {
    const present = z[i]! > 0;
    liquid.composition[i] = bubble ? z[i]! : present ? z[i]! / (K[i]! * liquidSum) : 0;
    vapour.composition[i] = bubble ? (present ? (z[i]! * K[i]!) / vapourSum : 0) : z[i]!;
  }
}

function newton(model: FluidModel, T: number, p: number, z: ArrayLike<number>, work: TwoPhaseWork): TwoPhaseOutcome {
  const { vapour, liquid, lnK, v, l, scale, step, hessian } = work;
  const count = z.length;
  let previous = Infinity;
  let damping = 0;

  for (let iteration = 0; iteration < newtonSteps; iteration++) {
    let V = 0;
    let L = 0;
    for (let i = 0; i < count; i++) {
      V += v[i]!;
      L += l[i]!;
    }
    if (!(V > 1e-14 && L > 1e-14)) return "one-phase";
    for (let i = 0; i < count; i++) {
      vapour.composition[i] = v[i]! / V;
      liquid.composition[i] = l[i]! / L;
    }
    evaluateLnPhi(model, vapour, T, p, "stable", 2);
    evaluateLnPhi(model, liquid, T, p, "stable", 2);

    let error = 0;
    let weighted = 0;
    let distinct = 0;
    for (let i = 0; i < count; i++) {
      if (!(z[i]! > 0)) {
        scale[i] = 0;
        step[i] = 0;
        continue;
      }
      const split = Math.log((v[i]! * L) / (l[i]! * V));
      const gradient = split + vapour.lnPhi[i]! - liquid.lnPhi[i]!;
      lnK[i] = split;
      distinct = Math.max(distinct, Math.abs(split));
      error = Math.max(error, Math.abs(gradient));
      scale[i] = Math.sqrt((v[i]! * l[i]!) / z[i]!);
      step[i] = -scale[i]! * gradient;
      weighted += step[i]! * step[i]!;
    }
    if (distinct < 1e-6) return "one-phase";
    work.beta = V;
    if (error < equalFugacity) return "converged";
    damping = weighted > previous ? Math.max(0.3, damping * 3) : damping > 0.02 ? damping / 3 : 0;
    previous = weighted;

    if (!solveStep(work, count, 1 / V, 1 / L, damping)) {
      damping = Math.max(0.3, damping * 3);
      previous = Infinity;
      gradientStep(z, work);
    }
    let longest = 1;
    for (let i = 0; i < count; i++) {
      const change = scale[i]! * step[i]!;
      if (change < 0) longest = Math.min(longest, (0.9 * v[i]!) / -change);
      else if (change > 0) longest = Math.min(longest, (0.9 * l[i]!) / change);
    }
    for (let i = 0; i < count; i++) {
      if (!(z[i]! > 0)) continue;
      const change = longest * scale[i]! * step[i]!;
      // The smaller of the two carries the digits; the larger is what is left of the feed.
      if (v[i]! < l[i]!) {
        v[i] = v[i]! + change;
        l[i] = z[i]! - v[i]!;
      } else {
        l[i] = l[i]! - change;
        v[i] = z[i]! - l[i]!;
      }
    }
  }
  return "failed";
}

/** Newton direction in scaled variables; false when the Hessian is not positive definite. */
function solveStep(work: TwoPhaseWork, count: number, perV: number, perL: number, damping: number): boolean {
  const { vapour, liquid, scale, step, hessian } = work;
  for (let i = 0; i < count; i++) {
    for (let j = 0; j <= i; j++) {
      const curvature = (vapour.lnPhiByMoles[i * count + j]! - 1) * perV + (liquid.lnPhiByMoles[i * count + j]! - 1) * perL;
      hessian[i * count + j] = scale[i]! * scale[j]! * curvature;
    }
    hessian[i * count + i] = hessian[i * count + i]! + 1 + damping;
  }
  return solvePositiveDefinite(hessian, step, count);
}

/** Steepest descent in the scaled variables, which is one step of successive substitution to first order. */
function gradientStep(z: ArrayLike<number>, work: TwoPhaseWork): void {
  const { vapour, liquid, lnK, scale, step } = work;
  for (let i = 0; i < z.length; i++) {
    step[i] = z[i]! > 0 ? -0.5 * scale[i]! * (lnK[i]! + vapour.lnPhi[i]! - liquid.lnPhi[i]!) : 0;
  }
}

export function createTwoPhaseWork(count: number): TwoPhaseWork {
  return {
    vapour: createPhaseWork(count),
    liquid: createPhaseWork(count),
    lnK: new Float64Array(count),
    K: new Float64Array(count),
    v: new Float64Array(count),
    l: new Float64Array(count),
    scale: new Float64Array(count),
    step: new Float64Array(count),
    hessian: new Float64Array(count * count),
    beta: 0.5,
  };
}
