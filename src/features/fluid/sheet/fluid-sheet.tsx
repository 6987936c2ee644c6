"use client";

import Link from "next/link";
import { useMemo, useState, type ReactNode } from "react";
import { ButtonLink } from "@/components/button/button-link";
import { Notice } from "@/components/caution/notice";
import { MarginHead, MarginNote } from "@/components/shell/margin";
import { PageHead } from "@/components/shell/page-head";
import { SheetWithMargin } from "@/components/shell/sheet";
import { WaitingLines } from "@/components/states/waiting";
import { useUnits } from "@/components/units/units-provider";
import type { FluidSpec } from "@/engine/cases/fluid-spec";
import { FluidDiagram, isPure, useEnvelope } from "../diagram/fluid-diagram";
import { FluidEngine, useFluidAnswer } from "../engine/fluid-engine";
import { EquationTable } from "../equations/equation-table";
import { stateFromText, stateToText } from "../keep/state-text";
import { useKept } from "../keep/use-kept";
import { BasisSwitch, type Basis } from "../state/basis-switch";
import { PhaseComposition } from "../state/phase-composition";
import { stateWords } from "../state/phase-words";
import { PropertyTable } from "../state/property-table";
import { StateFields } from "../state/state-fields";
import { readState, typedState, type TypedState } from "../state/typed";
import type { FluidOfScreening } from "./fluid-of-screening";
import { ReportedComposition } from "./reported-composition";
import { WarningNotes } from "./warning-notes";
import { WhatItIs } from "./what-it-is";

type Props = {
  titleBlock: ReactNode;
  subject: FluidOfScreening;
  /** Words for the equation in use. */
  equationTitle: string;
  /** Address of the lines, for whoever may change them. */
  edits?: string | undefined;
  /** Address of the change of state of this fluid. */
  changeHref?: string | undefined;
};

/** The fluid of a screening: what it is made of, where its phases lie, its properties at a state, and what other equations say. */
export function FluidSheet(props: Props) {
  return (
    <FluidEngine>
      <FluidPage {...props} />
    </FluidEngine>
  );
}

/** Where a fluid without a start is looked at first. */
const ambient = { temperatureK: 288.15, pressurePa: 101_325 };
const stateCodec = {
  encode: (state: TypedState) => encodeURIComponent(stateToText(state)),
  decode: (text: string) => stateFromText(decodeText(text)),
};

function decodeText(text: string): string {
  try {
    return decodeURIComponent(text);
  } catch {
    return "";
  }
}

function FluidPage({ titleBlock, subject, equationTitle, edits, changeHref }: Props) {
  const { system } = useUnits();
  const { fluid, start, path, pathIsOlder } = subject;
  const [typed, setTyped] = useKept<TypedState>(stateCodec, () => typedState(start ?? ambient, system));
  const envelope = useEnvelope(fluid);
  const atStart = useFluidAnswer<"state">(fluid && { kind: "state", fluid, point: start ?? ambient });

  return (
    <SheetWithMargin
      titleBlock={titleBlock}
      margin={
        <>
          <WhatItIs
            atStart={atStart.value}
            start={start}
            envelope={envelope.current ? envelope.value : null}
            pure={isPure(fluid)}
          />
          <MarginHead>Equation in use</MarginHead>
          <MarginNote no="3.02">{equationTitle}.</MarginNote>
          <MarginNote no="3.03">
            {fluid?.interaction === "none"
              ? "Binary interaction: none, all zero."
              : "Binary interaction: published values, where there are any."}
          </MarginNote>
          <WarningNotes warnings={atStart.value?.warnings ?? []} />
        </>
      }
    >
      <PageHead title="Fluid">
        {edits && <ButtonLink href={edits}>Change the composition</ButtonLink>}
        {changeHref && <ButtonLink href={changeHref}>Change of state</ButtonLink>}
      </PageHead>
      <section aria-label="Composition">
        <h2 className="mb-1">Composition</h2>
        {subject.rows.length > 0 ? (
          <ReportedComposition rows={subject.rows} sum={subject.sum} source={subject.source} />
        ) : (
          <p className="border-t py-3.5 font-serif text-prose text-ink-2">
            There is no component yet. {edits && <Link href={edits}>Add them in part 3, Fluid.</Link>}
          </p>
        )}
      </section>
      {!fluid && subject.rows.length > 0 && (
        <div className="mt-4">
          <Notice tone="caution" title="Nothing is computed.">
            The composition can’t be used as it stands: a figure is missing, or the sum is too far from 100.{" "}
            {edits && <Link href={edits}>Settle line 3.01.</Link>}
          </Notice>
        </div>
      )}
      {fluid && typed === null && <WaitingLines lines={6} />}
      {fluid && typed !== null && <Computed {...{ fluid, start, path, pathIsOlder, envelope, typed, setTyped }} />}
    </SheetWithMargin>
  );
}

