/** What a wall in a fire has on its two sides: the fire, and the contents of the vessel along a run. */
import type { BlowdownCase } from "../cases/blowdown-case";
import type { BlowdownSeries, BlowdownSummary, SteelInFire } from "../cases/blowdown-result";
import type { FluidModel } from "../eos/fluid-model";
import { naturalConvection, type FilmFlux } from "../heat/natural-convection";
import { fireFluxWPerM2 } from "../heat/surface-fire";

export type FireRun = { fluid: FluidModel; series: BlowdownSeries; summary: BlowdownSummary };

export type Fire = { basis: SteelInFire["fire"]["basis"]; fixedFluxWPerM2?: number; fluxWPerM2: (wallK: number) => number };

/** The case's own words first; a pool fire burns on dry steel as the set for an open pool. */
export function fireOf({ heat: { outside }, steelInFire: given = {} }: BlowdownCase): Fire | undefined {
  if (outside.model !== "pool-fire" && outside.model !== "surface-fire") return undefined;
  const surface = outside.model === "surface-fire" ? outside : undefined;
  const basis = given.basis ?? surface?.basis ?? "open-pool";
  const stated = given.heatFluxWPerM2 ?? surface?.heatFluxWPerM2;
  const factor = outside.factor ?? 1;
  if (stated === undefined) return { basis, fluxWPerM2: (T) => factor * fireFluxWPerM2(basis, T) };
  const fixed = factor * stated;
  return { basis, fixedFluxWPerM2: fixed, fluxWPerM2: () => fixed };
}

export type Surroundings = {
  startK: number;
  pressureAt: (timeS: number) => number;
  fluidAt: (timeS: number) => number;
  film: (timeS: number, differenceK: number) => number;
  liquidUntilS: number;
  liquidAt: (timeS: number) => number;
};

/** Last time at which there was liquid; 0 where there was none. */
export function liquidUntil({ timeS, liquidLevelM, vapourMoleFraction }: BlowdownSeries): number {
  for (let i = timeS.length - 1; i >= 0; i--)
    if (liquidLevelM ? (liquidLevelM[i] ?? 0) > 1e-6 : (vapourMoleFraction[i] ?? 1) < 1 - 1e-9) return timeS[i] ?? 0;
  return 0;
}

export function surroundingsOf({ heat }: BlowdownCase, { fluid, series, summary }: FireRun): Surroundings {
  const { timeS } = series;
  const pressureAt = (t: number): number => between(timeS, series.pressurePa, t);
  const gas = series.vapourTemperatureK ?? series.fluidTemperatureK;
  const liquid = series.liquidTemperatureK ?? series.fluidTemperatureK;
  const fluidAt = (t: number): number => between(timeS, gas, t);
  return {
    startK: summary.initialTemperatureK,
    pressureAt,
    fluidAt,
    liquidUntilS: liquidUntil(series),
    liquidAt: (t) => between(timeS, liquid, t),
    film: filmOf(heat.inside, fluid, { pressureAt, fluidAt, endS: summary.endTimeS }),
  };
}

type Along = { pressureAt: (t: number) => number; fluidAt: (t: number) => number; endS: number };

/** Heat from wall to gas [W/m²]. Films from correlations are made at a few moments; each holds until the next. */
function filmOf(inside: BlowdownCase["heat"]["inside"], fluid: FluidModel, along: Along): Surroundings["film"] {
  if (inside.model === "none") return () => 0;
  if (inside.model === "constant") return (_t, difference) => inside.coefficientWPerM2K * difference;
  const moments = 24;
  const films: FilmFlux[] = [];
  return (t, difference) => {
    const k = Math.min(Math.floor((moments * t) / along.endS), moments - 1);
    const time = ((k + 0.5) * along.endS) / moments;
    films[k] ??= naturalConvection(
      fluid,
      fluid.phaseAtPressure(along.fluidAt(time), along.pressureAt(time), fluid.feed, "vapour"),
      fluid.feed,
    );
    return (inside.factor ?? 1) * films[k](difference);
  };
}

/** On the straight line between neighbours; the end values hold outside. */
function between(x: readonly number[], y: readonly number[], at: number): number {
  let [low, high] = [0, x.length - 1];
  if (at >= (x[high] ?? 0)) return y[high] ?? 0;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if ((x[middle] ?? 0) <= at) low = middle;
    else high = middle;
  }
  const [x0, x1, y0, y1] = [x[low] ?? 0, x[high] ?? 0, y[low] ?? 0, y[high] ?? 0];
  return x1 > x0 ? y0 + ((y1 - y0) * Math.max(at - x0, 0)) / (x1 - x0) : y1;
}
