import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { steelById, steelIds } from "./steel";
import table from "./steels.json";

describe("steels", () => {
  it("offers every material of the table, each with its sources", () => {
    expect(table.materials.map((material) => material.id)).toEqual([...steelIds]);
    for (const id of steelIds) expect(Object.keys(steelById(id).sources).length).toBeGreaterThan(0);
  });

  // EN 1993-1-2:2005, 3.4.1.2: c = 425 + 0.773 t − 1.69e-3 t² + 2.22e-6 t³ for 20 to 600 °C; 3.4.1.3: k = 54 − 0.0333 t.
  it.each([20, 100, 300, 500])("carbon steel at %d °C has the specific heat and conductivity of EN 1993-1-2", (t) => {
    const steel = steelById("carbon_steel");
    const c = 425 + 0.773 * t - 1.69e-3 * t ** 2 + 2.22e-6 * t ** 3;
    // The conductivity table is rounded to 0.1 W/(m K).
    expect(Math.abs(steel.specificHeatJPerKgK(t + 273.15) / c - 1)).toBeLessThan(1e-3);
    expect(Math.abs(steel.conductivityWPerMK(t + 273.15) - (54 - 0.0333 * t))).toBeLessThan(0.06);
  });

  it("integrates the specific heat exactly, and back, inside the table and beyond it", () => {
    fc.assert(
      fc.property(fc.constantFrom(...steelIds), fc.double({ min: 30, max: 1600, noNaN: true }), (id, T) => {
        const steel = steelById(id);
        const q = steel.heatContentJPerKg(T);
        expect(Math.abs(steel.temperatureFromHeatContentK(q) - T)).toBeLessThan(1e-8 * T);
        // Two-sided slope; a knot inside the interval bends it by at most the step.
        const slope = (steel.heatContentJPerKg(T + 1e-3) - steel.heatContentJPerKg(T - 1e-3)) / 2e-3;
        expect(Math.abs(slope / steel.specificHeatJPerKgK(T) - 1)).toBeLessThan(1e-3);
      }),
    );
  });

  it("has no steel of an unknown name", () => {
    expect(() => steelById("timber" as "ss304")).toThrow(/no steel timber/);
  });
});