type ComputedProps = Pick<FluidOfScreening, "start" | "path" | "pathIsOlder"> & {
  fluid: FluidSpec;
  envelope: ReturnType<typeof useEnvelope>;
  typed: TypedState;
  setTyped: (state: TypedState) => void;
};

function Computed({ fluid, start, path, pathIsOlder, envelope, typed, setTyped }: ComputedProps) {
  const { barometricPressurePa } = useUnits();
  const [basis, setBasis] = useState<Basis>("mole");
  const point = useMemo(() => readState(typed, barometricPressurePa), [typed, barometricPressurePa]);
  const state = useFluidAnswer<"state">(point && { kind: "state", fluid, point });
  const equations = useFluidAnswer<"equations">(point && { kind: "equations", fluid, point });

  return (
    <>
      <section aria-label="Phase diagram" className="mt-8">
        <FluidDiagram
          {...{ fluid, start, path, envelope }}
          state={point}
          caption={
            <>
              <b>Phase diagram.</b> {captionOf(start !== undefined, path !== undefined, pathIsOlder)}
            </>
          }
        />
      </section>
      <section aria-label="Properties at a state" className="mt-8">
        <div className="mb-3 flex flex-wrap items-end justify-between gap-x-5 gap-y-3">
          <h2>Properties at a state</h2>
          <BasisSwitch basis={basis} onChange={setBasis} />
        </div>
        <div className="max-w-[480px]">
          <StateFields of="state" state={typed} onChange={setTyped} />
        </div>
        {state.problem ? (
          <div className="mt-3">
            <Notice tone="error" title="No state.">
              {state.problem}
            </Notice>
          </div>
        ) : state.value ? (
          <>
            <p role="status" className="py-3 font-serif text-prose">
              {state.current ? `${stateWords(state.value)}.` : point ? "\u00a0" : "Type pressure and temperature."}
            </p>
            <PropertyTable state={state.value} basis={basis} stale={!state.current} />
            <p className="pt-1.5 text-label text-ink-3">
              Zero of energies and entropy: each component as ideal gas at 25 °C and 1 bar(a). Viscosity and conductivity within
              about 10 %.
            </p>
            {state.value.phases.length > 1 && (
              <div className="mt-5">
                <h3>What the phases are made of</h3>
                <PhaseComposition state={state.value} stale={!state.current} />
              </div>
            )}
          </>
        ) : (
          <WaitingLines lines={5} label="Computing the state" />
        )}
        {state.current && state.value && state.value.warnings.length > 0 && (
          <ul className="pt-2 font-serif text-note text-ink-2">
            {state.value.warnings.map(({ code, message }) => (
              <li key={code + message} className="border-t py-1.5">
                {message}
              </li>
            ))}
          </ul>
        )}
      </section>
      <section aria-label="Equations of state side by side" className="mt-8">
        <h2 className="mb-1">Equations of state side by side</h2>
        <p className="pb-2 font-serif text-note text-ink-2">
          The same composition at the same state. Departure: real fluid less ideal gas at the same temperature and pressure.
        </p>
        {equations.problem ? (
          <Notice tone="error" title="Not compared.">
            {equations.problem}
          </Notice>
        ) : equations.value ? (
          <EquationTable entries={equations.value} inUse={fluid.equation} stale={!equations.current} />
        ) : (
          <WaitingLines lines={7} label="Comparing the equations" />
        )}
      </section>
    </>
  );
}

function captionOf(hasStart: boolean, hasPath: boolean, older: boolean): string {
  if (!hasStart) return "Bubble and dew line of the composition as used.";
  if (!hasPath) return "The start is marked; the path of the blowdown follows once it is computed.";
  return older
    ? "The path is that of the last full run, made before the lines were changed."
    : "The path is that of the fluid in the last full run.";
}
