"use client";

import { useMemo } from "react";
import { BridgeChart } from "@/components/charts/bridge-chart";
import { formatQuantity } from "@/components/quantity/format";
import { shownAbsolutePressure, shownUnit } from "@/components/quantity/shown-units";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import type { CaseRunView } from "@/contracts/views";
import type { ThreeSteps } from "@/engine/cases/blowdown-result";
import { fromSi } from "@/engine/units";
import { momentUnit } from "./governing";
import { useShowing } from "./use-showing";
import type { Showing } from "./limit-rows";
import { valueAtTime } from "./value-at-time";

/** The real-gas path from the start to the coldest state of the fluid: out to the ideal gas, across, and back. */
export function EnergyLedger({ run }: { run: CaseRunView }) {
  const showing = useShowing();
  const chart = useMemo(() => bridgeOf(run, showing), [run, showing]);
  const { startToColdest, startToEnd } = run.result.energyAccount;
  const moment = (seconds: number) => formatQuantity("time", seconds, momentUnit(run.result.summary.endTimeS)).text;
  return (
    <div>
      <BridgeChart
        {...chart}
        caption={
          <>
            <b>Energy ledger, three steps.</b> Enthalpy, start to coldest fluid, {chart.unit}.
          </>
        }
      />
      <StepsTable
        caption={`Start to coldest fluid, ${moment(startToColdest.atTimeS)}`}
        account={startToColdest}
        showing={showing}
      />
      <StepsTable caption={`Start to end of the run, ${moment(startToEnd.atTimeS)}`} account={startToEnd} showing={showing} />
      <p className="pt-1.5 text-label text-ink-3">For each mole of the fluid that is there. Reference: ideal gas at 25 °C.</p>
    </div>
  );
}

function bridgeOf({ result: { energyAccount, series, summary } }: CaseRunView, { system }: Showing) {
  const { enthalpyJPerMol: steps, atTimeS } = energyAccount.startToColdest;
  const unit = shownUnit("molarEnergy", system);
  const value = (si: number) => fromSi("molarEnergy", si, unit);
  const pressure = (si: number | null) => formatQuantity("pressure", si, shownAbsolutePressure[system]).text;
  const temperature = (si: number) => formatQuantity("temperature", si, shownUnit("temperature", system)).text;
  const coldest = summary.minimumFluidTemperatureK;
  return {
    unit,
    decimals: system === "SI" ? 2 : 0,
    steps: [
      {
        label: "Departure out",
        note: `real gas at ${pressure(summary.initialPressurePa)}, ${temperature(summary.initialTemperatureK)}, to ideal gas`,
        value: value(steps.departureOut),
      },
      {
        label: "Ideal-gas change",
        note: `${temperature(summary.initialTemperatureK)} to ${temperature(coldest)}`,
        value: value(steps.idealGas),
      },
      {
        label: "Departure back",
        note: `ideal gas to real gas at ${pressure(valueAtTime(series.timeS, series.pressurePa, atTimeS))}`,
        value: value(steps.departureBack),
      },
    ],
    sum: { label: "Change of enthalpy", note: "sum of the three steps" },
  };
}

type Account = CaseRunView["result"]["energyAccount"]["startToColdest"];

const steps: { key: keyof ThreeSteps; label: string }[] = [
  { key: "departureOut", label: "Departure out" },
  { key: "idealGas", label: "Ideal-gas change" },
  { key: "departureBack", label: "Departure back" },
  { key: "total", label: "Change, sum of the steps" },
];

function StepsTable({ caption, account, showing: { system } }: { caption: string; account: Account; showing: Showing }) {
  const energy = shownUnit("molarEnergy", system);
  const entropy = shownUnit("molarEntropy", system);
  const write = (quantity: "molarEnergy" | "molarEntropy", si: number, unit: string) =>
    formatQuantity(quantity, si, unit, { signed: true }).number;
  return (
    <div className="mt-4">
      <h3>{caption}</h3>
      <Table caption={caption}>
        <thead>
          <tr>
            <HeadCell>Step</HeadCell>
            <HeadCell numeric>Internal energy, {energy}</HeadCell>
            <HeadCell numeric>Enthalpy, {energy}</HeadCell>
            <HeadCell numeric>Entropy, {entropy}</HeadCell>
          </tr>
        </thead>
        <tbody>
          {steps.map(({ key, label }) => (
            <Row key={key} total={key === "total"}>
              <Cell head wholeRow>
                {label}
              </Cell>
              <Cell numeric label={`Internal energy, ${energy}`}>
                {write("molarEnergy", account.internalEnergyJPerMol[key], energy)}
              </Cell>
              <Cell numeric label={`Enthalpy, ${energy}`}>
                {write("molarEnergy", account.enthalpyJPerMol[key], energy)}
              </Cell>
              <Cell numeric label={`Entropy, ${entropy}`}>
                {write("molarEntropy", account.entropyJPerMolK[key], entropy)}
              </Cell>
            </Row>
          ))}
        </tbody>
      </Table>
    </div>
  );
}
