import type { FluidModel, ResidualDerivatives } from "../eos/fluid-model";
import { createResidualDerivatives } from "../eos/residual-derivatives";
import { referencePressurePa } from "../gas-constant";
import { solveLinear } from "./linear-solve";
import type { VolumeTarget } from "./two-phase-volume";

/** Three phases of one mole of feed as the unknowns of the volume-based Newton. */
export interface ThreePhaseVolumes {
  temperatureK: number;
  pressurePa: number;
  /** Moles of each component in each phase. */
  readonly moles: readonly [Float64Array, Float64Array, Float64Array];
  readonly volumes: Float64Array;
}

const maximumIterations = 40;
const nothing = 1e-12;

/**
 * Equilibrium of three phases at given overall volume and internal energy (entropy, temperature) of one mole of feed: the Newton of
 * `two-phase-volume.ts` with the amounts and volumes of two phases more than one as unknowns. Each amount, and the volume, is taken
 * from the phase that holds most of it, so the digits of the small ones are kept.
 *
 *   μ_i equal in the three phases,  p equal,  Σ U = U  (Σ S = S, or T given)
 *
 * Source   Michelsen, Fluid Phase Equilib. 158-160 (1999) 617-626, for any number of phases.
 * state    in: the guess; out: the answer
 * Returns  true when converged to three mechanically stable phases of positive pressure; false otherwise, with `state` spoiled
 */
export function solveThreeAtVolume(
  model: FluidModel,
  z: ArrayLike<number>,
  target: VolumeTarget,
  state: ThreePhaseVolumes,
): boolean {
  const work = workFor(z.length);
  const { active, size } = prepare(work, z);
  const [coldest, hottest] = model.temperatureRangeK;
  let previous = Infinity;
  for (let iteration = 0; iteration < maximumIterations; iteration++) {
    if (!(state.temperatureK > coldest && state.temperatureK < hottest)) return false;
    if (!evaluate(model, state, work)) return false;
    const error = assembleSystem(model, z, target, state, work, active, size);
    if (error < 1e-13 || (error < 1e-10 && error >= 0.5 * previous)) {
      state.pressurePa = model.gasConstantJPerMolK * state.temperatureK * work.pressures[0]!;
      return sound(model, state, work);
    }
    previous = error;
    if (!solveLinear(work.matrix, work.step, size)) return false;
    if (!advance(model, z, target, state, work, active, size)) return false;
  }
  return false;
}

interface Work {
  F: ResidualDerivatives[];
  totals: Float64Array;
  pressures: Float64Array;
  index: Int32Array;
  home: Int32Array;
  scale: Float64Array;
  step: Float64Array;
  matrix: Float64Array;
  trial: ThreePhaseVolumes["moles"];
  trialVolumes: Float64Array;
  volumeHome: number;
  cp0: Float64Array;
  h0: Float64Array;
  s0: Float64Array;
}

function prepare(work: Work, z: ArrayLike<number>): { active: number; size: number } {
  let active = 0;
  for (let i = 0; i < z.length; i++) if (z[i]! > 0) work.index[active++] = i;
  for (const amounts of work.trial) amounts.fill(0); // what is absent stays absent, whatever fluid was here before
  return { active, size: 2 * active + 3 };
}

function evaluate(model: FluidModel, state: ThreePhaseVolumes, work: Work): boolean {
  const { residual } = model;
  for (let k = 0; k < 3; k++) {
    const amounts = state.moles[k]!;
    let total = 0;
    for (let i = 0; i < amounts.length; i++) total += amounts[i]!;
    if (!(total > nothing)) return false;
    work.totals[k] = total;
    residual.setComposition(amounts);
    if (!(state.volumes[k]! > residual.minimumVolume())) return false;
    residual.evaluate(state.temperatureK, state.volumes[k]!, 2, work.F[k]!);
    work.pressures[k] = total / state.volumes[k]! - work.F[k]!.FV;
  }
  model.idealHelmholtz.evaluate(state.temperatureK, work.cp0, work.h0, work.s0);
  return true;
}

const other = (home: number, side: number): number => (side < home ? side : side + 1);

/** Second derivative of A/(R T) of one phase in (amounts, volume); component index -1 is the volume. */
function second(F: ResidualDerivatives, total: number, V: number, amounts: Float64Array, i: number, j: number): number {
  if (i < 0 && j < 0) return F.FVV + total / (V * V);
  if (i < 0) return F.FnV[j]! - 1 / V;
  if (j < 0) return F.FnV[i]! - 1 / V;
  const value = F.Fnn[i * amounts.length + j]!;
  return i === j ? value + 1 / amounts[i]! : value;
}

