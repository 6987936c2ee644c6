"use client";

import { useState } from "react";
import { Button } from "@/components/button/button";
import { AddComponent } from "@/components/composition/add-component";
import { AmountBar } from "@/components/composition/amount-bar";
import { PasteComposition } from "@/components/composition/paste-composition";
import { UnitField } from "@/components/line/unit-field";
import { WarningSign } from "@/components/line/warning-sign";
import { ButtonRow } from "@/components/shell/page-head";
import { formatNumber } from "@/components/quantity/format";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { componentList } from "@/contracts/component-list";
import { molePercentOf } from "@/contracts/derive-si";
import { compositionSum, moleFractions } from "@/contracts/draft-composition";
import type { LineKey } from "@/contracts/lines/line";
import { useDraft } from "./draft-context";
import { SourceField } from "./source-field";

const known = new Map(componentList.map((component) => [component.id, component]));

/** The composition as reported, its sum, and what it is after normalising. Nothing is scaled without the engineer's own act. */
export function CompositionTable({ lineKey }: { lineKey: LineKey }) {
  const { draft, editable, made, setComposition } = useDraft();
  const [pasting, setPasting] = useState(false);
  const { rows, normalised, source } = draft.composition;
  const sum = compositionSum(draft);
  const off = Math.abs(sum - 100) > 1e-4;
  const fractions = new Map(moleFractions(draft).map(({ id, moleFraction }) => [id, moleFraction]));
  const problem = made.problems.find((one) => one.line === lineKey)?.message;

  const setRow = (id: string, typed: string) =>
    setComposition({
      rows: rows.map((row) => (row.id === id ? { ...row, typed, molePercent: molePercentOf(typed) } : row)),
      normalised: false,
    });
  const addRow = (id: string) => {
    if (!rows.some((row) => row.id === id))
      setComposition({ rows: [...rows, { id, typed: "", molePercent: null }], normalised: false });
  };

  return (
    <div id={`line-${lineKey}`} className="scroll-mt-16">
      <div className="grid grid-cols-[46px_minmax(0,1fr)] items-baseline gap-x-3.5 py-2">
        <span className="line-no">{lineKey}</span>
        <SourceField
          lineNo={lineKey}
          label="the composition"
          source={source}
          asksFor={rows.length > 0}
          editable={editable}
          onChange={(changed) => setComposition({ source: changed })}
        />
      </div>
      {rows.length === 0 ? (
        <p className="border-t py-3.5 font-serif text-prose text-ink-2">
          No component yet. Add them one by one, or paste a table from the laboratory’s report.
        </p>
      ) : (
        <Table caption="Composition" settled stack={false}>
          <thead>
            <tr>
              <HeadCell>Component</HeadCell>
              <HeadCell hideOnPhone>CAS</HeadCell>
              <HeadCell numeric>As reported, mol %</HeadCell>
              <HeadCell hideOnPhone>log scale, 0.01 to 100</HeadCell>
              <HeadCell numeric>{off && !normalised ? "Share" : "Normalised"}</HeadCell>
              {editable && (
                <HeadCell>
                  <span className="sr-only">Remove</span>
                </HeadCell>
              )}
            </tr>
          </thead>
          <tbody>
            {rows.map(({ id, typed, molePercent }) => {
              const name = known.get(id)?.name ?? id;
              return (
                <Row key={id}>
                  <Cell head>
                    {name} <span className="text-small text-ink-3">{known.get(id)?.formula}</span>
                  </Cell>
                  <Cell hideOnPhone muted>
                    {known.get(id)?.cas}
                  </Cell>
                  <Cell numeric>
                    <span className="inline-block w-[108px]">
                      <UnitField
                        value={typed}
                        unit=""
                        label={`${name}, mol %`}
                        readOnly={!editable}
                        tone={editable ? (typed !== "" && molePercent === null ? "bad" : "rest") : "locked"}
                        onValueChange={(text) => setRow(id, text)}
                      />
                    </span>
                  </Cell>
                  <Cell hideOnPhone>
                    <AmountBar molePercent={molePercent} />
                  </Cell>
                  <Cell numeric>{formatNumber((fractions.get(id) ?? 0) * 100, { decimals: 3 })}</Cell>
                  {editable && (
                    <Cell>
                      <button
                        type="button"
                        aria-label={`Remove ${name}`}
                        title={`Remove ${name}`}
                        className="grid h-[34px] w-[34px] place-items-center text-tide phone:h-11 phone:w-9"
                        onClick={() => setComposition({ rows: rows.filter((row) => row.id !== id), normalised: false })}
                      >
                        <svg width="14" height="14" viewBox="0 0 14 14" aria-hidden="true">
                          <path d="M2 2l10 10M12 2L2 12" stroke="currentColor" strokeWidth="1.8" />
                        </svg>
                      </button>
                    </Cell>
                  )}
                </Row>
              );
            })}
            <Row total>
              <Cell head>Sum</Cell>
              <Cell hideOnPhone />
              <Cell numeric>{formatNumber(sum, { decimals: 3 })}</Cell>
              <Cell hideOnPhone>{off ? `${formatNumber(sum - 100, { decimals: 3 }, { signed: true })} from 100` : "is 100"}</Cell>
              <Cell numeric>
                {formatNumber([...fractions.values()].reduce((total, x) => total + x, 0) * 100, { decimals: 3 })}
              </Cell>
              {editable && <Cell />}
            </Row>
          </tbody>
        </Table>
      )}
      {problem && (
        <p role="alert" className="flex items-baseline gap-2 py-2 text-note text-beyond">
          <WarningSign /> {problem}
        </p>
      )}
      {editable && (
        <>
          <ButtonRow>
            <AddComponent present={rows.map(({ id }) => id)} onAdd={addRow} />
            <Button onClick={() => setPasting(true)}>Paste a table</Button>
            {off && rows.length > 0 && !normalised && (
              <Button kind="main" onClick={() => setComposition({ normalised: true })}>
                Normalise and keep both columns
              </Button>
            )}
          </ButtonRow>
          <PasteComposition
            open={pasting}
            onClose={() => setPasting(false)}
            onUse={(pasted) => {
              setComposition({ rows: pasted, normalised: false });
              setPasting(false);
            }}
          />
        </>
      )}
      {normalised && off && (
        <p className="pt-2 text-small text-ink-3">
          Normalised by you: the case uses the right-hand column, the record keeps both.
        </p>
      )}
    </div>
  );
}
