"use client";

import {
  Chart as ChartJs,
  LinearScale,
  LogarithmicScale,
  LineController,
  LineElement,
  PointElement,
  type ChartOptions,
} from "chart.js";
import { useEffect, useMemo, useRef } from "react";
import { Chart } from "react-chartjs-2";
import { timeScale, valueScale } from "./axis-scale";
import { chartFont, inkOf, onInkChange, onPaper } from "./canvas-ink";
import { curveLooks, type Curves, type Ground } from "./curve";
import { curvePlugin, setCurveDrawing } from "./curve-plugin";
import { formatNumber } from "../quantity/format";

ChartJs.register(LineController, LineElement, PointElement, LinearScale, LogarithmicScale);

/** Room for the axis names: the y name above, the x name at the right end beneath. */
const padding = { top: 24, right: 14, bottom: 18, left: 0 };
/** One width for the labels of y, so that panels one above the other share their time axis. */
const valueLabels = 44;

type Props = {
  curves: Curves;
  summary: string;
  ground: Ground;
  /** A low panel takes fewer ticks. */
  low: boolean;
  readingX: number | null;
  onPoint: (x: number | null) => void;
};

/** The canvas of a chart of curves. Loaded on its own, after the page, because Chart.js is the heaviest thing on it. */
export default function CurveCanvas({ curves, summary, ground, low, readingX, onPoint }: Props) {
  const chart = useRef<ChartJs<"line", { x: number; y: number }[]>>(null);
  const data = useMemo(() => dataOf(curves), [curves]);
  const options = useMemo(() => optionsOf(curves, low), [curves, low]);

  useEffect(() => {
    if (!chart.current) return;
    setCurveDrawing(chart.current as ChartJs, { ...curves, ground, readingX });
    chart.current.draw();
  }, [curves, ground, readingX, data, options]);

  useEffect(() => onInkChange(() => chart.current?.update("none")), []);

  return (
    <Chart
      ref={chart}
      type="line"
      data={data}
      options={options}
      plugins={[curvePlugin]}
      datasetIdKey="id"
      role="img"
      aria-label={summary}
      onPointerMove={(event) => {
        const x = chart.current?.scales.x;
        const box = event.currentTarget.getBoundingClientRect();
        onPoint(x?.getValueForPixel(event.clientX - box.left) ?? null);
      }}
      onPointerLeave={() => onPoint(null)}
    />
  );
}

const dataOf = ({ series }: Curves) => ({
  datasets: series.map(({ id, tone, x, y }) => {
    const look = curveLooks[tone];
    return {
      id,
      data: x.map((at, i) => ({ x: at, y: y[i] ?? NaN })),
      borderColor: ({ chart }: { chart: ChartJs }) => inkOf(chart.canvas, look.colour),
      borderWidth: look.width,
      borderDash: () => (onPaper() ? (look.printDash ?? look.dash) : look.dash),
      borderJoinStyle: "round" as const,
      pointRadius: 0,
      pointHitRadius: 0,
      pointHoverRadius: 0,
    };
  }),
});

function optionsOf(curves: Curves, low: boolean): ChartOptions<"line"> {
  const x = timeScale(curves);
  const y = valueScale(curves, low ? 3 : 5);
  const ticks = {
    color: ({ chart }: { chart: ChartJs }) => inkOf(chart.canvas, "--ink-2"),
    font: chartFont,
    autoSkip: false,
    maxRotation: 0,
    callback: (value: number | string) => formatNumber(Number(value), { decimals: 0, figures: 1 }),
  };
  const axisLine = ({ chart }: { chart: ChartJs }) => inkOf(chart.canvas, "--ink");

  return {
    parsing: false,
    normalized: true,
    animation: false,
    responsive: true,
    maintainAspectRatio: false,
    // The page reads the pointer itself; Chart.js needs no events.
    events: [],
    layout: { padding },
    scales: {
      x: {
        type: "linear",
        min: x.min,
        max: x.max,
        afterBuildTicks: (scale) => {
          scale.ticks = x.ticks.map((value) => ({ value }));
        },
        grid: { drawOnChartArea: false, tickLength: 5, tickColor: axisLine },
        border: { display: false },
        ticks: { ...ticks, callback: tickWriter(x.ticks) },
      },
      y: {
        type: curves.y.log ? "logarithmic" : "linear",
        min: y.min,
        max: y.max,
        afterBuildTicks: (scale) => {
          scale.ticks = y.ticks.map((value) => ({ value }));
        },
        afterFit: (scale) => {
          scale.width = valueLabels;
        },
        grid: { drawTicks: false, color: ({ chart }: { chart: ChartJs }) => inkOf(chart.canvas, "--rule") },
        border: { display: false },
        ticks: {
          ...ticks,
          padding: 7,
          callback: curves.y.log ? (value: number | string) => tickWriter([Number(value)])(value) : tickWriter(y.ticks),
        },
      },
    },
  };
}

/** Writes ticks with as many decimals as the finest of them needs. */
function tickWriter(ticks: readonly number[]): (value: number | string) => string {
  const decimals = Math.max(0, ...ticks.map((tick) => String(tick).split(".")[1]?.length ?? 0));
  return (value) => formatNumber(Number(value), { decimals });
}
