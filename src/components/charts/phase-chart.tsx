"use client";

import { useMemo, type ReactNode } from "react";
import { roundTicks } from "./axis-scale";
import type { CurveAxis, CurveMark, Ground } from "./curve";
import { CurveChart } from "./curve-chart";
import { PhaseData } from "./phase-data";
import { seriesOfLine, type PhaseLine } from "./phase-line";

type Props = {
  /** Temperature. */
  x: CurveAxis;
  /** Pressure, from zero. */
  y: CurveAxis;
  lines: readonly PhaseLine[];
  marks?: readonly CurveMark[];
  /** What the diagram shows, in one sentence. */
  summary: string;
  caption?: ReactNode;
  ground?: Ground;
  height?: "tall" | "panel" | "diagram";
  loading?: boolean;
  stale?: boolean;
};

/**
 * A pressure-temperature diagram on the same ground as the curves over time: arrow keys and pointer read every line at a temperature, and
 * the points of each line stand in a table beneath.
 */
export function PhaseChart({ x, y, lines, marks, summary, caption, ground, height = "diagram", loading, stale }: Props) {
  const series = useMemo(() => lines.flatMap(seriesOfLine), [lines]);
  const [min, max] = useMemo(() => temperatureEnds(lines, marks), [lines, marks]);
  return (
    <div className="min-w-0">
      <CurveChart
        withoutData
        x={{ ...x, min, max }}
        y={y}
        series={series}
        marks={marks}
        summary={summary}
        caption={caption}
        ground={ground}
        height={height}
        loading={loading}
        stale={stale}
      />
      {!loading && <PhaseData x={x} y={y} lines={lines} />}
    </div>
  );
}

/** Round ends that hold every line and mark. */
function temperatureEnds(lines: readonly PhaseLine[], marks: readonly CurveMark[] = []): [number, number] {
  const all = [...lines.flatMap(({ points }) => points.map(({ x }) => x)), ...marks.map(({ x }) => x)].filter(Number.isFinite);
  if (all.length === 0) return [0, 1];
  const [low, high] = [Math.min(...all), Math.max(...all)];
  const [first = low, second = low + 1] = roundTicks(low, high > low ? high : low + 1, 6);
  const step = second - first || 1;
  return [Math.floor(low / step) * step, Math.ceil(high / step) * step];
}
