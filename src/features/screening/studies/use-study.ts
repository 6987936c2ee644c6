"use client";

import { useCallback, useEffect, useRef, useState } from "react";
import type { Outcome, StudyCase, StudyResult } from "@/engine/cases/study-case";
import { startStudyWorker, troubleOf, type StudyWorker } from "./study-worker";

export type StudyState = {
  running: boolean;
  done: number;
  runs: number;
  /** Of all runs, or of those that were done when it was cancelled. */
  result: StudyResult | null;
  cancelled: boolean;
  problem: string | null;
  seconds: number | null;
};

const idle: StudyState = { running: false, done: 0, runs: 0, result: null, cancelled: false, problem: null, seconds: null };
/** Parts are small, so that cancelling loses little and progress moves. */
const partsPerWorker = 20;

/** Runs a study in workers of its own, shared out in parts. Cancelling keeps what is done. */
export function useStudy(): { state: StudyState; start: (study: StudyCase) => void; cancel: () => void } {
  const [state, setState] = useState(idle);
  const stop = useRef<(keep: boolean) => void>(undefined);

  useEffect(() => () => stop.current?.(false), []);

  const start = useCallback((study: StudyCase) => {
    stop.current?.(false);
    const began = performance.now();
    const outcomes: Outcome[] = [];
    let live = true;
    const first = startStudyWorker();
    const workers: StudyWorker[] = [first];
    const end = () => workers.forEach((worker) => worker.end());
    const settle = (change: Partial<StudyState>) => {
      if (!live) return;
      live = false;
      end();
      setState((before) => ({ ...before, running: false, seconds: (performance.now() - began) / 1000, ...change }));
    };
    const assemble = async (worker: StudyWorker, cancelled: boolean) => {
      const answer = await worker.ask({ work: "assemble", document: study, outcomes });
      const result = answer.type === "result" && answer.result.kind === "study" ? answer.result : null;
      settle({ result, cancelled, problem: troubleOf(answer) ?? null });
      worker.end();
    };

    setState({ ...idle, running: true });
    stop.current = (keep) => {
      end();
      // The unvaried run is the first; without it there is nothing to put together.
      if (!live || !keep || !outcomes.some(({ index }) => index === 0)) settle({ cancelled: true });
      else void assemble(startStudyWorker(), true);
    };

    void (async () => {
      const counted = await first.ask({ work: "count", document: study });
      if (!live) return;
      if (counted.type !== "runs") {
        settle({ problem: troubleOf(counted) ?? "This study has no runs." });
        return;
      }
      const { runs } = counted;
      setState((before) => ({ ...before, runs }));
      if (runs > 4 && (navigator.hardwareConcurrency ?? 1) > 1) workers.push(startStudyWorker());
      const size = Math.max(1, Math.ceil(runs / (workers.length * partsPerWorker)));
      let next = 0;
      const lane = async (worker: StudyWorker): Promise<string | undefined> => {
        while (live && next < runs) {
          const from = next;
          next += size;
          const answer = await worker.ask({ work: "part", document: study, from, to: Math.min(from + size, runs) });
          if (!live) return undefined;
          if (answer.type !== "outcomes") return troubleOf(answer) ?? "A part of the study gave no answer.";
          outcomes.push(...answer.outcomes);
          setState((before) => ({ ...before, done: outcomes.length }));
        }
        return undefined;
      };
      const trouble = (await Promise.all(workers.map(lane))).find((one) => one !== undefined);
      if (!live) return;
      if (trouble) settle({ problem: trouble });
      else await assemble(first, false);
    })();
  }, []);

  const cancel = useCallback(() => stop.current?.(true), []);
  return { state, start, cancel };
}
