"use client";

import { formatNumber } from "@/components/quantity/format";
import { useShown } from "@/components/quantity/quantity";
import { shownAbsolutePressure } from "@/components/quantity/shown-units";
import { MarginHead } from "@/components/shell/margin";
import { FactTable } from "@/components/table/table";
import type { StatePoint } from "@/engine/cases/path-case";
import type { PhaseEnvelope } from "@/engine/flash/phase-envelope";
import type { StateProperties } from "@/engine/properties/state-properties";
import { dewTemperatureAt } from "../diagram/phase-curves";
import { stateWords } from "../state/phase-words";

const airMolarMass = 28.9647; // g/mol, to which gas gravity is referred

type Props = { atStart: StateProperties | null; start: StatePoint | undefined; envelope: PhaseEnvelope | null; pure: boolean };

/** The fluid in a few figures, in the margin. */
export function WhatItIs({ atStart, start, envelope, pure }: Props) {
  const shown = useShown();
  if (!atStart) return null;
  const { molarMassKgPerMol, compressibility } = atStart.overall;
  const dew = start && envelope && !pure ? dewTemperatureAt(envelope, start.pressurePa) : undefined;
  const pressure = start && shown("pressure", start.pressurePa, { unit: shownAbsolutePressure }).text;
  return (
    <>
      <MarginHead>What this fluid is</MarginHead>
      <FactTable
        caption="What this fluid is"
        facts={[
          { label: "Molar mass", value: shown("molarMass", molarMassKgPerMol).text },
          { label: "Gas gravity, air = 1", value: formatNumber((molarMassKgPerMol * 1000) / airMolarMass, { decimals: 3 }) },
          ...(start
            ? [
                { label: "At start", value: stateWords(atStart) },
                { label: "Compressibility factor at start", value: formatNumber(compressibility, { decimals: 3 }) },
              ]
            : []),
          ...(dew === undefined
            ? []
            : [{ label: `First liquid on cooling at ${pressure}`, value: `about ${shown("temperature", dew).text}` }]),
        ]}
      />
    </>
  );
}
