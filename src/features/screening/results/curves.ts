/** Curves of a run in the units shown, with the limits and the points that matter. Pure; the charts only draw. */
import type { CurveAxis, CurveLimit, CurveMark, Curves, CurveSeries, CurveTone } from "@/components/charts/curve";
import { formatNumber, formatQuantity } from "@/components/quantity/format";
import { precisionOf } from "@/components/quantity/precision";
import { shownUnit } from "@/components/quantity/shown-units";
import type { CaseRunView } from "@/contracts/views";
import { fromSi, type QuantityId } from "@/engine/units";
import { momentUnit } from "./governing";
import type { Showing } from "./limit-rows";
import { runEvents } from "./run-events";
import { temperatureColumns } from "./temperature-columns";

export type RunCurves = {
  pressure: Curves;
  ventRate: Curves;
  temperature: Curves;
  outlet: Curves;
  mass: Curves;
  energy: Curves;
  /** Only where the vessel has a shape and held liquid. */
  level?: Curves;
};

export function runCurves({ document, result }: CaseRunView, showing: Showing): RunCurves {
  const { series, summary } = result;
  const limits = document.limits ?? {};
  const timeUnit = momentUnit(summary.endTimeS);
  const inTime = (seconds: number) => fromSi("time", seconds, timeUnit);
  const x: CurveAxis = {
    name: "time",
    unit: timeUnit,
    min: 0,
    max: inTime(summary.endTimeS),
    format: (value) => formatNumber(value, { decimals: 1 }),
  };
  const times = series.timeS.map(inTime);
  const text = (quantity: QuantityId, si: number) =>
    formatQuantity(quantity, si, shownUnit(quantity, showing.system), showing).text;
  const moment = (seconds: number) => formatQuantity("time", seconds, timeUnit).text;
  const of = (quantity: QuantityId) => scaleOf(quantity, showing);
  const curve = (id: string, label: string, tone: CurveTone, quantity: QuantityId, values: readonly number[]): CurveSeries => ({
    id,
    label,
    tone,
    x: times,
    y: values.map(of(quantity).convert),
  });
  const mark = (quantity: QuantityId, si: number, seconds: number, label: string): CurveMark => ({
    x: inTime(seconds),
    y: of(quantity).convert(si),
    label,
  });

  const allowed: CurveLimit[] =
    limits.targetTimeS !== undefined && limits.targetTimeS <= summary.endTimeS
      ? [{ axis: "x", at: inTime(limits.targetTimeS), label: `${moment(limits.targetTimeS)} allowed` }]
      : [];
  const target = limits.targetPressurePa;
  const reached = summary.timeToTargetPressureS;

  return {
    pressure: {
      x,
      y: { ...of("pressure").axis, name: "pressure", fromZero: true },
      series: [curve("pressure", "pressure", "pressure", "pressure", series.pressurePa)],
      limits: allowed,
      marks:
        target !== undefined && reached !== undefined
          ? [mark("pressure", target, reached, `${text("pressure", target)} after ${moment(reached)}`)]
          : [],
    },
    ventRate: {
      x,
      y: { ...of("massRate").axis, name: "vent rate", fromZero: true },
      series: [curve("vent-rate", "vent rate", "vent", "massRate", series.ventRateKgPerS)],
      limits:
        limits.ventCapacityKgPerS === undefined
          ? []
          : [
              {
                axis: "y",
                at: of("massRate").convert(limits.ventCapacityKgPerS),
                label: `${text("massRate", limits.ventCapacityKgPerS)} allotted`,
              },
            ],
      marks: [
        mark(
          "massRate",
          summary.peakVentRateKgPerS,
          summary.peakVentRateTimeS,
          `peak ${text("massRate", summary.peakVentRateKgPerS)}`,
        ),
      ],
    },
    temperature: temperatureCurves({ document, result }, { x, curve, mark, text, moment, of }),
    outlet: outletCurves({ document, result }, { x, curve, mark, text, moment, of }),
    mass: {
      x,
      y: { ...of("mass").axis, name: "mass inside", fromZero: true },
      series: [curve("mass", "mass inside", "pressure", "mass", series.massKg)],
      marks: [mark("mass", summary.finalMassKg, summary.endTimeS, `${text("mass", summary.finalMassKg)} left`)],
    },
    energy: {
      x,
      y: { ...of("energy").axis, name: "energy vented" },
      series: [curve("energy", "energy vented", "second-look", "energy", series.ventedEnergyJ)],
      marks: [mark("energy", summary.energyVentedJ, summary.endTimeS, text("energy", summary.energyVentedJ))],
    },
    ...(series.liquidLevelM?.some((level) => level > 0)
      ? { level: levelCurves(series.liquidLevelM, { x, times, showing }) }
      : {}),
  };
}

