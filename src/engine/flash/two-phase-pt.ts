import type { FluidModel, Root } from "../eos/fluid-model";
import { minimiseGibbs } from "./minimise-gibbs";
import { createPhaseWork, evaluateLnPhi, type PhaseWork } from "./phase-work";
import { rachfordRice } from "./rachford-rice";

export interface TwoPhaseWork {
  readonly vapour: PhaseWork;
  readonly liquid: PhaseWork;
  /** In: the first guess. Out: the answer. */
  readonly lnK: Float64Array;
  readonly K: Float64Array;
  /** Moles of each component in the two phases, of one mole of feed. */
  readonly v: Float64Array;
  readonly l: Float64Array;
  readonly savedV: Float64Array;
  readonly savedL: Float64Array;
  readonly scale: Float64Array;
  readonly step: Float64Array;
  readonly gradient: Float64Array;
  readonly hessian: Float64Array;
  beta: number;
  /** Σ n_i (ln x_i + ln φ_i) over both phases: the Gibbs energy over R T, less what depends on T and p alone. */
  gibbs: number;
}

export type TwoPhaseOutcome = "converged" | "one-phase" | "failed";

const substitutions = 30;
const longestOutside = 5;
const leastShare = 1e-13;
/** ln K beyond which a component is in one phase alone for all that numbers can tell. */
const extreme = 300;

/**
 * Two phases of feed z at (T, p) from a first guess of ln K: accelerated successive substitution, each phase on its own root,
 * then Newton on the Gibbs energy.
 *
 * Source   Michelsen, Fluid Phase Equilib. 9 (1982) 21-40; acceleration by the dominant eigenvalue, Orbach and Crowe,
 *          Can. J. Chem. Eng. 49 (1971) 509.
 * Returns  "converged" with both phases and beta filled; "one-phase" when the compositions meet or a phase vanishes, which is
 *          no verdict on the feed; "failed" when the iterations ran out
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
  let outside = 0;

  for (let iteration = 0; iteration < substitutions; iteration++) {
    split(z, work);
    evaluateLnPhi(model, vapour, T, p, "vapour", 1);
    evaluateLnPhi(model, liquid, T, p, "liquid", 1);
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
    if (!Number.isFinite(error)) return "failed";
    if (distinct < 1e-5) return "one-phase";
    const inside = work.beta > 0 && work.beta < 1;
    // One phase and its trial is what the stability test does better.
    if (!inside && (++outside === longestOutside || error < 1e-18)) return "one-phase";
    if (inside && iteration >= 2 && error < 1e-4) break;
    const lambda = iteration > 0 ? along / before : 0;
    if (iteration % 4 === 3 && inside && lambda > 0 && lambda < 0.97) {
      for (let i = 0; i < count; i++) if (z[i]! > 0) lnK[i] = lnK[i]! + (step[i]! * lambda) / (1 - lambda);
    }
    before = error;
  }
  split(z, work);
  if (!(work.beta > 0 && work.beta < 1)) return "one-phase";
  return minimiseGibbs(model, T, p, z, work);
}

/**
 * Two phases of an unstable feed from its trial phase: a little of the trial is taken out of the feed, which lowers the Gibbs
 * energy, and the descent goes on from there. Slower than the K-values, but it cannot fall back to one phase.
 */
export function splitOffTrial(
  model: FluidModel,
  T: number,
  p: number,
  z: ArrayLike<number>,
  trial: ArrayLike<number>,
  work: TwoPhaseWork,
): TwoPhaseOutcome {
  const { v, l, savedV } = work;
  let lowest = Infinity;
  for (let amount = 0.5; amount > 1e-9; amount *= 0.25) {
    for (let i = 0; i < z.length; i++) {
      v[i] = z[i]! > 0 ? Math.max(Math.min(amount * trial[i]!, 0.6 * z[i]!), 1e-290) : 0;
      l[i] = z[i]! - v[i]!;
    }
    const gibbs = gibbsOf(model, T, p, z, work, "stable");
    if (gibbs < lowest) {
      lowest = gibbs;
      savedV.set(v);
    }
  }
  const start = savedV.slice();
  let outcome: TwoPhaseOutcome = "failed";
  for (const firstDamping of [1e-9, 1e-5, 0.05]) {
    for (let i = 0; i < z.length; i++) {
      v[i] = start[i]!;
      l[i] = z[i]! - v[i]!;
    }
    outcome = minimiseGibbs(model, T, p, z, work, firstDamping);
    if (outcome === "converged") break;
  }
  return outcome;
}

/** Two phases, started from one component nearly pure and the rest of the feed. */
export function splitOffComponent(
  model: FluidModel,
  T: number,
  p: number,
  z: ArrayLike<number>,
  component: number,
  work: TwoPhaseWork,
): TwoPhaseOutcome {
  for (let i = 0; i < z.length; i++) {
    work.v[i] = z[i]! * (i === component ? 0.99 : 1e-8);
    work.l[i] = z[i]! - work.v[i]!;
  }
  return minimiseGibbs(model, T, p, z, work, 1e-5);
}

function gibbsOf(model: FluidModel, T: number, p: number, z: ArrayLike<number>, work: TwoPhaseWork, root: Root): number {
  const { v, l, vapour, liquid } = work;
  let V = 0;
  let L = 0;
  for (let i = 0; i < z.length; i++) {
    V += v[i]!;
    L += l[i]!;
  }
  for (let i = 0; i < z.length; i++) {
    vapour.composition[i] = v[i]! / V;
    liquid.composition[i] = l[i]! / L;
  }
  evaluateLnPhi(model, vapour, T, p, root, 1);
  evaluateLnPhi(model, liquid, T, p, root, 1);
  let gibbs = 0;
  for (let i = 0; i < z.length; i++) {
    if (!(z[i]! > 0)) continue;
    gibbs += v[i]! * (Math.log(vapour.composition[i]!) + vapour.lnPhi[i]!);
    gibbs += l[i]! * (Math.log(liquid.composition[i]!) + liquid.lnPhi[i]!);
  }
  return gibbs;
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
    lnK[i] = Math.max(-extreme, Math.min(extreme, lnK[i]!));
    K[i] = Math.exp(lnK[i]!);
    vapourSum += z[i]! * K[i]!;
    liquidSum += z[i]! / K[i]!;
  }
  const beta = vapourSum > 1 && liquidSum > 1 ? rachfordRice(z, K, work.beta) : 0;
  // So near an end, 1 − β is round-off and a component of extreme K (a hydrocarbon against cold water) would have no composition.
  if (beta > leastShare && beta < 1 - leastShare) {
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
  const bubble = vapourSum <= 1 || (liquidSum > 1 && beta < 0.5);
  work.beta = bubble ? 0 : 1;
  for (let i = 0; i < count; i++) {
    const present = z[i]! > 0;
    liquid.composition[i] = bubble ? z[i]! : present ? z[i]! / (K[i]! * liquidSum) : 0;
    vapour.composition[i] = bubble ? (present ? (z[i]! * K[i]!) / vapourSum : 0) : z[i]!;
  }
}

export function createTwoPhaseWork(count: number): TwoPhaseWork {
  const vector = () => new Float64Array(count);
  return {
    vapour: createPhaseWork(count),
    liquid: createPhaseWork(count),
    lnK: vector(),
    K: vector(),
    v: vector(),
    l: vector(),
    savedV: vector(),
    savedL: vector(),
    scale: vector(),
    step: vector(),
    gradient: vector(),
    hessian: new Float64Array(count * count),
    beta: 0.5,
    gibbs: 0,
  };
}
