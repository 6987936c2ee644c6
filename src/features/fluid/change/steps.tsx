"use client";

import { useMemo, useState } from "react";
import { BridgeChart } from "@/components/charts/bridge-chart";
import { formatQuantity } from "@/components/quantity/format";
import { useShown } from "@/components/quantity/quantity";
import { shownAbsolutePressure, shownUnit } from "@/components/quantity/shown-units";
import { Cell, HeadCell, Row, Table } from "@/components/table/table";
import { useUnits } from "@/components/units/units-provider";
import type { PathResult } from "@/engine/cases/path-case";
import { fromSi } from "@/engine/units";
import { PropertySwitch } from "./property-switch";
import { properties, stepKeys, stepNames, stepSentence, type Property } from "./step-words";

/** The three steps of one property, drawn and in words, and all three properties in a table. */
export function Steps({ result, stale }: { result: PathResult; stale: boolean }) {
  const [property, setProperty] = useState<Property>("enthalpyJPerMol");
  const { system } = useUnits();
  const shown = useShown();
  const about = properties.find(({ key }) => key === property) ?? properties[0]!;
  const unit = shownUnit(about.quantity, system);
  const scale = Math.max(...stepKeys.map((key) => Math.abs(result[property][key])));

  const chart = useMemo(() => {
    const temperature = (si: number) => shown("temperature", si).text;
    const pressure = (si: number) => shown("pressure", si, { unit: shownAbsolutePressure }).text;
    const { from, to } = result;
    const value = (si: number) => fromSi(about.quantity, si, unit);
    const steps = result[property];
    return {
      steps: [
        {
          label: stepNames.departureOut,
          note: `real to ideal gas at ${pressure(from.pressurePa)}`,
          value: value(steps.departureOut),
        },
        {
          label: stepNames.idealGas,
          note: `${temperature(from.temperatureK)} to ${temperature(to.temperatureK)}`,
          value: value(steps.idealGas),
        },
        {
          label: stepNames.departureBack,
          note: `ideal gas to real at ${pressure(to.pressurePa)}`,
          value: value(steps.departureBack),
        },
      ],
      sum: { label: `Change of ${about.name.toLowerCase()}` },
    };
  }, [result, property, about, unit, shown]);

  return (
    <div className={stale ? "text-ink-3" : undefined}>
      <div className="mb-3 flex flex-wrap items-end justify-between gap-x-5 gap-y-3">
        <h2>Three steps</h2>
        <PropertySwitch property={property} onChange={setProperty} />
      </div>
      <div className="grid grid-cols-2 items-start gap-9 rail:grid-cols-1 rail:gap-5">
        <BridgeChart
          {...chart}
          unit={unit}
          decimals={about.quantity === "molarEnergy" && system === "US" ? 0 : 2}
          caption={
            <>
              <b>{about.name}</b>, {unit}.
            </>
          }
        />
        <ol aria-label={`The steps of ${about.name.toLowerCase()} in words`} className="font-serif text-note text-ink-2">
          {stepKeys.map((key) => (
            <li key={key} className="border-t py-2 first:border-t-0">
              <b className="font-num text-body text-ink">{stepNames[key]}</b>{" "}
              {stepSentence(key, property, {
                value: result[property][key],
                size: shown(about.quantity, Math.abs(result[property][key])).text,
                scale,
              })}
            </li>
          ))}
        </ol>
      </div>
      <div className="mt-4">
        <StepsTable result={result} />
      </div>
    </div>
  );
}

function StepsTable({ result }: { result: PathResult }) {
  const { system } = useUnits();
  const head = (name: string, quantity: (typeof properties)[number]["quantity"]) => `${name}, ${shownUnit(quantity, system)}`;
  return (
    <Table caption="Steps of internal energy, enthalpy and entropy">
      <thead>
        <tr>
          <HeadCell>Step</HeadCell>
          {properties.map(({ key, name, quantity }) => (
            <HeadCell key={key} numeric>
              {head(name, quantity)}
            </HeadCell>
          ))}
        </tr>
      </thead>
      <tbody>
        {stepKeys.map((step) => (
          <Row key={step} total={step === "total"}>
            <Cell head wholeRow>
              {stepNames[step]}
            </Cell>
            {properties.map(({ key, name, quantity }) => (
              <Cell key={key} numeric label={head(name, quantity)}>
                {formatQuantity(quantity, result[key][step], shownUnit(quantity, system), { signed: true }).number}
              </Cell>
            ))}
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
