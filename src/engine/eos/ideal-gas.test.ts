import { describe, expect, it } from "vitest";
import { gasConstant } from "../gas-constant";
import { libraryRows, librarySubstance } from "../substances/library";
import { gergComponents, gergHeatCapacity } from "./gerg/gerg-data";
import { createIdealGasModel, exactFunctions } from "./ideal-gas";

describe("the table of ideal-gas functions", () => {
  const heatCapacities = [
    ...libraryRows.map((row) => librarySubstance(row).heatCapacity),
    ...[...gergComponents.keys()].map(gergHeatCapacity),
    { form: "polynomial" as const, coefficients: [4.568, -8.975e-3, 3.631e-5, -3.407e-8, 1.091e-11] },
  ];
  const model = createIdealGasModel(heatCapacities);
  const [cp, h, s] = [0, 0, 0].map(() => new Float64Array(heatCapacities.length)) as [Float64Array, Float64Array, Float64Array];

  it.each([60.51, 82.2, 120.49, 173.77, 250.001, 298.15, 371.5, 640.25, 1234.5])("repeats the published forms at %d K", (T) => {
    model.evaluate(T, cp, h, s);
    heatCapacities.forEach((heatCapacity, i) => {
      const exact = exactFunctions(heatCapacity, gasConstant)(T);
      expect(Math.abs(cp[i]! / exact.cp - 1)).toBeLessThan(1e-10);
      expect(Math.abs(h[i]! - exact.h)).toBeLessThan(1e-11 * exact.cp * T);
      expect(Math.abs(s[i]! - exact.s)).toBeLessThan(1e-11 * exact.cp);
    });
  });

  it("is still within 1e-9 at 31 K, where only hydrogen and helium are a fluid", () => {
    model.evaluate(31.3, cp, h, s);
    heatCapacities.forEach((heatCapacity, i) => {
      expect(Math.abs(cp[i]! / exactFunctions(heatCapacity, gasConstant)(31.3).cp - 1)).toBeLessThan(1e-9);
    });
  });

  it("is continuous where two pieces meet", () => {
    const below = [cp.slice(), h.slice(), s.slice()] as const;
    model.evaluate(200 - 1e-11, ...below);
    model.evaluate(200, cp, h, s);
    for (let i = 0; i < cp.length; i++) {
      expect(Math.abs(below[0][i]! - cp[i]!)).toBeLessThan(1e-8);
      expect(Math.abs(below[1][i]! - h[i]!)).toBeLessThan(1e-8);
    }
  });
});
