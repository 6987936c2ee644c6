"use client";

import dynamic from "next/dynamic";
import { useMemo, type ReactNode } from "react";
import { bridgeBars, type BridgeStep } from "./bridge";
import { ChartAxes } from "./chart-axes";
import type { Ground } from "./curve";
import { formatNumber, withUnit } from "../quantity/format";

const BridgeCanvas = dynamic(() => import("./bridge-canvas"), { ssr: false, loading: () => <ChartAxes /> });

type Props = {
  steps: readonly BridgeStep[];
  /** Names the sum of the steps, drawn last. */
  sum: { label: string; note?: string };
  /** Of all values. */
  unit: string;
  decimals?: number;
  caption?: ReactNode;
  ground?: Ground;
  loading?: boolean;
};

/** The three steps of a change of state out to the ideal gas, across and back, as bars from where the last one ended. */
export function BridgeChart({ steps, sum, unit, decimals = 1, caption, ground = "sheet", loading }: Props) {
  const bars = useMemo(() => bridgeBars(steps, sum), [steps, sum]);
  const write = (value: number) => withUnit(formatNumber(value, { decimals }, { signed: true }), unit);
  const summary = bars.map(({ label, value }) => `${label} ${write(value)}`).join(", ");

  return (
    <figure className="min-w-0">
      {caption && <figcaption className="mb-1.5 font-serif text-body leading-[1.35]">{caption}</figcaption>}
      <div className="relative h-[228px]" aria-busy={loading || undefined}>
        {loading ? <ChartAxes /> : <BridgeCanvas bars={bars} summary={summary} ground={ground} decimals={decimals} names={196} />}
      </div>
      {!loading && (
        <details className="text-small print:hidden">
          <summary className="inline-flex min-h-[34px] cursor-pointer items-center text-tide underline underline-offset-[.2em] phone:min-h-[44px]">
            Data
          </summary>
          <table className="ruled">
            <caption className="sr-only">{sum.label} and its steps</caption>
            <tbody>
              {bars.map(({ label, note, value, kind }) => (
                <tr key={label} className={kind === "sum" ? "total" : undefined}>
                  <th scope="row">
                    {label}
                    {note && <span className="block text-label text-ink-3">{note}</span>}
                  </th>
                  <td className="numeric">{write(value)}</td>
                </tr>
              ))}
            </tbody>
          </table>
        </details>
      )}
    </figure>
  );
}
