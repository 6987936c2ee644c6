/**
 * The browser's own engine, for the preview while typing and for the pages of fluids. Nothing computed here is stored.
 *
 * asks      WorkerRequest; in each lane a newer one replaces the older one that has not begun (latest wins), and lanes take turns
 * answers   PreviewAnswer with the id of the request; a replaced request is answered "replaced"
 *
 * A run cannot be broken off from outside: an owner that will not wait terminates the worker and starts another.
 */
import { EngineError } from "@/engine/errors";
import type { EngineResult } from "@/engine/run-case";
import { runDocument, type ErrorDocument } from "./engine-entry";
import { answerFluid, type FluidAnswer, type FluidAsk } from "./fluid-asks";

export type PreviewRequest = {
  id: number;
  document: unknown;
  /** A loose tolerance and a thinner series; the default. */ coarse?: boolean;
};
/** `lane` names who asks, where two ask for the same kind. */
export type FluidRequest = { id: number; ask: FluidAsk; lane?: string };
export type WorkerRequest = PreviewRequest | FluidRequest;

export type PreviewAnswer =
  | { type: "progress"; id: number; part: number }
  | { type: "result"; id: number; result: EngineResult }
  | { type: "fluid"; id: number; answer: FluidAnswer }
  | { type: "refused"; id: number; error: ErrorDocument }
  | { type: "replaced"; id: number }
  | { type: "failed"; id: number; message: string };

/** In order of arrival; a map keeps it. */
const waiting = new Map<string, WorkerRequest>();
let turnIsSet = false;

const say = (answer: PreviewAnswer): void => self.postMessage(answer);
const laneOf = (request: WorkerRequest): string => ("ask" in request ? (request.lane ?? request.ask.kind) : "case");

self.addEventListener("message", ({ data }: MessageEvent<WorkerRequest>) => {
  const replaced = waiting.get(laneOf(data));
  if (replaced) say({ type: "replaced", id: replaced.id });
  waiting.set(laneOf(data), data);
  setTurn();
});

/** One request a turn, so that messages which arrive meanwhile are read in between. */
function setTurn(): void {
  if (turnIsSet) return;
  turnIsSet = true;
  setTimeout(() => {
    turnIsSet = false;
    const [next] = waiting;
    if (!next) return;
    waiting.delete(next[0]);
    answer(next[1]);
    if (waiting.size > 0) setTurn();
  }, 0);
}

function answer(request: WorkerRequest): void {
  const { id } = request;
  try {
    if ("ask" in request) say({ type: "fluid", id, answer: answerFluid(request.ask) });
    else runPreview(request);
  } catch (error) {
    if (error instanceof EngineError) say({ type: "refused", id, error: errorDocument(error) });
    else say({ type: "failed", id, message: error instanceof Error ? error.message : String(error) });
  }
}

function runPreview({ id, document, coarse = true }: PreviewRequest): void {
  const outcome = runDocument(document, {
    engineVersion: "preview",
    coarse,
    now: () => performance.now(),
    onProgress: everyFiftyMs((part) => say({ type: "progress", id, part })),
  });
  say(outcome.status === 0 ? { type: "result", id, result: outcome.result } : { type: "refused", id, error: outcome.error });
}

const errorDocument = ({ code, path, message }: EngineError): ErrorDocument => ({
  format: "ebbmark-error/1",
  code,
  problems: [{ path: path ?? "", message }],
});

function everyFiftyMs(work: (part: number) => void): (part: number) => void {
  let last = Number.NEGATIVE_INFINITY;
  return (part) => {
    const now = performance.now();
    if (now - last < 50) return;
    last = now;
    work(part);
  };
}
