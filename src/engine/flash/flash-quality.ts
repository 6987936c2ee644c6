import { EngineError } from "../errors";
import type { FluidModel } from "../eos/fluid-model";
import { assemble } from "./assemble";
import type { Equilibrium } from "./equilibrium";
import { onlyComponent, saturationAtPressure, saturationAtTemperature, type PureSaturation } from "./saturation-pure";
import { mayHoldWater } from "./third-phase";
import { withEveryPhase } from "./vapour-fraction-search";
import { verifyPhases } from "./verify-phases";
import { createSaturationWork, solveSaturation, type SaturationPoint, type SaturationWork } from "./saturation-newton";

/**
 * Saturated state at given temperature and vapour mole fraction Q: bubble point at Q = 0, dew point at Q = 1. Free water and a second liquid
 * count as liquid: a dew point is that of whichever liquid forms first. Where a retrograde mixture has two dew points at one temperature, the
 * answer is the lower one.
 *
 * Throws   EngineError "not-applicable" above the critical point of a pure fluid; "no-convergence" where no such point was found
 */
export function flashTQ(
  model: FluidModel,
  { temperatureK, vapourMoleFraction }: { temperatureK: number; vapourMoleFraction: number },
  z: ArrayLike<number> = model.feed,
): Equilibrium {
  const Q = checkedQuality(vapourMoleFraction);
  if (onlyComponent(z) >= 0) return pureMix(model, saturationAtTemperature(model, temperatureK, z), Q, z);
  return solve(model, z, Q, { lnT: Math.log(temperatureK) });
}

/** As `flashTQ`, at given pressure. */
export function flashPQ(
  model: FluidModel,
  { pressurePa, vapourMoleFraction }: { pressurePa: number; vapourMoleFraction: number },
  z: ArrayLike<number> = model.feed,
): Equilibrium {
  const Q = checkedQuality(vapourMoleFraction);
  if (onlyComponent(z) >= 0) return pureMix(model, saturationAtPressure(model, pressurePa, z), Q, z);
  return solve(model, z, Q, { lnP: Math.log(pressurePa) });
}

function checkedQuality(Q: number): number {
  if (!(Q >= 0 && Q <= 1)) {
    throw new EngineError(
      "invalid-case",
      "the vapour mole fraction must lie between 0 and 1",
      { vapourMoleFraction: Q },
      "vapourMoleFraction",
    );
  }
  return Q;
}

function pureMix(model: FluidModel, saturation: PureSaturation, Q: number, z: ArrayLike<number>): Equilibrium {
  return assemble(model, saturation.temperatureK, saturation.pressurePa, [
    { moleFraction: Q, composition: z, molarVolume: saturation.vapourVolume },
    { moleFraction: 1 - Q, composition: z, molarVolume: saturation.liquidVolume },
  ]);
}

type Given = { lnT: number; lnP?: undefined } | { lnP: number; lnT?: undefined };

function solve(model: FluidModel, z: ArrayLike<number>, Q: number, given: Given): Equilibrium {
  const work = createSaturationWork(z.length);
  let found: Equilibrium | undefined;
  try {
    found = result(model, z, Q, saturationPoint(model, z, Q, given, work), work);
    if (verifyPhases(model, found) === "sound") return found;
  } catch (error) {
    if (!(error instanceof EngineError) || error.code !== "no-convergence" || !mayHoldWater(model, z)) throw error;
  }
  return withEveryPhase(model, z, Q, given, found);
}

/** The converged unknowns of a mixture's saturated state; `work` is left with both phases evaluated there. */
export function saturationPoint(
  model: FluidModel,
  z: ArrayLike<number>,
  Q: number,
  given: Given,
  work: SaturationWork,
): SaturationPoint {
  const count = z.length;
  const [specified, value] = given.lnT !== undefined ? [count, given.lnT] : [count + 1, given.lnP];
  const direct = wilsonPoint(model, z, Q, given);
  if (solveSaturation(model, z, Q, direct, specified, value, work) > 0 && plausible(direct, z)) return direct;
  const continued = continuation(model, z, Q, given, work);
  if (continued) return continued;
  throw new EngineError(
    "no-convergence",
    "no saturated state was found; the temperature or pressure may lie beyond the phase envelope",
    given.lnT !== undefined
      ? { temperatureK: Math.exp(given.lnT), vapourMoleFraction: Q }
      : { pressurePa: Math.exp(given.lnP), vapourMoleFraction: Q },
  );
}

/**
 * From a low-pressure point, where Wilson's K-values are close, to the wanted one in steps: warm starts along the saturation
 * line until the specified unknown is reached.
 */
