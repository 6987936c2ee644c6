import { describe, expect, it } from "vitest";
import { canonicalCase, runDocument } from "@/workers/engine-entry";
import { parseCase } from "./case-file";

const start = { pressurePa: 5e6, temperatureK: 300 };
const wall = { steel: "carbon_steel", thicknessM: 0.02, minimumDesignMetalTemperatureK: 244.15 };
const drum = { name: "Drum", geometry: { shape: "sphere", insideDiameterM: 2 }, wall, start };
const pipe = {
  name: "Pipe",
  geometry: { shape: "pipe", insideDiameterM: 0.3, lengthM: 40 },
  wall,
  start: { pressurePa: 2e6, temperatureK: 280 },
};
const section = (over: object = {}) => ({
  format: "ebbmark-case/1",
  kind: "blowdown",
  fluid: { components: [{ id: "nitrogen", moleFraction: 1 }], equation: "peng-robinson-1976" },
  vessels: [drum, pipe],
  release: { path: "orifice", diameterM: 0.02, dischargeCoefficient: 0.85 },
  heat: { inside: { model: "constant", coefficientWPerM2K: 50 }, wall: { model: "lumped" } },
  run: { stopTimeS: 600, stopPressurePa: 2e5, relativeTolerance: 1e-5 },
  ...over,
});
const problemsOf = (document: object) => {
  const parsed = parseCase(document);
  return parsed.ok ? [] : parsed.problems;
};

describe("several vessels in a case", () => {
  it("are written out as one vessel and a start", () => {
    const parsed = parseCase(section());
    expect(parsed.ok && parsed.document).toMatchObject({
      start: { settleOut: "adiabatic" },
      vessel: {
        geometry: { shape: "section", parts: [drum.geometry, pipe.geometry] },
        wall: { steel: "carbon_steel", minimumDesignMetalTemperatureK: 244.15 },
      },
    });
  });

  it("stay as they are when they are read again, down to the hash", () => {
    const once = parseCase(section());
    if (!once.ok) throw new Error("not parsed");
    const text = canonicalCase(once.document);
    const again = parseCase(JSON.parse(text.caseText));
    expect(again.ok && canonicalCase(again.document)).toEqual(text);
  });

  it("are computed, with what settled and what was vented adding up", () => {
    const outcome = runDocument(section(), { engineVersion: "test" });
    if (outcome.status !== 0 || outcome.result.kind !== "blowdown") throw new Error("not computed");
    const { settleOut, summary } = outcome.result;
    expect(settleOut?.vessels.map(({ name }) => name)).toEqual(["Drum", "Pipe"]);
    expect(summary.initialMassKg / (settleOut?.after.massKg ?? 0)).toBeCloseTo(1, 9);
    expect(summary.initialPressurePa).toBeCloseTo(settleOut?.after.pressurePa ?? 0, 3);
  });

  it.each<[string, object, string]>([
    ["a vessel that says something else", { vessel: { geometry: { shape: "sphere", insideDiameterM: 3 } } }, "vessel"],
    ["a start of their own for the whole", { start }, "start"],
    ["a wall on one alone", { vessels: [drum, { ...pipe, wall: undefined }] }, "vessels[1].wall"],
    [
      "a shape inside a shape",
      { vessels: [{ ...drum, geometry: { shape: "section", parts: [] } }] },
      "vessels[0].geometry.shape",
    ],
    ["a start of three figures", { vessels: [{ ...drum, start: { ...start, liquidVolumeFraction: 0.5 } }] }, "vessels[0].start"],
    [
      "fractions that do not add up",
      { vessels: [{ ...drum, components: [{ id: "nitrogen", moleFraction: 0.5 }] }] },
      "vessels[0].components",
    ],
  ])("are refused with %s, and the field is named", (_what, over, path) => {
    const problems = problemsOf(section(over));
    expect(problems.map((problem) => problem.path)).toContain(path);
    for (const { message } of problems) expect(message).toMatch(/[.]$/);
  });

  it("are asked for where a start settles out without them", () => {
    const { vessels: _vessels, ...without } = section({
      vessel: { geometry: { shape: "sphere", insideDiameterM: 2 } },
      start: { settleOut: "adiabatic" },
    });
    expect(problemsOf(without).map(({ path }) => path)).toEqual(["vessels"]);
  });

  it("name the component that the fluid lacks when they are computed", () => {
    const outcome = runDocument(section({ vessels: [{ ...drum, components: [{ id: "methane", moleFraction: 1 }] }] }), {
      engineVersion: "test",
    });
    expect(outcome).toMatchObject({ status: 2, error: { problems: [{ path: "vessels[0].components[0].id" }] } });
  });
});
