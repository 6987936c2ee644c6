import { expect, it } from "vitest";
import { saturatedWaterDensity } from "./liquid-water";

it("gives the densities of saturated water in IAPWS SR1-86(1992), table 2 (from memory)", () => {
  expect(saturatedWaterDensity(273.16)).toBeCloseTo(999.789, 2);
  expect(saturatedWaterDensity(373.1243)).toBeCloseTo(958.365, 2);
  expect(saturatedWaterDensity(647.096)).toBeCloseTo(322, 6);
  expect(saturatedWaterDensity(250)).toBe(saturatedWaterDensity(273.16));
});
