"use client";

import Link from "next/link";
import { useMemo, type ReactNode } from "react";
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
import { EquationSection } from "../equations/equation-section";
import { stateFromText, stateToText } from "../keep/state-text";
import { useKept } from "../keep/use-kept";
import { StateSection } from "../state/state-section";
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
          <WarningNotes title="To be known of the start" warnings={start ? (atStart.value?.warnings ?? []) : []} />
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
      {fluid && typed !== null && <Computed {...{ fluid, start, path, pathIsOlder, envelope, typed }} onType={setTyped} />}
    </SheetWithMargin>
  );
}

type ComputedProps = Pick<FluidOfScreening, "start" | "path" | "pathIsOlder"> & {
  fluid: FluidSpec;
  envelope: ReturnType<typeof useEnvelope>;
  typed: TypedState;
  onType: (state: TypedState) => void;
};

function Computed({ fluid, start, path, pathIsOlder, envelope, typed, onType }: ComputedProps) {
  const { barometricPressurePa } = useUnits();
  const point = useMemo(() => readState(typed, barometricPressurePa), [typed, barometricPressurePa]);
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
      <StateSection {...{ fluid, point, typed, onType }} />
      <EquationSection {...{ fluid, point }} />
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
