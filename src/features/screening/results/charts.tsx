"use client";

import { useMemo } from "react";
import { CurveChart } from "@/components/charts/curve-chart";
import { formatQuantity } from "@/components/quantity/format";
import { shownUnit } from "@/components/quantity/shown-units";
import type { CaseRunView } from "@/contracts/views";
import { runCurves } from "./curves";
import { momentUnit } from "./governing";
import type { Showing } from "./limit-rows";
import { useShowing } from "./use-showing";

/** Pressure over vent rate at the left, temperatures at the right; all three share the axis of time. */
export function Charts({ run, stale = false }: { run: CaseRunView; stale?: boolean }) {
  const showing = useShowing();
  const { pressure, ventRate, temperature } = useMemo(() => runCurves(run, showing), [run, showing]);
  const words = useMemo(() => summaries(run, showing), [run, showing]);
  return (
    <div className="grid grid-cols-2 gap-9 pb-1.5 pt-[22px] rail:grid-cols-1 rail:gap-6">
      <div>
        <CurveChart
          {...pressure}
          height="panel"
          stale={stale}
          summary={words.pressure}
          caption={
            <>
              <b>Pressure and vent rate.</b> Same time axis.
            </>
          }
        />
        <CurveChart {...ventRate} height="low" stale={stale} summary={words.ventRate} />
      </div>
      <CurveChart
        {...temperature}
        height="tall"
        stale={stale}
        summary={words.temperature}
        caption={
          <>
            <b>Temperature.</b>{" "}
            {run.result.series.gasWallTemperatureK
              ? "Fluid and wall, one of each for the whole vessel."
              : "One for the whole fluid; no wall is in the balance."}
          </>
        }
      />
    </div>
  );
}

/** What each chart finds, in one sentence, for those who listen. */
function summaries({ document, result: { summary } }: CaseRunView, { system, barometricPressurePa }: Showing) {
  const text = (quantity: "pressure" | "temperature" | "massRate", si: number) =>
    formatQuantity(quantity, si, shownUnit(quantity, system), { barometricPressurePa }).text;
  const moment = (seconds: number) => formatQuantity("time", seconds, momentUnit(summary.endTimeS)).text;
  const target = document.limits?.targetPressurePa;
  const reached = summary.timeToTargetPressureS;
  const wall = summary.minimumWallTemperatureK;
  return {
    pressure:
      `Pressure falls from ${text("pressure", summary.initialPressurePa)} to ${text("pressure", summary.finalPressurePa)} in ${moment(summary.endTimeS)}` +
      (target === undefined
        ? "."
        : reached === undefined
          ? "; the target is not reached."
          : `, past ${text("pressure", target)} after ${moment(reached)}.`),
    ventRate: `The vent rate peaks at ${text("massRate", summary.peakVentRateKgPerS)} after ${moment(summary.peakVentRateTimeS)}.`,
    temperature:
      `The fluid falls to ${text("temperature", summary.minimumFluidTemperatureK)} at ${moment(summary.minimumFluidTemperatureTimeS)}` +
      (wall === undefined
        ? "."
        : `, the wall to ${text("temperature", wall)} at ${moment(summary.minimumWallTemperatureTimeS ?? 0)}.`),
  };
}
