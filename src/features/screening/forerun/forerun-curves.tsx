"use client";

import { useMemo } from "react";
import { CurveChart } from "@/components/charts/curve-chart";
import type { CurveAxis, CurveLimit, CurveMark, CurveSeries } from "@/components/charts/curve";
import { formatNumber } from "@/components/quantity/format";
import { useShown } from "@/components/quantity/quantity";
import { shownUnit } from "@/components/quantity/shown-units";
import { useUnits } from "@/components/units/units-provider";
import type { BlowdownCase } from "@/engine/cases/blowdown-case";
import type { BlowdownResult } from "@/engine/cases/blowdown-result";
import { fromSi, type QuantityId } from "@/engine/units";
import { temperatureColumns } from "../results/temperature-columns";

export type ForerunRun = { result: BlowdownResult; document: BlowdownCase; before: BlowdownResult | null; stale: boolean };

/** Pressure over temperatures, one time scale; the wall (or the fluid, where there is no wall) before the last edit as a dotted ghost. */
export function ForerunCurves({ result, document, before, stale }: ForerunRun) {
  const { system, barometricPressurePa } = useUnits();
  const shown = useShown();
  const limits = document.limits;
  const mdmt = document.vessel.wall?.minimumDesignMetalTemperatureK;
  const steelLimit = mdmt === undefined ? undefined : mdmt + (limits?.minimumMetalMarginK ?? 0);
  const allowedS = limits?.targetTimeS;
  const targetPa = limits?.targetPressurePa;

  const x = useMemo<CurveAxis>(
    () => ({ name: "time", unit: "min", min: 0, max: Math.max(result.summary.endTimeS, allowedS ?? 0) / 60 }),
    [result, allowedS],
  );
  const axes = useMemo<{ pressure: CurveAxis; temperature: CurveAxis }>(
    () => ({
      pressure: { name: "pressure", unit: shownUnit("pressure", system), fromZero: true },
      temperature: { name: "temperature", unit: shownUnit("temperature", system) },
    }),
    [system],
  );
  const drawn = useMemo(() => {
    const inUnit = (quantity: QuantityId, si: number) => fromSi(quantity, si, shownUnit(quantity, system), barometricPressurePa);
    const curve = (run: BlowdownResult, quantity: QuantityId, values: readonly number[]) => ({
      x: run.series.timeS.map((time) => time / 60),
      y: values.map((si) => inUnit(quantity, si)),
    });
    const { pressurePa, gasWallTemperatureK } = result.series;
    const ghostOf = gasWallTemperatureK ? before?.series.gasWallTemperatureK : before?.series.fluidTemperatureK;

    const pressure: CurveSeries[] = [{ id: "pressure", label: "", tone: "pressure", ...curve(result, "pressure", pressurePa) }];
    const temperature: CurveSeries[] = [
      ...(before && ghostOf
        ? [{ id: "ghost", label: "", tone: "ghost" as const, ...curve(before, "temperature", ghostOf) }]
        : []),
      ...temperatureColumns(result.series).map(({ valuesK, ...column }) => ({
        ...column,
        ...curve(result, "temperature", valuesK),
      })),
    ];
    const reached = result.summary.timeToTargetPressureS;
    const marks: CurveMark[] =
      reached !== undefined && targetPa !== undefined
        ? [{ x: reached / 60, y: inUnit("pressure", targetPa), label: minutes(reached) }]
        : [];
    const posts: CurveLimit[] =
      allowedS === undefined ? [] : [{ axis: "x", at: allowedS / 60, label: `${minutes(allowedS)} allowed` }];
    const floors: CurveLimit[] =
      steelLimit === undefined
        ? []
        : [{ axis: "y", at: inUnit("temperature", steelLimit), label: `limit ${shown("temperature", steelLimit).text}` }];
    return { pressure, temperature, marks, posts, floors };
  }, [result, before, system, barometricPressurePa, allowedS, targetPa, steelLimit, shown]);

  const reached = result.summary.timeToTargetPressureS;
  return (
    <>
      <CurveChart
        ground="tint"
        height="low"
        stale={stale}
        withoutData
        summary={
          reached === undefined ? "Pressure does not reach its target." : `Pressure falls to its target in ${minutes(reached)}.`
        }
        x={x}
        y={axes.pressure}
        series={drawn.pressure}
        limits={drawn.posts}
        marks={drawn.marks}
      />
      <CurveChart
        ground="tint"
        height="panel"
        stale={stale}
        withoutData
        summary="Temperatures of fluid and wall over the same time."
        x={x}
        y={axes.temperature}
        series={drawn.temperature}
        limits={drawn.floors}
      />
      {before && (
        <p className="pl-11 text-label text-ink-3">
          dotted: {result.series.gasWallTemperatureK ? "wall" : "fluid"} before your last edit
        </p>
      )}
    </>
  );
}

/** Whole minutes stay whole: "15 min" allowed, "13.6 min" reached. */
const minutes = (seconds: number): string =>
  `${formatNumber(seconds / 60, { decimals: Number.isInteger(seconds / 60) ? 0 : 1 })}\u00a0min`;
