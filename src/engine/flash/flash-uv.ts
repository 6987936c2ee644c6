import { createPhaseState, type FluidModel, type PhaseState } from "../eos/fluid-model";
import { EngineError } from "../errors";
import { assemble } from "./assemble";
import { bracketedRoot } from "./bracketed-root";
import type { Equilibrium } from "./equilibrium";
import { flashPT } from "./flash-pt";
import { lever, type Sides } from "./lever";
import { insideDome, saturatedMix } from "./pure-volume";
import { onlyComponent } from "./saturation-pure";
import { solveAtVolume, type TwoPhaseVolumes, type VolumeTarget } from "./two-phase-volume";
import { createThreePhaseVolumes, solveThreeAtVolume, type ThreePhaseVolumes } from "./three-phase-volume";
import { mayHoldWater, splitsFurther } from "./third-phase";
import { verifyPhases } from "./verify-phases";
import { createTwoPhaseVolumes, seedFrom, seedThreeFrom } from "./volume-seed";

/**
 * Equilibrium of a closed rigid volume: given molar internal energy and molar volume (kind "UV"), or molar entropy and molar
 * volume. Of all states with that energy and volume the answer is the one of highest entropy.
 *
 * Order of attempts: two or three phases from the seed; one phase, accepted only if a stability test passes; two phases from the PT
 * flash at the one-phase state; nested one-dimensional searches, which always close. Two phases found without a seed are tested for a
 * third; those found from a seed only where the fluid holds water.
 *
 * z        mole fractions; defaults to the feed
 * seed     an equilibrium near by; changes the cost, not the answer
 * Throws   EngineError "no-convergence" | "outside-validity"
 */
export function flashUV(
  model: FluidModel,
  target: { internalEnergyJPerMol: number; molarVolumeM3PerMol: number },
  z: ArrayLike<number> = model.feed,
  seed?: Equilibrium,
): Equilibrium {
  return flashAtVolume(
    model,
    { hold: "energy", value: target.internalEnergyJPerMol, molarVolume: target.molarVolumeM3PerMol },
    z,
    seed,
  );
}

/** As `flashUV`, with the molar entropy given: the walk down an isentrope through the two-phase region. */
export function flashSV(
  model: FluidModel,
  target: { entropyJPerMolK: number; molarVolumeM3PerMol: number },
  z: ArrayLike<number> = model.feed,
  seed?: Equilibrium,
): Equilibrium {
  return flashAtVolume(
    model,
    { hold: "entropy", value: target.entropyJPerMolK, molarVolume: target.molarVolumeM3PerMol },
    z,
    seed,
  );
}

type HeldTarget = VolumeTarget & { hold: "energy" | "entropy" };

function flashAtVolume(model: FluidModel, target: HeldTarget, z: ArrayLike<number>, seed?: Equilibrium): Equilibrium {
  const v = target.molarVolume;
  model.residual.setComposition(z);
  if (!(v > model.residual.minimumVolume())) {
    throw new EngineError("outside-validity", "the molar volume is below the smallest that the equation allows", {
      molarVolumeM3PerMol: v,
      minimumM3PerMol: model.residual.minimumVolume(),
    });
  }
  const state = volumesFor(z.length);
  if (seed?.phases.length === 3) {
    const three = fromThree(model, z, target, seed);
    if (three) return three;
  }
  if (seed && seed.phases.length === 2 && seedFrom(seed, z, v, state) && solveAtVolume(model, z, target, state)) {
    const found = assembleTwo(model, state);
    return mayHoldWater(model, z) ? completed(model, found, z, target, seed) : found;
  }

  const only = onlyComponent(z);
  const single = onePhase(model, target, z, seed?.temperatureK ?? 300);
  if (only >= 0) return pure(model, target, z, single, state);

  if (single && single.pressurePa > 0 && single.pressureByVolume < 0) {
    if (isStable(model, single, z)) return assembleOne(model, single, z);
    const near = attempted(() => flashPT(model, single, z));
    const found = near && fromNear(model, z, target, near, state);
    if (found) return found;
  }
  const guess = single && single.pressurePa > 0 ? single.temperatureK : undefined;
  for (const T of [guess, single?.temperatureK, 0.8 * meanCriticalTemperature(model, z)]) {
    if (T === undefined || T < 0.35 * meanCriticalTemperature(model, z)) continue;
    const near = attempted(() => equilibriumAtVolume(model, T, v, z));
    const found = near && fromNear(model, z, target, near, state);
    if (found) return found;
  }
  return nested(model, target, z, single, state, seed);
}

