"use client";

import { useShown } from "@/components/quantity/quantity";
import { shownUnit } from "@/components/quantity/shown-units";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { useUnits } from "@/components/units/units-provider";
import { equationTitles } from "@/contracts/equation-titles";
import type { EquationId } from "@/engine/cases/fluid-spec";
import type { ComparedChange } from "@/engine/properties/compare-changes";
import { spreadOf } from "../equations/equation-rows";
import { FitnessCell, wideFirst } from "../equations/fitness-cell";
import { briefStateWords } from "../state/phase-words";
import { properties } from "./step-words";

/** The same change by every equation, with how fit each is for both ends, and the spread of those that are. */
export function ChangeEquations({
  entries,
  inUse,
  stale,
}: {
  entries: readonly ComparedChange[];
  inUse: EquationId;
  stale: boolean;
}) {
  const { system } = useUnits();
  const shown = useShown();
  const heads = properties.map(({ key, symbol, quantity }) => ({
    key,
    quantity,
    head: `Δ${symbol}, ${shownUnit(quantity, system)}`,
  }));
  return (
    <div className={`${wideFirst} ${stale ? "text-ink-3" : ""}`}>
      <Table caption="Equations of state side by side" settled>
        <thead>
          <tr>
            <HeadCell>Equation</HeadCell>
            <HeadCell>Phases, from and to, by mole</HeadCell>
            {heads.map(({ key, head }) => (
              <HeadCell key={key} numeric>
                {head}
              </HeadCell>
            ))}
          </tr>
        </thead>
        <tbody>
          {entries.map(({ equation, verdict, notes, result, refused }) => (
            <Row key={equation} chosen={equation === inUse}>
              <Cell wholeRow>
                <FitnessCell
                  title={equationTitles[equation]}
                  verdict={verdict}
                  notes={refused && !notes.includes(refused) ? [refused, ...notes] : notes}
                  inUse={equation === inUse}
                />
              </Cell>
              <Cell label="Phases, from and to, by mole" wholeRow>
                {result ? (
                  <>
                    {briefStateWords(result.from)}
                    <span className="block">{briefStateWords(result.to)}</span>
                  </>
                ) : (
                  "–"
                )}
              </Cell>
              {heads.map(({ key, head, quantity }) => (
                <Cell key={key} numeric label={head}>
                  {shown(quantity, result?.[key].total, { signed: true }).number}
                </Cell>
              ))}
            </Row>
          ))}
          <Row total>
            <Cell wholeRow>Spread of those that are fit</Cell>
            <Cell />
            {heads.map(({ key, head, quantity }) => {
              const ends = spreadOf(entries, ({ result }) => result?.[key].total);
              const write = (si: number) => shown(quantity, si, { signed: true }).number;
              return (
                <Cell key={key} numeric label={head}>
                  {ends ? `${write(ends.low)} to ${write(ends.high)}` : "–"}
                </Cell>
              );
            })}
          </Row>
        </tbody>
      </Table>
    </div>
  );
}
