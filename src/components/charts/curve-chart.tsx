"use client";

import dynamic from "next/dynamic";
import { useMemo, useState, type ReactNode } from "react";
import { timeScale } from "./axis-scale";
import { ChartAxes } from "./chart-axes";
import type { Curves, Ground } from "./curve";
import { CurveData } from "./curve-data";
import { moveReading, readingAt } from "./reading";

const CurveCanvas = dynamic(() => import("./curve-canvas"), { ssr: false, loading: () => <ChartAxes /> });

const heights = {
  tall: "h-[292px] phone:h-[260px]",
  panel: "h-[190px] phone:h-[190px]",
  low: "h-[150px] phone:h-[150px]",
  diagram: "h-[420px] phone:h-[330px]",
} as const;

type Props = Curves & {
  /** Says in one sentence what the chart shows: the finding, not the drawing. */
  summary: string;
  /** Stands above, in serif: **Temperature.** Dotted: outer wall. */
  caption?: ReactNode;
  ground?: Ground;
  height?: keyof typeof heights;
  /** Axes alone until the curves are there. */
  loading?: boolean;
  /** The curves no longer belong to the lines as they stand: drawn grey. */
  stale?: boolean;
  /** Leaves the table of figures out, where another chart of the same run offers it. */
  withoutData?: boolean;
};

/**
 * Curves over time. Limits are dashed with their words at the line, points that matter carry value and time, each curve its own name.
 * With the focus on it, arrow keys move a reading post; so does the pointer. The figures are read out and stand beneath.
 */
export function CurveChart({
  summary,
  caption,
  ground = "sheet",
  height = "tall",
  loading,
  stale,
  withoutData,
  x,
  y,
  series,
  bands,
  limits,
  marks,
}: Props) {
  const [readingX, setReadingX] = useState<number | null>(null);
  const curves = useMemo(
    () => ({
      x,
      y,
      series: stale ? series.map((curve) => ({ ...curve, tone: "ghost" as const })) : series,
      bands,
      limits,
      marks,
    }),
    [x, y, series, bands, limits, marks, stale],
  );
  const scale = useMemo(() => timeScale(curves), [curves]);
  const inRange = readingX !== null && readingX >= scale.min && readingX <= scale.max;

  return (
    <figure className="min-w-0">
      {caption && <figcaption className="mb-1.5 font-serif text-body leading-[1.35]">{caption}</figcaption>}
      <div
        className={`relative ${heights[height]}`}
        aria-busy={loading || undefined}
        {...(loading
          ? {}
          : {
              tabIndex: 0,
              role: "group",
              "aria-label": "Chart. Arrow keys read the curves.",
              onKeyDown: (event) => {
                const next = moveReading(event.key, inRange ? readingX : null, scale, event.shiftKey);
                if (next === undefined) return;
                event.preventDefault();
                setReadingX(next);
              },
              onBlur: () => setReadingX(null),
            })}
      >
        {loading ? (
          <ChartAxes />
        ) : (
          <CurveCanvas
            curves={curves}
            summary={summary}
            ground={ground}
            low={height === "panel" || height === "low"}
            readingX={inRange ? readingX : null}
            onPoint={setReadingX}
          />
        )}
      </div>
      <p role="status" className="min-h-[18px] text-label text-ink-3 print:hidden">
        {inRange && readingAt({ ...curves, series }, readingX)}
      </p>
      {!withoutData && !loading && <CurveData curves={{ ...curves, series }} />}
    </figure>
  );
}
