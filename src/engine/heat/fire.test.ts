import { describe, expect, it } from "vitest";
import { poolFireHeatW } from "./pool-fire";
import { fireFluxWPerM2, fireSets, type FireBasis } from "./surface-fire";

describe("poolFireHeatW", () => {
  // M6-01 of tests/fixtures/checks/methods.json, recomputed from the published law; the Btu form of it converts to 43 192 and 70 959.
  it("takes 1.06817 and 1.75308 MW into 50 m²", () => {
    expect(poolFireHeatW(50, "adequate", 1) / 1.06817e6 - 1).toBeCloseTo(0, 5);
    expect(poolFireHeatW(50, "inadequate", 1) / 1.75308e6 - 1).toBeCloseTo(0, 5);
    const btuPerH = 1055.05585262 / 3600;
    expect(Math.abs((21000 * btuPerH * (1 / 0.3048 ** 2) ** 0.82) / 43200 - 1)).toBeLessThan(1e-3);
  });
  it("is nothing on a dry vessel, and less behind insulation", () => {
    expect(poolFireHeatW(0, "adequate", 1)).toBe(0);
    expect(poolFireHeatW(50, "adequate", 0.3)).toBeCloseTo(0.3 * poolFireHeatW(50, "adequate", 1), 6);
  });
});

describe("fireFluxWPerM2", () => {
  // M6-04: the set of the open pool, 95.50 kW/m² at 20 °C and 59.50 at 600 °C (own Python).
  it("of an open pool is 95.50 kW/m² on cold and 59.50 on hot steel", () => {
    expect(Math.abs(fireFluxWPerM2("open-pool", 293.15) / 95500 - 1)).toBeLessThan(1e-4);
    expect(Math.abs(fireFluxWPerM2("open-pool", 873.15) / 59500 - 1)).toBeLessThan(1e-4);
  });
  it.each([
    ["open-pool", 45, 130],
    ["confined-pool", 100, 250],
    ["jet", 100, 400],
  ] as [FireBasis, number, number][])("of %s begins within the published range", (basis, low, high) => {
    const first = fireFluxWPerM2(basis, 293.15) / 1000;
    expect(first).toBeGreaterThan(low);
    expect(first).toBeLessThan(high);
    expect(fireFluxWPerM2(basis, fireSets[basis].flameTemperatureK + 200)).toBeLessThan(0);
  });
});
