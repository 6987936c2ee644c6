"use client";

import { Power, useShown } from "@/components/quantity/quantity";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import type { CaseRunView } from "@/contracts/views";
import type { SettleOutReport } from "@/engine/cases/blowdown-result";
import { CautionBeside } from "./caution-beside";

/** Several vessels before and after they are joined. */
export function SettleOut({ run: { result } }: { run: CaseRunView }) {
  if (!result.settleOut) return null;
  return (
    <section className="mt-7">
      <h2 className="mb-1">Settle-out</h2>
      <SettleOutTable report={result.settleOut} />
      <CautionBeside id="M-settle-out" result={result} />
    </section>
  );
}

const ruleWords = { adiabatic: "Without the heat of the steel", "with-steel": "With the steel taking part" } as const;

export function SettleOutTable({ report }: { report: SettleOutReport }) {
  const shown = useShown();
  const { vessels, after, alternative } = report;
  const total = vessels.reduce((sum, { massKg }) => sum + massKg, 0);
  const signed = (kg: number) => shown("mass", kg, { signed: true }).text;
  return (
    <>
      <Table caption="Vessels before and after settling">
        <thead>
          <tr>
            <HeadCell>Item</HeadCell>
            <HeadCell numeric>Volume</HeadCell>
            <HeadCell numeric>Before</HeadCell>
            <HeadCell numeric>Temperature</HeadCell>
            <HeadCell numeric>Mass</HeadCell>
            <HeadCell numeric>Moves</HeadCell>
          </tr>
        </thead>
        <tbody>
          {vessels.map(({ name, volumeM3, pressurePa, temperatureK, massKg, movesKg }) => (
            <Row key={name}>
              <Cell head wholeRow>
                {name}
              </Cell>
              <Cell numeric label="Volume">
                {shown("volume", volumeM3).text}
              </Cell>
              <Cell numeric label="Before">
                {shown("pressure", pressurePa).text}
              </Cell>
              <Cell numeric label="Temperature">
                {shown("temperature", temperatureK).text}
              </Cell>
              <Cell numeric label="Mass">
                {shown("mass", massKg).text}
              </Cell>
              <Cell numeric label="Moves">
                {signed(movesKg)} {movesKg > 0 ? "in" : movesKg < 0 ? "out" : ""}
              </Cell>
            </Row>
          ))}
          <Row total>
            <Cell head wholeRow>
              After settling
            </Cell>
            <Cell numeric label="Volume">
              {shown("volume", after.volumeM3).text}
            </Cell>
            <Cell numeric label="Pressure">
              {shown("pressure", after.pressurePa).text}
            </Cell>
            <Cell numeric label="Temperature">
              {shown("temperature", after.temperatureK).text}
            </Cell>
            <Cell numeric label="Mass">
              {shown("mass", after.massKg).text}
            </Cell>
            <Cell numeric label="Moves">
              {shown("mass", 0).text}
            </Cell>
          </Row>
        </tbody>
      </Table>
      <p className="pt-2 font-serif text-note text-ink-2">
        Mass and internal energy are kept: {shown("mass", total).text}, {shown("energy", report.internalEnergyBeforeJ).text}{" "}
        before and {shown("energy", report.internalEnergyAfterJ).text} after
        {report.heatFromSteelJ === 0 ? "" : `, ${shown("energy", report.heatFromSteelJ).text} of it from the steel`}; energy
        closes to {report.energyClosure === 0 ? "0" : <Power value={report.energyClosure} figures={1} />}.
        {alternative &&
          ` ${ruleWords[alternative.rule]} the section would settle at ${shown("pressure", alternative.pressurePa).text} and ${shown("temperature", alternative.temperatureK).text}.`}
        {report.restAtTemperatureK !== undefined &&
          ` It then rests until all of it has ${shown("temperature", report.restAtTemperatureK).text}.`}
      </p>
    </>
  );
}
