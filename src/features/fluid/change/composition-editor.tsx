"use client";

import { useState } from "react";
import { Button } from "@/components/button/button";
import { AddComponent } from "@/components/composition/add-component";
import { AmountBar } from "@/components/composition/amount-bar";
import { PasteComposition } from "@/components/composition/paste-composition";
import { UnitField } from "@/components/line/unit-field";
import { WarningSign } from "@/components/line/warning-sign";
import { formatMolePercent, formatNumber } from "@/components/quantity/format";
import { ButtonRow } from "@/components/shell/page-head";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { componentName } from "@/contracts/component-list";
import { molePercentOf } from "@/contracts/derive-si";
import type { CompositionRow } from "@/contracts/draft";
import { compositionProblem, sumOf, type ChangeInput } from "./change-input";

type Composition = Pick<ChangeInput, "rows" | "normalised">;

/** Components and amounts of a calculation: added one by one or pasted; a sum other than 100 is scaled by the person's own act alone. */
export function CompositionEditor({ rows, normalised, onChange }: Composition & { onChange: (change: Composition) => void }) {
  const [pasting, setPasting] = useState(false);
  const sum = sumOf(rows);
  const off = Math.abs(sum - 100) > 1e-4;
  const problem = rows.length > 0 ? compositionProblem({ rows, normalised }) : undefined;
  const setRows = (changed: CompositionRow[]) => onChange({ rows: changed, normalised: false });
  const share = (molePercent: number | null) => (sum > 0 ? (molePercent ?? 0) / sum : Number.NaN);

  return (
    <div>
      {rows.length === 0 ? (
        <p className="border-t py-3.5 font-serif text-prose text-ink-2">
          No component yet. Add them one by one, or paste a table from the laboratory’s report.
        </p>
      ) : (
        <Table caption="Composition" settled stack={false}>
          <thead>
            <tr>
              <HeadCell>Component</HeadCell>
              <HeadCell numeric>Amount, mol %</HeadCell>
              <HeadCell hideOnPhone>log scale, 0.01 to 100</HeadCell>
              <HeadCell numeric>As used, mol %</HeadCell>
              <HeadCell>
                <span className="sr-only">Remove</span>
              </HeadCell>
            </tr>
          </thead>
          <tbody>
            {rows.map(({ id, typed, molePercent }) => (
              <Row key={id}>
                <Cell head>{componentName(id)}</Cell>
                <Cell numeric>
                  <span className="inline-block w-[116px]">
                    <UnitField
                      value={typed}
                      unit=""
                      label={`${componentName(id)}, mol %`}
                      tone={typed !== "" && molePercent === null ? "bad" : "rest"}
                      onValueChange={(text) =>
                        setRows(
                          rows.map((row) => (row.id === id ? { ...row, typed: text, molePercent: molePercentOf(text) } : row)),
                        )
                      }
                    />
                  </span>
                </Cell>
                <Cell hideOnPhone>
                  <AmountBar molePercent={molePercent} />
                </Cell>
                <Cell numeric>{formatMolePercent(share(molePercent))}</Cell>
                <Cell>
                  <button
                    type="button"
                    aria-label={`Remove ${componentName(id)}`}
                    title={`Remove ${componentName(id)}`}
                    className="grid h-[34px] w-[34px] place-items-center text-tide phone:h-11 phone:w-9"
                    onClick={() => setRows(rows.filter((row) => row.id !== id))}
                  >
                    <svg width="14" height="14" viewBox="0 0 14 14" aria-hidden="true">
                      <path d="M2 2l10 10M12 2L2 12" stroke="currentColor" strokeWidth="1.8" />
                    </svg>
                  </button>
                </Cell>
              </Row>
            ))}
            <Row total>
              <Cell head>Sum</Cell>
              <Cell numeric>{formatNumber(sum, { decimals: 3 })}</Cell>
              <Cell hideOnPhone>{off ? `${formatNumber(sum - 100, { decimals: 3 }, { signed: true })} from 100` : "is 100"}</Cell>
              <Cell numeric>{formatMolePercent(sum > 0 ? 1 : Number.NaN)}</Cell>
              <Cell />
            </Row>
          </tbody>
        </Table>
      )}
      {problem && (
        <p role="status" className="flex items-baseline gap-2 py-2 text-note text-beyond">
          <WarningSign /> {problem}
        </p>
      )}
      <ButtonRow>
        <AddComponent
          present={rows.map(({ id }) => id)}
          onAdd={(id) => setRows([...rows, { id, typed: "", molePercent: null }])}
        />
        <Button onClick={() => setPasting(true)}>Paste a table</Button>
        {off && rows.length > 0 && !normalised && <Button onClick={() => onChange({ rows, normalised: true })}>Normalise</Button>}
      </ButtonRow>
      <PasteComposition
        open={pasting}
        onClose={() => setPasting(false)}
        onUse={(pasted) => {
          setRows(pasted);
          setPasting(false);
        }}
      />
    </div>
  );
}
