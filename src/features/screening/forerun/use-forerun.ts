"use client";

import { useEffect, useRef, useState } from "react";
import type { BlowdownCase } from "@/engine/cases/blowdown-case";
import type { BlowdownResult, Verdict } from "@/engine/cases/blowdown-result";
import type { PreviewAnswer, PreviewRequest } from "@/workers/browser";

/** A pause short enough that curves follow the typing, long enough that a figure is finished. */
const restMs = 250;
/** A run that takes longer is given up, so that one case can't hold the form. */
const patienceMs = 20_000;
/** A worker that has just been started fetches the engine first, which may take long on a slow line. */
const loadingMs = 40_000;
/** How long an older run may stand in the way of the newest one. Starting a worker anew costs less than that. */
const inTheWayMs = 1_000;

export type ForerunState = {
  /** The newest answer; kept, greyed, while the lines can't be computed. */
  result: BlowdownResult | null;
  /** The case that `result` answers. */
  document: BlowdownCase | null;
  /** Letter of the case that `result` is of, and the verdict of each case that has been run. */
  letter: string | null;
  verdicts: Readonly<Record<string, Verdict>>;
  /** The answer before the last edit, for the ghost. */
  before: BlowdownResult | null;
  running: boolean;
  /** Why there is no answer for the lines as they stand, and the path of the case it concerns. */
  problem: string | null;
  problemPath: string | null;
  seconds: number | null;
};

const nothing: ForerunState = {
  result: null,
  document: null,
  letter: null,
  verdicts: {},
  before: null,
  running: false,
  problem: null,
  problemPath: null,
  seconds: null,
};

/** Runs the case in the browser's own worker after every change: latest wins, nothing is stored. */
export function useForerun(document: BlowdownCase | undefined, letter: string): ForerunState {
  const [state, setState] = useState(nothing);
  const worker = useRef<Worker>(undefined);
  const newest = useRef(0);
  const busySince = useRef<number>(undefined);
  // A title moves no curve, so typing one starts no run.
  const text = document ? JSON.stringify({ ...document, title: undefined }) : undefined;

  useEffect(() => () => stop(worker, busySince), []);

  useEffect(() => {
    const id = (newest.current += 1);
    if (text === undefined) {
      // The answer on show no longer belongs to the lines: said at once, without waiting for a run.
      // eslint-disable-next-line react-hooks/set-state-in-effect
      setState((before) =>
        before.running || before.problem ? { ...before, running: false, problem: null, problemPath: null } : before,
      );
      return;
    }
    let patience: ReturnType<typeof setTimeout>;
    const giveUp = (problem: string) => {
      stop(worker, busySince);
      setState((before) => ({ ...before, running: false, problem, problemPath: null }));
    };
    const rest = setTimeout(() => {
      const started = performance.now();
      // A run can't be broken off from outside; one that is in the way for long is ended with its worker.
      if (busySince.current !== undefined && started - busySince.current > inTheWayMs) stop(worker, busySince);
      const asked = JSON.parse(text) as BlowdownCase; // written from a case above
      const loading = worker.current === undefined ? loadingMs : 0;
      worker.current ??= new Worker(new URL("../../../workers/browser.ts", import.meta.url), { type: "module" });
      worker.current.onerror = () =>
        giveUp("The preview could not be started in this browser. Compute in full works without it.");
      worker.current.onmessage = ({ data }: MessageEvent<PreviewAnswer>) => {
        if (data.type === "progress" || data.type === "replaced") return;
        busySince.current = data.id === newest.current ? undefined : performance.now();
        if (data.id !== newest.current) return;
        clearTimeout(patience);
        const seconds = (performance.now() - started) / 1000;
        setState((before) => answered(before, data, { document: asked, letter }, seconds));
      };
      busySince.current ??= started;
      setState((before) => ({ ...before, running: true }));
      const tooLong = () => giveUp("The preview takes too long for this case. Compute in full to see it.");
      patience = setTimeout(tooLong, patienceMs + loading);
      worker.current.postMessage({ id, document: asked, coarse: true } satisfies PreviewRequest);
    }, restMs);
    return () => {
      clearTimeout(rest);
      clearTimeout(patience);
    };
  }, [text, letter]);

  return state;
}

type Box<T> = { current: T | undefined };

function stop(worker: Box<Worker>, busySince: Box<number>): void {
  worker.current?.terminate();
  worker.current = undefined;
  busySince.current = undefined;
}

function answered(
  before: ForerunState,
  answer: PreviewAnswer,
  { document, letter }: { document: BlowdownCase; letter: string },
  seconds: number,
): ForerunState {
  if (answer.type === "result" && answer.result.kind === "blowdown") {
    return {
      result: answer.result,
      document,
      letter,
      verdicts: { ...before.verdicts, [letter]: answer.result.verdict },
      // Another case's curve is no ghost of this one.
      before: before.letter === letter ? before.result : null,
      running: false,
      problem: null,
      problemPath: null,
      seconds,
    };
  }
  if (answer.type === "refused") {
    const { error } = answer;
    return {
      ...before,
      running: false,
      problem: error.problems.map(({ message }) => message).join(" ") || "The case can't be computed.",
      problemPath: error.problems[0]?.path || null,
      seconds,
    };
  }
  return {
    ...before,
    running: false,
    problem: answer.type === "failed" ? answer.message : "The preview gave no answer.",
    problemPath: null,
    seconds,
  };
}