/** Two or three phases by Newton from an equilibrium near by; undefined where that fails or leaves a phase out. */
function fromNear(
  model: FluidModel,
  z: ArrayLike<number>,
  target: VolumeTarget,
  near: Equilibrium,
  state: TwoPhaseVolumes,
): Equilibrium | undefined {
  if (near.phases.length === 3) return fromThree(model, z, target, near);
  if (!seedFrom(near, z, target.molarVolume, state) || !solveAtVolume(model, z, target, state)) return undefined;
  const found = assembleTwo(model, state);
  return splitsFurther(model, found) ? withThird(model, z, target, found) : found;
}

/** Two phases that came from a seed, or three where a test finds one more. */
function completed(
  model: FluidModel,
  found: Equilibrium,
  z: ArrayLike<number>,
  target: HeldTarget,
  seed: Equilibrium,
): Equilibrium {
  if (!splitsFurther(model, found)) return found;
  const three = withThird(model, z, target, found);
  return three ?? nested(model, target, z, undefined, volumesFor(z.length), seed);
}

function withThird(model: FluidModel, z: ArrayLike<number>, target: VolumeTarget, found: Equilibrium): Equilibrium | undefined {
  const near = attempted(() => flashPT(model, found, z, found));
  return near && fromThree(model, z, target, near);
}

function fromThree(model: FluidModel, z: ArrayLike<number>, target: VolumeTarget, near: Equilibrium): Equilibrium | undefined {
  const state = threeFor(z.length);
  if (!seedThreeFrom(near, z, target.molarVolume, state)) return undefined;
  if (target.hold === "temperature") state.temperatureK = target.value;
  if (!solveThreeAtVolume(model, z, target, state)) return undefined;
  const found = assembleThree(model, state);
  return attempted(() => verifyPhases(model, found)) === "sound" ? found : undefined;
}

/** The root of lowest Gibbs energy at its own pressure, and no split there. */
function isStable(model: FluidModel, single: PhaseState, z: ArrayLike<number>): boolean {
  const { temperatureK: T, pressurePa: p, molarVolumeM3PerMol: v } = single;
  model.residual.setComposition(z);
  const best = model.residual.volumeAtPressure(T, p, "stable");
  if (Math.abs(best / v - 1) > 1e-6) return false;
  return model.stability(T, p, z).stable;
}

function onePhase(model: FluidModel, target: HeldTarget, z: ArrayLike<number>, guess: number): PhaseState | undefined {
  try {
    return target.hold === "energy"
      ? model.phaseFromEnergy(target.value, target.molarVolume, z, guess, createPhaseState())
      : model.phaseFromEntropyVolume(target.value, target.molarVolume, z, guess, createPhaseState());
  } catch (error) {
    if (error instanceof EngineError && (error.code === "no-convergence" || error.code === "outside-validity")) return undefined;
    throw error;
  }
}

/** The value, or undefined where the engine says no: one attempt of several. */
function attempted<Value>(attempt: () => Value): Value | undefined {
  try {
    return attempt();
  } catch (error) {
    if (error instanceof EngineError) return undefined;
    throw error;
  }
}

function pure(
  model: FluidModel,
  target: HeldTarget,
  z: ArrayLike<number>,
  single: PhaseState | undefined,
  state: TwoPhaseVolumes,
): Equilibrium {
  const v = target.molarVolume;
  // A one-phase state in tension is no answer; nor is one so cold that its saturation pressure is beyond all numbers.
  const outside = single && single.pressurePa > 0 && attempted(() => insideDome(model, single.temperatureK, v, z) === undefined);
  if (outside) return assembleOne(model, single, z);
  const start = domeStart(model, v, z, single?.temperatureK);
  if (start === undefined) {
    throw new EngineError("no-convergence", "no equilibrium state has this energy at this volume", {
      molarVolumeM3PerMol: v,
      value: target.value,
    });
  }
  const { saturation, quality } = saturatedMix(model, z, { v, value: target.value, kind: target.hold }, start);
  const index = onlyComponent(z);
  state.v.fill(0);
  state.l.fill(0);
  state.v[index] = quality;
  state.l[index] = 1 - quality;
  state.temperatureK = saturation.temperatureK;
  state.vapourVolume = quality * saturation.vapourVolume;
  state.liquidVolume = v - state.vapourVolume;
  if (quality > 1e-12 && quality < 1 - 1e-12 && solveAtVolume(model, z, target, state)) return assembleTwo(model, state);
  return assemble(model, saturation.temperatureK, saturation.pressurePa, [
    { moleFraction: quality, composition: z, molarVolume: saturation.vapourVolume },
    { moleFraction: 1 - quality, composition: z, molarVolume: saturation.liquidVolume },
  ]);
}

