"use client";

import { useMemo } from "react";
import { CurveChart } from "@/components/charts/curve-chart";
import { formatQuantity } from "@/components/quantity/format";
import { shownUnit } from "@/components/quantity/shown-units";
import type { CaseRunView } from "@/contracts/views";
import { runCurves } from "./curves";
import { momentUnit } from "./governing";
import type { Showing } from "./limit-rows";
import { endingWords, runEvents } from "./run-events";
import { temperatureColumns } from "./temperature-columns";
import { useShowing } from "./use-showing";

/**
 * Two columns over one axis of time: what leaves at the left (pressure, vent rate, mass, energy), how cold it gets at the right
 * (temperatures, behind the opening, level).
 */
export function Charts({ run, stale = false }: { run: CaseRunView; stale?: boolean }) {
  const showing = useShowing();
  const curves = useMemo(() => runCurves(run, showing), [run, showing]);
  const words = useMemo(() => summaries(run, showing), [run, showing]);
  const low = (name: "ventRate" | "mass" | "energy" | "outlet" | "level") =>
    curves[name] && <CurveChart {...curves[name]} height="low" stale={stale} summary={words[name]} />;
  return (
    <div className="pb-1.5 pt-[22px]">
      <div className="grid grid-cols-2 gap-9 rail:grid-cols-1 rail:gap-6">
        <div>
          <CurveChart
            {...curves.pressure}
            height="panel"
            stale={stale}
            summary={words.pressure}
            caption={
              <>
                <b>Pressure, vent rate, mass and energy vented.</b> Same time axis.
              </>
            }
          />
          {low("ventRate")}
          {low("mass")}
          {low("energy")}
        </div>
        <div>
          <CurveChart
            {...curves.temperature}
            height="tall"
            stale={stale}
            summary={words.temperature}
            caption={
              <>
                <b>Temperature.</b> {zonesWords(run.result)}
              </>
            }
          />
          {low("outlet")}
          {low("level")}
        </div>
      </div>
      <Happened run={run} />
    </div>
  );
}

function zonesWords({ series }: CaseRunView["result"]): string {
  const columns = temperatureColumns(series).map(({ id }) => id);
  if (!series.gasWallTemperatureK) return "One for the whole fluid; no wall is in the balance.";
  if (columns.includes("liquid-wall")) return "Wall dashed where liquid wets it.";
  return "Fluid and wall, one of each for the whole vessel.";
}

/** Changes of phase and the end, in words with their times. */
function Happened({ run: { result } }: { run: CaseRunView }) {
  const moment = (seconds: number) => formatQuantity("time", seconds, momentUnit(result.summary.endTimeS)).text;
  const events = runEvents(result);
  return (
    <p className="pt-2 font-serif text-note text-ink-2">
      {events.length === 0
        ? "No phase appeared or went. "
        : `${events.map(({ timeS, words }) => `${words} at ${moment(timeS)}`).join("; ")}. `.replace(/^./, (first) =>
            first.toUpperCase(),
          )}
      {endingWords[result.summary.endedBy]}
    </p>
  );
}

/** What each chart finds, in one sentence, for those who listen. */
function summaries({ document, result: { summary } }: CaseRunView, { system, barometricPressurePa }: Showing) {
  const text = (quantity: "pressure" | "temperature" | "massRate" | "mass" | "energy", si: number) =>
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
    mass: `The mass inside falls from ${text("mass", summary.initialMassKg)} to ${text("mass", summary.finalMassKg)}.`,
    energy: `${text("energy", summary.energyVentedJ)} leave with ${text("mass", summary.ventedMassKg)} vented.`,
    outlet: `Behind the opening it falls to ${text("temperature", summary.minimumOutletTemperatureK)} at ${moment(summary.minimumOutletTemperatureTimeS)}.`,
    level: "Liquid level over the same time.",
    temperature:
      `The fluid falls to ${text("temperature", summary.minimumFluidTemperatureK)} at ${moment(summary.minimumFluidTemperatureTimeS)}` +
      (wall === undefined
        ? "."
        : `, the wall to ${text("temperature", wall)} at ${moment(summary.minimumWallTemperatureTimeS ?? 0)}.`),
  };
}
