"use client";

import { useShown } from "@/components/quantity/quantity";
import { VerdictWord } from "@/components/verdict/verdict-word";
import { runSentence } from "@/contracts/verdict-sentence";
import type { BlowdownSummary } from "@/engine/cases/blowdown-result";
import type { QuantityId } from "@/engine/units";
import type { ForerunRun } from "./forerun-curves";

type Row = { label: string; quantity: QuantityId; difference: QuantityId; of: (summary: BlowdownSummary) => number | undefined };

/** Governing figures with their change by the last edit, the verdict and the first caution. */
export function ForerunFigures({ result, document, before, stale }: ForerunRun) {
  const shown = useShown();
  const { limits } = document;
  const rows: Row[] = [
    {
      label: limits?.targetPressurePa ? `Time to ${shown("pressure", limits.targetPressurePa).text}` : "Time to target pressure",
      quantity: "time",
      difference: "time",
      of: (summary) => summary.timeToTargetPressureS,
    },
    {
      label: "Lowest fluid",
      quantity: "temperature",
      difference: "temperatureDifference",
      of: (summary) => summary.minimumFluidTemperatureK,
    },
    ...(document.vessel.wall
      ? [
          {
            label: "Lowest wall",
            quantity: "temperature",
            difference: "temperatureDifference",
            of: (summary: BlowdownSummary) => summary.minimumWallTemperatureK,
          } as const,
        ]
      : []),
    { label: "Peak vent load", quantity: "massRate", difference: "massRate", of: (summary) => summary.peakVentRateKgPerS },
  ];

  return (
    <>
      <table className={`mt-2 w-full border-collapse border-t-1.5 border-ink ${stale ? "text-ink-3" : ""}`}>
        <caption className="sr-only">Figures of the forerun, and their change with the last edit</caption>
        <tbody>
          {rows.map(({ label, quantity, difference, of }) => {
            const [now, then] = [of(result.summary), before ? of(before.summary) : undefined];
            return (
              <tr key={quantity + label} className="border-b">
                <th scope="row" className="py-2 text-left font-normal">
                  {label}
                </th>
                <td className="whitespace-nowrap py-2 text-right font-semibold">
                  {now === undefined ? "not reached" : shown(quantity, now).text}
                </td>
                {before && (
                  <td className="w-[64px] whitespace-nowrap py-2 pl-2 text-right text-ink-3">
                    {now === undefined || then === undefined ? "–" : shown(difference, now - then, { signed: true }).number}
                  </td>
                )}
              </tr>
            );
          })}
        </tbody>
      </table>
      <p className="py-2.5">
        <VerdictWord verdict={result.verdict} />{" "}
        <span className="font-serif text-ink-2">{runSentence(result, limits?.minimumMetalMarginK)}</span>
      </p>
      <p className="font-serif text-label text-ink-3">C1 {result.cautions[result.cautionIds.indexOf("C1")]}</p>
    </>
  );
}
