/**
 * A thread of the server that runs cases, one after the other, with the engine that it is told to load.
 *
 * workerData    { enginePath, engineVersion }   absolute path of an engine file
 * asks          ThreadRequest; `cancel` is an Int32Array of length 1 on shared memory, set to 1 to stop the run
 * answers       { type: "ready" } once, then for each request "progress" (at most every 50 ms) and one "done" or "failed"
 *
 * A run past its time limit ends as code "out-of-time". A thread that does not answer at all is for its owner to terminate.
 */
import { pathToFileURL } from "node:url";
import { parentPort, workerData } from "node:worker_threads";
import type * as Engine from "./engine-entry";
import type { ComputedTwice, ErrorDocument, Outcome } from "./engine-entry";

export type ThreadData = { enginePath: string; engineVersion: string };
export type ThreadRequest = {
  id: string;
  document: unknown;
  twice: boolean;
  /** Where the document is a study that is run in parts. */
  study?: StudyAct;
  timeLimitMs: number;
  cancel?: SharedArrayBuffer;
};
export type StudyAct =
  | { act: "count" }
  | { act: "part"; from: number; to: number }
  | { act: "assemble"; outcomes: Parameters<typeof Engine.assembleStudyParts>[1] };
type Answered = Outcome | ComputedTwice | ReturnType<typeof Engine.countStudyRuns> | ReturnType<typeof Engine.runStudyPart>;
export type ThreadAnswer =
  | { type: "ready"; engineVersion: string }
  | { type: "progress"; id: string; part: number }
  | { type: "done"; id: string; outcome: Answered }
  | { type: "failed"; id: string; message: string };

const { enginePath, engineVersion } = workerData as ThreadData;
const port = parentPort;
if (!port) throw new Error("server-thread is started as a worker thread");

const engine = (await import(/* webpackIgnore: true */ pathToFileURL(enginePath).href)) as typeof Engine;
const say = (answer: ThreadAnswer): void => port.postMessage(answer);

port.on("message", (request: ThreadRequest) => {
  try {
    say({ type: "done", id: request.id, outcome: run(request) });
  } catch (error) {
    say({ type: "failed", id: request.id, message: error instanceof Error ? (error.stack ?? error.message) : String(error) });
  }
});
say({ type: "ready", engineVersion });

function run({ id, document, twice, study, timeLimitMs, cancel }: ThreadRequest): Answered {
  const flag = cancel ? new Int32Array(cancel) : undefined;
  const deadline = performance.now() + timeLimitMs;
  let lastSaid = Number.NEGATIVE_INFINITY;
  let late = false;
  const context: Engine.EntryContext = {
    engineVersion,
    now: () => performance.now(),
    onProgress: (part) => {
      const now = performance.now();
      if (now - lastSaid < 50) return;
      lastSaid = now;
      say({ type: "progress", id, part });
    },
    isCancelled: () => {
      late ||= performance.now() > deadline;
      return late || (flag !== undefined && Atomics.load(flag, 0) === 1);
    },
  };
  const outcome = study
    ? actOn(study, document, context)
    : twice
      ? engine.runDocumentTwice(document, context)
      : engine.runDocument(document, context);
  return late && outcome.status === 3 && outcome.error.code === "cancelled"
    ? { status: 3, error: outOfTime(timeLimitMs) }
    : outcome;
}

function actOn(study: StudyAct, document: unknown, context: Engine.EntryContext): Answered {
  switch (study.act) {
    case "count":
      return engine.countStudyRuns(document);
    case "part":
      return engine.runStudyPart(document, study, context);
    case "assemble":
      return engine.assembleStudyParts(document, study.outcomes, context);
  }
}

const outOfTime = (timeLimitMs: number): ErrorDocument => ({
  format: "ebbmark-error/1",
  code: "out-of-time",
  problems: [
    {
      path: "run",
      message: `The calculation took longer than ${Math.round(timeLimitMs / 1000)} s and was stopped. Loosen the tolerance or shorten the run.`,
    },
  ],
});
