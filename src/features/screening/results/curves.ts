/** Curves of a run in the units shown, with the limits and the points that matter. Pure; the charts only draw. */
import type { CurveAxis, CurveLimit, CurveMark, Curves, CurveSeries, CurveTone } from "@/components/charts/curve";
import { formatNumber, formatQuantity } from "@/components/quantity/format";
import { precisionOf } from "@/components/quantity/precision";
import { shownUnit } from "@/components/quantity/shown-units";
import type { CaseRunView } from "@/contracts/views";
import { fromSi, type QuantityId } from "@/engine/units";
import { momentUnit } from "./governing";
import type { Showing } from "./limit-rows";

export type RunCurves = { pressure: Curves; ventRate: Curves; temperature: Curves };

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

/** Fluid and wall; what leaves the opening only where a limit is set on it, as it would flatten the rest. */
function temperatureCurves(
  { document, result: { series, summary } }: Pick<CaseRunView, "document" | "result">,
  { x, curve, mark, text, moment, of }: Tools,
): Curves {
  const wall = series.gasWallTemperatureK;
  const rated = document.vessel.wall?.minimumDesignMetalTemperatureK;
  const margin = document.limits?.minimumMetalMarginK ?? 0;
  const outlet = document.limits?.minimumOutletTemperatureK;
  const curves: CurveSeries[] = [curve("fluid", "fluid", "fluid", "temperature", series.fluidTemperatureK)];
  if (wall) curves.push(curve("wall", "wall", "wall", "temperature", wall));
  if (outlet !== undefined)
    curves.push(curve("outlet", "behind the opening", "second-look", "temperature", series.outletTemperatureK));

  const limits: CurveLimit[] = [];
  const at = of("temperature").convert;
  if (wall && rated !== undefined) {
    const words = margin > 0 ? "rated temperature plus margin" : "minimum design metal temperature";
    limits.push({ axis: "y", at: at(rated + margin), label: `${words} ${text("temperature", rated + margin)}` });
  }
  if (outlet !== undefined)
    limits.push({ axis: "y", at: at(outlet), label: `behind the opening not below ${text("temperature", outlet)}` });

  const marks = [
    mark(
      "temperature",
      summary.minimumFluidTemperatureK,
      summary.minimumFluidTemperatureTimeS,
      `lowest fluid ${text("temperature", summary.minimumFluidTemperatureK)}`,
    ),
  ];
  const { minimumWallTemperatureK: lowest, minimumWallTemperatureTimeS: when } = summary;
  if (wall && lowest !== undefined && when !== undefined)
    marks.push(mark("temperature", lowest, when, `${text("temperature", lowest)} at ${moment(when)}`));
  return { x, y: { ...of("temperature").axis, name: "temperature" }, series: curves, limits, marks };
}

type Scale = { convert: (si: number) => number; axis: Omit<CurveAxis, "name"> };

function scaleOf(quantity: QuantityId, { system, barometricPressurePa }: Showing): Scale {
  const unit = shownUnit(quantity, system);
  return {
    convert: (si) => fromSi(quantity, si, unit, barometricPressurePa),
    axis: { unit, format: (value) => formatNumber(value, precisionOf(quantity, unit)) },
  };
}