/** A temperature at which v lies inside the dome: from near the critical one downwards. */
function domeStart(model: FluidModel, v: number, z: ArrayLike<number>, near: number | undefined): number | undefined {
  const Tc = model.criticalTemperaturesK[onlyComponent(z)]!;
  const candidates: number[] = [];
  for (let reduced = 0.98; reduced > 0.25; reduced -= 0.06) candidates.push(reduced * Tc);
  for (const reduced of [0.99, 0.995, 0.998, 0.9995]) candidates.push(reduced * Tc);
  if (near !== undefined && near < Tc) candidates.push(near);
  return candidates.find((T) => T > model.temperatureRangeK[0] && attempted(() => insideDome(model, T, v, z)) !== undefined);
}

/**
 * Last resort for mixtures: T by a bracketed search on the energy (or entropy), which rises with T at constant volume; for each
 * T the pressure by a bracketed search on the volume, which falls with p at constant T. Slow, but each search must close.
 */
function nested(
  model: FluidModel,
  target: HeldTarget,
  z: ArrayLike<number>,
  single: PhaseState | undefined,
  state: TwoPhaseVolumes,
  seed: Equilibrium | undefined,
): Equilibrium {
  const v = target.molarVolume;
  const [coldest, hottest] = model.temperatureRangeK;
  let latest: Equilibrium | undefined;
  const excess = (T: number): number => {
    latest = equilibriumAtVolume(model, T, v, z, latest);
    const have = target.hold === "energy" ? latest.internalEnergyJPerMol : latest.entropyJPerMolK;
    return have - target.value;
  };
  // A one-phase state in tension says nothing of the equilibrium temperature; nor does one that holds as vapour what is really water.
  const alone = single && single.pressurePa > 0 ? single.temperatureK : undefined;
  const hint = seed?.temperatureK ?? (alone !== undefined && mayHoldWater(model, z) ? Math.max(alone, 300) : alone);
  let a = Math.min(Math.max(hint ?? 0.8 * meanCriticalTemperature(model, z), coldest * 1.01), hottest * 0.99);
  let fa = excess(a);
  let b = a;
  let fb = fa;
  for (let k = 0; k < 60 && fa * fb > 0; k++) {
    a = b;
    fa = fb;
    b = fb > 0 ? Math.max(0.94 * b, coldest) : Math.min(1.06 * b, hottest);
    if (b === a) break;
    fb = excess(b);
  }
  const T = bracketedRoot(excess, { a, fa, b, fb }, { within: 1e-12 * a, what: "temperature at given energy and volume" });
  excess(T);
  const found = latest!;
  const near = found.phases.length > 1 ? fromNear(model, z, target, found, state) : undefined;
  if (near) return near;
  const polished = found.phases.length === 1 ? onePhase(model, target, z, T) : undefined;
  if (polished && isStable(model, polished, z)) return assembleOne(model, polished, z);
  return asAsked(model, target, found);
}

/** Largest error of volume, and of energy over R T, that a nested search may leave. */
const closeEnough = 1e-7;

/** What the nested searches ended in, if it has the volume and the energy: at a jump that they cannot divide it has not. */
function asAsked(model: FluidModel, target: HeldTarget, found: Equilibrium): Equilibrium {
  const R = model.gasConstantJPerMolK;
  const off =
    target.hold === "energy"
      ? (found.internalEnergyJPerMol - target.value) / (R * found.temperatureK)
      : (found.entropyJPerMolK - target.value) / R;
  const offVolume = found.molarVolumeM3PerMol / target.molarVolume - 1;
  if (Math.abs(off) <= closeEnough && Math.abs(offVolume) <= closeEnough) return found;
  throw new EngineError("no-convergence", "the search for the equilibrium of this energy and volume did not close", {
    temperatureK: found.temperatureK,
    pressurePa: found.pressurePa,
    volumeError: offVolume,
    energyError: off,
  });
}

function meanCriticalTemperature(model: FluidModel, z: ArrayLike<number>): number {
  let mean = 0;
  for (let i = 0; i < z.length; i++) mean += z[i]! * model.criticalTemperaturesK[i]!;
  return mean;
}

