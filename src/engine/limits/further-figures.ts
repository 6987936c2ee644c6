/** Solids, hydrate and liquid carry-over of a run, as figures held against limits. A line is there only where the fluid and the case ask for it. */
import type { Contents } from "../cases/blowdown/contents";
import { surfaceTension } from "../cases/blowdown/inside-film";
import type { VesselModel } from "../cases/blowdown/vessel-model";
import type { BlowdownCase } from "../cases/blowdown-case";
import type { BlowdownSeries, BlowdownSummary, LimitId, Warning } from "../cases/blowdown-result";
import { airMolarMass, hydrateMarginK, motieeHydrateTemperature, towlerMokhatabHydrateTemperature } from "../solids/hydrate";
import { levelAtVolume, type MeasuredVessel } from "../vessel/geometry";
import type { Figure } from "./assess";
import { swelledShare } from "./carry-over";
import { farthestK, freezingDistanceK } from "./freezing-distance";

export type LookedAt = {
  model: VesselModel;
  series: BlowdownSeries;
  summary: BlowdownSummary;
  /** Copy what has to survive the next call. */
  contentsAt: (timeS: number) => Contents;
  /** Another case, coarsely. */
  rerun: (blowdown: BlowdownCase) => { series: BlowdownSeries; summary: BlowdownSummary };
};

/** Moments that are looked at besides the coldest. */
const moments = 16;
/** So far from solid at the coldest moments, the others are not looked at. */
const farFromSolidK = 40;

export function furtherFigures(blowdown: BlowdownCase, looked: LookedAt): { figures: Figure[]; warnings: Warning[] } {
  const { model, series, summary } = looked;
  const freezes = model.solids.length > 0;
  const carriesOver = model.from === "vapour" && series.vapourMoleFraction.some((share) => share < 1);
  const least = { vessel: farthestK, behind: farthestK };
  let swelled = 0;
  const seesLevel = carriesOver && model.vessel.below !== undefined;
  const { coldest, even } = rowsToLookAt(series);
  const look = (i: number): void => {
    const contents = looked.contentsAt(series.timeS[i] ?? 0);
    if (freezes) {
      least.vessel = Math.min(least.vessel, freezingDistanceK(model.fluid, contents, model.solids));
      least.behind = Math.min(
        least.behind,
        behindOpening(model, contents, series.outletTemperatureK[i] ?? contents.temperatureK),
      );
    }
    if (seesLevel) swelled = Math.max(swelled, swelledAt(model, contents, series.ventRateKgPerS[i] ?? 0));
  };
  if (freezes || seesLevel) coldest.forEach(look);
  if (seesLevel || Math.min(least.vessel, least.behind) < farFromSolidK) even.forEach(look);
  const wet = hydrateDistance(blowdown, looked);
  return {
    figures: [
      ...(freezes ? solidFigures(summary, least, model) : []),
      ...(wet ? [wet.figure] : []),
      ...(carriesOver ? [carryOver(model.vessel, swelled)] : []),
    ],
    warnings: wet?.warnings ?? [],
  };
}

/** The coldest inside and behind the opening and the last; and others, evenly over the rows. */
function rowsToLookAt({ timeS, fluidTemperatureK, outletTemperatureK }: BlowdownSeries): { coldest: number[]; even: number[] } {
  const lowest = (values: number[]): number => values.reduce((best, value, i) => (value < (values[best] ?? 0) ? i : best), 0);
  const last = timeS.length - 1;
  const coldest = [...new Set([lowest(fluidTemperatureK), lowest(outletTemperatureK), last])].sort((a, b) => a - b);
  const even = Array.from({ length: moments + 1 }, (_, k) => Math.round((k * last) / moments));
  return { coldest, even: [...new Set(even)].filter((i) => !coldest.includes(i)) };
}

function behindOpening({ fluid, solids, backPressurePa }: VesselModel, contents: Contents, temperatureK: number): number {
  const curves = solids.filter((curve) => curve.sublimationPa);
  if (curves.length === 0) return farthestK;
  const composition = contents.lightestComposition;
  const lightest = fluid.phaseAtPressure(temperatureK, backPressurePa, composition, "vapour");
  return freezingDistanceK(
    fluid,
    { ...contents, temperatureK, pressurePa: backPressurePa, phases: 1, lightest, equilibrium: undefined },
    curves,
  );
}

