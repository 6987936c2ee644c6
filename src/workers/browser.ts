/**
 * The browser's own engine, for the preview while typing. Nothing computed here is stored.
 *
 * asks      PreviewRequest; a newer one replaces every older one that has not begun (latest wins)
 * answers   PreviewAnswer with the id of the request; a replaced request is answered "replaced"
 *
 * A run cannot be broken off from outside: an owner that will not wait terminates the worker and starts another.
 */
import { runDocument, type ErrorDocument } from "./engine-entry";
import type { EngineResult } from "@/engine/run-case";

export type PreviewRequest = {
  id: number;
  document: unknown;
  /** A loose tolerance and a thinner series; the default. */ coarse?: boolean;
};
export type PreviewAnswer =
  | { type: "progress"; id: number; part: number }
  | { type: "result"; id: number; result: EngineResult }
  | { type: "refused"; id: number; error: ErrorDocument }
  | { type: "replaced"; id: number }
  | { type: "failed"; id: number; message: string };

let waiting: PreviewRequest | undefined;

const say = (answer: PreviewAnswer): void => self.postMessage(answer);

self.addEventListener("message", ({ data }: MessageEvent<PreviewRequest>) => {
  if (waiting) say({ type: "replaced", id: waiting.id });
  else setTimeout(runWaiting, 0);
  waiting = data;
});

function runWaiting(): void {
  const request = waiting;
  waiting = undefined;
  if (!request) return;
  const { id, document, coarse = true } = request;
  try {
    const outcome = runDocument(document, {
      engineVersion: "preview",
      coarse,
      now: () => performance.now(),
      onProgress: everyFiftyMs((part) => say({ type: "progress", id, part })),
    });
    say(outcome.status === 0 ? { type: "result", id, result: outcome.result } : { type: "refused", id, error: outcome.error });
  } catch (error) {
    say({ type: "failed", id, message: error instanceof Error ? error.message : String(error) });
  }
}

function everyFiftyMs(work: (part: number) => void): (part: number) => void {
  let last = Number.NEGATIVE_INFINITY;
  return (part) => {
    const now = performance.now();
    if (now - last < 50) return;
    last = now;
    work(part);
  };
}
