"use client";

import { formatNumber, formatPercent } from "@/components/quantity/format";
import { useShown } from "@/components/quantity/quantity";
import { shownUnit } from "@/components/quantity/shown-units";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { useUnits } from "@/components/units/units-provider";
import type { StateProperties } from "@/engine/properties/state-properties";
import type { Basis } from "./basis-switch";
import { phaseNames } from "./phase-words";
import { propertyRows, type PropertyRow } from "./property-rows";

/** Every property of a state; of several phases each stands in a column of its own beside the whole. */
export function PropertyTable({ state, basis, stale }: { state: StateProperties; basis: Basis; stale: boolean }) {
  const shown = useShown();
  const { system } = useUnits();
  const two = state.phases.length > 1;
  const names = phaseNames(state.phases);
  const write = ({ quantity, decimals }: PropertyRow, value: number | undefined) =>
    decimals === undefined ? shown(quantity, value).number : formatNumber(value, { decimals });
  return (
    <div className={`${two ? "" : "max-w-[760px]"} ${stale ? "text-ink-3" : ""}`}>
      <Table caption="Properties at the state" settled stack={two}>
        <thead>
          <tr>
            <HeadCell>Property</HeadCell>
            <HeadCell hideOnPhone>Unit</HeadCell>
            {two && <HeadCell numeric>Whole</HeadCell>}
            {names.map((name) => (
              <HeadCell key={name} numeric>
                {name}
              </HeadCell>
            ))}
          </tr>
        </thead>
        <tbody>
          {two && (
            <>
              <Row>
                <Cell head wholeRow>
                  Share by mole
                  <UnitOnPhone unit="%" />
                </Cell>
                <Cell muted hideOnPhone>
                  %
                </Cell>
                <Cell numeric label="Whole">
                  100
                </Cell>
                {state.phases.map(({ moleFraction }, i) => (
                  <Cell key={i} numeric strong label={names[i]}>
                    {share(moleFraction)}
                  </Cell>
                ))}
              </Row>
              <Row>
                <Cell head wholeRow>
                  Share by mass
                  <UnitOnPhone unit="%" />
                </Cell>
                <Cell muted hideOnPhone>
                  %
                </Cell>
                <Cell numeric label="Whole">
                  100
                </Cell>
                {state.phases.map(({ massFraction }, i) => (
                  <Cell key={i} numeric strong label={names[i]}>
                    {share(massFraction)}
                  </Cell>
                ))}
              </Row>
            </>
          )}
          {propertyRows(state, basis).map((row) => (
            <Row key={row.name}>
              <Cell head wholeRow>
                {row.name}
                <UnitOnPhone unit={shownUnit(row.quantity, system)} />
                {row.note && <span className="block text-label text-ink-3">{row.note}</span>}
              </Cell>
              <Cell muted hideOnPhone>
                {shownUnit(row.quantity, system)}
              </Cell>
              {two && (
                <Cell numeric label="Whole">
                  {write(row, row.overall)}
                </Cell>
              )}
              {row.phases.map((value, i) => (
                <Cell key={i} numeric strong label={names[i]}>
                  {write(row, value)}
                </Cell>
              ))}
            </Row>
          ))}
        </tbody>
      </Table>
    </div>
  );
}

/** Phones have no room for a column of units. */
function UnitOnPhone({ unit }: { unit: string }) {
  return unit === "–" ? null : <span className="hidden text-ink-3 phone:inline">, {unit}</span>;
}

/** "93.4"; the unit stands in its own column. */
const share = (fraction: number): string =>
  fraction > 0.001 && fraction < 0.999 ? (fraction * 100).toFixed(1) : formatPercent(fraction).replace(/\s*%$/, "");
