"use client";

import { AmountBar } from "@/components/composition/amount-bar";
import { SourceNote } from "@/components/line/source-note";
import { formatMolePercent, formatNumber } from "@/components/quantity/format";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { componentList, componentName } from "@/contracts/component-list";
import type { FluidOfScreening } from "./fluid-of-screening";

const known = new Map(componentList.map((component) => [component.id, component]));

/** The composition as the report gives it, and the mole fractions that every figure here rests on. */
export function ReportedComposition({ rows, sum, source }: Pick<FluidOfScreening, "rows" | "sum" | "source">) {
  const off = Math.abs(sum - 100) > 1e-4;
  return (
    <>
      <div className="grid grid-cols-[46px_minmax(0,1fr)] items-baseline gap-x-3.5 pb-1">
        <span className="line-no">3.01</span>
        <SourceNote kind={source ? source.kind : "missing"}>{source ? source.note : "no source is given yet"}</SourceNote>
      </div>
      <Table caption="Composition as reported and as used" settled stack={false}>
        <thead>
          <tr>
            <HeadCell>Component</HeadCell>
            <HeadCell hideOnPhone>CAS</HeadCell>
            <HeadCell numeric>As reported, mol %</HeadCell>
            <HeadCell hideOnPhone>log scale, 0.01 to 100</HeadCell>
            <HeadCell numeric>As used, mol %</HeadCell>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ id, reported, moleFraction }) => (
            <Row key={id}>
              <Cell head>
                {componentName(id)} <span className="text-small text-ink-3">{known.get(id)?.formula}</span>
              </Cell>
              <Cell hideOnPhone muted>
                {known.get(id)?.cas}
              </Cell>
              <Cell numeric>{reported === "" ? "–" : reported}</Cell>
              <Cell hideOnPhone>
                <AmountBar molePercent={moleFraction * 100} />
              </Cell>
              <Cell numeric strong>
                {formatMolePercent(moleFraction)}
              </Cell>
            </Row>
          ))}
          <Row total>
            <Cell head>Sum</Cell>
            <Cell hideOnPhone />
            <Cell numeric>{formatNumber(sum, { decimals: 3 })}</Cell>
            <Cell hideOnPhone>{off ? `${formatNumber(sum - 100, { decimals: 3 }, { signed: true })} from 100` : "is 100"}</Cell>
            <Cell numeric>{formatMolePercent(rows.reduce((total, { moleFraction }) => total + moleFraction, 0))}</Cell>
          </Row>
        </tbody>
      </Table>
    </>
  );
}
