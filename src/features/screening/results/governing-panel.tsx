"use client";

import { useMemo } from "react";
import { CurveChart } from "@/components/charts/curve-chart";
import { Figure } from "@/components/verdict/figure";
import { VerdictWord } from "@/components/verdict/verdict-word";
import type { PreparedView } from "@/contracts/views";
import type { LimitId } from "@/engine/cases/blowdown-result";
import { runCurves, type RunCurves } from "./curves";
import { decidingCase, governingOf, governingWords } from "./governing";
import { limitRows } from "./limit-rows";
import { useShowing } from "./use-showing";

const curveOf: Partial<Record<LimitId, Exclude<keyof RunCurves, "level">>> = {
  "time-to-target": "pressure",
  "minimum-wall-temperature": "temperature",
  "minimum-outlet-temperature": "outlet",
  "peak-vent-rate": "ventRate",
  "minimum-liquid-wall-temperature": "temperature",
  solids: "temperature",
  "solids-behind-opening": "temperature",
  hydrate: "temperature",
  "liquid-carry-over": "ventRate",
  "least-strength-ratio": "pressure",
};

/** The one figure that decides the verdict, beside the curve it is read from, in the sentence of the record. */
export function GoverningPanel({ prepared }: { prepared: PreparedView }) {
  const showing = useShowing();
  const { content, runs } = prepared;
  const deciding = decidingCase(content, runs);
  const curves = useMemo(() => deciding && runCurves(deciding.run, showing), [deciding, showing]);
  const governing = deciding && governingOf(deciding.recordCase, deciding.run);
  const row = deciding && limitRows(deciding.recordCase, deciding.run, showing).find(({ governs }) => governs);
  return (
    <>
      <p className="pb-3 font-serif text-meaning">
        <span className="font-num">
          <VerdictWord verdict={content.verdict} />
        </span>{" "}
        {content.sentence}
      </p>
      {deciding && governing && curves && (
        <div className="grid grid-cols-[220px_minmax(0,1fr)] items-center gap-[26px] phone:grid-cols-1 phone:gap-3">
          <div>
            <Figure label={row?.title ?? governing.limit.title} {...governingWords(governing, deciding.run, showing)} />
            <p className="mt-1.5 text-small text-ink-3">
              line {governing.line}
              {row?.limit && <>, {row.limit}</>}
            </p>
          </div>
          <CurveChart {...curves[curveOf[governing.limit.id] ?? "temperature"]} height="panel" summary={content.sentence} />
        </div>
      )}
    </>
  );
}
