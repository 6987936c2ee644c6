"use client";

import Link from "next/link";
import { useEffect, useMemo, useState } from "react";
import { CurveChart } from "@/components/charts/curve-chart";
import type { CurveAxis, CurveLimit, CurveMark, CurveSeries } from "@/components/charts/curve";
import { formatNumber } from "@/components/quantity/format";
import { useShown } from "@/components/quantity/quantity";
import { shownUnit } from "@/components/quantity/shown-units";
import { useUnits } from "@/components/units/units-provider";
import { VerdictWord } from "@/components/verdict/verdict-word";
import { EmptyAxes } from "@/components/states/empty-axes";
import { runSentence } from "@/contracts/verdict-sentence";
import type { BlowdownResult } from "@/engine/cases/blowdown-result";
import { fromSi, type QuantityId } from "@/engine/units";
import { useDraft } from "../form/draft-context";
import { lineAddress } from "../form/line-address";
import { useForerun } from "./use-forerun";

/** Live coarse run of the lines as they stand, beside the form. Never stored, never signed. */
export function Forerun() {
  const { made, subject } = useDraft();
  const { result, before, running, problem, seconds } = useForerun(made.document);
  const inTheWay = [...made.problems.map(({ line }) => line), ...made.missing];
  const first = inTheWay[0];
  const stale = result !== null && (first !== undefined || problem !== null);

  return (
    <>
      <div className="mb-1 flex flex-wrap items-baseline justify-between gap-x-3">
        <h2 className="text-sub">Forerun</h2>
        <span className="text-small text-ink-3">
          {running
            ? "running…"
            : seconds === null
              ? "coarse run, not for signing"
              : `coarse run, ${formatNumber(seconds, { decimals: 1 })} s, not for signing`}
        </span>
      </div>
      {first !== undefined && (
        <p className="border-t py-2 font-serif text-note text-ink-2">
          {result ? "These curves belong to the lines before. " : "Forerun starts when parts 2 to 5 have their first values. "}
          {made.problems.length > 0 ? (
            <Link href={lineAddress(subject.screeningId, first)}>Line {first} is to fix</Link>
          ) : (
            <>
              {inTheWay.length} {inTheWay.length === 1 ? "line is" : "lines are"} missing:{" "}
              <Link href={lineAddress(subject.screeningId, first)}>go to line {first}</Link>
            </>
          )}
          .
        </p>
      )}
      {first === undefined && problem && (
        <p role="status" className="border-t py-2 font-serif text-note text-beyond">
          {problem}
        </p>
      )}
      {result ? <ForerunCurves result={result} before={before} stale={stale} /> : <EmptyAxes />}
      {result && <ForerunFigures result={result} before={before} stale={stale} />}
    </>
  );
}

type Pair = { result: BlowdownResult; before: BlowdownResult | null; stale: boolean };

function ForerunCurves({ result, before, stale }: Pair) {
  const { system, barometricPressurePa } = useUnits();
  const { made } = useDraft();
  const limits = made.document?.limits;
  const mdmt = made.document?.vessel.wall?.minimumDesignMetalTemperatureK;
  const margin = limits?.minimumMetalMarginK ?? 0;

  const drawn = useMemo(() => {
    const shown = (quantity: QuantityId, si: readonly number[]) =>
      si.map((value) => fromSi(quantity, value, shownUnit(quantity, system), barometricPressurePa));
    const minutes = (run: BlowdownResult) => run.series.timeS.map((time) => time / 60);
    const end = Math.max(result.summary.endTimeS, limits?.targetTimeS ?? 0) / 60;
    const x: CurveAxis = { name: "time", unit: "min", min: 0, max: end };
    const pressure: CurveSeries[] = [
      { id: "pressure", label: "", tone: "pressure", x: minutes(result), y: shown("pressure", result.series.pressurePa) },
    ];
    const temperature: CurveSeries[] = [
      {
        id: "fluid",
        label: "fluid",
        tone: "fluid",
        x: minutes(result),
        y: shown("temperature", result.series.fluidTemperatureK),
      },
    ];
    if (result.series.gasWallTemperatureK) {
      if (before?.series.gasWallTemperatureK) {
        temperature.push({
          id: "ghost",
          label: "",
          tone: "ghost",
          x: minutes(before),
          y: shown("temperature", before.series.gasWallTemperatureK),
        });
      }
      temperature.push({
        id: "wall",
        label: "wall",
        tone: "wall",
        x: minutes(result),
        y: shown("temperature", result.series.gasWallTemperatureK),
      });
    } else if (before) {
      temperature.push({
        id: "ghost",
        label: "",
        tone: "ghost",
        x: minutes(before),
        y: shown("temperature", before.series.fluidTemperatureK),
      });
    }
    const pressureLimits: CurveLimit[] = limits?.targetTimeS
      ? [
          {
            axis: "x",
            at: limits.targetTimeS / 60,
            label: `${formatNumber(limits.targetTimeS / 60, { decimals: 0 })} min allowed`,
          },
        ]
      : [];
    const reached = result.summary.timeToTargetPressureS;
    const marks: CurveMark[] =
      reached !== undefined && limits?.targetPressurePa
        ? [
            {
              x: reached / 60,
              y: fromSi("pressure", limits.targetPressurePa, shownUnit("pressure", system), barometricPressurePa),
              label: `${formatNumber(reached / 60, { decimals: 1 })} min`,
            },
          ]
        : [];
    const temperatureLimits: CurveLimit[] =
      mdmt === undefined
        ? []
        : [{ axis: "y", at: fromSi("temperature", mdmt + margin, shownUnit("temperature", system)), label: "limit of the wall" }];
    return { x, pressure, temperature, pressureLimits, marks, temperatureLimits };
  }, [result, before, system, barometricPressurePa, limits, mdmt, margin]);

  const yPressure = useMemo<CurveAxis>(
    () => ({ name: "pressure", unit: shownUnit("pressure", system), fromZero: true }),
    [system],
  );
  const yTemperature = useMemo<CurveAxis>(() => ({ name: "temperature", unit: shownUnit("temperature", system) }), [system]);
  const shownTime = result.summary.timeToTargetPressureS;

  return (
    <>
      <CurveChart
        ground="tint"
        height="low"
        stale={stale}
        withoutData
        summary={
          shownTime === undefined
            ? "Pressure does not reach its target."
            : `Pressure falls to its target in ${formatNumber(shownTime / 60, { decimals: 1 })} min.`
        }
        x={drawn.x}
        y={yPressure}
        series={drawn.pressure}
        limits={drawn.pressureLimits}
        marks={drawn.marks}
      />
      <CurveChart
        ground="tint"
        height="panel"
        stale={stale}
        withoutData
        summary="Temperatures of fluid and wall over the same time."
        x={drawn.x}
        y={yTemperature}
        series={drawn.temperature}
        limits={drawn.temperatureLimits}
      />
      {before && (
        <p className="pl-11 text-label text-ink-3">
          dotted: {result.series.gasWallTemperatureK ? "wall" : "fluid"} before your last edit
        </p>
      )}
    </>
  );
}

