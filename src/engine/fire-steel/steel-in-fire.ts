/**
 * Does the blowdown lower the stress faster than the fire takes the strength?
 *
 * Each piece of steel heats up from the start of the fire, which is the opening of the valve. Dry steel is cooled by the gas film only (not
 * at all where the run has none). Wetted steel stays `boilingExcessK` above the liquid until the liquid is gone, and then heats up like dry steel.
 *
 *   ratio = strength / stress, least over the run          1 is rupture; near up to 1.1
 *
 * Beside it: the time to rupture, the same with 30 % more flux, and the same with the section shut in at its highest pressure.
 * Source   methods of `heat-up.ts` and `rupture.ts`
 * Holds    an order of magnitude: 30 % in flux changes the time by about as much. No jet's own cooling or erosion, no creep
 * Checks   steel-in-fire.test.ts
 */
import type { BlowdownCase } from "../cases/blowdown-case";
import type { BlowdownSeries, BlowdownSummary, SteelInFire, SteelInFireItem, Verdict } from "../cases/blowdown-result";
import type { FluidModel } from "../eos/fluid-model";
import { naturalConvection, type FilmFlux } from "../heat/natural-convection";
import { fireFluxWPerM2 } from "../heat/surface-fire";
import { heatUp } from "./heat-up";
import { itemsInFire, type Item } from "./items";
import { crossingTime, strengthPa, stressPa, type StrengthRule } from "./rupture";

export type FireRun = { fluid: FluidModel; series: BlowdownSeries; summary: BlowdownSummary };

const defaultStrengthFraction = 0.85;
const moreFlux = 1.3;
const nearRatio = 1.1;
/** Nucleate boiling holds a wetted wall within 10 to 50 K of its liquid; the upper end is taken. */
const boilingExcessK = 50;
const steps = 600;
const shownPoints = 100;
/** Shut in, at least an hour of fire is looked at. */
const shutInHorizonS = 3600;
const softeningK = 673.15;

/** Undefined where there is no fire, or no steel whose diameter is known. */
export function steelInFire(blowdown: BlowdownCase, run: FireRun): SteelInFire | undefined {
  const fire = fireOf(blowdown);
  if (!fire) return undefined;
  const { series, summary } = run;
  const wetted = liquidUntil(series) > 0;
  const items = itemsInFire(blowdown, wetted);
  if (items.length === 0) return undefined;

  const given = blowdown.steelInFire ?? {};
  const strengthFraction = given.strengthFraction ?? defaultStrengthFraction;
  const horizonS = Math.max(summary.endTimeS, blowdown.limits?.targetTimeS ?? 0);
  const shutInPressurePa = Math.max(summary.initialPressurePa, blowdown.vessel.wall?.designPressurePa ?? 0);
  const surroundings = surroundingsOf(blowdown, run);
  const setting: Setting = { fire: fire.fluxWPerM2, horizonS, shutInPressurePa, strengthFraction, ...surroundings };
  const looked = items.map((item) => look(item, setting, given.tensileStrengthPa, summary.timeToTargetPressureS));
  const worst = looked.reduce((least, item, i) => (item.leastRatio < (looked[least]?.leastRatio ?? 0) ? i : least), 0);
  const judged = looked.map((item, i) => ({ ...item, governs: i === worst }));
  const governing = judged[worst];
  const depressurisationWins = judged.every((item) => item.ruptureTimeS === undefined);
  return {
    fire: {
      basis: fire.basis,
      initialFluxWPerM2: fire.fluxWPerM2(summary.initialTemperatureK),
      ...(fire.fixedFluxWPerM2 === undefined ? {} : { fixedFluxWPerM2: fire.fixedFluxWPerM2 }),
    },
    strengthFraction,
    horizonS,
    shutInPressurePa,
    items: judged,
    depressurisationWins,
    verdict: worstOf(judged.map((item) => item.verdict)),
    sentence: governing ? sentence(governing) : "",
  };
}

