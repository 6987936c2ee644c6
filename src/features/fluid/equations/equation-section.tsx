"use client";

import { Notice } from "@/components/caution/notice";
import { WaitingLines } from "@/components/states/waiting";
import type { FluidSpec } from "@/engine/cases/fluid-spec";
import type { StatePoint } from "@/engine/cases/path-case";
import { useFluidAnswer } from "../engine/fluid-engine";
import { EquationTable } from "./equation-table";

/** All equations at the state in hand. */
export function EquationSection({ fluid, point }: { fluid: FluidSpec; point: StatePoint | undefined }) {
  const { value, current, problem } = useFluidAnswer<"equations">(point && { kind: "equations", fluid, point });
  return (
    <section aria-label="Equations of state side by side" className="mt-8">
      <h2 className="mb-1">Equations of state side by side</h2>
      <p className="pb-2 font-serif text-note text-ink-2">
        The same composition at the same state. Departure: real fluid less ideal gas at the same temperature and pressure.
      </p>
      {problem && (
        <Notice tone="error" title="Not compared.">
          {problem}
        </Notice>
      )}
      {!problem && value && <EquationTable entries={value} inUse={fluid.equation} stale={!current} />}
      {!problem && !value && <WaitingLines lines={7} label="Comparing the equations" />}
    </section>
  );
}
