"use client";

import { useMemo } from "react";
import { Button } from "@/components/button/button";
import { Notice } from "@/components/caution/notice";
import { ChoiceField } from "@/components/line/choice-field";
import { MarginHead, MarginNote } from "@/components/shell/margin";
import { PageHead } from "@/components/shell/page-head";
import { SheetWithMargin } from "@/components/shell/sheet";
import { WaitingLines } from "@/components/states/waiting";
import { useShown } from "@/components/quantity/quantity";
import { useUnits } from "@/components/units/units-provider";
import { equationTitles } from "@/contracts/equation-titles";
import { equationIds } from "@/engine/cases/fluid-spec";
import type { PathCase } from "@/engine/cases/path-case";
import { FluidEngine, useFluidAnswer } from "../engine/fluid-engine";
import { useKept } from "../keep/use-kept";
import { WarningNotes } from "../sheet/warning-notes";
import { StateFields } from "../state/state-fields";
import { ChangeActions } from "./change-actions";
import { ChangeEquations } from "./change-equations";
import { caseOfInput, changeFromText, changeToText, compositionProblem, emptyChange, type ChangeInput } from "./change-input";
import { CompositionEditor } from "./composition-editor";
import { EndsTable } from "./ends-table";
import { Steps } from "./steps";
import { properties } from "./step-words";

const codec = { encode: changeToText, decode: changeFromText };

/**
 * A calculator: two states in, and each step of the change between them by every equation. What is typed stays in the address and in this
 * browser's store.
 *
 * store   key of the store, one a person
 */
export function ChangePage({ store }: { store: string }) {
  return (
    <FluidEngine>
      <Calculator store={store} />
    </FluidEngine>
  );
}

function Calculator({ store }: { store: string }) {
  const { system, barometricPressurePa } = useUnits();
  const [input, setInput] = useKept<ChangeInput>(codec, () => emptyChange(system), store);
  const document = useMemo(() => (input ? caseOfInput(input, barometricPressurePa) : undefined), [input, barometricPressurePa]);
  const change = useFluidAnswer<"change">(document && { kind: "change", document });
  const changes = useFluidAnswer<"changes">(document && { kind: "changes", document });
  const result = change.current ? change.value?.result : undefined;

  return (
    <SheetWithMargin
      margin={
        <>
          <MarginHead>Gauge pressures</MarginHead>
          <MarginNote>Measured here from 1.01325 bar(a), not from the barometer of a site.</MarginNote>
          <WarningNotes warnings={result?.warnings ?? []} />
        </>
      }
    >
      <PageHead title="Change of state">
        {input && <ChangeActions document={document} result={result} onClear={() => setInput(emptyChange(system))} />}
      </PageHead>
      {input ? (
        <>
          <Input input={input} setInput={setInput} />
          <Answers {...{ input, document, change, changes }} />
        </>
      ) : (
        <WaitingLines lines={8} />
      )}
    </SheetWithMargin>
  );
}

const interactions = [
  { value: "library", label: "Published values, where there are any" },
  { value: "none", label: "None, all zero" },
];

function Input({ input, setInput }: { input: ChangeInput; setInput: (input: ChangeInput) => void }) {
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

function Choice({ id, label, children }: { id: string; label: string; children: React.ReactNode }) {
  return (
    <div className="min-w-0">
      <label htmlFor={id} className="mb-[5px] block font-medium">
        {label}
      </label>
      {children}
    </div>
  );
}

type AnswersProps = {
  input: ChangeInput;
  document: PathCase | undefined;
  change: ReturnType<typeof useFluidAnswer<"change">>;
  changes: ReturnType<typeof useFluidAnswer<"changes">>;
};

function Answers({ input, document, change, changes }: AnswersProps) {
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
            <Totals value={change.value} stale={stale} />
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

/** The three changes in one line, per mole and, small beneath, per mass. */
function Totals({ value: { result, from }, stale }: { value: NonNullable<AnswersProps["change"]["value"]>; stale: boolean }) {
  const shown = useShown();
  const M = from.overall.molarMassKgPerMol;
  return (
    <dl aria-live="polite" className={`flex flex-wrap gap-x-10 gap-y-3 ${stale ? "text-ink-3" : ""}`}>
      {properties.map(({ key, name, symbol, quantity }) => (
        <div key={key}>
          <dt className="text-label text-ink-3">
            {name}, Δ{symbol}
          </dt>
          <dd className="whitespace-nowrap text-head font-semibold">
            {shown(quantity, result[key].total, { signed: true }).text}
            <span className="block text-small font-normal text-ink-3">
              {
                shown(quantity === "molarEnergy" ? "specificEnergy" : "specificHeat", result[key].total / M, { signed: true })
                  .text
              }
            </span>
          </dd>
        </div>
      ))}
    </dl>
  );
}
