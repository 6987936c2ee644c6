// The server's threads with an engine that was built for the test.
import { mkdtempSync, rmSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { build } from "esbuild";
import { afterAll, beforeAll, describe, expect, it, vi } from "vitest";
import { buildEngine } from "@/ops/build-engine.mjs";
import { Refusal } from "@/server/refusal";
import { runDocument } from "@/workers/engine-entry";
import { runOnce, runStudy } from "./run-in-thread";

const place = vi.hoisted(() => ({ engineFolder: "", engineThread: "" }));
vi.mock("@/server/env", () => ({ env: () => place }));

const folder = mkdtempSync(join(tmpdir(), "ebbmark-threads-"));
beforeAll(async () => {
  place.engineFolder = join(folder, "engine");
  place.engineThread = join(folder, "server-thread.mjs");
  await buildEngine(place.engineFolder);
  await build({
    absWorkingDir: fileURLToPath(new URL("../../..", import.meta.url)),
    entryPoints: ["src/workers/server-thread.ts"],
    outfile: place.engineThread,
    bundle: true,
    platform: "node",
    format: "esm",
    target: "node20",
    logLevel: "silent",
  });
}, 60_000);
afterAll(async () => {
  await (globalThis as { ebbmarkEnginePool?: { stop: () => Promise<void> } }).ebbmarkEnginePool?.stop();
  rmSync(folder, { recursive: true, force: true });
});

const bank = {
  format: "ebbmark-case/1",
  kind: "blowdown",
  fluid: { components: [{ id: "nitrogen", moleFraction: 1 }], equation: "peng-robinson-1976" },
  vessel: { geometry: { shape: "volume", volumeM3: 0.5 } },
  start: { pressurePa: 5e6, temperatureK: 288 },
  release: { path: "orifice", diameterM: 0.006, dischargeCoefficient: 0.84 },
  run: { stopTimeS: 900, stopPressurePa: 1e6, relativeTolerance: 1e-5 },
};
const study = (over: object = {}) => ({
  format: "ebbmark-case/1",
  kind: "study",
  study: "percentiles",
  samples: 90,
  seed: 5,
  of: bank,
  ...over,
});

describe("a study in the server's threads", () => {
  it("is that of one go, although it was run in parts", async () => {
    const inParts = await runStudy(study());
    const alone = runDocument(study(), { engineVersion: "test" });
    if (alone.status !== 0) throw new Error("refused");
    const body = (text: string): unknown => ({ ...(JSON.parse(text) as object), engineVersion: "" });
    expect(body(inParts.resultText)).toEqual(body(alone.resultText));
    expect(inParts.caseSha256).toBe(alone.caseSha256);
  }, 60_000);

  it.each([
    [study({ inputs: [{ input: "liquid-level", low: 0.9, high: 1.1, distribution: "uniform" }] }), "inputs[0].input"],
    [study({ samples: 0 }), "samples"],
  ])("refuses what the engine refuses, with the path", async (document, path) => {
    const refusal = await runStudy(document).catch((error: unknown) => error);
    expect(refusal).toBeInstanceOf(Refusal);
    expect(JSON.stringify(refusal)).toContain(path);
  });

  it("refuses a study whose own case cannot be computed", async () => {
    const hopeless = study({ samples: 4, of: { ...bank, start: { temperatureK: 288, liquidVolumeFraction: 0.5 } } });
    await expect(runStudy(hopeless)).rejects.toBeInstanceOf(Refusal);
    await expect(runOnce(hopeless)).rejects.toBeInstanceOf(Refusal);
  }, 60_000);
});
