import type { FluidModel } from "../eos/fluid-model";
import { solvePositiveDefinite } from "./linear-solve";
import { createPhaseWork, evaluateLnPhi, type PhaseWork } from "./phase-work";

/** Three phases of one mole of feed at given temperature and pressure. */
export interface ThreePhaseWork {
  readonly phases: readonly [PhaseWork, PhaseWork, PhaseWork];
  /** In: the first guess. Out: the answer. Moles of each component in each phase. */
  readonly moles: readonly [Float64Array, Float64Array, Float64Array];
  readonly saved: readonly [Float64Array, Float64Array, Float64Array];
  readonly totals: Float64Array;
  /** For each component the phase that holds most of it; the amounts in the two others are the unknowns. */
  readonly home: Int32Array;
  /** Home of each component when the step was computed, for which alone the step means anything. */
  readonly stepHome: Int32Array;
  readonly scale: Float64Array;
  readonly gradient: Float64Array;
  readonly step: Float64Array;
  readonly hessian: Float64Array;
  gibbs: number;
}

/** "vanished": one phase has run out of matter, and what is left in the others is a better answer. */
export type ThreePhaseOutcome = "converged" | "vanished" | "failed";

const maximumIterations = 120;
const equalFugacity = 1e-11;
const gibbsNoise = 1e-13;
/** Below this share of the feed a phase counts as gone. */
const nothing = 1e-12;

/**
 * Descends from the amounts in `work` to a minimum of the Gibbs energy of three phases at (T, p), each on its root of lowest Gibbs
 * energy: the two-phase descent of `minimise-gibbs.ts` with two unknowns a component. It cannot end above the energy it started from.
 *
 * Source   Michelsen, Fluid Phase Equilib. 9 (1982) 21-40; Michelsen and Mollerup (2007), chapter 11.
 */
export function minimiseThreePhases(
  model: FluidModel,
  T: number,
  p: number,
  z: ArrayLike<number>,
  work: ThreePhaseWork,
): ThreePhaseOutcome {
  const { moles, saved, totals } = work;
  let accepted = Infinity;
  let previousError = Infinity;
  let length = 1;
  for (let iteration = 0; iteration < maximumIterations; iteration++) {
    if (!evaluatePhases(model, T, p, work)) return "vanished";
    const error = gibbsAndGradient(z, work);
    if (error < equalFugacity || (error < 1e-10 && error >= 0.5 * previousError)) return apart(work) ? "converged" : "vanished";
    if (!(work.gibbs <= accepted + gibbsNoise) && !(error <= 1e-7)) {
      length *= 0.3;
      if (length < 1e-8) return "failed";
      advance(z, work, length);
      continue;
    }
    accepted = work.gibbs;
    previousError = error;
    for (let k = 0; k < 3; k++) saved[k]!.set(moles[k]!);
    let damping = 0;
    while (!solveStep(z, work, damping)) {
      damping = damping === 0 ? 1e-9 : damping * 10;
      if (damping > 1e12) return "failed";
    }
    work.stepHome.set(work.home);
    for (let a = 0; a < work.step.length; a++) work.step[a] = work.step[a]! * work.scale[a]!;
    length = longestStep(z, work);
    advance(z, work, length);
    if (totals.some((total) => total < nothing)) return "vanished";
  }
  return "failed";
}

/** Compositions, totals and ln φ with derivatives of the three phases; false when one is empty. */
function evaluatePhases(model: FluidModel, T: number, p: number, { phases, moles, totals }: ThreePhaseWork): boolean {
  for (let k = 0; k < 3; k++) {
    const amounts = moles[k]!;
    let total = 0;
    for (let i = 0; i < amounts.length; i++) total += amounts[i]!;
    if (!(total > nothing)) return false;
    totals[k] = total;
    const { composition } = phases[k]!;
    for (let i = 0; i < amounts.length; i++) composition[i] = amounts[i]! / total;
    evaluateLnPhi(model, phases[k]!, T, p, "stable", 2);
  }
  return true;
}

/** Fills the gradient, the homes and the scales; returns the largest difference of ln fugacity. */
function gibbsAndGradient(z: ArrayLike<number>, work: ThreePhaseWork): number {
  const { phases, moles, home, scale, gradient } = work;
  const count = z.length;
  let gibbs = 0;
  let error = 0;
  for (let i = 0; i < count; i++) {
    if (!(z[i]! > 0)) {
      home[i] = 0;
      scale[2 * i] = scale[2 * i + 1] = gradient[2 * i] = gradient[2 * i + 1] = 0;
      continue;
    }
    let most = 0;
    for (let k = 1; k < 3; k++) if (moles[k]![i]! > moles[most]![i]!) most = k;
    home[i] = most;
    const atHome = Math.log(phases[most]!.composition[i]!) + phases[most]!.lnPhi[i]!;
    gibbs += moles[most]![i]! * atHome;
    for (let side = 0; side < 2; side++) {
      const k = other(most, side);
      const amount = moles[k]![i]!;
      const away = Math.log(phases[k]!.composition[i]!) + phases[k]!.lnPhi[i]!;
      gibbs += amount * away;
      gradient[2 * i + side] = away - atHome;
      scale[2 * i + side] = Math.sqrt((amount * moles[most]![i]!) / (amount + moles[most]![i]!));
      error = Math.max(error, Math.abs(away - atHome));
    }
  }
  work.gibbs = gibbs;
  return error;
}

/** The phase of unknown `side` of a component whose home is `home`: the other two in order. */
function other(home: number, side: number): number {
  return side < home ? side : side + 1;
}

