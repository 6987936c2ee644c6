"use client";

import { useState } from "react";
import { Notice } from "@/components/caution/notice";
import { WaitingLines } from "@/components/states/waiting";
import type { FluidSpec } from "@/engine/cases/fluid-spec";
import type { StatePoint } from "@/engine/cases/path-case";
import { useFluidAnswer } from "../engine/fluid-engine";
import { BasisSwitch, type Basis } from "./basis-switch";
import { PhaseComposition } from "./phase-composition";
import { stateWords } from "./phase-words";
import { PropertyTable } from "./property-table";
import { StateFields } from "./state-fields";
import type { TypedState } from "./typed";

type Props = {
  fluid: FluidSpec;
  /** What the fields give; nothing while they can't be read. */
  point: StatePoint | undefined;
  typed: TypedState;
  onType: (state: TypedState) => void;
};

/** Pressure and temperature in, everything that is known of the fluid there out. */
export function StateSection({ fluid, point, typed, onType }: Props) {
  const [basis, setBasis] = useState<Basis>("mole");
  const { value: state, current, problem } = useFluidAnswer<"state">(point && { kind: "state", fluid, point });
  const shown = problem ? null : state;

  return (
    <section aria-label="Properties at a state" className="mt-8">
      <div className="mb-3 flex flex-wrap items-end justify-between gap-x-5 gap-y-3">
        <h2>Properties at a state</h2>
        <BasisSwitch basis={basis} onChange={setBasis} />
      </div>
      <div className="max-w-[480px]">
        <StateFields of="state" state={typed} onChange={onType} />
      </div>
      {problem && (
        <div className="mt-3">
          <Notice tone="error" title="No state.">
            {problem}
          </Notice>
        </div>
      )}
      {!problem && !state && <WaitingLines lines={5} label="Computing the state" />}
      {shown && (
        <>
          <p role="status" className="py-3 font-serif text-prose">
            {current ? `${stateWords(shown)}.` : point ? "\u00a0" : "Type pressure and temperature."}
          </p>
          <PropertyTable state={shown} basis={basis} stale={!current} />
          <p className="pt-1.5 text-label text-ink-3">
            Zero of energies and entropy: each component as ideal gas at 25 °C and 1 bar(a). Viscosity and conductivity by general
            correlations, within about 10 % for gases and hydrocarbon liquids; of polar liquids they may be wrong by half.
          </p>
          {shown.phases.length > 1 && (
            <div className="mt-5">
              <h3>What the phases are made of</h3>
              <PhaseComposition state={shown} stale={!current} />
            </div>
          )}
          {current && shown.warnings.length > 0 && (
            <ul aria-label="To be known of this state" className="mt-3 border-b font-serif text-note text-ink-2">
              {shown.warnings.map(({ code, message }) => (
                <li key={code + message} className="border-t py-1.5">
                  {message}
                </li>
              ))}
            </ul>
          )}
        </>
      )}
    </section>
  );
}
