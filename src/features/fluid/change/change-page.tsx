"use client";

import { useMemo } from "react";
import { MarginHead, MarginNote } from "@/components/shell/margin";
import { PageHead } from "@/components/shell/page-head";
import { SheetWithMargin } from "@/components/shell/sheet";
import { WaitingLines } from "@/components/states/waiting";
import { useUnits } from "@/components/units/units-provider";
import { FluidEngine, useFluidAnswer } from "../engine/fluid-engine";
import { useKept } from "../keep/use-kept";
import { WarningNotes } from "../sheet/warning-notes";
import { Answers } from "./answers";
import { ChangeActions } from "./change-actions";
import { caseOfInput, changeFromText, changeToText, emptyChange, type ChangeInput } from "./change-input";
import { ChangeInputs } from "./change-inputs";

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
  const current = change.current ? change.value : null;

  return (
    <SheetWithMargin
      margin={
        <>
          <MarginHead>Gauge pressures</MarginHead>
          <MarginNote>Measured here from 1.01325 bar(a), not from the barometer of a site.</MarginNote>
          <WarningNotes title="To be known of these states" warnings={current?.result.warnings ?? []} />
        </>
      }
    >
      <PageHead title="Change of state">
        {input && <ChangeActions document={document} change={current} onClear={() => setInput(emptyChange(system))} />}
      </PageHead>
      {input ? (
        <>
          <ChangeInputs input={input} setInput={setInput} />
          <Answers {...{ input, document, change, changes }} />
        </>
      ) : (
        <WaitingLines lines={8} />
      )}
    </SheetWithMargin>
  );
}