function continuation(
  model: FluidModel,
  z: ArrayLike<number>,
  Q: number,
  given: Given,
  work: SaturationWork,
): SaturationPoint | undefined {
  const count = z.length;
  const byTemperature = given.lnT !== undefined;
  const goal = byTemperature ? given.lnT : given.lnP;
  const specified = byTemperature ? count : count + 1;
  for (const startPressure of [1e5, 1e4, 1e6]) {
    let point = wilsonPoint(model, z, Q, { lnP: Math.log(startPressure) });
    if (solveSaturation(model, z, Q, point, count + 1, Math.log(startPressure), work) < 0) continue;
    let at = byTemperature ? point.lnT : point.lnP;
    let previous: { point: SaturationPoint; at: number } | undefined;
    let step = Math.max(-1, Math.min(1, goal - at)) * (byTemperature ? 0.05 : 0.5);
    for (let k = 0; k < 200 && Math.abs(step) > 1e-7; k++) {
      const target = Math.abs(goal - at) <= Math.abs(step) ? goal : at + step;
      const next = previous ? extrapolated(previous, { point, at }, target) : copyOf(point);
      const iterations = solveSaturation(model, z, Q, next, specified, target, work, 12);
      if (iterations < 0 || !plausible(next, z)) {
        step *= 0.5;
        continue;
      }
      if (target === goal) return next;
      previous = { point, at };
      point = next;
      at = target;
      if (iterations < 5) step *= 1.5;
    }
  }
  return undefined;
}

function extrapolated(
  a: { point: SaturationPoint; at: number },
  b: { point: SaturationPoint; at: number },
  target: number,
): SaturationPoint {
  const t = (target - b.at) / (b.at - a.at);
  return {
    lnK: b.point.lnK.map((value, i) => value + t * (value - a.point.lnK[i]!)),
    lnT: b.point.lnT + t * (b.point.lnT - a.point.lnT),
    lnP: b.point.lnP + t * (b.point.lnP - a.point.lnP),
  };
}

/** Both phases must have the K-values of a volatile vapour over a heavy liquid, not of the trivial solution. */
function plausible(point: SaturationPoint, z: ArrayLike<number>): boolean {
  let above = false;
  let below = false;
  for (let i = 0; i < z.length; i++) {
    if (!(z[i]! > 0)) continue;
    if (point.lnK[i]! > 1e-4) above = true;
    if (point.lnK[i]! < -1e-4) below = true;
  }
  return above && below;
}

/** T (or p) at which Wilson's K-values give the vapour fraction Q, and those K-values. */
function wilsonPoint(model: FluidModel, z: ArrayLike<number>, Q: number, given: Given): SaturationPoint {
  const { criticalTemperaturesK: Tc, criticalPressuresPa: pc, acentricFactors: omega } = model;
  const lnK = new Float64Array(z.length);
  const fill = (lnT: number, lnP: number) => {
    for (let i = 0; i < z.length; i++) {
      lnK[i] = Math.max(-200, Math.min(200, Math.log(pc[i]!) - lnP + 5.373 * (1 + omega[i]!) * (1 - Tc[i]! / Math.exp(lnT))));
    }
  };
  // β at (T, p) rises with T and falls with p; Σ(y − x) at β = Q has the same sign as β − Q.
  const excess = () => {
    let sum = 0;
    for (let i = 0; i < z.length; i++) {
      const K = Math.exp(lnK[i]!);
      sum += (z[i]! * (K - 1)) / (1 - Q + Q * K);
    }
    return sum;
  };
  let low = given.lnT !== undefined ? Math.log(1e-3) : Math.log(model.temperatureRangeK[0]);
  let high = given.lnT !== undefined ? Math.log(1e9) : Math.log(model.temperatureRangeK[1]);
  for (let k = 0; k < 80; k++) {
    const middle = 0.5 * (low + high);
    if (given.lnT !== undefined) fill(given.lnT, middle);
    else fill(middle, given.lnP);
    if (excess() > 0 === (given.lnT !== undefined)) low = middle;
    else high = middle;
  }
  const found = 0.5 * (low + high);
  const lnT = given.lnT ?? found;
  const lnP = given.lnP ?? found;
  fill(lnT, lnP);
  return { lnK, lnT, lnP };
}

const copyOf = (point: SaturationPoint): SaturationPoint => ({ ...point, lnK: point.lnK.slice() });

function result(model: FluidModel, z: ArrayLike<number>, Q: number, point: SaturationPoint, work: SaturationWork): Equilibrium {
  const { vapour, liquid } = work;
  return assemble(model, Math.exp(point.lnT), Math.exp(point.lnP), [
    { moleFraction: Q, composition: Q === 1 ? z : vapour.composition, molarVolume: vapour.molarVolume },
    { moleFraction: 1 - Q, composition: Q === 0 ? z : liquid.composition, molarVolume: liquid.molarVolume },
  ]);
}
