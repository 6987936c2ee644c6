import { describe, expect, it } from "vitest";
import { EngineError } from "../errors";
import { describeMethods, runMethod } from "./run-method";
import type { Field } from "./field";
import { methods } from "./registry";

const run = (method: string, inputs: Record<string, unknown>) =>
  runMethod({ format: "ebbmark-case/1", kind: "method", method, inputs });

function refusalOf(work: () => unknown): EngineError {
  try {
    work();
  } catch (error) {
    if (error instanceof EngineError) return error;
    throw error;
  }
  throw new Error("it was computed");
}

describe("inputs of a method", () => {
  it("are all named when they are missing, unknown, out of range or of the wrong kind", () => {
    const { code, problems } = refusalOf(() =>
      run("relief-thermal-expansion", { expansionPerK: -1, heatW: "1e5", densityKgPerM3: Infinity, colour: 1 }),
    );
    expect(code).toBe("invalid-case");
    expect(problems.map(({ path }) => path)).toEqual([
      "inputs.colour",
      "inputs.expansionPerK",
      "inputs.heatW",
      "inputs.densityKgPerM3",
      "inputs.specificHeatJPerKgK",
    ]);
    for (const { message } of problems) expect(message).toMatch(/Give|Its inputs are/);
  });

  it("get their defaults, which the answer shows", () => {
    expect(run("energy-tnt-equivalent", { energyJ: 4_266_920 })).toMatchObject({
      inputs: { blastFraction: 1, energyOfTntJPerKg: 4_266_920 },
      outputs: { tntKg: 1 },
    });
  });

  it("are refused together where each fits alone", () => {
    const { problems } = refusalOf(() => run("energy-brode", { pressurePa: 1e5, volumeM3: 1, heatCapacityRatio: 1.4 }));
    expect(problems[0]?.path).toBe("inputs.pressurePa");
  });

  it("of a composition must be fractions that sum to one", () => {
    const composed = (composition: unknown) => refusalOf(() => run("disposal-vent-gas-quality", { composition })).problems;
    expect(composed({ methane: 0.5 })[0]?.message).toContain("sum to 0.5");
    expect(composed({ methane: 2 })[0]?.path).toBe("inputs.composition.methane");
    expect(composed([1])[0]?.message).toContain("mole fractions");
  });
});

describe("validity", () => {
  it("is said with the bound that is broken", () => {
    const inputs = {
      massFlowKgPerS: 1,
      molarMassKgPerMol: 0.02,
      temperatureK: 300,
      compressibility: 0.7,
      heatCapacityRatio: 1.3,
      relievingPressurePa: 1e6,
      backPressurePa: 0.9e6,
    };
    const { valid, warnings } = run("relief-gas-critical", inputs);
    expect(valid).toBe(false);
    expect(warnings.map(({ message }) => message.slice(0, 13))).toEqual(["Z from 0.8 to", "Back pressure"]);
  });

  it("ends in a refusal where a curve does not reach", () => {
    expect(refusalOf(() => run("blast-surface", { distanceM: 0.1, tntKg: 1 })).code).toBe("outside-validity");
  });
});

describe("two forms of one law", () => {
  it("agree: flux at the distance that a flux asks for", () => {
    const flame = { heatReleaseW: 5e8, radiatedFraction: 0.25, transmissivity: 0.9 };
    const distance = run("disposal-radiation-distance", { ...flame, fluxWPerM2: 4730 }).outputs.distanceM as number;
    expect(run("disposal-radiation", { ...flame, distanceM: distance }).outputs.fluxWPerM2).toBeCloseTo(4730, 6);
  });

  it("agree where choked and subcritical sizing meet", () => {
    const k = 1.3;
    const base = {
      massFlowKgPerS: 3,
      molarMassKgPerMol: 0.018,
      temperatureK: 320,
      compressibility: 0.95,
      heatCapacityRatio: k,
      relievingPressurePa: 2e6,
    };
    const critical = run("relief-gas-critical", base).outputs;
    const ratio = critical.criticalPressureRatio as number;
    const subcritical = run("relief-gas-subcritical", { ...base, backPressurePa: ratio * 2e6 * (1 + 1e-9) }).outputs;
    // 17.9 is the rounded 17.910 of the derivation.
    expect((subcritical.requiredAreaM2 as number) / (critical.requiredAreaM2 as number)).toBeCloseTo(1, 2.5);
  });

  it("agree: API and ISO forms of one choked device", () => {
    const gas = {
      molarMassKgPerMol: 0.02,
      temperatureK: 300,
      compressibility: 1,
      heatCapacityRatio: 1.3,
      relievingPressurePa: 3e6,
    };
    const area = run("relief-gas-critical", { ...gas, massFlowKgPerS: 5, dischargeCoefficient: 0.8 }).outputs.requiredAreaM2;
    const { outputs } = run("relief-iso-gas-capacity", { ...gas, flowAreaM2: area, deratedCoefficient: 0.8 });
    expect(outputs.massFlowKgPerS).toBeCloseTo(5, 2);
  });

  it("agree: a pipe's inlet pressure falls to its outlet's as it gets short", () => {
    const pipe = { massFlowKgPerS: 5, diameterM: 0.3, temperatureK: 300, molarMassKgPerMol: 0.02, outletPressurePa: 1.2e5 };
    const inlet = (lengthM: number) =>
      run("disposal-pipe-inlet-pressure", { ...pipe, lengthM, darcyFrictionFactor: 0.02 }).outputs.inletPressurePa as number;
    expect(inlet(0)).toBe(1.2e5);
    expect(inlet(100)).toBeGreaterThan(inlet(10));
  });
});

describe("the list of methods", () => {
  it("tells of each what it takes, gives and rests on", () => {
    const list = describeMethods();
    expect(new Set(list.map(({ id }) => id)).size).toBe(list.length);
    for (const { title, source, formula, inputs, outputs } of list) {
      for (const text of [title, source, formula]) expect(text.length).toBeGreaterThan(3);
      expect(inputs.length).toBeGreaterThan(0);
      expect(outputs.length).toBeGreaterThan(0);
    }
  });

  it("gives numbers in the middle of every range, or says why not", () => {
    for (const method of methods) {
      const inputs = Object.fromEntries(Object.entries(method.inputs).map(([key, field]) => [key, middle(field)]));
      try {
        for (const value of Object.values(run(method.id, inputs).outputs)) {
          if (typeof value === "number") expect(Number.isFinite(value), method.id).toBe(true);
        }
      } catch (error) {
        if (!(error instanceof EngineError)) throw error;
        expect(error.message.length, method.id).toBeGreaterThan(20);
      }
    }
  });
});

function middle(field: Field): unknown {
  switch (field.kind) {
    case "choice":
      return field.choices[0];
    case "composition":
      return { methane: 1 };
    case "number":
    case "numbers": {
      const { min, above, max = 1, below = max } = field;
      const low = min ?? above ?? 0;
      const value = low > 0 ? Math.sqrt(low * below) : low + (below - low) * 1e-3;
      return field.kind === "number" ? value : [value, value];
    }
  }
}
