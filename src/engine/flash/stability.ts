import { EngineError } from "../errors";
import type { FluidModel, Stability } from "../eos/fluid-model";
import { solvePositiveDefinite } from "./linear-solve";
import { createPhaseWork, evaluateLnPhi, type PhaseWork } from "./phase-work";
import { wilsonLnK } from "./wilson";

/** Below this a negative tangent-plane distance is a split and not round-off. */
const negativeDistance = -1e-10;
/** A search ends the test only where it is beyond doubt: a phase in equilibrium has its partners at zero, give or take their round-off. */
const certainDistance = -1e-6;
const substitutions = 4;
const pureSearches = 3;
const newtonSteps = 60;
/** Strongly non-ideal trials (water in the cold) defeat Newton from afar: half-length substitutions bring them near. */
const dampedSubstitutions = 300;

export interface StabilityEffort {
  /** How many nearly pure starts are followed, likeliest first. */
  searches?: number;
  /** The other phase of a known split: a search that comes back to it has found nothing new and ends there. */
  partner?: ArrayLike<number>;
}

interface Trial {
  distance: number;
  trivial: boolean;
}

/**
 * Does the homogeneous phase of lowest Gibbs energy at (T, p) split?
 *
 *   tm(W) = 1 + Σ W_i (ln W_i + ln φ_i(W) − d_i − 1),   d_i = ln z_i + ln φ_i(z)
 *
 * The phase is unstable as soon as one W has tm < 0, so a search may stop there; it is called stable only when every search
 * has converged to a stationary point with tm ≥ 0 or back to z.
 *
 * Source   Michelsen, Fluid Phase Equilib. 9 (1982) 1-19: Wilson trials on both sides, then each component nearly pure;
 *          successive substitution, then Newton in 2√W.
 * effort   how wide the search is; the default agrees with a search from every corner (brute-force.test.ts)
 * Throws   "no-convergence" when a search does neither: a failed test is never a verdict
 */
export function testStability(
  model: FluidModel,
  T: number,
  p: number,
  z: ArrayLike<number>,
  { searches = pureSearches, partner }: StabilityEffort = {},
): Stability {
  const count = z.length;
  const work = stabilityWork(count);
  const { feed, trial, d, lnK, W, best } = work;
  feed.composition.set(z);
  evaluateLnPhi(model, feed, T, p, "stable", 1);
  let active = 0;
  for (let i = 0; i < count; i++) {
    const present = z[i]! > 0;
    if (present) active++;
    d[i] = present ? Math.log(z[i]!) + feed.lnPhi[i]! : -Infinity;
  }
  if (active === 1) {
    return { stable: true, tangentPlaneDistance: 0, trialComposition: Float64Array.from(z), trialIsVapour: false };
  }
  wilsonLnK(model, T, p, lnK);

  let lowest = Infinity;
  let lightest = false;
  const consider = (start: (i: number) => number): boolean => {
    for (let i = 0; i < count; i++) W[i] = z[i]! > 0 ? start(i) : 0;
    const { distance, trivial } = search(model, T, p, z, work, partner);
    if (!trivial && distance < lowest) {
      lowest = distance;
      best.set(trial.composition);
      lightest = trial.molarVolume > feed.molarVolume;
    }
    return distance < certainDistance && !trivial;
  };

  const found =
    consider((i) => z[i]! * Math.exp(lnK[i]!)) ||
    consider((i) => z[i]! * Math.exp(-lnK[i]!)) ||
    likeliestPure(model, T, p, z, work, searches).some((pure) => consider((i) => (i === pure ? 0.999 : 0.001 * z[i]!)));

  return {
    stable: !found && lowest >= negativeDistance,
    tangentPlaneDistance: lowest === Infinity ? 0 : lowest,
    trialComposition: Float64Array.from(lowest === Infinity ? z : best),
    trialIsVapour: lightest,
  };
}

/**
 * The components whose pure phase lies lowest over the tangent plane, ln φ_i(pure) − d_i: where a new phase is rich in one
 * component, it is rich in one of these. flash/brute-force.test.ts compares the verdicts with a search from every corner.
 */
function likeliestPure(
  model: FluidModel,
  T: number,
  p: number,
  z: ArrayLike<number>,
  work: StabilityWork,
  searches: number,
): number[] {
  const { trial, d } = work;
  const chosen: number[] = [];
  const heights: number[] = [];
  for (let i = 0; i < z.length; i++) {
    if (!(z[i]! > 1e-12)) continue;
    trial.composition.fill(0);
    trial.composition[i] = 1;
    evaluateLnPhi(model, trial, T, p, "stable", 1);
    const height = trial.lnPhi[i]! - d[i]!;
    let place = chosen.length;
    while (place > 0 && heights[place - 1]! > height) place--;
    if (place >= searches) continue;
    chosen.splice(place, 0, i);
    heights.splice(place, 0, height);
    if (chosen.length > searches) {
      chosen.pop();
      heights.pop();
    }
  }
  return chosen;
}