type Fire = { basis: SteelInFire["fire"]["basis"]; fixedFluxWPerM2?: number; fluxWPerM2: (wallK: number) => number };

/** The case's own words first; a pool fire burns on dry steel as the set for an open pool. */
function fireOf({ heat: { outside }, steelInFire: given = {} }: BlowdownCase): Fire | undefined {
  if (outside.model !== "pool-fire" && outside.model !== "surface-fire") return undefined;
  const surface = outside.model === "surface-fire" ? outside : undefined;
  const basis = given.basis ?? surface?.basis ?? "open-pool";
  const stated = given.heatFluxWPerM2 ?? surface?.heatFluxWPerM2;
  const factor = outside.factor ?? 1;
  if (stated === undefined) return { basis, fluxWPerM2: (T) => factor * fireFluxWPerM2(basis, T) };
  const fixed = factor * stated;
  return { basis, fixedFluxWPerM2: fixed, fluxWPerM2: () => fixed };
}

type Surroundings = {
  startK: number;
  pressureAt: (timeS: number) => number;
  fluidAt: (timeS: number) => number;
  film: (timeS: number, differenceK: number) => number;
  liquidUntilS: number;
  liquidAt: (timeS: number) => number;
};
type Setting = Surroundings & {
  fire: (wallK: number) => number;
  horizonS: number;
  shutInPressurePa: number;
  strengthFraction: number;
};

/** Last time at which there was liquid; 0 where there was none. */
function liquidUntil({ timeS, liquidLevelM, vapourMoleFraction }: BlowdownSeries): number {
  for (let i = timeS.length - 1; i >= 0; i--)
    if (liquidLevelM ? (liquidLevelM[i] ?? 0) > 1e-6 : (vapourMoleFraction[i] ?? 1) < 1 - 1e-9) return timeS[i] ?? 0;
  return 0;
}

