import { createPhaseState, type FluidModel, type PhaseState } from "../eos/fluid-model";
import { EngineError } from "../errors";
import { assemble } from "./assemble";
import { bracketedRoot } from "./bracketed-root";
import type { Equilibrium } from "./equilibrium";
import { flashPT } from "./flash-pt";
import { lever, type Sides } from "./lever";
import { mayHoldWater } from "./third-phase";
import { onlyComponent, saturationAtPressure, type PureSaturation } from "./saturation-pure";

/**
 * Equilibrium at given pressure and molar enthalpy. Enthalpy rises with temperature at constant pressure through every phase
 * change, so the answer is a bracketed search on T; a pure fluid inside its dome is the lever rule at its boiling point.
 *
 * Throws   EngineError "no-convergence" where no temperature the equation allows has this enthalpy
 */
export function flashPH(
  model: FluidModel,
  { pressurePa, enthalpyJPerMol }: { pressurePa: number; enthalpyJPerMol: number },
  z: ArrayLike<number> = model.feed,
  seed?: Equilibrium,
): Equilibrium {
  return flashAtPressure(model, pressurePa, { of: "enthalpy", value: enthalpyJPerMol }, z, seed);
}

/** As `flashPH`, with the molar entropy given: the end of an isentropic expansion to a pressure. */
export function flashPS(
  model: FluidModel,
  { pressurePa, entropyJPerMolK }: { pressurePa: number; entropyJPerMolK: number },
  z: ArrayLike<number> = model.feed,
  seed?: Equilibrium,
): Equilibrium {
  return flashAtPressure(model, pressurePa, { of: "entropy", value: entropyJPerMolK }, z, seed);
}

interface PressureTarget {
  of: "enthalpy" | "entropy";
  value: number;
}

const read = (target: PressureTarget, state: { enthalpyJPerMol: number; entropyJPerMolK: number }) =>
  target.of === "enthalpy" ? state.enthalpyJPerMol : state.entropyJPerMolK;

function flashAtPressure(
  model: FluidModel,
  p: number,
  target: PressureTarget,
  z: ArrayLike<number>,
  seed: Equilibrium | undefined,
): Equilibrium {
  if (!(p > 0 && Number.isFinite(p))) throw new EngineError("invalid-case", "pressure must be above 0 Pa", {}, "pressurePa");
  if (onlyComponent(z) >= 0) return pure(model, p, target, z, seed?.temperatureK ?? 300);

  const [coldest, hottest] = model.temperatureRangeK;
  let latest = seed;
  const sides: Sides = {};
  const excess = (T: number): number => {
    latest = flashPT(model, { temperatureK: T, pressurePa: p }, z, latest);
    const difference = read(target, latest) - target.value;
    if (difference < 0) sides.below = latest;
    else sides.above = latest;
    return difference;
  };
  // A one-phase guess may lie where no flash can follow (deep in the cold), above all where most of the water would really be liquid:
  // then the search comes down from room temperature.
  const guess = onePhaseGuess(model, p, target, z);
  const starts = [seed?.temperatureK, mayHoldWater(model, z) ? Math.max(guess, 300) : guess, 300];
  const start = firstEvaluated(starts, excess);
  let { at: a, value: fa } = start;
  let b = a;
  let fb = fa;
  for (let k = 0, shrink = 1; k < 120 && fa * fb > 0; k++) {
    const heatCapacity = Math.max(40, latest!.phases[0]!.state.heatCapacityPJPerMolK);
    const slope = target.of === "enthalpy" ? heatCapacity : heatCapacity / b;
    const jump = shrink * Math.max(0.5, Math.min(0.25 * b, (1.2 * Math.abs(fb)) / slope));
    const next = fb > 0 ? Math.max(b - jump, coldest) : Math.min(b + jump, hottest);
    if (next === b) break;
    let value: number;
    try {
      value = excess(next);
    } catch (error) {
      if (!(error instanceof EngineError) || shrink < 1e-3) throw error;
      shrink *= 0.25;
      continue;
    }
    a = b;
    fa = fb;
    b = next;
    fb = value;
  }
  const scale = target.of === "enthalpy" ? model.gasConstantJPerMolK * a : model.gasConstantJPerMolK;
  const what = `temperature of given ${target.of} and pressure`;
  const T = bracketedRoot(excess, { a, fa, b, fb }, { within: 1e-14 * a, accept: 1e-14 * scale, what });
  const left = excess(T);
  if (Math.abs(left) <= 1e-7 * scale) return latest!;
  return between(model, target, sides, T);
}