/** Follows W from where it stands to a stationary point of tm, or until tm < 0 is certain. */
function search(
  model: FluidModel,
  T: number,
  p: number,
  z: ArrayLike<number>,
  work: StabilityWork,
  partner?: ArrayLike<number>,
): Trial {
  const { trial, d, W, saved, step, gradient } = work;
  const count = z.length;
  let distance = Infinity;
  let accepted = Infinity;
  let length = 1;

  const rescue = substitutions + newtonSteps;
  const lastNewton = rescue + dampedSubstitutions;
  for (let iteration = 0; iteration < lastNewton + newtonSteps; iteration++) {
    const newton = (iteration >= substitutions && iteration < rescue) || iteration >= lastNewton;
    let sum = 0;
    for (let i = 0; i < count; i++) sum += W[i]!;
    for (let i = 0; i < count; i++) trial.composition[i] = W[i]! / sum;
    evaluateLnPhi(model, trial, T, p, "stable", newton ? 2 : 1);

    let tm = 1;
    let slopeToFeed = 0;
    let gap = 0;
    let error = 0;
    for (let i = 0; i < count; i++) {
      if (!(z[i]! > 0)) continue;
      const g = Math.log(W[i]!) + trial.lnPhi[i]! - d[i]!;
      gradient[i] = g;
      tm += W[i]! * (g - 1);
      slopeToFeed += (W[i]! - z[i]!) * g;
      gap += (W[i]! - z[i]!) ** 2 / z[i]!;
      error = Math.max(error, Math.sqrt(W[i]!) * Math.abs(g));
    }
    distance = tm;
    if (gap < 1e-8) return { distance: 0, trivial: true };
    if (partner && Math.abs(tm) < 1e-4 && distanceTo(partner, W) < 1e-3) return { distance: 0, trivial: true };
    if (iteration >= 2 && tm < -1e-6) return { distance, trivial: false };
    if (error < 1e-9) return { distance, trivial: false };
    // On the way back to z, tm is half its slope along W − z (Michelsen 1982).
    if (iteration >= 1 && Math.abs(tm) < 1e-3 && gap < 0.05 && Math.abs((2 * tm) / slopeToFeed - 1) < 0.1 && tm > 0) {
      return { distance: 0, trivial: true };
    }
    if (!newton) {
      for (let i = 0; i < count; i++) {
        if (!(z[i]! > 0)) continue;
        const lnW = Math.log(W[i]!) - (iteration < substitutions ? 1 : 0.5) * gradient[i]!;
        W[i] = Math.exp(Math.max(-600, Math.min(600, lnW)));
      }
      accepted = Infinity;
      continue;
    }
    if (tm > accepted + 1e-13 * Math.max(1, Math.abs(accepted)) && error > 1e-6) {
      length *= 0.3;
      if (length < 1e-9) {
        if (iteration >= rescue) break;
        iteration = rescue - 1;
        W.set(saved);
        continue;
      }
    } else {
      accepted = tm;
      saved.set(W);
      newtonDirection(work, sum);
      length = 1;
      // √W may fall to a fifth at most; growth is left to the energy test.
      for (let i = 0; i < count; i++) {
        if (W[i]! > 0 && step[i]! < 0) length = Math.min(length, (1.6 * Math.sqrt(W[i]!)) / -step[i]!);
      }
    }
    for (let i = 0; i < count; i++) {
      if (!(saved[i]! > 0)) continue;
      const root = Math.sqrt(saved[i]!) + 0.5 * length * step[i]!;
      W[i] = Math.max(root * root, 1e-270);
    }
  }
  throw new EngineError("no-convergence", "the phase stability test did not converge", {
    temperatureK: T,
    pressurePa: p,
    tangentPlaneDistance: distance,
    iterations: substitutions + newtonSteps,
  });
}

/** Σ (W_i − y_i)²/y_i over the components present. */
function distanceTo(y: ArrayLike<number>, W: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < W.length; i++) if (y[i]! > 0) sum += (W[i]! - y[i]!) ** 2 / y[i]!;
  return sum;
}

/** Newton direction of tm in α = 2√W, damped until it points downhill. */
function newtonDirection({ trial, W, gradient, step, root, hessian }: StabilityWork, sum: number): void {
  const count = W.length;
  for (let i = 0; i < count; i++) root[i] = Math.sqrt(W[i]!);
  for (let damping = 0; ; damping = damping === 0 ? 0.05 : damping * 4) {
    for (let i = 0; i < count; i++) {
      for (let j = 0; j <= i; j++) {
        // lnPhiByMoles is for one mole of phase; W holds `sum` moles
        hessian[i * count + j] = (root[i]! * root[j]! * trial.lnPhiByMoles[i * count + j]!) / sum;
      }
      const own = i * count + i;
      hessian[own] = hessian[own]! + 1 + damping + (W[i]! > 0 ? 0.5 * gradient[i]! : 0);
      step[i] = W[i]! > 0 ? -root[i]! * gradient[i]! : 0;
    }
    if (damping > 1e12 || solvePositiveDefinite(hessian, step, count)) return;
  }
}

interface StabilityWork {
  feed: PhaseWork;
  trial: PhaseWork;
  d: Float64Array;
  lnK: Float64Array;
  W: Float64Array;
  best: Float64Array;
  saved: Float64Array;
  step: Float64Array;
  gradient: Float64Array;
  root: Float64Array;
  hessian: Float64Array;
}

const works = new Map<number, StabilityWork>();

function stabilityWork(count: number): StabilityWork {
  let work = works.get(count);
  if (!work) {
    work = {
      feed: createPhaseWork(count),
      trial: createPhaseWork(count),
      d: new Float64Array(count),
      lnK: new Float64Array(count),
      W: new Float64Array(count),
      best: new Float64Array(count),
      saved: new Float64Array(count),
      step: new Float64Array(count),
      gradient: new Float64Array(count),
      root: new Float64Array(count),
      hessian: new Float64Array(count * count),
    };
    works.set(count, work);
  }
  return work;
}
