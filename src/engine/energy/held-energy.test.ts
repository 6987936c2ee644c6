import { describe, expect, it } from "vitest";
import { readCheck } from "../../../tests/fixtures/check-file";
import type { EnergyCase } from "../cases/energy-case";
import { EngineError } from "../errors";
import { freeAirOverpressurePa, freeAirScaledDistance, surfaceOverpressurePa } from "./blast";
import { runEnergy } from "./held-energy";

const energyOf = (id: string, start: EnergyCase["start"], volumeM3: number, more: Partial<EnergyCase> = {}) =>
  runEnergy({
    format: "ebbmark-case/1",
    kind: "energy",
    fluid: { components: [{ id, moleFraction: 1 }], equation: "reference", interaction: "library" },
    vessel: { geometry: { shape: "volume", volumeM3 } },
    start,
    surroundingsPa: 101325,
    standOffBy: "isentropic-real",
    blastFraction: 1,
    tntEnergyJPerKg: 4_266_920,
    overpressuresPa: [2070, 20700],
    ...more,
  });

type Real = { id: string; expected: Record<string, { value: number }> & { end_quality: number }; source: string };
const { checks } = readCheck<{ checks: Real[] }>("methods.json");
const expected = (id: string) => checks.find((one) => one.id === id)!.expected;
/** Relative, as the file's own tolerance for these entries. */
const band = 5e-3;
const near = (found: number, wanted: number) => expect(Math.abs(found / wanted - 1)).toBeLessThan(band);

describe("held energy of real fluids, tests/fixtures/checks/methods.json (reference equation, CoolProp)", () => {
  it("M8-03 nitrogen at 101 bar", () => {
    const { energies, expanded } = energyOf("nitrogen", { pressurePa: 10.1e6, temperatureK: 300 }, 10);
    const wanted = expected("M8-03");
    near(expanded.workJPerKg, wanted.work_per_kg!.value);
    near(energies.find(({ definition }) => definition === "isentropic-real")!.energyJ, wanted.total!.value);
    near(expanded.workJPerKg - expanded.atmosphereJPerKg, wanted.work_less_atmosphere_per_kg!.value);
    expect(Math.abs(expanded.temperatureK - wanted.end_T!.value)).toBeLessThan(0.05);
    expect(expanded.vapourMoleFraction).toBe(1);
    expect(energies.map(({ definition }) => definition)).toHaveLength(6);
  });

  it("M8-04 propane, saturated liquid at 10 bar, flashes", () => {
    const { energies, expanded } = energyOf("propane", { pressurePa: 1e6, liquidVolumeFraction: 1 }, 2);
    const wanted = expected("M8-04");
    near(expanded.workJPerKg, wanted.work_per_kg!.value);
    near(expanded.workJPerKg - expanded.atmosphereJPerKg, wanted.work_less_atmosphere_per_kg!.value);
    expect(Math.abs(expanded.vapourMoleFraction - wanted.end_quality)).toBeLessThan(2e-3);
    expect(Math.abs(expanded.temperatureK - wanted.end_T!.value)).toBeLessThan(0.02);
    // No vapour: only the definitions that count liquid are given.
    expect(energies.map(({ definition }) => definition)).toEqual(["isentropic-real", "isentropic-real-less-atmosphere"]);
  });
});

describe("held energy", () => {
  it("is refused for contents that are not above their surroundings, and for a definition without its vapour", () => {
    const code = (work: () => unknown) => {
      try {
        work();
      } catch (error) {
        if (error instanceof EngineError) return [error.code, error.path];
      }
      return undefined;
    };
    expect(code(() => energyOf("nitrogen", { pressurePa: 9e4, temperatureK: 300 }, 1))).toEqual(["invalid-case", "start"]);
    expect(code(() => energyOf("propane", { pressurePa: 1e6, liquidVolumeFraction: 1 }, 1, { standOffBy: "brode" }))).toEqual([
      "not-applicable",
      "standOffBy",
    ]);
  });

  it("doubles with the volume, and the distance grows with its cube root", () => {
    const one = energyOf("methane", { pressurePa: 7e6, temperatureK: 300 }, 1);
    const eight = energyOf("methane", { pressurePa: 7e6, temperatureK: 300 }, 8);
    one.energies.forEach(({ energyJ }, i) => expect(eight.energies[i]!.energyJ / energyJ).toBeCloseTo(8, 9));
    one.standOff.forEach(({ distanceM }, i) => expect(eight.standOff[i]!.distanceM / distanceM).toBeCloseTo(2, 9));
  });

  it("stands off where the curves give the overpressure asked for", () => {
    const { standOff } = energyOf("methane", { pressurePa: 7e6, temperatureK: 300 }, 5);
    for (const { overpressurePa, scaledDistance } of standOff)
      expect(surfaceOverpressurePa(scaledDistance) / overpressurePa).toBeCloseTo(1, 2);
    expect(freeAirOverpressurePa(freeAirScaledDistance(6900))).toBeCloseTo(6900, 6);
  });

  it("orders the ideal definitions as the published comparison: isothermal, availability, Brode, isentropic", () => {
    const { energies } = energyOf("nitrogen", { pressurePa: 10.1e6, temperatureK: 300 }, 10);
    const of = (definition: string) => energies.find((one) => one.definition === definition)!.energyJ;
    expect(of("isothermal")).toBeGreaterThan(of("availability"));
    expect(of("availability")).toBeGreaterThan(of("brode"));
    expect(of("brode")).toBeGreaterThan(of("isentropic-ideal"));
  });
});