/** Equilibrium at given temperature and molar volume. */
export function equilibriumAtVolume(
  model: FluidModel,
  T: number,
  v: number,
  z: ArrayLike<number>,
  seed?: Equilibrium,
): Equilibrium {
  const single = model.phaseAtVolume(T, v, z, createPhaseState());
  if (single.pressurePa > 0 && single.pressureByVolume < 0 && isStable(model, single, z)) return assembleOne(model, single, z);
  const state = volumesFor(z.length);
  const target: VolumeTarget = { hold: "temperature", value: T, molarVolume: v };
  if (seed?.phases.length === 2 && seedFrom(seed, z, v, state)) {
    state.temperatureK = T;
    if (solveAtVolume(model, z, target, state)) {
      const found = assembleTwo(model, state);
      if (!splitsFurther(model, found)) return found;
    }
  }
  if (seed?.phases.length === 3) {
    const found = fromThree(model, z, target, seed);
    if (found) return found;
  }
  let latest: Equilibrium | undefined;
  const sides: Sides = {};
  const excess = (lnP: number): number => {
    latest = flashPT(model, { temperatureK: T, pressurePa: Math.exp(lnP) }, z, latest);
    const difference = Math.log(latest.molarVolumeM3PerMol / v);
    if (difference < 0) sides.below = latest;
    else sides.above = latest;
    return difference;
  };
  const start = single.pressurePa > 1e3 ? single.pressurePa : (0.5 * model.gasConstantJPerMolK * T) / v;
  let a = Math.log(start);
  let fa = excess(a);
  let b = a;
  let fb = fa;
  for (let k = 0, jump = 0.25; k < 40 && fa * fb > 0; k++, jump = Math.min(2 * jump, 3)) {
    a = b;
    fa = fb;
    b += fb > 0 ? jump : -jump;
    fb = excess(b);
  }
  const lnP = bracketedRoot(excess, { a, fa, b, fb }, { within: 1e-13, what: "pressure at given temperature and volume" });
  const left = excess(lnP);
  const found = (Math.abs(left) > 1e-7 && between(model, v, sides)) || latest!;
  if (found.phases.length === 3) return fromThree(model, z, target, found) ?? found;
  if (found.phases.length === 2 && seedFrom(found, z, v, state)) {
    state.temperatureK = T;
    if (solveAtVolume(model, z, target, state)) {
      const polished = assembleTwo(model, state);
      if (!splitsFurther(model, polished)) return polished;
    }
  }
  return found;
}

/** At a jump of the volume: the two sides together. */
function between(model: FluidModel, v: number, { below, above }: Sides): Equilibrium | undefined {
  if (!below || !above) return undefined;
  const [low, high] = [below.molarVolumeM3PerMol, above.molarVolumeM3PerMol];
  return lever(model, below, above, (v - low) / (high - low));
}

function assembleOne(model: FluidModel, single: PhaseState, z: ArrayLike<number>): Equilibrium {
  return assemble(model, single.temperatureK, single.pressurePa, [
    { moleFraction: 1, composition: z, molarVolume: single.molarVolumeM3PerMol },
  ]);
}

function assembleTwo(model: FluidModel, state: TwoPhaseVolumes): Equilibrium {
  const { v, l, vapourVolume, liquidVolume, temperatureK, pressurePa } = state;
  let nv = 0;
  let nl = 0;
  for (let i = 0; i < v.length; i++) {
    nv += v[i]!;
    nl += l[i]!;
  }
  for (let i = 0; i < v.length; i++) {
    v[i] = v[i]! / nv; // the unknowns are spent: they leave as the compositions
    l[i] = l[i]! / nl;
  }
  return assemble(model, temperatureK, pressurePa, [
    { moleFraction: nv, composition: v, molarVolume: vapourVolume / nv },
    { moleFraction: nl, composition: l, molarVolume: liquidVolume / nl },
  ]);
}

function assembleThree(model: FluidModel, { moles, volumes, temperatureK, pressurePa }: ThreePhaseVolumes): Equilibrium {
  const phases = moles.map((amounts, k) => {
    const total = amounts.reduce((sum, amount) => sum + amount, 0);
    return { moleFraction: total, composition: amounts.map((amount) => amount / total), molarVolume: volumes[k]! / total };
  });
  return assemble(model, temperatureK, pressurePa, phases);
}

const threes = new Map<number, ThreePhaseVolumes>();

function threeFor(count: number): ThreePhaseVolumes {
  let state = threes.get(count);
  if (!state) threes.set(count, (state = createThreePhaseVolumes(count)));
  return state;
}

const states = new Map<number, TwoPhaseVolumes>();

function volumesFor(count: number): TwoPhaseVolumes {
  let state = states.get(count);
  if (!state) states.set(count, (state = createTwoPhaseVolumes(count)));
  return state;
}
