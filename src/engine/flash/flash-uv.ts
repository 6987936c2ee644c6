import { createPhaseState, type FluidModel, type PhaseState } from "../eos/fluid-model";
import { EngineError } from "../errors";
import { attempted } from "./attempted";
import { bracketedRoot } from "./bracketed-root";
import type { Equilibrium } from "./equilibrium";
import { equilibriumAtVolume } from "./equilibrium-at-volume";
import { flashPT } from "./flash-pt";
import { pureAtVolume, type HeldTarget } from "./pure-at-volume";
import { onlyComponent } from "./saturation-pure";
import { mayHoldWater, splitsFurther } from "./third-phase";
import { solveAtVolume, type TwoPhaseVolumes } from "./two-phase-volume";
import { assembleOne, assembleTwo, fromNear, fromThree, isStable, volumesFor, withThird } from "./volume-phases";
import { seedFrom } from "./volume-seed";

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
  if (only >= 0) return pureAtVolume(model, target, z, single, state);

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
