"use client";

import { useMemo, useState } from "react";
import { Notice } from "@/components/caution/notice";
import { formatQuantity } from "@/components/quantity/format";
import { useShown } from "@/components/quantity/quantity";
import { shownUnit } from "@/components/quantity/shown-units";
import { MarginHead, MarginNote } from "@/components/shell/margin";
import { SheetWithMargin } from "@/components/shell/sheet";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { Figure } from "@/components/verdict/figure";
import type { SizingCase, SizingPoint, SizingResult } from "@/engine/cases/sizing-case";
import { fromSi } from "@/engine/units";
import type { Showing } from "../results/limit-rows";
import { useShowing } from "../results/use-showing";
import { curveWithEdges, pointAtBore } from "./point-at-bore";
import { useWindow } from "./use-window";
import { WindowChart, type WindowPanel, type WindowZones } from "./window-chart";

/**
 * Which bores are fast enough in the fire and keep the steel warm enough in the cold case. Looked for in this browser from the computed cases;
 * nothing of it is stored.
 *
 * names   of the two cases ("case B")
 */
export function WindowSheet({
  sizing,
  names,
  titleBlock,
  back,
}: {
  sizing: SizingCase;
  names: { fire: string | undefined; cold: string | undefined };
  titleBlock: React.ReactNode;
  back: React.ReactNode;
}) {
  const { result, part, problem, running } = useWindow(sizing);
  const [moved, setMoved] = useState<number | null>(null);
  const showing = useShowing();
  const bore = moved ?? result?.chosen?.diameterM;
  const point =
    result && bore !== undefined ? (moved === null ? result.chosen : pointAtBore(curveWithEdges(result), bore)) : undefined;
  return (
    <SheetWithMargin
      titleBlock={titleBlock}
      margin={result && <WindowMargin result={result} bore={bore} point={point} readOff={moved !== null} onMove={setMoved} />}
    >
      <h1 className="pb-2">{result?.sentence ?? "Which bores work"}</h1>
      <p className="pb-4 font-serif text-prose text-ink-2">
        {names.fire && `Too slow is judged in the fire of ${names.fire}. `}
        {names.cold && `Too cold is judged by the steel of ${names.cold}. `}
        Looked for in your browser; not part of the record.
      </p>
      {running && (
        <p role="status" className="flex flex-wrap items-center gap-3 pb-4 text-small text-ink-2">
          <progress max={1} value={part} aria-label="Looking for the edges" className="h-2.5 w-[260px] accent-tide" />
          Looking for the edges…
        </p>
      )}
      {problem && (
        <Notice tone="error" title="No window was found.">
          {problem}
        </Notice>
      )}
      {result && <Found result={result} bore={bore} point={point} showing={showing} />}
      {result?.warnings.map(({ message }) => (
        <p key={message} className="pt-2 font-serif text-note text-ink-2">
          {message}
        </p>
      ))}
      <div className="mt-6">{back}</div>
    </SheetWithMargin>
  );
}

type At = { bore: number | undefined; point: SizingPoint | undefined };

function Found({ result, bore, point, showing }: At & { result: SizingResult; showing: Showing }) {
  const { smallest, largest, coldBelow, window, limits } = result;
  const lower =
    window.fromM === undefined ? undefined : smallest?.diameterM === window.fromM ? smallest : (coldBelow ?? smallest);
  const chart = useMemo(() => chartOf(result, { bore, point }, showing), [result, bore, point, showing]);
  const shown = useShown();
  const figure = (label: string, edge: typeof smallest) => {
    if (!edge) return <Figure label={label} value="–" rest="none in the range looked at" />;
    const { number, unit } = shown("length", edge.diameterM);
    const met = edge.unit === "s" ? shown("time", edge.value).text : shown("temperature", edge.value).text;
    return <Figure label={label} value={number} rest={`${unit}, ${met}`} />;
  };
  return (
    <>
      <div className="mb-5 grid grid-cols-3 gap-6 border-b-3 border-t-1.5 border-double border-ink py-3 phone:grid-cols-1">
        {figure("Smallest that works", lower)}
        {bore === undefined ? (
          <Figure label="Bore in hand" value="–" />
        ) : (
          <Figure label="Bore in hand" value={shown("length", bore).number} rest={shown("length", bore).unit} />
        )}
        {figure("Largest that works", largest)}
      </div>
      <WindowChart {...chart} summary={result.sentence} />
      <p className="pt-2 text-label text-ink-3">
        {limits.targetPressurePa !== undefined && `Target ${shown("pressure", limits.targetPressurePa).text}. `}
        Edges are confirmed by runs on both sides at the tolerance of the case.
      </p>
    </>
  );
}

