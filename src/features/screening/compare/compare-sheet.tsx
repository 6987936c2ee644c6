"use client";

import { useRouter } from "next/navigation";
import { useMemo } from "react";
import { Button } from "@/components/button/button";
import { CurveChart } from "@/components/charts/curve-chart";
import { ChoiceField } from "@/components/line/choice-field";
import { SourceNote } from "@/components/line/source-note";
import { formatQuantity } from "@/components/quantity/format";
import { shownUnit } from "@/components/quantity/shown-units";
import { MarginHead, MarginNote } from "@/components/shell/margin";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { verdictWords } from "@/components/verdict/verdict";
import { VerdictWord } from "@/components/verdict/verdict-word";
import { CautionBeside } from "../results/caution-beside";
import { distanceQuantity, limitTitle, quantityOfLimit, type Showing } from "../results/limit-rows";
import { lineWords } from "../results/line-words";
import { useShowing } from "../results/use-showing";
import { compareCurves } from "./compare-curves";
import { ShareMove } from "./share-move";
import { changedLines, compareTitle, linesOf, movedLimits, sameFluid, type Moved, type Side } from "./sides";

export type SideChoice = { value: string; label: string };

/**
 * Two cases, or two revisions of one, side by side: lines that differ with the source as written, what moved, and the curves over each other.
 *
 * choices   what can stand on either side; `address` leads to a pair of them
 */
export function CompareSheet({
  from,
  to,
  chosen,
  choices,
  path,
}: {
  from: Side;
  to: Side;
  chosen: { from: string; to: string };
  choices: readonly SideChoice[];
  path: string;
}) {
  const router = useRouter();
  const showing = useShowing();
  const changed = useMemo(() => changedLines(from, to), [from, to]);
  const moved = useMemo(() => movedLimits(from, to), [from, to]);
  const fluid = sameFluid(from, to);
  const go = (one: string, other: string) => router.push(`${path}?${new URLSearchParams({ from: one, to: other }).toString()}`);
  return (
    <>
      <h1 className="pb-3">
        {compareTitle(changed.length + (fluid ? 0 : 1), from.run.result.verdict, to.run.result.verdict, verdictWords)}
      </h1>
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2 pb-5 print:hidden">
        <span className="text-ink-3">From</span>
        <span className="w-[230px]">
          <ChoiceField label="From" value={chosen.from} options={choices} onValueChange={(value) => go(value, chosen.to)} />
        </span>
        <span className="text-ink-3">to</span>
        <span className="w-[230px]">
          <ChoiceField label="To" value={chosen.to} options={choices} onValueChange={(value) => go(chosen.from, value)} />
        </span>
        <Button kind="quiet" onClick={() => go(chosen.to, chosen.from)}>
          Swap
        </Button>
      </div>
      <ChangedTable from={from} to={to} changed={changed} fluidChanged={!fluid} showing={showing} />
      <MovedTable from={from} to={to} moved={moved} showing={showing} />
      <Overlay from={from} to={to} showing={showing} />
      <CautionBeside id="C1" result={to.run.result} />
    </>
  );
}

type TableProps = { from: Side; to: Side; showing: Showing };

function ChangedTable({
  from,
  to,
  changed,
  fluidChanged,
  showing,
}: TableProps & { changed: ReturnType<typeof changedLines>; fluidChanged: boolean }) {
  if (changed.length === 0 && !fluidChanged) return <p className="font-serif text-prose">Every line says the same.</p>;
  const words = (side: Side) => side.content.composition.map(({ name, typed }) => `${name} ${typed}`).join(", ");
  return (
    <section>
      <h2 className="mb-1">What differs</h2>
      <Table caption="Lines that differ">
        <thead>
          <tr>
            <HeadCell>Line</HeadCell>
            <HeadCell>What</HeadCell>
            <HeadCell numeric>{from.name}</HeadCell>
            <HeadCell numeric>{to.name}</HeadCell>
            <HeadCell>Source as written</HeadCell>
          </tr>
        </thead>
        <tbody>
          {changed.map(({ no, label, from: one, to: other }) => (
            <Row key={no}>
              <Cell>
                <span className="line-no">{no}</span>
              </Cell>
              <Cell>{label}</Cell>
              <Cell numeric muted label={from.name}>
                {one ? lineWords(one, showing).value : "–"}
              </Cell>
              <Cell numeric strong label={to.name}>
                {other ? lineWords(other, showing).value : "–"}
              </Cell>
              <Cell wholeRow>{other?.source && <SourceNote kind={other.source.kind}>{other.source.note}</SourceNote>}</Cell>
            </Row>
          ))}
          {fluidChanged && (
            <Row>
              <Cell>
                <span className="line-no">3.01</span>
              </Cell>
              <Cell>Composition</Cell>
              <Cell muted wholeRow label={from.name}>
                {words(from)}
              </Cell>
              <Cell strong wholeRow label={to.name}>
                {words(to)}
              </Cell>
              <Cell />
            </Row>
          )}
        </tbody>
      </Table>
    </section>
  );
}

