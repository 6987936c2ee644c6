"use client";

import { useState } from "react";
import { axisTitle } from "./axis-scale";
import type { Curves } from "./curve";
import { valueAt } from "./curve-plugin";
import { formatNumber } from "../quantity/format";

const rows = 60;

/** The figures behind a chart, one key away. Long runs are thinned to 60 rows, evenly, first and last kept; the table says so. */
export function CurveData({ curves }: { curves: Curves }) {
  const [open, setOpen] = useState(false);
  return (
    <details className="text-small print:hidden" onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary className="inline-flex min-h-[34px] cursor-pointer items-center text-tide underline underline-offset-[.2em] phone:min-h-[44px]">
        Data
      </summary>
      {open && <CurveRows curves={curves} />}
    </details>
  );
}

function CurveRows({ curves: { x, y, series } }: { curves: Curves }) {
  const shown = series.filter(({ tone, label }) => tone !== "ghost" && label !== "");
  const all = shown[0]?.x ?? [];
  const times =
    all.length <= rows
      ? all
      : Array.from({ length: rows }, (_, i) => all[Math.round((i * (all.length - 1)) / (rows - 1))] ?? NaN);
  const write = (axis: typeof x, value: number | null) =>
    value === null ? "–" : (axis.format?.(value) ?? formatNumber(value, { figures: 3 }));

  return (
    <div className="max-h-80 overflow-auto" tabIndex={0} role="region" aria-label={`Data of ${y.name}`}>
      <table className="ruled">
        <caption className="pb-1 text-left text-label text-ink-3">
          {all.length > rows ? `${rows} of ${all.length} points` : `${all.length} points`}
        </caption>
        <thead>
          <tr>
            <th scope="col" className="numeric">
              {axisTitle(x)}
            </th>
            {shown.map(({ id, label }) => (
              <th key={id} scope="col" className="numeric">
                {axisTitle({ ...y, name: label })}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {times.map((at) => (
            <tr key={at}>
              <td className="numeric">{write(x, at)}</td>
              {shown.map((curve) => (
                <td key={curve.id} className="numeric">
                  {write(y, valueAt(curve, at))}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
