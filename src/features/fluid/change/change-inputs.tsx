"use client";

import type { ReactNode } from "react";
import { Button } from "@/components/button/button";
import { ChoiceField } from "@/components/line/choice-field";
import { equationTitles } from "@/contracts/equation-titles";
import { equationIds } from "@/engine/cases/fluid-spec";
import { StateFields } from "../state/state-fields";
import type { ChangeInput } from "./change-input";
import { CompositionEditor } from "./composition-editor";

const interactions = [
  { value: "library", label: "Published values, where there are any" },
  { value: "none", label: "None, all zero" },
];

/** What a change of state rests on: composition, equation, two states. */
export function ChangeInputs({ input, setInput }: { input: ChangeInput; setInput: (input: ChangeInput) => void }) {
  const set = (part: Partial<ChangeInput>) => setInput({ ...input, ...part });
  return (
    <>
      <section aria-label="Fluid">
        <h2 className="mb-1">Fluid</h2>
        <CompositionEditor rows={input.rows} normalised={input.normalised} onChange={set} />
        <div className="mt-4 grid grid-cols-[repeat(auto-fit,minmax(min(100%,280px),1fr))] gap-x-5 gap-y-3">
          <Choice id="equation" label="Equation of state">
            <ChoiceField
              id="equation"
              value={input.equation}
              options={equationIds.map((value) => ({ value, label: equationTitles[value] }))}
              onValueChange={(chosen) => set({ equation: equationIds.find((id) => id === chosen) ?? input.equation })}
            />
          </Choice>
          <Choice id="interaction" label="Binary interaction">
            <ChoiceField
              id="interaction"
              value={input.interaction}
              options={interactions}
              onValueChange={(chosen) => set({ interaction: chosen === "none" ? "none" : "library" })}
            />
          </Choice>
        </div>
      </section>
      <section aria-label="Two states" className="mt-8">
        <div className="mb-2 flex flex-wrap items-baseline justify-between gap-3">
          <h2>Two states</h2>
          <Button kind="quiet" onClick={() => set({ from: input.to, to: input.from })}>
            Swap the ends
          </Button>
        </div>
        <div className="grid grid-cols-2 gap-9 rail:grid-cols-1 rail:gap-5">
          <div className="border-t-1.5 border-ink pt-2">
            <h3 className="mb-2">From</h3>
            <StateFields of="from" state={input.from} onChange={(from) => set({ from })} />
          </div>
          <div className="border-t-1.5 border-ink pt-2">
            <h3 className="mb-2">To</h3>
            <StateFields of="to" state={input.to} onChange={(to) => set({ to })} />
          </div>
        </div>
      </section>
    </>
  );
}

function Choice({ id, label, children }: { id: string; label: string; children: ReactNode }) {
  return (
    <div className="min-w-0">
      <label htmlFor={id} className="mb-[5px] block font-medium">
        {label}
      </label>
      {children}
    </div>
  );
}
