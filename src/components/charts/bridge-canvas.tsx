"use client";

import { BarController, BarElement, CategoryScale, Chart as ChartJs, LinearScale, type ChartOptions } from "chart.js";
import { useEffect, useMemo, useRef } from "react";
import { Chart } from "react-chartjs-2";
import { formatNumber } from "../quantity/format";
import { roundTicks } from "./axis-scale";
import type { BridgeBar } from "./bridge";
import { bridgePlugin, setBridgeDrawing } from "./bridge-plugin";
import { chartFont, inkOf, onInkChange } from "./canvas-ink";
import type { Ground } from "./curve";

ChartJs.register(BarController, BarElement, CategoryScale, LinearScale);

const fills = { rise: "--c-wall", fall: "--c-pressure", sum: "--ink" } as const;

type Props = { bars: readonly BridgeBar[]; summary: string; ground: Ground; decimals: number; names: number };

/** The canvas of a bridge. Loaded on its own, after the page. `names` is the room for the words at the left, px. */
export default function BridgeCanvas({ bars, summary, ground, decimals, names }: Props) {
  const chart = useRef<ChartJs<"bar", [number, number][]>>(null);
  const data = useMemo(() => dataOf(bars), [bars]);
  const options = useMemo(() => optionsOf(bars, names), [bars, names]);

  useEffect(() => {
    if (!chart.current) return;
    setBridgeDrawing(chart.current as ChartJs, { bars, ground, decimals });
    chart.current.draw();
  }, [bars, ground, decimals, data, options]);

  useEffect(() => onInkChange(() => chart.current?.update("none")), []);

  return <Chart ref={chart} type="bar" data={data} options={options} plugins={[bridgePlugin]} role="img" aria-label={summary} />;
}

const dataOf = (bars: readonly BridgeBar[]) => ({
  labels: bars.map(({ label }) => label),
  datasets: [
    {
      data: bars.map(({ from, to }): [number, number] => [from, to]),
      backgroundColor: ({ chart, dataIndex }: { chart: ChartJs; dataIndex: number }) =>
        inkOf(chart.canvas, fills[bars[dataIndex]?.kind ?? "sum"]),
      barPercentage: 0.58,
      categoryPercentage: 1,
    },
  ],
});

function optionsOf(bars: readonly BridgeBar[], names: number): ChartOptions<"bar"> {
  const ends = bars.flatMap(({ from, to }) => [from, to]).filter(Number.isFinite);
  const [low, high] = [Math.min(0, ...ends), Math.max(0, ...ends)];
  const room = (high - low || 1) * 0.18;
  const [min, max] = [low < 0 ? low - room : low, high > 0 ? high + room * 0.4 : high];

  return {
    indexAxis: "y",
    animation: false,
    responsive: true,
    maintainAspectRatio: false,
    events: [],
    layout: { padding: { left: names, right: 10, top: 4, bottom: 0 } },
    scales: {
      x: {
        min,
        max: max > min ? max : min + 1,
        afterBuildTicks: (scale) => {
          scale.ticks = roundTicks(min, max > min ? max : min + 1, 5).map((value) => ({ value }));
        },
        grid: { color: ({ chart }) => inkOf(chart.canvas, "--rule"), drawTicks: false },
        border: { display: false },
        ticks: {
          color: ({ chart }) => inkOf(chart.canvas, "--ink-2"),
          font: chartFont,
          autoSkip: false,
          maxRotation: 0,
          padding: 6,
          callback: (value) => formatNumber(Number(value), { decimals: String(value).split(".")[1]?.length ?? 0 }),
        },
      },
      y: { grid: { display: false }, border: { display: false }, ticks: { display: false } },
    },
  };
}
