import fc from "fast-check";
import { describe, expect, expectTypeOf, it } from "vitest";
import type { BlowdownCase } from "@/engine/cases/blowdown-case";
import type { NozzleCase } from "@/engine/cases/nozzle-case";
import { parseCase, parseCaseText, type CaseFile } from "./case-file";

const fluid = { components: [{ id: "nitrogen", moleFraction: 1 }], equation: "peng-robinson-1976" };
const blowdown = () => ({
  format: "ebbmark-case/1",
  kind: "blowdown",
  fluid: structuredClone(fluid),
  vessel: { geometry: { shape: "volume", volumeM3: 1, innerAreaM2: 6 }, wall: { steel: "carbon_steel", thicknessM: 0.02 } },
  start: { pressurePa: 1e7, temperatureK: 290 },
  release: { path: "orifice", diameterM: 0.01, dischargeCoefficient: 0.85 },
  heat: { inside: { model: "constant", coefficientWPerM2K: 60 }, wall: { model: "lumped" }, outside: { model: "adiabatic" } },
  run: { stopTimeS: 900, stopPressurePa: 120000 },
});

/** The document with one place set to a value; `undefined` removes the key. */
function changed(path: string, value: unknown): unknown {
  const document: Record<string, unknown> = blowdown();
  const keys = path.split(".");
  let place = document;
  for (const key of keys.slice(0, -1)) place = place[key] as Record<string, unknown>;
  const last = keys.at(-1) ?? "";
  if (value === undefined) delete place[last];
  else place[last] = value;
  return document;
}

const problems = (document: unknown) => {
  const parsed = parseCase(document);
  return parsed.ok ? [] : parsed.problems;
};

