"use client";

import { Formik, useFormikContext } from "formik";
import { useSearchParams } from "next/navigation";
import { useCallback, useEffect, useMemo, useState, type ReactNode } from "react";
import { SitePressure, useUnits } from "@/components/units/units-provider";
import { withInitials, type DraftDocument, type LineValue } from "@/contracts/draft";
import { deriveSi, siOf } from "@/contracts/derive-si";
import { caseFromDraft } from "@/contracts/draft-to-case";
import type { LineKey, QuantityLine } from "@/contracts/lines/line";
import { parseLineKey } from "@/contracts/lines/registry";
import type { DraftView } from "@/contracts/views";
import { ForerunProvider } from "../forerun/forerun-context";
import { DraftContext, type FormSubject } from "./draft-context";
import { lineErrors } from "./line-schema";
import { shownUnitOf } from "./shown-unit";
import { newTab } from "./tab-alive";
import { useJournal } from "./use-journal";
import { useKeeper } from "./use-keeper";

/** Holds the draft for all parts of the form, so that going from part to part loses nothing and runs nothing again. */
export function DraftProvider({ subject, start, children }: { subject: FormSubject; start: DraftView; children: ReactNode }) {
  return (
    <SitePressure barometricPressurePa={subject.site.barometricPressurePa}>
      <Formik<DraftDocument>
        initialValues={start.document}
        onSubmit={() => undefined}
        validateOnChange={false}
        validateOnBlur={false}
      >
        <Held subject={subject} start={start}>
          {children}
        </Held>
      </Formik>
    </SitePressure>
  );
}

const emptyValue: LineValue = { typed: "", unit: null, si: null, source: null };

function Held({ subject, start, children }: { subject: FormSubject; start: DraftView; children: ReactNode }) {
  const { values, setValues } = useFormikContext<DraftDocument>();
  // What is kept and compared is what people did; what is shown and computed has the registry's choices where nobody chose.
  const draft = useMemo(() => withInitials(values), [values]);
  const { system } = useUnits();
  const { site } = subject;
  const baro = site.barometricPressurePa;

  // Units chosen at single lines hold until the whole sheet is switched.
  const [chosen, setChosen] = useState<{ system: typeof system; units: Record<LineKey, string> }>({ system, units: {} });
  const units = chosen.system === system ? chosen.units : none;

  const replace = useCallback((document: DraftDocument) => void setValues(deriveSi(document, baro), false), [setValues, baro]);
  const [tab] = useState(newTab);
  const keeper = useKeeper(values, start, tab, replace);
  const journal = useJournal(start, tab, keeper.adopt);

  const setLine = useCallback(
    (key: LineKey, change: Partial<LineValue>) =>
      void setValues((before) => {
        const value = { ...(withInitials(before).lines[key] ?? emptyValue), ...change };
        const line = parseLineKey(key)?.line;
        return { ...before, lines: { ...before.lines, [key]: line ? { ...value, si: siOf(line, value, baro) } : value } };
      }, false),
    [setValues, baro],
  );
  const setComposition = useCallback(
    (change: Partial<DraftDocument["composition"]>) =>
      void setValues((before) => ({ ...before, composition: { ...before.composition, ...change } }), false),
    [setValues],
  );
  const unitOf = useCallback(
    (key: LineKey, line: QuantityLine) => shownUnitOf(line, draft.lines[key], system, units[key]),
    [draft.lines, system, units],
  );
  const chooseUnit = useCallback(
    (key: LineKey, unit: string) =>
      setChosen((before) => ({ system, units: { ...(before.system === system ? before.units : {}), [key]: unit } })),
    [system],
  );

  const errors = useMemo(() => lineErrors(draft, site, unitOf), [draft, site, unitOf]);
  const cases = useMemo(
    () => draft.cases.map((one) => ({ ...one, made: caseFromDraft(draft, one.letter, site) })),
    [draft, site],
  );
  const asked = useSearchParams().get("case");
  const inHand = cases.find(({ letter: one }) => one === asked) ?? cases[0];
  if (!inHand) throw new Error("a draft has no case");
  const { letter, made } = inHand;
  const setCases = useCallback(
    (change: (before: DraftDocument) => DraftDocument) => void setValues((before) => deriveSi(change(before), baro), false),
    [setValues, baro],
  );
  const editable = start.editable;

  const held = useMemo(
    () => ({
      subject,
      start,
      draft,
      editable,
      errors,
      letter,
      made,
      cases,
      keeper,
      setLine,
      setCases,
      setComposition,
      unitOf,
      chooseUnit,
    }),
    [subject, start, draft, editable, errors, letter, made, cases, keeper, setLine, setCases, setComposition, unitOf, chooseUnit],
  );

  // Text and figures that are not yet with the server are lost only if this page and the browser's store both go.
  useEffect(() => {
    if (keeper.keeping.state !== "not-kept" && keeper.keeping.state !== "conflict") return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", warn);
    return () => window.removeEventListener("beforeunload", warn);
  }, [keeper.keeping.state]);

  return (
    <DraftContext.Provider value={held}>
      {journal}
      <ForerunProvider>{children}</ForerunProvider>
    </DraftContext.Provider>
  );
}

const none: Record<LineKey, string> = {};
