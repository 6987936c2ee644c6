"use client";

import { useMemo, useState } from "react";
import { CurveChart } from "@/components/charts/curve-chart";
import type { Curves } from "@/components/charts/curve";
import { ChoiceField } from "@/components/line/choice-field";
import { formatNumber, formatQuantity } from "@/components/quantity/format";
import { useShown } from "@/components/quantity/quantity";
import { shownUnit } from "@/components/quantity/shown-units";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { VerdictWord } from "@/components/verdict/verdict-word";
import type { CaseRunView } from "@/contracts/views";
import type { FigureHead, PercentileResult } from "@/engine/cases/study-case";
import { fromSi } from "@/engine/units";
import type { Showing } from "../results/limit-rows";
import { useShowing } from "../results/use-showing";
import { quantityOfFigure } from "./figure-units";
import { leadingFigureOf, limitOfFigure } from "./limit-of-figure";
import { StudyRunner } from "./study-runner";
import { useStudy } from "./use-study";

const sampleChoices = ["100", "300", "1000"].map((value) => ({ value, label: `${value} samples` }));

/** All inputs varied together, by a Latin hypercube; the figures as percentiles. */
export function PercentileStudyPanel({ run }: { run: CaseRunView }) {
  const { state, start, cancel } = useStudy();
  const [samples, setSamples] = useState("100");
  const result = state.result?.study === "percentiles" ? state.result : null;
  return (
    <section className="pb-8">
      <h2 className="mb-1">Inputs together</h2>
      <p className="pb-3 font-serif text-prose text-ink-2">
        {result
          ? result.sentence
          : "All inputs drawn together from their bands, independent of each other. The same seed gives the same samples."}
      </p>
      <StudyRunner
        study={{
          format: "ebbmark-case/1",
          kind: "study",
          study: "percentiles",
          of: run.document,
          samples: Number(samples),
          seed: 1,
        }}
        label="Draw the samples"
        state={state}
        start={start}
        cancel={cancel}
      >
        <span className="w-[160px]">
          <ChoiceField label="Number of samples" value={samples} options={sampleChoices} onValueChange={setSamples} />
        </span>
      </StudyRunner>
      {result && <Found result={result} run={run} />}
    </section>
  );
}

function Found({ result, run }: { result: PercentileResult; run: CaseRunView }) {
  const showing = useShowing();
  const curve = useMemo(() => cumulative(result, run, showing), [result, run, showing]);
  const { samples, verdicts } = result;
  return (
    <div className="grid grid-cols-2 items-start gap-9 rail:grid-cols-1 rail:gap-6">
      <CurveChart
        {...curve}
        height="tall"
        summary={result.sentence}
        caption={
          <>
            <b>Percentiles,</b> {samples.computed} samples, seed {result.seed}.
          </>
        }
      />
      <div>
        <PercentileTable result={result} />
        <p className="flex flex-wrap gap-x-4 pt-3 text-small">
          {(["within", "near", "beyond", "open"] as const).map(
            (verdict) =>
              verdicts[verdict] > 0 && (
                <span key={verdict}>
                  <VerdictWord verdict={verdict} /> {verdicts[verdict]} of {samples.computed}
                </span>
              ),
          )}
        </p>
        {samples.failed.length > 0 && (
          <p className="pt-2 font-serif text-note text-ink-2">
            {samples.failed.length} of {samples.asked} could not be computed:{" "}
            {samples.failed
              .slice(0, 5)
              .map(({ index, message }) => `${index}: ${message}`)
              .join(" ")}
          </p>
        )}
        {result.cautions.map(
          (words, i) =>
            result.cautionIds[i] === "M-study" && (
              <p key={words} className="pt-2 font-serif text-note text-ink-2">
                <b className="mr-1.5 font-cond text-label font-semibold text-near">M-study</b>
                {words}
              </p>
            ),
        )}
      </div>
    </div>
  );
}

function PercentileTable({ result }: { result: PercentileResult }) {
  const shown = useShown();
  return (
    <Table caption="Percentiles of every figure">
      <thead>
        <tr>
          <HeadCell>Figure</HeadCell>
          <HeadCell numeric>P10</HeadCell>
          <HeadCell numeric>P50</HeadCell>
          <HeadCell numeric>P90</HeadCell>
        </tr>
      </thead>
      <tbody>
        {result.percentiles.map((row) => {
          const text = (si: number | undefined) => (si === undefined ? "–" : shown(quantityOfFigure(row), si).text);
          return (
            <Row key={row.id}>
              <Cell head wholeRow>
                {row.title}
                {row.notReached > 0 && <small className="block text-label text-ink-3">not reached in {row.notReached}</small>}
              </Cell>
              <Cell numeric label="P10">
                {text(row.p10)}
              </Cell>
              <Cell numeric strong label="P50">
                {text(row.p50)}
              </Cell>
              <Cell numeric label="P90">
                {text(row.p90)}
              </Cell>
            </Row>
          );
        })}
      </tbody>
    </Table>
  );
}

/** Part of the samples at or below each value, with P10, P50, P90 marked and the limit as a post. */
function cumulative(result: PercentileResult, run: CaseRunView, { system }: Showing): Curves {
  const id = leadingFigureOf(
    run,
    result.percentiles.map((row) => row.id),
  );
  const row = result.percentiles.find((one) => one.id === id);
  const figure: FigureHead = row ?? { id, title: "Figure", unit: "K" };
  const quantity = quantityOfFigure(figure);
  const unit = shownUnit(quantity, system);
  const shown = (si: number) => fromSi(quantity, si, unit);
  const text = (si: number) => formatQuantity(quantity, si, unit).number;
  const values = result.rows.flatMap(({ figures }) => (figures[id] === undefined ? [] : [figures[id]])).sort((a, b) => a - b);
  const limit = limitOfFigure(run, id);
  const all = [...values, ...(limit ? [limit.at] : [])].map(shown);
  const room = (Math.max(...all) - Math.min(...all) || 1) * 0.06;
  const marks = (
    [
      ["P10", row?.p10, 10],
      ["P50", row?.p50, 50],
      ["P90", row?.p90, 90],
    ] as const
  ).flatMap(([name, si, percent]) => (si === undefined ? [] : [{ x: shown(si), y: percent, label: `${name} ${text(si)}` }]));
  return {
    x: {
      name: figure.title.toLowerCase(),
      unit,
      min: Math.min(...all) - room,
      max: Math.max(...all) + room,
      format: (value) => formatNumber(value, { figures: 3 }),
    },
    y: { name: "samples at or below", unit: "%", min: 0, max: 100 },
    series: [
      {
        id: "share",
        label: "",
        tone: "wall",
        x: values.map(shown),
        y: values.map((_, i) => (100 * (i + 0.5)) / values.length),
      },
    ],
    limits: limit ? [{ axis: "x", at: shown(limit.at), label: `limit ${text(limit.at)}` }] : [],
    marks,
  };
}
