"use client";

import { formatNumber } from "@/components/quantity/format";
import { useShown } from "@/components/quantity/quantity";
import { shownAbsolutePressure } from "@/components/quantity/shown-units";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import type { PhaseProperties, StateProperties } from "@/engine/properties/state-properties";
import { phaseNames, stateWords } from "../state/phase-words";

type Fact = { name: string; of: (state: StateProperties) => string };

/** The phases at either end, side by side. */
export function EndsTable({ from, to, stale }: { from: StateProperties; to: StateProperties; stale: boolean }) {
  const shown = useShown();
  const each = (write: (phase: PhaseProperties) => string) => (state: StateProperties) => {
    const names = phaseNames(state.phases);
    return state.phases
      .map((phase, i) => (names.length > 1 ? `${names[i]?.toLowerCase() ?? ""} ${write(phase)}` : write(phase)))
      .join(", ");
  };
  const facts: Fact[] = [
    { name: "Pressure", of: ({ pressurePa }) => shown("pressure", pressurePa, { unit: shownAbsolutePressure }).text },
    { name: "Temperature", of: ({ temperatureK }) => shown("temperature", temperatureK).text },
    { name: "Phases", of: stateWords },
    { name: "Density", of: ({ overall }) => shown("density", overall.densityKgPerM3).text },
    { name: "Density of each phase", of: each(({ densityKgPerM3 }) => shown("density", densityKgPerM3).text) },
    { name: "Compressibility factor", of: each(({ compressibility }) => formatNumber(compressibility, { decimals: 4 })) },
  ];
  const anyTwo = from.phases.length > 1 || to.phases.length > 1;
  return (
    <div className={stale ? "text-ink-3" : undefined}>
      <Table caption="The two states" settled>
        <thead>
          <tr>
            <HeadCell>What</HeadCell>
            <HeadCell>From</HeadCell>
            <HeadCell>To</HeadCell>
          </tr>
        </thead>
        <tbody>
          {facts
            .filter(({ name }) => anyTwo || name !== "Density of each phase")
            .map(({ name, of }) => (
              <Row key={name}>
                <Cell head wholeRow muted>
                  {name}
                </Cell>
                <Cell label="From">{of(from)}</Cell>
                <Cell label="To">{of(to)}</Cell>
              </Row>
            ))}
        </tbody>
      </Table>
    </div>
  );
}
