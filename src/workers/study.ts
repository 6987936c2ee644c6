/**
 * The browser's engine for studies and the window of bores: runs that take longer than a preview, in workers of their own, so that typing never
 * waits for them. Nothing computed here is stored.
 *
 * asks      StudyRequest, one at a time
 * answers   StudyAnswer with the id of the request
 *
 * A run cannot be broken off from outside: an owner that will not wait terminates the worker. What other parts have left can still be put
 * together.
 */
import type { Outcome } from "@/engine/cases/study-case";
import type { EngineResult } from "@/engine/run-case";
import { assembleStudyParts, countStudyRuns, runDocument, runStudyPart, type ErrorDocument } from "./engine-entry";

export type StudyRequest = { id: number; document: unknown } & (
  | { work: "whole" }
  | { work: "count" }
  | { work: "part"; from: number; to: number }
  | { work: "assemble"; outcomes: readonly Outcome[] }
);
export type StudyAnswer =
  | { type: "progress"; id: number; part: number }
  | { type: "runs"; id: number; runs: number }
  | { type: "outcomes"; id: number; outcomes: Outcome[] }
  | { type: "result"; id: number; result: EngineResult }
  | { type: "refused"; id: number; error: ErrorDocument }
  | { type: "failed"; id: number; message: string };

const context = { engineVersion: "preview", now: () => performance.now() };

const say = (answer: StudyAnswer): void => self.postMessage(answer);

self.addEventListener("message", ({ data }: MessageEvent<StudyRequest>) => {
  try {
    say(answerTo(data));
  } catch (error) {
    say({ type: "failed", id: data.id, message: error instanceof Error ? error.message : String(error) });
  }
});

function answerTo(request: StudyRequest): StudyAnswer {
  const { id, document } = request;
  switch (request.work) {
    case "whole": {
      const outcome = runDocument(document, { ...context, onProgress: (part) => say({ type: "progress", id, part }) });
      return outcome.status === 0
        ? { type: "result", id, result: outcome.result }
        : { type: "refused", id, error: outcome.error };
    }
    case "count": {
      const counted = countStudyRuns(document);
      return counted.status === 0 ? { type: "runs", id, runs: counted.runs } : { type: "refused", id, error: counted.error };
    }
    case "part": {
      const done = runStudyPart(document, request, context);
      return done.status === 0 ? { type: "outcomes", id, outcomes: done.outcomes } : { type: "refused", id, error: done.error };
    }
    case "assemble": {
      const outcome = assembleStudyParts(document, request.outcomes, context);
      return outcome.status === 0
        ? { type: "result", id, result: outcome.result }
        : { type: "refused", id, error: outcome.error };
    }
  }
}
