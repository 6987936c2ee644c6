/** Settled: a double rule, as everything settled has. To fix and without source carry the signs of an error and of an assumption. */
export type PartState = "settled" | "to-fix" | "without-source" | "started" | "untouched";

/** Sign of a part's state; the note beside it says the same in words. */
export function PartSign({ state }: { state: PartState }) {
  return (
    <svg width="14" height="14" viewBox="0 0 14 14" aria-hidden="true" fill="none">
      {state === "settled" && <path d="M1 11.5h12M1 8h12" className="stroke-ink-2" strokeWidth="1.8" />}
      {state === "started" && <path d="M1 11.5h12" className="stroke-ink-2" strokeWidth="1.8" />}
      {state === "untouched" && <path d="M1 11.5h12" className="stroke-rule-2" strokeWidth="1.8" strokeDasharray="2 2" />}
      {state === "to-fix" && (
        <g className="stroke-beyond">
          <path d="M7 1l6 11H1z" strokeWidth="1.7" />
          <path d="M7 5v3.6M7 10v1" strokeWidth="1.5" />
        </g>
      )}
      {state === "without-source" && <path d="M7 1.2L12.8 7 7 12.8 1.2 7z" className="stroke-near" strokeWidth="1.7" />}
    </svg>
  );
}
