"use client";

import { useMemo } from "react";
import { CurveChart } from "@/components/charts/curve-chart";
import type { CurveBand, CurveTone } from "@/components/charts/curve";
import { formatPercent, formatQuantity } from "@/components/quantity/format";
import { useShown } from "@/components/quantity/quantity";
import { shownUnit } from "@/components/quantity/shown-units";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import type { CaseRunView } from "@/contracts/views";
import type { FigureHead, SpreadResult } from "@/engine/cases/study-case";
import { fromSi } from "@/engine/units";
import { runCurves } from "../results/curves";
import { momentUnit } from "../results/governing";
import type { Showing } from "../results/limit-rows";
import { useShowing } from "../results/use-showing";
import { DotRows, type DotRow } from "./dot-rows";
import { differenceOfFigure, quantityOfFigure } from "./figure-units";
import { leadingFigureOf, limitOfFigure } from "./limit-of-figure";
import { spreadBand } from "./spread-band";
import { StudyRunner } from "./study-runner";
import { useStudy } from "./use-study";

const fitWords: Record<SpreadResult["entries"][number]["fitness"], string> = {
  first: "fit, first choice",
  fit: "fit",
  uncertain: "uncertain here",
  "comparison-only": "for comparison only",
  "outside-range": "outside its range",
  "not-applicable": "not applicable",
};

/** The same case under every equation that is fit for its fluid. */
export function SpreadStudyPanel({ run }: { run: CaseRunView }) {
  const { state, start, cancel } = useStudy();
  const result = state.result?.study === "spread" ? state.result : null;
  return (
    <section className="pb-8">
      <h2 className="mb-1">Equations of state</h2>
      <p className="pb-3 font-serif text-prose text-ink-2">
        {result ? result.sentence : "The same case under each equation: how far the figures differ, against what is in hand."}
      </p>
      <StudyRunner
        study={{ format: "ebbmark-case/1", kind: "study", study: "spread", of: run.document }}
        label="Run under each equation"
        state={state}
        start={start}
        cancel={cancel}
      />
      {result && <Found result={result} run={run} />}
    </section>
  );
}

function Found({ result, run }: { result: SpreadResult; run: CaseRunView }) {
  const showing = useShowing();
  const curves = useMemo(() => bandCurves(result, run, showing), [result, run, showing]);
  const rows = useMemo(() => dotRows(result, run, showing), [result, run, showing]);
  return (
    <>
      <div className="grid grid-cols-2 items-start gap-9 rail:grid-cols-1 rail:gap-6">
        <CurveChart
          {...curves}
          height="tall"
          summary={result.sentence}
          caption={
            <>
              <b>Temperature.</b> Line: equation used. Shade: lowest to highest of the fit ones.
            </>
          }
        />
        <figure>
          <figcaption className="mb-1.5 font-serif">
            <b>{rows.title} under each equation.</b> Dot: used. Ring: fit. Cross: left out of the shade.
          </figcaption>
          <DotRows {...rows} summary={result.sentence} />
        </figure>
      </div>
      <RangesTable result={result} />
      {result.entries.map(
        ({ equation, title, notes, refused }) =>
          (refused || notes.length > 0) && (
            <p key={equation} className="pt-1.5 font-serif text-note text-ink-2">
              <b className="font-num">{title}</b> {refused ?? notes.join(" ")}
            </p>
          ),
      )}
    </>
  );
}

function RangesTable({ result }: { result: SpreadResult }) {
  const shown = useShown();
  return (
    <div className="mt-6">
      <Table caption="Every figure under the fit equations" showCaption>
        <thead>
          <tr>
            <HeadCell>Figure</HeadCell>
            <HeadCell numeric>Used</HeadCell>
            <HeadCell numeric>Lowest</HeadCell>
            <HeadCell numeric>Highest</HeadCell>
            <HeadCell numeric>Spread</HeadCell>
            <HeadCell numeric>In hand</HeadCell>
            <HeadCell numeric>Spread of what is in hand</HeadCell>
          </tr>
        </thead>
        <tbody>
          {result.ranges.map((range) => {
            const quantity = quantityOfFigure(range);
            const difference = differenceOfFigure(range);
            return (
              <Row key={range.id}>
                <Cell head wholeRow>
                  {range.title}
                </Cell>
                <Cell numeric strong label="Used">
                  {shown(quantity, range.used).text}
                </Cell>
                <Cell numeric label="Lowest">
                  {shown(quantity, range.low).text}
                </Cell>
                <Cell numeric label="Highest">
                  {shown(quantity, range.high).text}
                </Cell>
                <Cell numeric label="Spread">
                  {shown(difference, range.spread).text}
                </Cell>
                <Cell numeric label="In hand">
                  {shown(difference, range.inHand).text}
                </Cell>
                <Cell numeric label="Spread of what is in hand">
                  {range.share === undefined ? "–" : formatPercent(range.share)}
                </Cell>
              </Row>
            );
          })}
        </tbody>
      </Table>
    </div>
  );
}

function bandCurves(result: SpreadResult, run: CaseRunView, showing: Showing) {
  const { temperature } = runCurves(run, showing);
  const unit = shownUnit("temperature", showing.system);
  const timeUnit = momentUnit(run.result.summary.endTimeS);
  const counted = result.entries.flatMap(({ inSpread, curve }) => (inSpread && curve ? [curve] : []));
  const band = (id: string, tone: CurveTone, column: "fluidTemperatureK" | "wallTemperatureK"): CurveBand[] => {
    const found = counted.length > 1 ? spreadBand(counted, column) : undefined;
    if (!found) return [];
    const inUnit = (values: readonly number[]) => values.map((si) => fromSi("temperature", si, unit));
    return [
      { id, tone, x: found.timeS.map((s) => fromSi("time", s, timeUnit)), low: inUnit(found.low), high: inUnit(found.high) },
    ];
  };
  return {
    ...temperature,
    marks: [],
    bands: [...band("fluid", "fluid", "fluidTemperatureK"), ...band("wall", "wall", "wallTemperatureK")],
  };
}

function dotRows(result: SpreadResult, run: CaseRunView, { system }: Showing) {
  const id = leadingFigureOf(
    run,
    result.figures.map((figure) => figure.id),
  );
  const figure: FigureHead = result.figures.find((one) => one.id === id) ?? { id, title: "Figure", unit: "K" };
  const quantity = quantityOfFigure(figure);
  const unit = shownUnit(quantity, system);
  const text = (si: number) => formatQuantity(quantity, si, unit).number;
  const limit = limitOfFigure(run, id);
  const rows = result.entries.map(({ equation, title, fitness, used, inSpread, figures, refused }): DotRow => {
    const si = figures?.[id];
    return {
      id: equation,
      title,
      note: used ? `used, ${fitWords[fitness]}` : fitWords[fitness],
      value: si === undefined ? undefined : fromSi(quantity, si, unit),
      text: si === undefined ? (refused ? "not computed" : "not reached") : text(si),
      kind: used ? "used" : inSpread ? "fit" : "unfit",
    };
  });
  return {
    rows,
    unit: `${figure.title.toLowerCase()}, ${unit}`,
    title: figure.title,
    limit: limit && { at: fromSi(quantity, limit.at, unit), label: `limit ${text(limit.at)}` },
  };
}