function ForerunFigures({ result, before, stale }: Pair) {
  const shown = useShown();
  const { summary } = result;
  const was = before?.summary;
  const rows: {
    label: string;
    quantity: QuantityId;
    difference: QuantityId;
    now: number | undefined;
    then: number | undefined;
  }[] = [
    {
      label: "Time to target pressure",
      quantity: "time",
      difference: "time",
      now: summary.timeToTargetPressureS,
      then: was?.timeToTargetPressureS,
    },
    {
      label: "Lowest fluid",
      quantity: "temperature",
      difference: "temperatureDifference",
      now: summary.minimumFluidTemperatureK,
      then: was?.minimumFluidTemperatureK,
    },
    {
      label: "Lowest wall",
      quantity: "temperature",
      difference: "temperatureDifference",
      now: summary.minimumWallTemperatureK,
      then: was?.minimumWallTemperatureK,
    },
    {
      label: "Peak vent load",
      quantity: "massRate",
      difference: "massRate",
      now: summary.peakVentRateKgPerS,
      then: was?.peakVentRateKgPerS,
    },
  ];
  const { made } = useDraft();
  const sentence = runSentence(result, made.document?.limits?.minimumMetalMarginK);
  const said = `${result.verdict}. ${sentence}`;
  const announced = useSettled(said, 5000);

  return (
    <>
      <table className={`mt-2 w-full border-collapse border-t-1.5 border-ink ${stale ? "text-ink-3" : ""}`}>
        <caption className="sr-only">Figures of the forerun, and their change with the last edit</caption>
        <tbody>
          {rows
            .filter(({ label, now }) => label !== "Lowest wall" || now !== undefined)
            .map(({ label, quantity, difference, now, then }) => (
              <tr key={label} className="border-b">
                <th scope="row" className="py-2 text-left font-normal">
                  {label}
                </th>
                <td className="whitespace-nowrap py-2 text-right font-semibold">
                  {now === undefined ? "not reached" : shown(quantity, now).text}
                </td>
                <td className="w-[64px] whitespace-nowrap py-2 pl-2 text-right text-ink-3">
                  {now !== undefined && then !== undefined ? shown(difference, now - then, { signed: true }).number : ""}
                </td>
              </tr>
            ))}
        </tbody>
      </table>
      <p className="py-2.5">
        <VerdictWord verdict={result.verdict} /> <span className="font-serif text-ink-2">{sentence}</span>
      </p>
      <p className="font-serif text-label text-ink-3">C1 {result.cautions[0]}</p>
      <p aria-live="polite" className="sr-only">
        {announced}
      </p>
    </>
  );
}

/** The newest text, but no more often than every `everyMs`: a reader by ear is not interrupted at each keystroke. */
function useSettled(text: string, everyMs: number): string {
  const [settled, setSettled] = useState(text);
  useEffect(() => {
    const timer = setTimeout(() => setSettled(text), everyMs);
    return () => clearTimeout(timer);
  }, [text, everyMs]);
  return settled;
}
