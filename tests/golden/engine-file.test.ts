// The engine as one file, and the server's thread that loads it by path.
import { mkdtempSync, readFileSync, rmSync, statSync } from "node:fs";
import { tmpdir } from "node:os";
import { basename, join } from "node:path";
import { fileURLToPath } from "node:url";
import { Worker } from "node:worker_threads";
import { build } from "esbuild";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import type { Outcome as StudyOutcome } from "@/engine/cases/study-case";
import type { ComputedTwice } from "@/workers/engine-entry";
import type { ThreadAnswer, ThreadData, ThreadRequest } from "@/workers/server-thread";
import { buildEngine } from "@/ops/build-engine.mjs";

const root = fileURLToPath(new URL("../..", import.meta.url));
const folder = mkdtempSync(join(tmpdir(), "ebbmark-engine-"));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const bank = {
  format: "ebbmark-case/1",
  kind: "blowdown",
  fluid: { components: [{ id: "nitrogen", moleFraction: 1 }], equation: "peng-robinson-1976" },
  vessel: { geometry: { shape: "volume", volumeM3: 0.5 } },
  start: { pressurePa: 2e7, temperatureK: 288 },
  release: { path: "orifice", diameterM: 0.006, dischargeCoefficient: 0.84 },
  run: { stopTimeS: 900, stopPressurePa: 120000 },
};

describe("the engine file", () => {
  it("has the same bytes wherever it is built, is named by its hash, and is built once", async () => {
    const [one, two] = await Promise.all([buildEngine(join(folder, "a")), buildEngine(join(folder, "b"))]);
    expect(basename(one.file)).toBe(basename(two.file));
    expect(readFileSync(one.file).equals(readFileSync(two.file))).toBe(true);
    expect(one.engineVersion).toMatch(/^\d+\.\d+\.\d+\+[0-9a-f]{16}$/);
    const written = statSync(one.file).mtimeMs;
    expect(await buildEngine(join(folder, "a"))).toEqual(one);
    expect(statSync(one.file).mtimeMs).toBe(written);
  }, 60_000);

  it("imports nothing: it can be kept and run again years later", async () => {
    const { file } = await buildEngine(join(folder, "a"));
    expect(readFileSync(file, "utf8")).not.toMatch(/^import |\brequire\("node:|import\("/m);
  }, 60_000);
});

describe("the server's thread", () => {
  let worker: Worker;
  const answers: ThreadAnswer[] = [];
  const answerTo = async (id: string): Promise<ThreadAnswer> => {
    for (let i = 0; i < 6000; i++) {
      const found = answers.find((answer) => "id" in answer && answer.id === id && answer.type !== "progress");
      if (found) return found;
      await new Promise((resolve) => setTimeout(resolve, 10));
    }
    throw new Error("the thread did not answer");
  };
  const ask = (request: ThreadRequest) => worker.postMessage(request);

  beforeAll(async () => {
    const { file, engineVersion } = await buildEngine(join(folder, "a"));
    const outfile = join(folder, "server-thread.mjs");
    await build({
      absWorkingDir: root,
      entryPoints: ["src/workers/server-thread.ts"],
      outfile,
      bundle: true,
      platform: "node",
      format: "esm",
      target: "node20",
      logLevel: "silent",
    });
    worker = new Worker(outfile, { workerData: { enginePath: file, engineVersion } satisfies ThreadData });
    worker.on("message", (answer: ThreadAnswer) => answers.push(answer));
  }, 60_000);
  afterAll(() => worker.terminate());

  it("runs a case twice and gives the canonical texts", async () => {
    ask({ id: "twice", document: bank, twice: true, timeLimitMs: 60_000 });
    const answer = await answerTo("twice");
    expect(answer).toMatchObject({
      type: "done",
      outcome: { status: 0, caseSha256: expect.stringMatching(/^[0-9a-f]{64}$/) as string },
    });
    // Asked for twice and computed, so this is the answer with a confirmation.
    const outcome = answer.type === "done" ? (answer.outcome as ComputedTwice) : undefined;
    expect(outcome?.confirmation.figures.length).toBeGreaterThan(3);
    expect(outcome?.resultText).not.toContain("wallClockMs");
    expect(answers.some((one) => one.type === "ready")).toBe(true);
  }, 60_000);

  it("counts, runs and assembles the parts of a study", async () => {
    const study = {
      format: "ebbmark-case/1",
      kind: "study",
      study: "tornado",
      inputs: [{ input: "volume", low: 0.9, high: 1.1 }],
      of: bank,
    };
    const ordinary = { document: study, twice: false, timeLimitMs: 60_000 };
    ask({ ...ordinary, id: "count", study: { act: "count" } });
    expect(await answerTo("count")).toMatchObject({ type: "done", outcome: { status: 0, runs: 3 } });
    const outcomes: StudyOutcome[] = [];
    for (const part of [
      { from: 0, to: 2 },
      { from: 2, to: 3 },
    ]) {
      ask({ ...ordinary, id: `part-${part.from}`, study: { act: "part", ...part } });
      const answer = await answerTo(`part-${part.from}`);
      if (answer.type === "done" && "outcomes" in answer.outcome) outcomes.push(...answer.outcome.outcomes);
    }
    ask({ ...ordinary, id: "assemble", study: { act: "assemble", outcomes } });
    expect(await answerTo("assemble")).toMatchObject({
      type: "done",
      outcome: { status: 0, result: { study: "tornado", bars: [{ input: "volume" }] } },
    });
  }, 60_000);

  it("answers an invalid document with its problems, and goes on", async () => {
    ask({ id: "invalid", document: { ...bank, start: {} }, twice: false, timeLimitMs: 60_000 });
    expect(await answerTo("invalid")).toMatchObject({
      type: "done",
      outcome: { status: 2, error: { problems: [{ path: "start" }] } },
    });
  }, 60_000);

  it("stops at its time limit, and when the flag is raised", async () => {
    ask({ id: "late", document: bank, twice: false, timeLimitMs: 0 });
    expect(await answerTo("late")).toMatchObject({ type: "done", outcome: { status: 3, error: { code: "out-of-time" } } });
    const cancel = new SharedArrayBuffer(4);
    Atomics.store(new Int32Array(cancel), 0, 1);
    ask({ id: "cancelled", document: bank, twice: false, timeLimitMs: 60_000, cancel });
    expect(await answerTo("cancelled")).toMatchObject({ type: "done", outcome: { status: 3, error: { code: "cancelled" } } });
  }, 60_000);
});
