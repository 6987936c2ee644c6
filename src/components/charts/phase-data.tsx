"use client";

import { useState } from "react";
import { formatNumber } from "../quantity/format";
import { axisTitle } from "./axis-scale";
import type { CurveAxis } from "./curve";
import type { PhaseLine } from "./phase-line";

const most = 30;

/** The points of each line of a diagram, one key away; long lines are thinned to 30 points, ends kept, and the table says so. */
export function PhaseData({ x, y, lines }: { x: CurveAxis; y: CurveAxis; lines: readonly PhaseLine[] }) {
  const [open, setOpen] = useState(false);
  return (
    <details className="text-small print:hidden" onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary className="inline-flex min-h-[34px] cursor-pointer items-center text-tide underline underline-offset-[.2em] phone:min-h-[44px]">
        Data
      </summary>
      {open && <LineTables x={x} y={y} lines={lines} />}
    </details>
  );
}

function LineTables({ x, y, lines }: { x: CurveAxis; y: CurveAxis; lines: readonly PhaseLine[] }) {
  const write = (axis: CurveAxis, value: number) => axis.format?.(value) ?? formatNumber(value, { figures: 3 });
  return (
    <div
      className="max-h-80 overflow-auto"
      tabIndex={0}
      role="region"
      aria-label={`Data of the diagram, ${y.name} over ${x.name}`}
    >
      {lines.map(({ id, label, points }) => {
        const shown = thinned(points);
        return (
          <table key={id} className="ruled mb-3">
            <caption className="pb-1 text-left text-label text-ink-3">
              {label}, {shown.length < points.length ? `${shown.length} of ${points.length} points` : `${points.length} points`}
            </caption>
            <thead>
              <tr>
                <th scope="col" className="numeric">
                  {axisTitle(x)}
                </th>
                <th scope="col" className="numeric">
                  {axisTitle(y)}
                </th>
              </tr>
            </thead>
            <tbody>
              {shown.map((point, at) => (
                <tr key={at}>
                  <td className="numeric">{write(x, point.x)}</td>
                  <td className="numeric">{write(y, point.y)}</td>
                </tr>
              ))}
            </tbody>
          </table>
        );
      })}
    </div>
  );
}

function thinned<T>(points: readonly T[]): T[] {
  if (points.length <= most) return [...points];
  return Array.from({ length: most }, (_, i) => points[Math.round((i * (points.length - 1)) / (most - 1))] as T);
}