function solidFigures(summary: BlowdownSummary, least: { vessel: number; behind: number }, { solids }: VesselModel): Figure[] {
  const met = summary.endedBy === "solid-phase";
  const line = (id: LimitId, title: string, value: number): Figure => ({
    id,
    title,
    unit: "K",
    sense: "at-least",
    required: false,
    value,
    limit: 0,
    difference: true,
    ...(value >= farthestK ? { note: `Nothing freezes within ${farthestK} K.` } : {}),
  });
  return [
    line("solids", "Distance to solid in the vessel", met ? Math.min(least.vessel, 0) : least.vessel),
    ...(solids.some((curve) => curve.sublimationPa)
      ? [line("solids-behind-opening", "Distance to solid behind the opening", least.behind)]
      : []),
  ];
}

const freezingK = 273.15;
const lowestPressurePa = 3e5;

function hydrateDistance(
  { fluid, limits }: BlowdownCase,
  { model, series, summary }: LookedAt,
): { figure: Figure; warnings: Warning[] } | undefined {
  const water = fluid.components.some(({ id, moleFraction }) => id === "water" && moleFraction > 0);
  if (!water && !limits?.waterPresent) return undefined;
  const figure: Figure = {
    id: "hydrate",
    title: "Distance to hydrate",
    unit: "K",
    sense: "at-least",
    required: false,
    limit: hydrateMarginK,
    difference: true,
  };
  const ice: Warning[] =
    summary.minimumFluidTemperatureK < freezingK
      ? [
          {
            code: "ice",
            message: `Water is present and the fluid reaches ${summary.minimumFluidTemperatureK.toFixed(1)} K, below 273.15 K: ice may form and block the outlet.`,
          },
        ]
      : [];
  const gravity = model.fluid.mixtureMolarMass(model.fluid.feed) / airMolarMass;
  if (!(gravity >= 0.55 && gravity <= 1))
    return {
      figure: {
        ...figure,
        note: `The hydrate correlations hold for a gas gravity of 0.55 to 1; this one has ${gravity.toFixed(2)}.`,
      },
      warnings: ice,
    };
  const distances = series.pressurePa.flatMap((p, i) =>
    p > lowestPressurePa
      ? [
          (series.fluidTemperatureK[i] ?? 0) -
            Math.max(motieeHydrateTemperature(p, gravity), towlerMokhatabHydrateTemperature(p, gravity)),
        ]
      : [],
  );
  if (distances.length === 0)
    return {
      figure: { ...figure, note: "The pressure is below the range of the hydrate correlations throughout." },
      warnings: ice,
    };
  return { figure: { ...figure, value: Math.min(...distances) }, warnings: ice };
}

function swelledAt({ fluid, vessel }: VesselModel, contents: Contents, ventRateKgPerS: number): number {
  if (contents.isLiquidFull) return 1;
  const [vapour, liquid] = contents.equilibrium?.phases ?? [];
  const { heightM, below } = vessel;
  if (!vapour || !liquid || !below || heightM === undefined) return 0;
  const levelM = levelAtVolume(vessel, contents.liquidVolumeM3) ?? 0;
  return swelledShare({
    levelM,
    heightM,
    surfaceM2: surfaceAt(below, levelM, heightM),
    vapourRateKgPerS: ventRateKgPerS,
    vapourDensityKgPerM3: vapour.state.densityKgPerM3,
    liquidDensityKgPerM3: liquid.state.densityKgPerM3,
    surfaceTensionNPerM: surfaceTension(fluid, liquid.composition, contents.temperatureK),
  });
}

/** dV/dh over a thousandth of the height. */
function surfaceAt(below: NonNullable<MeasuredVessel["below"]>, levelM: number, heightM: number): number {
  const step = 5e-4 * heightM;
  const [low, high] = [Math.max(levelM - step, 0), Math.min(levelM + step, heightM)];
  return (below(high).volumeM3 - below(low).volumeM3) / (high - low);
}

function carryOver({ below }: MeasuredVessel, swelled: number): Figure {
  const figure: Figure = {
    id: "liquid-carry-over",
    title: "Swelled liquid over the height of the vessel",
    unit: "1",
    sense: "at-most",
    required: false,
    limit: 1,
  };
  return below
    ? { ...figure, value: swelled, note: "An outlet at the top is reached at 1." }
    : { ...figure, note: "The shape of the vessel is not known, so neither is the level." };
}
