"use client";

import { formatNumber } from "@/components/quantity/format";
import { Power, useShown } from "@/components/quantity/quantity";
import { shownUnit } from "@/components/quantity/shown-units";
import { useUnits } from "@/components/units/units-provider";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import type { RecordContent } from "@/contracts/record-content";
import type { CaseRunView } from "@/contracts/views";
import type { BlowdownSummary } from "@/engine/cases/blowdown-result";
import { fromSi, type QuantityId } from "@/engine/units";

type Figure = { label: string; quantity: QuantityId; change: QuantityId };

const figures: Partial<Record<keyof BlowdownSummary, Figure>> = {
  timeToTargetPressureS: { label: "Time to target pressure", quantity: "time", change: "time" },
  minimumWallTemperatureK: { label: "Lowest wall temperature", quantity: "temperature", change: "temperatureDifference" },
  minimumFluidTemperatureK: { label: "Lowest fluid temperature", quantity: "temperature", change: "temperatureDifference" },
  minimumOutletTemperatureK: {
    label: "Lowest temperature behind the opening",
    quantity: "temperature",
    change: "temperatureDifference",
  },
  peakVentRateKgPerS: { label: "Peak vent load", quantity: "massRate", change: "massRate" },
  ventedMassKg: { label: "Mass vented", quantity: "mass", change: "mass" },
  endTimeS: { label: "End of the run", quantity: "time", change: "time" },
};

/** The run again at a tenfold tighter tolerance: how far the figures moved, which says how much of them is arithmetic. */
export function SecondRun({ recordCase, run }: { recordCase: RecordContent["cases"][number]; run: CaseRunView }) {
  const shown = useShown();
  const { system } = useUnits();
  const rows = recordCase.confirmation.flatMap(({ id, change }) => {
    const figure = figures[id as keyof BlowdownSummary];
    const value = run.result.summary[id as keyof BlowdownSummary];
    return figure && typeof value === "number" ? [{ id, figure, value, change }] : [];
  });
  return (
    <section>
      <h2 className="mb-1">Second run, tenfold tighter</h2>
      <Table caption="Second run at a tenfold tighter tolerance" stack={false} settled>
        <thead>
          <tr>
            <HeadCell>Figure</HeadCell>
            <HeadCell numeric>This run</HeadCell>
            <HeadCell numeric>Change</HeadCell>
          </tr>
        </thead>
        <tbody>
          {rows.map(({ id, figure, value, change }) => {
            const unit = shownUnit(figure.change, system);
            return (
              <Row key={id}>
                <Cell head>{figure.label}</Cell>
                <Cell numeric>{shown(figure.quantity, value).text}</Cell>
                <Cell numeric>
                  <Change value={fromSi(figure.change, change, unit)} /> {unit}
                </Cell>
              </Row>
            );
          })}
        </tbody>
      </Table>
    </section>
  );
}

function Change({ value }: { value: number }) {
  if (value === 0) return <>0</>;
  if (Math.abs(value) < 1e-3) return <Power value={value} figures={1} />;
  return <>{formatNumber(value, { figures: 2 }, { signed: true })}</>;
}
