"use client";

import { useMemo } from "react";
import { useShown } from "@/components/quantity/quantity";
import { EbbThumb } from "@/components/verdict/ebb-thumb";
import { VerdictWord } from "@/components/verdict/verdict-word";
import { ebbOf } from "@/contracts/ebb";
import { useDraft } from "../form/draft-context";
import { useForerunState } from "./forerun-context";
import { governingFigure } from "./governing";

/** The Forerun on phones: ebb, verdict and governing figure at the foot of the screen. It opens upwards. */
export function ForerunBar({ controls, open, onToggle }: { controls: string; open: boolean; onToggle: () => void }) {
  const { made } = useDraft();
  const { result, document, running, problem } = useForerunState();
  const shown = useShown();
  const ebb = useMemo(() => (result && document ? ebbOf(document, result) : null), [result, document]);
  const inTheWay = made.problems.length + made.missing.length;
  const governing = result && governingFigure(result, shown);
  const note = inTheWay > 0 ? waiting(made.problems.length, made.missing.length) : running ? "running…" : problem;

  return (
    <div className="grid min-h-[58px] grid-cols-[88px_minmax(0,1fr)_44px] items-center gap-3 border-t-1.5 border-ink bg-tint py-[7px] pl-3.5 pr-1">
      <EbbThumb ebb={ebb} width={88} height={40} />
      <span className="min-w-0">
        {result && governing ? (
          <>
            <VerdictWord verdict={result.verdict} /> <b>{governing.figure}</b>
            <span className="block text-label text-ink-3">{note ?? governing.words}</span>
          </>
        ) : (
          <>
            <b>Forerun</b>
            <span className="block text-label text-ink-3">{note ?? "not started"}</span>
          </>
        )}
      </span>
      <button
        type="button"
        aria-expanded={open}
        aria-controls={controls}
        aria-label={open ? "Close the Forerun" : "Open the Forerun"}
        onClick={onToggle}
        className="grid h-11 w-11 place-items-center"
      >
        <svg width="18" height="12" viewBox="0 0 18 12" aria-hidden="true" className={open ? "rotate-180" : ""}>
          <path d="M1 10.5L9 2l8 8.5" fill="none" stroke="currentColor" strokeWidth="2" />
        </svg>
      </button>
    </div>
  );
}

const waiting = (toFix: number, missing: number): string =>
  toFix > 0
    ? `${toFix} ${toFix === 1 ? "line" : "lines"} to fix`
    : `${missing} ${missing === 1 ? "line is" : "lines are"} missing`;