function solveStep(z: ArrayLike<number>, work: ThreePhaseWork, damping: number): boolean {
  const { home, scale, gradient, step, hessian } = work;
  const count = z.length;
  const size = 2 * count;
  for (let a = 0; a < size; a++) {
    const i = a >> 1;
    const p = other(home[i]!, a & 1);
    for (let b = 0; b <= a; b++) {
      const j = b >> 1;
      const q = other(home[j]!, b & 1);
      let value = 0;
      if (p === q) value += curvature(work, p, i, j);
      if (p === home[j]) value -= curvature(work, p, i, j);
      if (home[i] === q) value -= curvature(work, q, i, j);
      if (home[i] === home[j]) value += curvature(work, home[i]!, i, j);
      hessian[a * size + b] = scale[a]! * scale[b]! * value;
    }
    if (!(z[i]! > 0)) hessian[a * size + a] = 1;
    hessian[a * size + a] = hessian[a * size + a]! + damping;
    step[a] = -scale[a]! * gradient[a]!;
  }
  return solvePositiveDefinite(hessian, step, size);
}

/** ∂²G/∂n_i∂n_j of one phase over R T. */
function curvature({ phases, totals }: ThreePhaseWork, k: number, i: number, j: number): number {
  const { composition, lnPhiByMoles } = phases[k]!;
  const shared = lnPhiByMoles[i * composition.length + j]! - 1;
  return (i === j && composition[i]! > 0 ? shared + 1 / composition[i]! : shared) / totals[k]!;
}

/** No amount may fall by more than nine tenths in one step. */
function longestStep(z: ArrayLike<number>, { moles, stepHome: home, step }: ThreePhaseWork): number {
  let length = 1;
  for (let i = 0; i < z.length; i++) {
    if (!(z[i]! > 0)) continue;
    let leaving = 0;
    for (let side = 0; side < 2; side++) {
      const change = step[2 * i + side]!;
      leaving += change;
      if (change < 0) length = Math.min(length, (0.9 * moles[other(home[i]!, side)]![i]!) / -change);
    }
    if (leaving > 0) length = Math.min(length, (0.9 * moles[home[i]!]![i]!) / leaving);
  }
  return length;
}

function advance(z: ArrayLike<number>, { moles, saved, totals, stepHome: home, step }: ThreePhaseWork, length: number): void {
  totals.fill(0);
  for (let i = 0; i < z.length; i++) {
    if (!(z[i]! > 0)) continue;
    let away = 0;
    for (let side = 0; side < 2; side++) {
      const k = other(home[i]!, side);
      const amount = Math.max(saved[k]![i]! + length * step[2 * i + side]!, 1e-290);
      moles[k]![i] = amount;
      totals[k] = totals[k]! + amount;
      away += amount;
    }
    moles[home[i]!]![i] = z[i]! - away;
    totals[home[i]!] = totals[home[i]!]! + z[i]! - away;
  }
}

/** Are the three phases three, and not one of them twice? */
function apart({ phases }: ThreePhaseWork): boolean {
  for (let k = 0; k < 3; k++) {
    const [a, b] = [phases[k]!, phases[(k + 1) % 3]!];
    let distance = Math.abs(a.molarVolume / b.molarVolume - 1);
    for (let i = 0; i < a.composition.length; i++) distance = Math.max(distance, Math.abs(a.composition[i]! - b.composition[i]!));
    if (distance < 1e-6) return false;
  }
  return true;
}

/**
 * Starts from two phases (`v`, `l`) and a trial phase with a negative tangent-plane distance: of several small amounts of the trial,
 * the one of lowest Gibbs energy.
 */
export function startThirdPhase(
  model: FluidModel,
  T: number,
  p: number,
  z: ArrayLike<number>,
  two: { v: ArrayLike<number>; l: ArrayLike<number> },
  trial: ArrayLike<number>,
  work: ThreePhaseWork,
): void {
  const place = (amount: number) => {
    for (let i = 0; i < z.length; i++) {
      const taken = z[i]! > 0 ? Math.max(Math.min(amount * trial[i]!, 0.6 * z[i]!), 1e-290) : 0;
      const left = z[i]! > 0 ? 1 - taken / z[i]! : 0;
      work.moles[0][i] = Math.max(two.v[i]! * left, z[i]! > 0 ? 1e-290 : 0);
      work.moles[1][i] = Math.max(two.l[i]! * left, z[i]! > 0 ? 1e-290 : 0);
      work.moles[2][i] = taken;
    }
  };
  let lowest = Infinity;
  let best = 1e-6;
  for (let amount = 0.5; amount > 1e-8; amount *= 0.25) {
    place(amount);
    if (!evaluatePhases(model, T, p, work)) continue;
    gibbsAndGradient(z, work);
    if (work.gibbs < lowest) {
      lowest = work.gibbs;
      best = amount;
    }
  }
  place(best);
}

const works = new Map<number, ThreePhaseWork>();

export function threePhaseWork(count: number): ThreePhaseWork {
  let work = works.get(count);
  if (!work) {
    const vector = () => new Float64Array(count);
    work = {
      phases: [createPhaseWork(count), createPhaseWork(count), createPhaseWork(count)],
      moles: [vector(), vector(), vector()],
      saved: [vector(), vector(), vector()],
      totals: new Float64Array(3),
      home: new Int32Array(count),
      stepHome: new Int32Array(count),
      scale: new Float64Array(2 * count),
      gradient: new Float64Array(2 * count),
      step: new Float64Array(2 * count),
      hessian: new Float64Array(4 * count * count),
      gibbs: 0,
    };
    works.set(count, work);
  }
  return work;
}