/** Matrix and right-hand side in scaled unknowns; returns the largest residual. */
function assembleSystem(
  model: FluidModel,
  z: ArrayLike<number>,
  target: VolumeTarget,
  state: ThreePhaseVolumes,
  work: Work,
  active: number,
  size: number,
): number {
  const { F, totals, pressures, index, home, scale, step, matrix, cp0, h0 } = work;
  const { temperatureK: T, moles, volumes } = state;
  const R = model.gasConstantJPerMolK;
  const rowT = size - 1;
  work.volumeHome = volumes[0]! >= volumes[1]! && volumes[0]! >= volumes[2]! ? 0 : volumes[1]! >= volumes[2]! ? 1 : 2;
  const component = (a: number) => (a < 2 * active ? index[a >> 1]! : -1);
  const homeOf = (a: number) => (a < 2 * active ? home[a >> 1]! : work.volumeHome);
  let error = 0;
  let cp = 0;
  let h = 0;
  for (let k = 0; k < active; k++) {
    const i = index[k]!;
    cp += z[i]! * cp0[i]!;
    h += z[i]! * h0[i]!;
    let most = 0;
    for (let p = 1; p < 3; p++) if (moles[p]![i]! > moles[most]![i]!) most = p;
    home[k] = most;
    const atHome = F[most]!.Fn[i]! + Math.log(moles[most]![i]! / volumes[most]!);
    for (let side = 0; side < 2; side++) {
      const p = other(most, side);
      const amount = moles[p]![i]!;
      const gap = F[p]!.Fn[i]! + Math.log(amount / volumes[p]!) - atHome;
      scale[2 * k + side] = Math.sqrt((amount * moles[most]![i]!) / (amount + moles[most]![i]!));
      step[2 * k + side] = -scale[2 * k + side]! * gap;
      error = Math.max(error, Math.abs(gap));
    }
  }
  for (let side = 0; side < 2; side++) {
    const p = other(work.volumeHome, side);
    const a = 2 * active + side;
    const stiffness = totals[p]! / volumes[p]! ** 2 + totals[work.volumeHome]! / volumes[work.volumeHome]! ** 2;
    scale[a] = 1 / Math.sqrt(stiffness);
    step[a] = scale[a]! * (pressures[p]! - pressures[work.volumeHome]!);
    const reference = Math.max(Math.abs(pressures[0]!), 1e-6 * Math.abs(pressures[p]!), 1e-300);
    error = Math.max(error, Math.abs(pressures[p]! - pressures[work.volumeHome]!) / reference);
  }
  const at = (p: number, i: number, j: number) => second(F[p]!, totals[p]!, volumes[p]!, moles[p]!, i, j);
  const byT = (p: number, i: number) => T * (i < 0 ? F[p]!.FTV : F[p]!.FnT[i]!);
  for (let a = 0; a < rowT; a++) {
    const [i, p, hi] = [
      component(a),
      a < 2 * active ? other(home[a >> 1]!, a & 1) : other(work.volumeHome, a - 2 * active),
      homeOf(a),
    ];
    for (let b = 0; b <= a; b++) {
      const [j, q, hj] = [
        component(b),
        b < 2 * active ? other(home[b >> 1]!, b & 1) : other(work.volumeHome, b - 2 * active),
        homeOf(b),
      ];
      let value = 0;
      if (p === q) value += at(p, i, j);
      if (p === hj) value -= at(p, i, j);
      if (hi === q) value -= at(q, i, j);
      if (hi === hj) value += at(hi, i, j);
      value *= scale[a]! * scale[b]!;
      matrix[a * size + b] = value;
      matrix[b * size + a] = value;
    }
    const withT = scale[a]! * (byT(p, i) - byT(hi, i));
    matrix[a * size + rowT] = withT;
    // ∂S/∂x carries −∂A/∂x/T besides −∂U/∂x/T; `step` holds −∂(A/RT)/∂x
    matrix[rowT * size + a] = target.hold === "temperature" ? 0 : target.hold === "entropy" ? step[a]! - withT : -withT;
  }
  let FT = 0;
  let FTT = 0;
  for (let p = 0; p < 3; p++) {
    FT += F[p]!.FT;
    FTT += F[p]!.FTT;
  }
  const cv = cp - R - R * T * (2 * FT + T * FTT);
  const balance =
    target.hold === "energy"
      ? (target.value - (h - R * T - R * T * T * FT)) / (R * T)
      : target.hold === "entropy"
        ? (target.value - entropy(state, work, active, R)) / R
        : (target.value - T) / T;
  matrix[rowT * size + rowT] = target.hold === "temperature" ? 1 : cv / R;
  step[rowT] = balance;
  return Math.max(error, Math.abs(balance));
}

function entropy(
  { moles, volumes, temperatureK: T }: ThreePhaseVolumes,
  { F, s0, index }: Work,
  active: number,
  R: number,
): number {
  const thermal = (R * T) / referencePressurePa;
  let S = 0;
  for (let p = 0; p < 3; p++) {
    S -= R * (F[p]!.F + T * F[p]!.FT);
    for (let k = 0; k < active; k++) {
      const i = index[k]!;
      const amount = moles[p]![i]!;
      S += amount * (s0[i]! - R * Math.log((amount * thermal) / volumes[p]!));
    }
  }
  return S;
}

