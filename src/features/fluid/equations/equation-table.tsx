"use client";

import { formatNumber, withUnit } from "@/components/quantity/format";
import { useShown } from "@/components/quantity/quantity";
import { shownUnit } from "@/components/quantity/shown-units";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { useUnits } from "@/components/units/units-provider";
import { equationTitles } from "@/contracts/equation-titles";
import type { EquationId } from "@/engine/cases/fluid-spec";
import type { Fitness, FitnessDeviation } from "@/engine/eos/fitness";
import { fromSi, type QuantityId } from "@/engine/units";
import { briefStateWords } from "../state/phase-words";
import { spreadOf, type Ends } from "./equation-rows";
import { FitnessCell, wideFirst } from "./fitness-cell";

type Props = { entries: readonly Fitness[]; inUse: EquationId; stale: boolean };

/** All equations at one state: how fit each is, what it gives, how far it is from the best one held for this fluid. */
export function EquationTable({ entries, inUse, stale }: Props) {
  const { system } = useUnits();
  const shown = useShown();
  const from = entries.find(({ deviation }) => deviation)?.deviation?.from;
  const best = from && equationTitles[from];
  const write = (quantity: QuantityId, si: number | undefined) => shown(quantity, si).number;
  const density = `Density, ${shownUnit("density", system)}`;
  const departure = `Enthalpy departure, ${shownUnit("molarEnergy", system)}`;
  const sound = `Speed of sound, ${shownUnit("speed", system)}`;
  const against = best ? `Against ${best}` : "Against the best";

  return (
    <div className={`${wideFirst} ${stale ? "text-ink-3" : ""}`}>
      <Table caption="Equations of state side by side" settled>
        <thead>
          <tr>
            <HeadCell>Equation</HeadCell>
            <HeadCell>Phases, by mole</HeadCell>
            <HeadCell numeric>{density}</HeadCell>
            <HeadCell numeric>Z</HeadCell>
            <HeadCell numeric>{departure}</HeadCell>
            <HeadCell numeric>{sound}</HeadCell>
            {best && <HeadCell>{against}</HeadCell>}
          </tr>
        </thead>
        <tbody>
          {entries.map(({ equation, verdict, notes, values, deviation }) => (
            <Row key={equation} chosen={equation === inUse}>
              <Cell wholeRow>
                <FitnessCell title={equationTitles[equation]} verdict={verdict} notes={notes} inUse={equation === inUse} />
              </Cell>
              <Cell label="Phases, by mole" wholeRow>
                {values ? briefStateWords(values) : "–"}
              </Cell>
              <Cell numeric label={density}>
                {write("density", values?.densityKgPerM3)}
              </Cell>
              <Cell numeric label="Z">
                {formatNumber(values?.compressibility, { decimals: 4 })}
              </Cell>
              <Cell numeric label={departure}>
                {write("molarEnergy", values?.enthalpyDepartureJPerMol)}
              </Cell>
              <Cell numeric label={sound}>
                {write("speed", values?.soundSpeedMPerS)}
              </Cell>
              {best && (
                <Cell label={against} wholeRow>
                  {equation === from ? "is the measure" : deviation ? <Deviation deviation={deviation} /> : "–"}
                </Cell>
              )}
            </Row>
          ))}
          <Row total>
            <Cell wholeRow>Spread of those that are fit</Cell>
            <Cell wholeRow />
            <SpreadCell label={density} quantity="density" ends={spreadOf(entries, ({ values }) => values?.densityKgPerM3)} />
            <SpreadCell label="Z" decimals={4} ends={spreadOf(entries, ({ values }) => values?.compressibility)} />
            <SpreadCell
              label={departure}
              quantity="molarEnergy"
              ends={spreadOf(entries, ({ values }) => values?.enthalpyDepartureJPerMol)}
            />
            <SpreadCell label={sound} quantity="speed" ends={spreadOf(entries, ({ values }) => values?.soundSpeedMPerS)} />
            {best && <Cell />}
          </Row>
        </tbody>
      </Table>
    </div>
  );
}

function Deviation({ deviation }: { deviation: FitnessDeviation }) {
  const { system } = useUnits();
  const unit = shownUnit("molarEnergy", system);
  const energy = formatNumber(
    fromSi("molarEnergy", deviation.enthalpyJPerMol, unit),
    { decimals: system === "SI" ? 3 : 0 },
    { signed: true },
  );
  if (deviation.otherPhase) return <span className="text-near">finds other phases</span>;
  const percent = formatNumber(deviation.densityPercent, { decimals: 1 }, { signed: true });
  return (
    <>
      <span className="block whitespace-nowrap">density {percent}&nbsp;%</span>
      <span className="block whitespace-nowrap">enthalpy {withUnit(energy, unit)}</span>
    </>
  );
}

type SpreadProps = { label: string; quantity?: QuantityId; decimals?: number; ends: Ends | undefined };

function SpreadCell({ label, quantity, decimals, ends }: SpreadProps) {
  const shown = useShown();
  const write = (value: number) => (quantity ? shown(quantity, value).number : formatNumber(value, { decimals }));
  return (
    <Cell numeric label={label}>
      {ends ? `${write(ends.low)} to ${write(ends.high)}` : "–"}
    </Cell>
  );
}
