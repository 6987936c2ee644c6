"use client";

import { Notice } from "@/components/caution/notice";
import { WaitingLines } from "@/components/states/waiting";
import type { PathCase } from "@/engine/cases/path-case";
import type { FluidAnswered } from "../engine/fluid-engine";
import { ChangeEquations } from "./change-equations";
import { compositionProblem, type ChangeInput } from "./change-input";
import { EndsTable } from "./ends-table";
import { Steps } from "./steps";
import { Totals } from "./totals";

type AnswersProps = {
  input: ChangeInput;
  document: PathCase | undefined;
  change: FluidAnswered<"change">;
  changes: FluidAnswered<"changes">;
};

/** The change as far as it is computed, or what it waits for. */
export function Answers({ input, document, change, changes }: AnswersProps) {
  if (!document && !change.value) {
    return (
      <p className="mt-6 border-t py-3.5 font-serif text-prose text-ink-2">
        {compositionProblem(input) ?? "Type pressure and temperature of both states."}
      </p>
    );
  }
  const waits = document ? undefined : (compositionProblem(input) ?? "Type pressure and temperature of both states.");
  const stale = !change.current;
  return (
    <>
      <section aria-label="Change" className="mt-8">
        {waits && (
          <Notice tone="caution" title="These figures belong to what stood before.">
            {waits}
          </Notice>
        )}
        {change.problem && (
          <Notice tone="error" title="Not computed.">
            {change.problem}
          </Notice>
        )}
        {change.value && !change.problem && (
          <>
            <Totals change={change.value} stale={stale} />
            <div className="mt-6">
              <Steps result={change.value.result} stale={stale} />
            </div>
            <h2 className="mb-1 mt-8">The two states</h2>
            <EndsTable from={change.value.from} to={change.value.to} stale={stale} />
          </>
        )}
        {!change.value && !change.problem && <WaitingLines lines={6} label="Computing the change" />}
      </section>
      <section aria-label="Equations of state side by side" className="mt-8">
        <h2 className="mb-1">Equations of state side by side</h2>
        {changes.problem ? (
          <Notice tone="error" title="Not compared.">
            {changes.problem}
          </Notice>
        ) : changes.value ? (
          <ChangeEquations entries={changes.value} inUse={input.equation} stale={!changes.current} />
        ) : (
          <WaitingLines lines={7} label="Comparing the equations" />
        )}
      </section>
    </>
  );
}
