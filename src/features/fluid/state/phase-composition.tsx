"use client";

import { formatMolePercent, formatNumber } from "@/components/quantity/format";
import { Power } from "@/components/quantity/quantity";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { componentName } from "@/contracts/component-list";
import type { StateProperties } from "@/engine/properties/state-properties";
import { phaseNames } from "./phase-words";

/** What each of several phases is made of, and the ratio of vapour to liquid for each component. */
export function PhaseComposition({ state, stale }: { state: StateProperties; stale: boolean }) {
  if (state.phases.length < 2) return null;
  const names = phaseNames(state.phases);
  return (
    <div className={stale ? "text-ink-3" : undefined}>
      <Table caption="Composition of the phases" settled stack={state.phases.length > 2}>
        <thead>
          <tr>
            <HeadCell>Component</HeadCell>
            <HeadCell numeric hideOnPhone>
              Whole, mol %
            </HeadCell>
            {names.map((name) => (
              <HeadCell key={name} numeric>
                {name}, mol %
              </HeadCell>
            ))}
            <HeadCell numeric>K-value</HeadCell>
          </tr>
        </thead>
        <tbody>
          {state.components.map(({ id, moleFraction, ratio }, i) => (
            <Row key={id}>
              <Cell head wholeRow>
                {componentName(id)}
              </Cell>
              <Cell numeric hideOnPhone>
                {formatMolePercent(moleFraction)}
              </Cell>
              {state.phases.map(({ composition }, phase) => (
                <Cell key={phase} numeric label={names[phase]}>
                  {formatMolePercent(composition[i] ?? Number.NaN)}
                </Cell>
              ))}
              <Cell numeric strong label="K-value">
                <Ratio value={ratio} />
              </Cell>
            </Row>
          ))}
        </tbody>
      </Table>
    </div>
  );
}

function Ratio({ value }: { value: number | undefined }) {
  if (value === undefined || !Number.isFinite(value)) return <>–</>;
  return value >= 1e-3 && value < 1e5 ? <>{formatNumber(value, { figures: 3 })}</> : <Power value={value} figures={3} />;
}