function chartOf(
  result: SizingResult,
  { bore, point }: At,
  { system, barometricPressurePa }: Showing,
): { panels: WindowPanel[]; zones: WindowZones; bore: number | undefined; unit: string } {
  const { limits, window, smallest, coldBelow } = result;
  const curve = curveWithEdges(result);
  const unit = shownUnit("length", system);
  const inBore = (metres: number) => fromSi("length", metres, unit);
  const temperatureUnit = shownUnit("temperature", system);
  const inTemperature = (kelvin: number) => fromSi("temperature", kelvin, temperatureUnit);
  const minutes = (seconds: number) => fromSi("time", seconds, "min");
  const target = limits.targetPressurePa;
  const toTarget =
    target === undefined
      ? "time to target"
      : `time to ${formatQuantity("pressure", target, shownUnit("pressure", system), { barometricPressurePa }).text}`;
  const panels: WindowPanel[] = [];
  if (curve.some(({ timeToTargetS }) => timeToTargetS !== undefined)) {
    panels.push({
      title: `${toTarget} in fire, min`,
      tone: "pressure",
      fromZero: true,
      points: curve.map(({ diameterM, timeToTargetS: at }) => ({
        x: inBore(diameterM),
        y: at === undefined ? undefined : minutes(at),
      })),
      ...(limits.targetTimeS === undefined
        ? {}
        : {
            limit: {
              at: minutes(limits.targetTimeS),
              label: `${formatQuantity("time", limits.targetTimeS, "min").text} allowed`,
            },
          }),
      ...(point?.timeToTargetS === undefined
        ? {}
        : { chosen: { y: minutes(point.timeToTargetS), label: formatQuantity("time", point.timeToTargetS, "min").text } }),
    });
  }
  if (curve.some(({ minimumWallTemperatureK }) => minimumWallTemperatureK !== undefined)) {
    const text = (kelvin: number) => formatQuantity("temperature", kelvin, temperatureUnit).text;
    panels.push({
      title: `lowest steel, cold case, ${temperatureUnit}`,
      tone: "wall",
      points: curve.map(({ diameterM, minimumWallTemperatureK: at }) => ({
        x: inBore(diameterM),
        y: at === undefined ? undefined : inTemperature(at),
      })),
      ...(limits.minimumWallTemperatureK === undefined
        ? {}
        : {
            limit: { at: inTemperature(limits.minimumWallTemperatureK), label: `rated ${text(limits.minimumWallTemperatureK)}` },
          }),
      ...(point?.minimumWallTemperatureK === undefined
        ? {}
        : { chosen: { y: inTemperature(point.minimumWallTemperatureK), label: text(point.minimumWallTemperatureK) } }),
    });
  }
  const bores = curve.map(({ diameterM }) => inBore(diameterM));
  return {
    panels,
    unit,
    bore: bore === undefined ? undefined : inBore(bore),
    zones: {
      min: Math.min(...bores),
      max: Math.max(...bores),
      ...(window.fromM === undefined ? {} : { from: inBore(window.fromM) }),
      ...(window.toM === undefined ? {} : { to: inBore(window.toM) }),
      below:
        window.fromM !== undefined && window.fromM === coldBelow?.diameterM && smallest?.diameterM !== window.fromM
          ? "too cold"
          : "too slow",
      none: window.state === "none",
    },
  };
}

function WindowMargin({
  result,
  bore,
  point,
  readOff,
  onMove,
}: At & { result: SizingResult; readOff: boolean; onMove: (bore: number) => void }) {
  const shown = useShown();
  const { curve, limits, loadPassedAboveM, numerics, cautions, cautionIds } = result;
  const [low, high] = [curve[0]?.diameterM ?? 0, curve.at(-1)?.diameterM ?? 1];
  const inHand = (value: number | undefined, limit: number | undefined, sign: 1 | -1) =>
    value === undefined || limit === undefined ? undefined : sign * (limit - value);
  const time = inHand(point?.timeToTargetS, limits.targetTimeS, 1);
  const steel = inHand(point?.minimumWallTemperatureK, limits.minimumWallTemperatureK, -1);
  const load = point?.peakVentRateFireKgPerS ?? point?.peakVentRateColdKgPerS;
  const left = inHand(load, limits.ventCapacityKgPerS, 1);
  return (
    <>
      <MarginHead>Bore in hand</MarginHead>
      {bore !== undefined && (
        <label className="block py-2">
          <span className="font-semibold">{shown("length", bore).text}</span>
          <input
            type="range"
            min={low}
            max={high}
            step={1e-4}
            value={bore}
            aria-valuetext={shown("length", bore).text}
            onChange={(event) => onMove(Number(event.target.value))}
            className="mt-1 block h-9 w-full accent-tide"
          />
          <small className="block text-label text-ink-3">
            {readOff ? "Figures read off the curves." : "Figures of runs at the bore of the lines."}
          </small>
        </label>
      )}
      {point && (
        <Table caption="Figures at the bore in hand" stack={false}>
          <thead>
            <tr>
              <HeadCell>Figure</HeadCell>
              <HeadCell numeric>Value</HeadCell>
              <HeadCell numeric>In hand</HeadCell>
            </tr>
          </thead>
          <tbody>
            <Row>
              <Cell head>Time in fire</Cell>
              <Cell numeric>{point.timeToTargetS === undefined ? "not reached" : shown("time", point.timeToTargetS).text}</Cell>
              <Cell numeric>{time === undefined ? "–" : shown("time", time).text}</Cell>
            </Row>
            <Row>
              <Cell head>Lowest steel</Cell>
              <Cell numeric>{shown("temperature", point.minimumWallTemperatureK).text}</Cell>
              <Cell numeric>{steel === undefined ? "–" : shown("temperatureDifference", steel).text}</Cell>
            </Row>
            <Row>
              <Cell head>Peak load</Cell>
              <Cell numeric>{shown("massRate", load).text}</Cell>
              <Cell numeric>{left === undefined ? "–" : shown("massRate", left).text}</Cell>
            </Row>
          </tbody>
        </Table>
      )}
      {loadPassedAboveM !== undefined && limits.ventCapacityKgPerS !== undefined && (
        <MarginNote no="Load">
          {shown("massRate", limits.ventCapacityKgPerS).text} is passed above {shown("length", loadPassedAboveM).text} in fire. It
          is not part of this window; line 7.04 carries it.
        </MarginNote>
      )}
      <MarginHead>Cautions</MarginHead>
      {cautions.map((words, i) => (
        <MarginNote key={words} no={cautionIds[i]} caution>
          {words}
        </MarginNote>
      ))}
      <MarginNote no="Runs">
        {numerics.runs} in {shown("time", numerics.wallClockMs / 1000, { unit: { SI: "s", US: "s" } }).text}.
      </MarginNote>
    </>
  );
}