/** Takes the step, shortened until every amount and every volume stays possible; false where that leaves nothing of it. */
function advance(
  model: FluidModel,
  z: ArrayLike<number>,
  target: VolumeTarget,
  state: ThreePhaseVolumes,
  work: Work,
  active: number,
  size: number,
): boolean {
  const { index, home, scale, step, trial, trialVolumes, volumeHome } = work;
  const { moles, volumes } = state;
  let length = 1;
  for (let k = 0; k < active; k++) {
    const i = index[k]!;
    let leaving = 0;
    for (let side = 0; side < 2; side++) {
      const change = scale[2 * k + side]! * step[2 * k + side]!;
      if (!Number.isFinite(change)) return false;
      leaving += change;
      if (change < 0) length = Math.min(length, (0.9 * moles[other(home[k]!, side)]![i]!) / -change);
    }
    if (leaving > 0) length = Math.min(length, (0.9 * moles[home[k]!]![i]!) / leaving);
  }
  const changeT = step[size - 1]! * state.temperatureK;
  if (!Number.isFinite(changeT)) return false;
  if (Math.abs(changeT) > 0.15 * state.temperatureK) length = Math.min(length, (0.15 * state.temperatureK) / Math.abs(changeT));
  for (let attempt = 0; attempt < 25; attempt++, length *= 0.6) {
    for (let k = 0; k < active; k++) {
      const i = index[k]!;
      let away = 0;
      for (let side = 0; side < 2; side++) {
        const p = other(home[k]!, side);
        trial[p]![i] = moles[p]![i]! + length * scale[2 * k + side]! * step[2 * k + side]!;
        away += trial[p]![i]!;
      }
      trial[home[k]!]![i] = z[i]! - away;
    }
    let awayV = 0;
    for (let side = 0; side < 2; side++) {
      const p = other(volumeHome, side);
      trialVolumes[p] = volumes[p]! + length * scale[2 * active + side]! * step[2 * active + side]!;
      awayV += trialVolumes[p]!;
    }
    trialVolumes[volumeHome] = target.molarVolume - awayV;
    if (!fits(model, work)) continue;
    for (let p = 0; p < 3; p++) moles[p]!.set(trial[p]!);
    volumes.set(trialVolumes);
    state.temperatureK += length * changeT;
    return length > 1e-6;
  }
  return false;
}

function fits(model: FluidModel, { trial, trialVolumes }: Work): boolean {
  for (let p = 0; p < 3; p++) {
    model.residual.setComposition(trial[p]!);
    if (!(trialVolumes[p]! > 1.0001 * model.residual.minimumVolume())) return false;
  }
  return true;
}

/** Positive pressure, mechanical stability, three different phases, and each on an outer density root of its equation. */
function sound(model: FluidModel, state: ThreePhaseVolumes, work: Work): boolean {
  const { F, totals } = work;
  if (!(state.pressurePa > 0)) return false;
  for (let p = 0; p < 3; p++) {
    if (!(F[p]!.FVV + totals[p]! / state.volumes[p]! ** 2 > 0)) return false;
    const q = (p + 1) % 3;
    let apart = Math.abs((state.volumes[p]! * totals[q]!) / (state.volumes[q]! * totals[p]!) - 1);
    for (let i = 0; i < state.moles[p]!.length; i++) {
      apart = Math.max(apart, Math.abs(state.moles[p]![i]! / totals[p]! - state.moles[q]![i]! / totals[q]!));
    }
    if (!(apart > 1e-6)) return false;
  }
  if (!model.residual.hasFalseBranches) return true;
  for (let p = 0; p < 3; p++) {
    for (let i = 0; i < work.trial[0].length; i++) work.trial[0][i] = state.moles[p]![i]! / totals[p]!;
    model.residual.setComposition(work.trial[0]);
    const own = state.volumes[p]! / totals[p]!;
    const is = (root: "liquid" | "vapour") =>
      Math.abs(model.residual.volumeAtPressure(state.temperatureK, state.pressurePa, root) / own - 1) < 1e-5;
    if (!is("liquid") && !is("vapour")) return false;
  }
  return true;
}

const works = new Map<number, Work>();

function workFor(count: number): Work {
  let work = works.get(count);
  if (!work) {
    const vector = () => new Float64Array(count);
    const size = 2 * count + 3;
    work = {
      F: [createResidualDerivatives(count), createResidualDerivatives(count), createResidualDerivatives(count)],
      totals: new Float64Array(3),
      pressures: new Float64Array(3),
      index: new Int32Array(count),
      home: new Int32Array(count),
      scale: new Float64Array(size),
      step: new Float64Array(size),
      matrix: new Float64Array(size * size),
      trial: [vector(), vector(), vector()],
      trialVolumes: new Float64Array(3),
      volumeHome: 0,
      cp0: vector(),
      h0: vector(),
      s0: vector(),
    };
    works.set(count, work);
  }
  return work;
}

export function createThreePhaseVolumes(count: number): ThreePhaseVolumes {
  const vector = () => new Float64Array(count);
  return { temperatureK: 0, pressurePa: 0, moles: [vector(), vector(), vector()], volumes: new Float64Array(3) };
}
