// A study shared by two workers that load the engine by path is the study run in one go, byte for byte.
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { pathToFileURL } from "node:url";
import { Worker } from "node:worker_threads";
import { afterAll, describe, expect, it } from "vitest";
import type * as Engine from "@/workers/engine-entry";
import type { Outcome } from "@/engine/cases/study-case";
import { buildEngine } from "@/ops/build-engine.mjs";

const folder = mkdtempSync(join(tmpdir(), "ebbmark-study-"));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const study = {
  format: "ebbmark-case/1",
  kind: "study",
  study: "percentiles",
  samples: 8,
  seed: 4127,
  of: {
    format: "ebbmark-case/1",
    kind: "blowdown",
    fluid: {
      components: [
        { id: "methane", moleFraction: 0.9 },
        { id: "propane", moleFraction: 0.1 },
      ],
      equation: "peng-robinson-1976",
    },
    vessel: {
      geometry: { shape: "volume", volumeM3: 2, innerAreaM2: 9 },
      wall: { steel: "carbon_steel", thicknessM: 0.02, minimumDesignMetalTemperatureK: 244.15 },
    },
    start: { pressurePa: 6e6, temperatureK: 290 },
    release: { path: "orifice", diameterM: 0.015, dischargeCoefficient: 0.85 },
    heat: { inside: { model: "constant", coefficientWPerM2K: 100 }, wall: { model: "lumped" } },
    run: { stopTimeS: 1800, stopPressurePa: 5e5, relativeTolerance: 1e-5 },
    limits: { targetPressurePa: 1e6, targetTimeS: 900 },
  },
};

const thread = `
const { workerData, parentPort } = require("node:worker_threads");
import(workerData.engine).then((engine) => {
  parentPort.postMessage(engine.runStudyPart(workerData.study, workerData.part, { engineVersion: "test" }));
});`;

function partIn(engine: string, part: { from: number; to: number }): Promise<Outcome[]> {
  return new Promise((resolve, reject) => {
    const worker = new Worker(thread, { eval: true, workerData: { engine, study, part } });
    worker.once("error", reject);
    worker.once("message", (answer: ReturnType<typeof Engine.runStudyPart>) => {
      if (answer.status === 0) resolve(answer.outcomes);
      else reject(new Error(JSON.stringify(answer.error)));
    });
  });
}

describe("a study in parts", () => {
  it("is the same from two workers as from one", async () => {
    const { file, engineVersion } = await buildEngine(join(folder, "engine"));
    const address = pathToFileURL(file).href;
    const engine = (await import(/* @vite-ignore */ address)) as typeof Engine;
    const count = engine.countStudyRuns(study);
    expect(count).toEqual({ status: 0, runs: 9 });
    const [early, late] = await Promise.all([partIn(address, { from: 0, to: 4 }), partIn(address, { from: 4, to: 9 })]);
    const together = engine.assembleStudyParts(study, [...late, ...early], { engineVersion });
    const alone = engine.runDocument(study, { engineVersion });
    if (together.status !== 0 || alone.status !== 0) throw new Error("refused");
    expect(together.resultText).toBe(alone.resultText);
    expect(together.caseSha256).toBe(alone.caseSha256);
  }, 60_000);

  it("refuses what has no parts, and a study that is wrong", async () => {
    const { file } = await buildEngine(join(folder, "engine"));
    const engine = (await import(/* @vite-ignore */ pathToFileURL(file).href)) as typeof Engine;
    expect(engine.countStudyRuns(study.of)).toMatchObject({ status: 2, error: { problems: [{ path: "kind" }] } });
    expect(
      engine.countStudyRuns({ ...study, inputs: [{ input: "liquid-level", low: 0.9, high: 1.1, distribution: "uniform" }] }),
    ).toMatchObject({
      status: 2,
      error: { problems: [{ path: "inputs[0].input" }] },
    });
  }, 60_000);
});
