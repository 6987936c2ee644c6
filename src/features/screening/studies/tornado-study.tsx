"use client";

import { useMemo } from "react";
import { formatNumber, formatQuantity } from "@/components/quantity/format";
import { shownUnit } from "@/components/quantity/shown-units";
import type { CaseRunView } from "@/contracts/views";
import type { FigureHead, TornadoBar, TornadoResult } from "@/engine/cases/study-case";
import { fromSi } from "@/engine/units";
import type { Showing } from "../results/limit-rows";
import { useShowing } from "../results/use-showing";
import { quantityOfFigure } from "./figure-units";
import { limitOfFigure } from "./limit-of-figure";
import { StudyRunner } from "./study-runner";
import { TornadoChart, type TornadoRow } from "./tornado-chart";
import { useStudy } from "./use-study";

/** One input at a time to the ends of its band. */
export function TornadoStudyPanel({ run }: { run: CaseRunView }) {
  const { state, start, cancel } = useStudy();
  const showing = useShowing();
  const result = state.result?.study === "tornado" ? state.result : null;
  const chart = useMemo(() => (result ? tornadoOf(result, run, showing) : null), [result, run, showing]);
  return (
    <section className="pb-8">
      <h2 className="mb-1">One input at a time</h2>
      <p className="pb-3 font-serif text-prose text-ink-2">
        {result ? result.sentence : "Each input at the low and at the high end of its usual band, the others as they are."}
      </p>
      <StudyRunner
        study={{ format: "ebbmark-case/1", kind: "study", study: "tornado", of: run.document }}
        label="Vary one input at a time"
        state={state}
        start={start}
        cancel={cancel}
      />
      {result && chart && (
        <>
          <TornadoChart {...chart} summary={result.sentence} />
          {result.bars.flatMap(({ title, refused }) =>
            [refused?.atLow, refused?.atHigh].flatMap((message, i) =>
              message ? [<Note key={`${title}${i}`} title={`${title}, ${i === 0 ? "low" : "high"}`} text={message} />] : [],
            ),
          )}
        </>
      )}
    </section>
  );
}

const Note = ({ title, text }: { title: string; text: string }) => (
  <p className="pt-1.5 font-serif text-note text-ink-2">
    <b className="font-num">{title}</b> {text}
  </p>
);

function tornadoOf(result: TornadoResult, run: CaseRunView, { system }: Showing) {
  const id = result.sortedBy;
  const figure: FigureHead = result.figures.find((one) => one.id === id) ?? { id, title: "Figure", unit: "K" };
  const quantity = quantityOfFigure(figure);
  const unit = shownUnit(quantity, system);
  const shown = (si: number) => fromSi(quantity, si, unit);
  const text = (si: number) => formatQuantity(quantity, si, unit).number;
  const limit = limitOfFigure(run, id);
  const base = result.base.figures[id];
  const end = (si: number | undefined) => ({
    value: si === undefined ? undefined : shown(si),
    text: si === undefined ? "" : text(si),
    past: si !== undefined && limit !== undefined && (limit.pastWhen === "above" ? si >= limit.at : si <= limit.at),
  });
  const rows = result.bars.map((bar): TornadoRow => ({
    id: bar.input,
    title: bar.title,
    ends: endsOf(bar, system),
    low: end(bar.atLow?.[id]),
    high: end(bar.atHigh?.[id]),
  }));
  return {
    rows,
    unit: `${figure.title.toLowerCase()}, ${unit}`,
    base: { at: shown(base ?? 0), label: `base ${base === undefined ? "–" : text(base)}` },
    limit: limit && { at: shown(limit.at), label: `limit ${text(limit.at)}` },
  };
}

/** "−8 % to +8 %", "−5 K to +5 K". */
function endsOf({ mode, low, high }: TornadoBar, system: Showing["system"]): string {
  if (mode === "shift") {
    const unit = shownUnit("temperatureDifference", system);
    const write = (kelvin: number) => formatQuantity("temperatureDifference", kelvin, unit, { signed: true }).text;
    return `${write(low)} to ${write(high)}`;
  }
  if (low <= 0.6 || high >= 1.9) return `×${formatNumber(low, { figures: 2 })} to ×${formatNumber(high, { figures: 2 })}`;
  const percent = (factor: number) => `${formatNumber(100 * (factor - 1), { decimals: 0 }, { signed: true })}\u00a0%`;
  return `${percent(low)} to ${percent(high)}`;
}
