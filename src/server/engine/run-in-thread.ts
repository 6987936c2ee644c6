import "server-only";
import { readFileSync } from "node:fs";
import { availableParallelism } from "node:os";
import { join } from "node:path";
import { z } from "zod";
import type { CaseProblem } from "@/contracts/case-file";
import type { BlowdownResult, Confirmation } from "@/engine/cases/blowdown-result";
import type { EngineResult } from "@/engine/run-case";
import type { Outcome as StudyOutcome } from "@/engine/cases/study-case";
import { env } from "@/server/env";
import { Refusal } from "@/server/refusal";
import { PoolError, ThreadPool, type Protocol } from "@/server/threads/thread-pool";

/** What the engine's own entry answers with; see src/workers/engine-entry.ts. `status`: 0 computed, 2 invalid, 3 valid but not to be computed. */
type Failure = { status: 2 | 3; error: { code: string; problems: CaseProblem[] } };
export type Computed<Result extends EngineResult = EngineResult> = {
  status: 0;
  caseText: string;
  caseSha256: string;
  result: Result;
  resultText: string;
};
export type ComputedTwice = Computed<BlowdownResult> & { confirmation: Confirmation; confirmationText: string };

/** As `src/workers/server-thread.ts` reads it. */
type StudyAct = { act: "count" } | { act: "part"; from: number; to: number } | { act: "assemble"; outcomes: StudyOutcome[] };
type Job = { document: unknown; twice: boolean; study?: StudyAct };

/** The run itself stops a little before its thread would be ended, so that the usual end is a sentence. */
const timeLimitMs = 60_000;
const killAfterMs = timeLimitMs + 5_000;
const longestQueue = 32;

const protocol: Protocol = {
  ask: (id, job) => ({ id: String(id), timeLimitMs, ...(job as Job) }),
  read: (message) => {
    const answer = message as { type: string; id?: string; outcome?: unknown; message?: string };
    if (answer.type === "done") return { id: Number(answer.id), done: answer.outcome };
    if (answer.type === "failed") return { id: Number(answer.id), failed: answer.message ?? "the engine failed" };
    return undefined;
  },
};

const poolSize = (): number => Math.max(1, availableParallelism() - 1);

type Holder = { ebbmarkEnginePool?: ThreadPool };

const pool = (): ThreadPool => ((globalThis as Holder).ebbmarkEnginePool ??= makePool());

function makePool(): ThreadPool {
  const { engineFolder, engineThread } = env();
  const { file, engineVersion } = currentEngine(engineFolder);
  return new ThreadPool({
    file: engineThread,
    size: poolSize(),
    longestQueue,
    budgetMs: killAfterMs,
    resourceLimits: { maxOldGenerationSizeMb: 256, maxYoungGenerationSizeMb: 64 },
    workerData: { enginePath: join(engineFolder, file), engineVersion },
    protocol,
  });
}

const currentSchema = z.looseObject({ file: z.string().regex(/^[0-9a-f]{64}\.mjs$/), engineVersion: z.string() });

function currentEngine(folder: string): { file: string; engineVersion: string } {
  try {
    return currentSchema.parse(JSON.parse(readFileSync(join(folder, "current.json"), "utf8")));
  } catch (cause) {
    throw new Error("The engine has not been built. `npm run up` builds it.", { cause });
  }
}

/**
 * Runs a case document of any kind in a thread.
 *
 * Throws   Refusal "invalid-request" with the engine's problems by path, "cannot-compute" with its reason, "busy"
 */
export function runOnce(document: unknown): Promise<Computed> {
  return run<Computed>({ document, twice: false });
}

/** A blowdown and its confirmation at a tenfold tighter tolerance. */
export function runTwice(document: unknown): Promise<ComputedTwice> {
  return run<ComputedTwice>({ document, twice: true });
}

/** So many runs of a study go to a thread at a time: others get their turn in between, and each part keeps to the time limit. */
const runsAtATime = 40;

/**
 * A study in parts, which may take longer than one case may.
 *
 * Throws   as `runOnce`
 */
export async function runStudy(document: unknown): Promise<Computed> {
  const job = { document, twice: false };
  const { runs } = await run<{ status: 0; runs: number }>({ ...job, study: { act: "count" } });
  const parts = Array.from({ length: Math.ceil(runs / runsAtATime) }, (_, i) => ({
    from: i * runsAtATime,
    to: Math.min((i + 1) * runsAtATime, runs),
  }));
  const done: StudyOutcome[] = [];
  const work = async (): Promise<void> => {
    for (let part = parts.shift(); part; part = parts.shift()) {
      const answer = run<{ status: 0; outcomes: StudyOutcome[] }>({ ...job, study: { act: "part", ...part } });
      // One part that fails ends the study: the others are not worth a thread then.
      done.push(...(await answer.catch(giveUp)).outcomes);
    }
  };
  const giveUp = (error: unknown): never => {
    parts.length = 0;
    throw error;
  };
  // No more at once than there are threads, so that a long study does not fill the queue.
  await Promise.all(Array.from({ length: poolSize() }, work));
  return run<Computed>({ ...job, study: { act: "assemble", outcomes: done } });
}

async function run<T extends { status: 0 }>(job: Job): Promise<T> {
  const outcome = await pool()
    .run<T | Failure>(job)
    .catch((error: unknown) => {
      throw error instanceof PoolError ? refusalOf(error) : error;
    });
  if (outcome.status === 0) return outcome;
  const { code, problems } = (outcome as Failure).error;
  if (outcome.status === 2) throw new Refusal("invalid-request", { problems });
  throw new Refusal("cannot-compute", { detail: problems[0]?.message ?? `The engine says: ${code}.`, problems });
}

function refusalOf({ trouble }: PoolError): Refusal {
  if (trouble === "queue-full" || trouble === "stopped") return new Refusal("busy", { retryAfterS: 10 });
  const detail =
    trouble === "out-of-time"
      ? `The calculation ran longer than ${killAfterMs / 1000} s and was stopped. Nothing was stored. Loosen the tolerance or shorten the run.`
      : "The calculation needed more memory than it may take, or its thread ended. Nothing was stored. Check the case for extreme values.";
  return new Refusal("cannot-compute", { detail });
}
