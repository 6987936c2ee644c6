"use client";

import { LimitTable } from "@/components/verdict/limit-table";
import type { RecordContent } from "@/contracts/record-content";
import type { CaseRunView } from "@/contracts/views";
import { limitRows } from "./limit-rows";
import { useShowing } from "./use-showing";

/** The limits of one case in the units shown, and what the engine says about a line that is open. */
export function Limits({ recordCase, run }: { recordCase: RecordContent["cases"][number]; run: CaseRunView }) {
  const showing = useShowing();
  const lineOf = new Map(recordCase.limits.map(({ id, line }) => [id, line]));
  const notes = run.result.limits.filter(
    ({ note, id, verdict }) => note && (verdict !== "open" || id === "minimum-wall-temperature" || id === "time-to-target"),
  );
  return (
    <>
      <LimitTable caption={`Limits of case ${recordCase.letter}`} rows={limitRows(recordCase, run, showing)} />
      {notes.map(({ id, note }) => (
        <p key={id} className="pt-1.5 text-small text-ink-2">
          <b className="line-no">{lineOf.get(id)}</b> {note}
        </p>
      ))}
    </>
  );
}