describe("parseCase", () => {
  it("accepts a complete case and writes out the defaults", () => {
    const parsed = parseCase(blowdown());
    expect(parsed.ok && parsed.document).toMatchObject({
      fluid: { interaction: "library" },
      release: { from: "vapour", backPressurePa: 101325, openingTimeS: 0, flowModel: "frozen" },
      run: { relativeTolerance: 1e-6 },
    });
  });

  it("gives the same document when it is parsed again", () => {
    const once = parseCase(blowdown());
    expect(once.ok && parseCase(once.document)).toEqual(once);
  });

  it("has the engine's own types", () => {
    expectTypeOf<Extract<CaseFile, { kind: "blowdown" }>>().toExtend<BlowdownCase>();
    expectTypeOf<Extract<CaseFile, { kind: "nozzle" }>>().toExtend<NozzleCase>();
    expectTypeOf<BlowdownCase["release"]>().toExtend<Extract<CaseFile, { kind: "blowdown" }>["release"]>();
  });

  it.each([
    ["release.diameterM", -0.01, "release.diameterM", /-0.01 is out of range.*above 0 to 10 m/],
    ["release.diameterM", "10 mm", "release.diameterM", /"10 mm" is not what belongs here.*number above 0/],
    ["release.diameterM", undefined, "release.diameterM", /missing.*number above 0/],
    ["release.diameterM", Number.NaN, "release.diameterM", /not a finite number/],
    ["release.diameterM", Number.POSITIVE_INFINITY, "release.diameterM", /not a finite number/],
    ["release.diameterM", null, "release.diameterM", /null/],
    ["release.path", "hole", "release.path", /"orifice", "valve", "sized"/],
    ["release.bore", 1, "release.bore", /"bore" is not a key/],
    ["run.relativeTolerance", 1e-2, "run.relativeTolerance", /from 1e-9 to 0.001/],
    ["run.relativeTolerance", 1e-10, "run.relativeTolerance", /from 1e-9 to 0.001/],
    ["run.stopPressurePa", 2e7, "run.stopPressurePa", /end below the pressure at start/],
    ["release.backPressurePa", 1e7, "release.backPressurePa", /below the pressure at start/],
    ["start.liquidVolumeFraction", 0.5, "start", /exactly two/],
    ["start.temperatureK", undefined, "start", /exactly two/],
    ["vessel.wall", undefined, "vessel.wall", /needs its steel and thickness/],
    ["vessel.wall.steel", "timber", "vessel.wall.steel", /"carbon_steel"/],
    ["vessel.geometry", { shape: "volume", volumeM3: 1 }, "vessel.geometry.innerAreaM2", /give its area/],
    ["vessel.geometry.shape", "box", "vessel.geometry.shape", /"cylinder"/],
    ["heat.wall", { model: "none" }, "heat.inside.model", /no wall for the film/],
    ["fluid.equation", "ideal", "fluid.equation", /"peng-robinson-1976"/],
    ["fluid.interaction", "some", "fluid.interaction", /"library", "none" or a list/],
    ["fluid.components", [], "fluid.components", /no component/],
    ["fluid.components", [{ id: "methane", moleFraction: 0.9 }], "fluid.components", /sum to 0.9/],
    [
      "fluid.components",
      [
        { id: "methane", moleFraction: 0.5 },
        { id: "ethane", moleFraction: "half" },
      ],
      "fluid.components[1].moleFraction",
      /"half"/,
    ],
    [
      "fluid.components",
      [
        { id: "methane", moleFraction: 0.5 },
        { id: "methane", moleFraction: 0.5 },
      ],
      "fluid.components[1].id",
      /stands twice/,
    ],
    ["kind", "flare", "kind", /"path", "flash", "nozzle", "blowdown"/],
    ["format", "ebbmark-case/2", "format", /ebbmark-case\/1/],
    ["limits", { targetPressure: 1 }, "limits.targetPressure", /not a key/],
    ["vessel", 7, "vessel", /does not belong here/],
  ] as [string, unknown, string, RegExp][])("refuses %s = %j at its path", (path, value, where, words) => {
    const found = problems(changed(path, value));
    expect(found.map((problem) => problem.path)).toContain(where);
    expect(found.find((problem) => problem.path === where)?.message).toMatch(words);
  });

  it("reports every problem at once", () => {
    const document = changed("release.diameterM", -1) as ReturnType<typeof blowdown>;
    document.run.stopTimeS = 0;
    expect(problems(document).map((problem) => problem.path)).toEqual(["release.diameterM", "run.stopTimeS"]);
  });

  it.each([[null], [undefined], ["text"], [[1]], [7], [{}]])("refuses %j with a sentence", (document) => {
    expect(problems(document)[0]?.message).toMatch(/^(Give one case document|Use one of)/);
  });

  it("accepts custom constants with one to eight coefficients and refuses none or nine", () => {
    const withCoefficients = (polynomial: number[]) =>
      problems(
        changed("fluid.components", [
          {
            id: "my-gas",
            moleFraction: 1,
            custom: {
              molarMassKgPerMol: 0.028,
              criticalTemperatureK: 126,
              criticalPressurePa: 3.4e6,
              acentricFactor: -0.2,
              idealGasHeatCapacityOverR: { polynomial, rangeK: [50, 1000] },
            },
          },
        ]),
      );
    expect(withCoefficients([3.5])).toEqual([]);
    expect(withCoefficients(new Array<number>(8).fill(0))).toEqual([]);
    for (const wrong of [[], new Array<number>(9).fill(0)]) {
      expect(withCoefficients(wrong)[0]).toMatchObject({
        path: "fluid.components[0].custom.idealGasHeatCapacityOverR.polynomial",
      });
    }
  });

  it.each([
    ["path", { from: { temperatureK: 300, pressurePa: 1e7 }, to: { temperatureK: 250, pressurePa: 1e5 } }],
    ["flash", { specification: "PT", pressurePa: 1e6, temperatureK: 300 }],
    ["flash", { specification: "UV", internalEnergyJPerMol: -1000, molarVolumeM3PerMol: 1e-3 }],
    ["flash", { specification: "PQ", pressurePa: 1e6, vapourMoleFraction: 0.5 }],
    ["nozzle", { stagnation: { pressurePa: 1e7, temperatureK: 300 }, backPressurePa: 101325, flowModel: "frozen" }],
    ["nozzle", { stagnation: { pressurePa: 1e6, vapourMoleFraction: 0 }, backPressurePa: 101325, flowModel: "equilibrium" }],
  ])("accepts the kind %s", (kind, rest) => {
    expect(problems({ format: "ebbmark-case/1", kind, fluid, ...rest })).toEqual([]);
  });

  it.each([
    [{ kind: "flash", specification: "PT", pressurePa: 1e6 }, "temperatureK"],
    [{ kind: "flash", specification: "XY" }, "specification"],
    [{ kind: "nozzle", stagnation: { pressurePa: 1e6 }, backPressurePa: 1e5, flowModel: "frozen" }, "stagnation"],
    [{ kind: "path", from: { temperatureK: 300, pressurePa: 0 }, to: { temperatureK: 300, pressurePa: 1e5 } }, "from.pressurePa"],
  ])("refuses %j at %s", (rest, where) => {
    expect(problems({ format: "ebbmark-case/1", fluid, ...rest }).map((problem) => problem.path)).toContain(where);
  });

  it("never throws on any value", () => {
    fc.assert(
      fc.property(fc.anything(), (value) => void parseCase(value)),
      { numRuns: 500 },
    );
    fc.assert(
      fc.property(fc.jsonValue(), (value) => void parseCase({ ...blowdown(), fluid: value, heat: value, start: value })),
      { numRuns: 300 },
    );
  });
});

describe("parseCaseText", () => {
  it("refuses text that is not JSON, and says where it breaks", () => {
    const parsed = parseCaseText("{ not json");
    expect(parsed.ok ? [] : parsed.problems).toMatchObject([
      { path: "", message: expect.stringMatching(/not valid JSON/) as string },
    ]);
  });

  it.each([
    ['{"kind":"path","kind":"flash"}', "kind"],
    ['{"a":{"b":1,"b":2}}', "a.b"],
    ['{"a":[{"x":1},{"x":1,"y":{"z":[1,2],"z":3}}]}', "a[1].y.z"],
    ['{"k\\u0061":1,"ka":2}', "ka"],
    ['{"__proto__":1,"__proto__":2}', "__proto__"],
  ])("refuses the double key in %s at %s", (jsonText, path) => {
    const parsed = parseCaseText(jsonText);
    expect(parsed.ok ? [] : parsed.problems).toMatchObject([{ path, message: expect.stringMatching(/twice/) as string }]);
  });

  it("is not misled by keys and commas inside text values", () => {
    const document = { ...blowdown(), title: '"kind":"x", {"kind": [1,2], \\" }' };
    expect(parseCaseText(JSON.stringify(document)).ok).toBe(true);
  });

  it("finds no double key in any document that JSON.stringify made", () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        const parsed = parseCaseText(JSON.stringify(value));
        expect(parsed.ok ? "" : parsed.problems.map((problem) => problem.message).join()).not.toMatch(/The key stands twice/);
      }),
    );
  });
});