function levelCurves(
  levelM: readonly number[],
  { x, times, showing: { system } }: { x: CurveAxis; times: number[]; showing: Showing },
): Curves {
  const unit = system === "SI" ? "m" : "ft";
  const shown = levelM.map((level) => fromSi("length", level, unit));
  const axis: CurveAxis = {
    name: "liquid level",
    unit,
    fromZero: true,
    format: (value) => formatNumber(value, precisionOf("length", unit)),
  };
  return { x, y: axis, series: [{ id: "level", label: "liquid level", tone: "liquid", x: times, y: shown }] };
}

/** What leaves, behind the opening, at the back pressure. */
function outletCurves(
  { document, result: { series, summary } }: Pick<CaseRunView, "document" | "result">,
  { x, curve, mark, text, of }: Tools,
): Curves {
  const limit = document.limits?.minimumOutletTemperatureK;
  return {
    x,
    y: { ...of("temperature").axis, name: "temperature behind the opening" },
    series: [curve("outlet", "behind the opening", "second-look", "temperature", series.outletTemperatureK)],
    limits:
      limit === undefined
        ? []
        : [{ axis: "y", at: of("temperature").convert(limit), label: `not below ${text("temperature", limit)}` }],
    marks: [
      mark(
        "temperature",
        summary.minimumOutletTemperatureK,
        summary.minimumOutletTemperatureTimeS,
        `lowest ${text("temperature", summary.minimumOutletTemperatureK)}`,
      ),
    ],
  };
}

type Tools = {
  x: CurveAxis;
  curve: (id: string, label: string, tone: CurveTone, quantity: QuantityId, values: readonly number[]) => CurveSeries;
  mark: (quantity: QuantityId, si: number, seconds: number, label: string) => CurveMark;
  text: (quantity: QuantityId, si: number) => string;
  moment: (seconds: number) => string;
  of: (quantity: QuantityId) => Scale;
};

/** Fluid and steel; changes of phase stand on the fluid's curve. */
function temperatureCurves(
  { document, result }: Pick<CaseRunView, "document" | "result">,
  { x, curve, mark, text, moment, of }: Tools,
): Curves {
  const { series, summary } = result;
  const rated = document.vessel.wall?.minimumDesignMetalTemperatureK;
  const margin = document.limits?.minimumMetalMarginK ?? 0;
  const columns = temperatureColumns(series);
  const curves = columns.map(({ id, label, tone, valuesK }) => curve(id, label, tone, "temperature", valuesK));
  const walled = series.gasWallTemperatureK !== undefined;

  const limits: CurveLimit[] = [];
  const at = of("temperature").convert;
  if (walled && rated !== undefined) {
    const words = margin > 0 ? "rated temperature plus margin" : "minimum design metal temperature";
    limits.push({ axis: "y", at: at(rated + margin), label: `${words} ${text("temperature", rated + margin)}` });
  }

  const marks = [
    mark(
      "temperature",
      summary.minimumFluidTemperatureK,
      summary.minimumFluidTemperatureTimeS,
      `lowest fluid ${text("temperature", summary.minimumFluidTemperatureK)}`,
    ),
  ];
  const { minimumWallTemperatureK: lowest, minimumWallTemperatureTimeS: when } = summary;
  if (walled && lowest !== undefined && when !== undefined && when > 0)
    marks.push(mark("temperature", lowest, when, `${text("temperature", lowest)} at ${moment(when)}`));
  for (const { timeS, row, words } of runEvents(result).slice(0, eventsDrawn))
    marks.push(mark("temperature", series.fluidTemperatureK[row] ?? Number.NaN, timeS, `${words}, ${moment(timeS)}`));
  return { x, y: { ...of("temperature").axis, name: "temperature" }, series: curves, limits, marks };
}

/** More would crowd the chart; the list beneath names all. */
const eventsDrawn = 3;

type Scale = { convert: (si: number) => number; axis: Omit<CurveAxis, "name"> };

function scaleOf(quantity: QuantityId, { system, barometricPressurePa }: Showing): Scale {
  const unit = shownUnit(quantity, system);
  return {
    convert: (si) => fromSi(quantity, si, unit, barometricPressurePa),
    axis: { unit, format: (value) => formatNumber(value, precisionOf(quantity, unit)) },
  };
}
