"use client";

import { useEffect, useState } from "react";
import type { SizingCase, SizingResult } from "@/engine/cases/sizing-case";
import { startStudyWorker, troubleOf } from "./study-worker";

export type WindowState = { result: SizingResult | null; part: number; problem: string | null; running: boolean };

const idle: WindowState = { result: null, part: 0, problem: null, running: true };

/** Looks for the window of bores, once for each sizing case it is given. */
export function useWindow(sizing: SizingCase): WindowState {
  const text = JSON.stringify(sizing);
  const [state, setState] = useState({ text, ...idle });
  useEffect(() => {
    let live = true;
    const worker = startStudyWorker();
    void worker
      .ask({ work: "whole", document: JSON.parse(text) as unknown }, (part) => {
        if (live) setState((before) => ({ ...(before.text === text ? before : { text, ...idle }), part }));
      })
      .then((answer) => {
        if (!live) return;
        const result = answer.type === "result" && answer.result.kind === "sizing" ? answer.result : null;
        setState({ text, result, part: 1, problem: troubleOf(answer) ?? null, running: false });
        worker.end();
      });
    return () => {
      live = false;
      worker.end();
    };
  }, [text]);
  return state.text === text ? state : idle;
}
