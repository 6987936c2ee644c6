"use client";

import { useShown } from "@/components/quantity/quantity";
import type { ChangeAnswer } from "@/workers/fluid-asks";
import { properties } from "./step-words";

/** The three changes in one line, per mole and, small beneath, per mass. */
export function Totals({ change: { result, from }, stale }: { change: ChangeAnswer; stale: boolean }) {
  const shown = useShown();
  const M = from.overall.molarMassKgPerMol;
  return (
    <dl aria-live="polite" className={`flex flex-wrap gap-x-10 gap-y-3 ${stale ? "text-ink-3" : ""}`}>
      {properties.map(({ key, name, symbol, quantity }) => (
        <div key={key}>
          <dt className="text-label text-ink-3">
            {name}, Δ{symbol}
          </dt>
          <dd className="whitespace-nowrap text-head font-semibold">
            {shown(quantity, result[key].total, { signed: true }).text}
            <span className="block text-small font-normal text-ink-3">
              {
                shown(quantity === "molarEnergy" ? "specificEnergy" : "specificHeat", result[key].total / M, { signed: true })
                  .text
              }
            </span>
          </dd>
        </div>
      ))}
    </dl>
  );
}