function MovedTable({ from, to, moved, showing }: TableProps & { moved: Moved[] }) {
  return (
    <section className="mt-7">
      <h2 className="mb-1">What moves</h2>
      <Table caption="Figures of both, held against their limits">
        <thead>
          <tr>
            <HeadCell>Line</HeadCell>
            <HeadCell>Figure</HeadCell>
            <HeadCell numeric>{from.name}</HeadCell>
            <HeadCell numeric>{to.name}</HeadCell>
            <HeadCell numeric>Change</HeadCell>
            <HeadCell hideOnPhone>Share of limit used, 50 to 105 %</HeadCell>
            <HeadCell>Verdict</HeadCell>
          </tr>
        </thead>
        <tbody>
          {moved.map(({ id, line, from: one, to: other, governs }) => {
            const limit = other ?? one;
            if (!limit) return null;
            const quantity = quantityOfLimit(limit);
            const text = (si: number | undefined) =>
              si === undefined ? "–" : formatQuantity(quantity, si, shownUnit(quantity, showing.system), showing).text;
            const distance = distanceQuantity(limit);
            const change =
              one?.value === undefined || other?.value === undefined
                ? "–"
                : formatQuantity(distance, other.value - one.value, shownUnit(distance, showing.system), { signed: true }).text;
            return (
              <Row key={id} chosen={governs}>
                <Cell>
                  <span className="line-no">{line}</span>
                </Cell>
                <Cell>{limitTitle(limit, to.run, showing)}</Cell>
                <Cell numeric muted label={from.name}>
                  {text(one?.value)}
                </Cell>
                <Cell numeric strong label={to.name}>
                  {text(other?.value)}
                </Cell>
                <Cell numeric label="Change">
                  {change}
                </Cell>
                <Cell hideOnPhone>
                  {(one?.share !== undefined || other?.share !== undefined) && <ShareMove from={one?.share} to={other?.share} />}
                </Cell>
                <Cell wholeRow>
                  {one && other && one.verdict !== other.verdict ? (
                    <>
                      <VerdictWord verdict={one.verdict} /> <span className="text-ink-3">to</span>{" "}
                      <VerdictWord verdict={other.verdict} />
                    </>
                  ) : (
                    <VerdictWord verdict={limit.verdict} />
                  )}
                </Cell>
              </Row>
            );
          })}
        </tbody>
      </Table>
    </section>
  );
}

function Overlay({ from, to, showing }: TableProps) {
  const curves = useMemo(() => compareCurves(from, to, showing), [from, to, showing]);
  const dotted = `Dotted: ${from.name}.`;
  return (
    <div className="grid grid-cols-2 gap-9 pt-7 rail:grid-cols-1 rail:gap-6">
      <CurveChart
        {...curves.temperature}
        height="tall"
        summary={`Temperatures of ${from.name} and ${to.name} over the same time.`}
        caption={
          <>
            <b>Temperature.</b> {dotted}
          </>
        }
      />
      <div>
        <CurveChart
          {...curves.pressure}
          height="panel"
          summary={`Pressures of ${from.name} and ${to.name} over the same time.`}
          caption={
            <>
              <b>Pressure and vent rate.</b> {dotted}
            </>
          }
        />
        <CurveChart {...curves.ventRate} height="low" summary={`Vent rates of ${from.name} and ${to.name}.`} />
      </div>
    </div>
  );
}

/** What did not change, and the engines that computed both. */
export function CompareMargin({ from, to }: { from: Side; to: Side }) {
  const same = linesOf(to).size - changedLines(from, to).filter(({ to: other }) => other).length;
  return (
    <>
      <MarginHead>Unchanged</MarginHead>
      <MarginNote>
        {same} lines{sameFluid(from, to) ? " and the composition" : ""}.
      </MarginNote>
      <MarginHead>Engines</MarginHead>
      <MarginNote no={from.name}>{from.content.engineVersion}</MarginNote>
      <MarginNote no={to.name}>{to.content.engineVersion}</MarginNote>
      {from.content.engineVersion !== to.content.engineVersion && (
        <MarginNote>Computed by different engine versions: part of what moved may come from that.</MarginNote>
      )}
    </>
  );
}