function surroundingsOf({ heat }: BlowdownCase, { fluid, series, summary }: FireRun): Surroundings {
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

function look(
  item: Item,
  setting: Setting,
  tensileStrengthPa: number | undefined,
  targetTimeS: number | undefined,
): SteelInFireItem {
  const rule: StrengthRule = {
    strengthFraction: setting.strengthFraction,
    tensileStrengthPa: tensileStrengthPa ?? item.steel.tensileStrengthPa,
  };
  const blownDown = follow(item, setting, rule, { fluxFactor: 1, untilS: setting.horizonS });
  const hotter = follow(item, setting, rule, { fluxFactor: moreFlux, untilS: setting.horizonS });
  const shutIn = follow(item, setting, rule, {
    fluxFactor: 1,
    untilS: Math.max(setting.horizonS, shutInHorizonS),
    heldPressurePa: setting.shutInPressurePa,
  });
  const optional = <K extends string>(key: K, value: number | undefined) =>
    value === undefined ? {} : ({ [key]: value } as Record<K, number>);
  const { leastRatio, leastRatioTimeS } = leastOf(blownDown);
  const early = hotter.ruptureTimeS !== undefined && hotter.ruptureTimeS < (targetTimeS ?? setting.horizonS);
  const verdict: Verdict = leastRatio <= 1 || early ? "beyond" : leastRatio < nearRatio ? "near" : "within";
  const { timeS, wallTemperatureK } = blownDown;
  return {
    id: item.id,
    name: item.name,
    steel: item.steel.id,
    part: item.part,
    insideDiameterM: item.insideDiameterM,
    thicknessM: item.thicknessM,
    leastRatio,
    leastRatioTimeS,
    hottestWallK: Math.max(...wallTemperatureK),
    ...optional("ruptureTimeS", blownDown.ruptureTimeS),
    ...optional("ruptureTimeAtMoreFluxS", hotter.ruptureTimeS),
    ...optional("ruptureTimeShutInS", shutIn.ruptureTimeS),
    ...optional(
      "timeTo400CelsiusS",
      timeS.find((_, i) => (wallTemperatureK[i] ?? 0) >= softeningK),
    ),
    verdict,
    governs: false,
    series: thinned(blownDown),
  };
}

type Followed = {
  timeS: number[];
  wallTemperatureK: number[];
  stressPa: number[];
  strengthPa: number[];
  ruptureTimeS: number | undefined;
};

function follow(
  item: Item,
  setting: Setting,
  rule: StrengthRule,
  { fluxFactor, untilS, heldPressurePa }: { fluxFactor: number; untilS: number; heldPressurePa?: number },
): Followed {
  const wetUntilS = item.part === "wet" ? Math.min(heldPressurePa === undefined ? setting.liquidUntilS : untilS, untilS) : 0;
  const parts = 1 - wetUntilS / untilS;
  const timeS: number[] = [];
  const wallTemperatureK: number[] = [];
  let startK = setting.startK;
  for (let i = 0, count = Math.round(steps * (1 - parts)); i < count; i++) {
    const t = (i * wetUntilS) / count;
    timeS.push(t);
    wallTemperatureK.push(Math.max(setting.liquidAt(t) + (i === 0 ? 0 : boilingExcessK), setting.startK));
    startK = wallTemperatureK.at(-1) ?? startK;
  }
  if (wetUntilS < untilS) {
    const dry = heatUp(
      {
        steel: item.steel,
        thicknessM: item.thicknessM,
        startK,
        fireFluxWPerM2: (T) => fluxFactor * setting.fire(T),
        insideFluxWPerM2: (t, T) => setting.film(t, T - setting.fluidAt(t)),
      },
      { fromS: wetUntilS, untilS, steps: Math.max(Math.round(steps * parts), 20) },
    );
    timeS.push(...dry.timeS);
    wallTemperatureK.push(...dry.temperatureK);
  }
  const stress = timeS.map((t) => stressPa(item, heldPressurePa ?? setting.pressureAt(t)));
  const strength = wallTemperatureK.map((T) => strengthPa(item.steel, rule, T));
  return { timeS, wallTemperatureK, stressPa: stress, strengthPa: strength, ruptureTimeS: crossingTime(timeS, strength, stress) };
}

/** Without stress there is no ratio; a large one stands for it. */
const largestRatio = 1000;

function leastOf({ timeS, stressPa: stress, strengthPa: strength }: Followed): { leastRatio: number; leastRatioTimeS: number } {
  let leastRatio = largestRatio;
  let leastRatioTimeS = 0;
  stress.forEach((load, i) => {
    const ratio = load > 0 ? (strength[i] ?? 0) / load : largestRatio;
    if (ratio >= leastRatio) return;
    leastRatio = ratio;
    leastRatioTimeS = timeS[i] ?? 0;
  });
  return { leastRatio, leastRatioTimeS };
}

function thinned({ timeS, wallTemperatureK, stressPa: stress, strengthPa: strength }: Followed): SteelInFireItem["series"] {
  const every = Math.max(Math.floor(timeS.length / shownPoints), 1);
  const keep = <T>(list: T[]): T[] => list.filter((_, i) => i % every === 0 || i === list.length - 1);
  return { timeS: keep(timeS), wallTemperatureK: keep(wallTemperatureK), stressPa: keep(stress), strengthPa: keep(strength) };
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

const worstOf = (verdicts: Verdict[]): Verdict =>
  (["beyond", "open", "near"] as const).find((one) => verdicts.includes(one)) ?? "within";

function sentence({ name, leastRatio, ruptureTimeS }: SteelInFireItem): string {
  if (ruptureTimeS !== undefined)
    return `${name}: the fire takes the strength faster than the blowdown lowers the stress. It ruptures after about ${(ruptureTimeS / 60).toPrecision(2)} min.`;
  return `${name}: the blowdown keeps the stress below the hot strength, at worst by a factor of ${(Math.floor(leastRatio * 100) / 100).toPrecision(2)}.`;
}
