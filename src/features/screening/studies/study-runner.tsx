"use client";

import type { ReactNode } from "react";
import { Button } from "@/components/button/button";
import { Notice } from "@/components/caution/notice";
import { formatNumber } from "@/components/quantity/format";
import type { StudyCase } from "@/engine/cases/study-case";
import type { StudyState } from "./use-study";

/** Button, progress and cancel of one study. Cancelling keeps what is done, and says so. */
export function StudyRunner({
  study,
  label,
  state,
  start,
  cancel,
  children,
}: {
  study: StudyCase;
  label: string;
  state: StudyState;
  start: (study: StudyCase) => void;
  cancel: () => void;
  children?: ReactNode;
}) {
  const { running, done, runs, result, cancelled, problem, seconds } = state;
  return (
    <div className="grid gap-2 pb-4 print:hidden">
      <div className="flex flex-wrap items-end gap-4">
        {!running && (
          <>
            {children}
            <Button onClick={() => start(study)}>{result ? `${label} again` : label}</Button>
          </>
        )}
        {running && (
          <>
            <span className="grid gap-1">
              <progress
                max={Math.max(runs, 1)}
                value={done}
                aria-label={label}
                className="h-2.5 w-[320px] max-w-full accent-tide"
              />
              <span role="status" className="text-small text-ink-3">
                {runs === 0 ? "beginning…" : `${done} of ${runs} runs`}
              </span>
            </span>
            <Button onClick={cancel}>Cancel the study</Button>
          </>
        )}
      </div>
      {!running && result && (
        <p className="text-small text-ink-3">
          {cancelled ? `Cancelled: put together from the ${done} of ${runs} runs that were done. ` : `${runs} runs. `}
          {seconds !== null && `${formatNumber(seconds, { decimals: 1 })} s in this browser; not part of the record.`}
        </p>
      )}
      {!running && cancelled && !result && <p className="text-small text-ink-3">Cancelled before the first run was done.</p>}
      {problem && (
        <Notice tone="error" title="The study stopped.">
          {problem}
        </Notice>
      )}
    </div>
  );
}