/** At a jump of the energy: water and a hydrocarbon that boil together do so at one temperature. */
function between(model: FluidModel, target: PressureTarget, { below, above }: Sides, T: number): Equilibrium {
  if (below && above) {
    const [low, high] = [read(target, below), read(target, above)];
    const merged = lever(model, below, above, (target.value - low) / (high - low));
    if (merged) return merged;
  }
  throw new EngineError("no-convergence", `no temperature has the given ${target.of}; the search closed without reaching it`, {
    temperatureK: T,
    value: target.value,
  });
}

/** The first of several temperatures at which the flash answers. */
function firstEvaluated(temperatures: readonly (number | undefined)[], excess: (T: number) => number) {
  let refusal: unknown;
  for (const at of temperatures) {
    if (at === undefined) continue;
    try {
      return { at, value: excess(at) };
    } catch (error) {
      if (!(error instanceof EngineError)) throw error;
      refusal = error;
    }
  }
  throw refusal;
}

function onePhaseGuess(model: FluidModel, p: number, target: PressureTarget, z: ArrayLike<number>): number {
  try {
    return onePhase(model, p, target, z, 300).temperatureK;
  } catch (error) {
    if (error instanceof EngineError) return 300;
    throw error;
  }
}

function onePhase(model: FluidModel, p: number, target: PressureTarget, z: ArrayLike<number>, guess: number): PhaseState {
  return target.of === "enthalpy"
    ? model.phaseFromEnthalpy(target.value, p, z, guess, "stable", createPhaseState())
    : model.phaseFromEntropyPressure(target.value, p, z, guess, "stable", createPhaseState());
}

function pure(model: FluidModel, p: number, target: PressureTarget, z: ArrayLike<number>, guess: number): Equilibrium {
  const pc = model.criticalPressuresPa[onlyComponent(z)]!;
  const saturation = p < pc ? boilingIfAny(model, p, z) : undefined;
  if (saturation) {
    const vapour = model.phaseAtVolume(saturation.temperatureK, saturation.vapourVolume, z, createPhaseState());
    const liquid = model.phaseAtVolume(saturation.temperatureK, saturation.liquidVolume, z, createPhaseState());
    const quality = (target.value - read(target, liquid)) / (read(target, vapour) - read(target, liquid));
    if (quality >= 0 && quality <= 1) {
      return assemble(model, saturation.temperatureK, p, [
        { moleFraction: quality, composition: z, molarVolume: saturation.vapourVolume },
        { moleFraction: 1 - quality, composition: z, molarVolume: saturation.liquidVolume },
      ]);
    }
    const above = quality > 1;
    const start = above ? Math.max(guess, saturation.temperatureK * 1.001) : Math.min(guess, saturation.temperatureK * 0.999);
    return single(model, p, z, onePhase(model, p, target, z, start));
  }
  return single(model, p, z, onePhase(model, p, target, z, guess));
}

/** The boiling point at a pressure, or undefined where the fluid has none by its equation. */
function boilingIfAny(model: FluidModel, p: number, z: ArrayLike<number>): PureSaturation | undefined {
  try {
    return saturationAtPressure(model, p, z);
  } catch (error) {
    if (error instanceof EngineError && error.code === "not-applicable") return undefined;
    throw error;
  }
}

function single(model: FluidModel, p: number, z: ArrayLike<number>, state: PhaseState): Equilibrium {
  return assemble(model, state.temperatureK, p, [{ moleFraction: 1, composition: z, molarVolume: state.molarVolumeM3PerMol }]);
}
