/**
 * Heat flux that a surface in flames takes up, by a balance of radiation and convection; it falls as the surface heats up.
 *
 *   q = σ (α ε_f T_f⁴ − ε_s T_s⁴) + h (T_g − T_s)
 *
 * Source   analytical method of API Std 521 (annex); the values below lie inside the published ranges (open pool 45 to 130 kW/m² at first,
 *          confined pool 100 to 250, impinging jet 100 to 400), which are from memory, and are fixed by this program
 * Holds    the part of the surface that is in the flames
 * Returns  q [W/m²] into the surface at T_s
 * Checks   fire.test.ts
 */
import { surfaceBalanceWPerM2 } from "./fire-laws";

export type FireBasis = "open-pool" | "confined-pool" | "jet";

export type FireSet = {
  flameEmissivity: number;
  surfaceAbsorptivity: number;
  surfaceEmissivity: number;
  coefficientWPerM2K: number;
  flameTemperatureK: number;
  gasTemperatureK: number;
};

const surface = { surfaceAbsorptivity: 0.75, surfaceEmissivity: 0.75 };
export const fireSets: Record<FireBasis, FireSet> = {
  "open-pool": { ...surface, flameEmissivity: 0.7, coefficientWPerM2K: 20, flameTemperatureK: 1273.15, gasTemperatureK: 1173.15 },
  "confined-pool": {
    ...surface,
    flameEmissivity: 0.75,
    coefficientWPerM2K: 20,
    flameTemperatureK: 1373.15,
    gasTemperatureK: 1273.15,
  },
  jet: { ...surface, flameEmissivity: 0.75, coefficientWPerM2K: 80, flameTemperatureK: 1473.15, gasTemperatureK: 1473.15 },
};

export function fireFluxWPerM2(basis: FireBasis, surfaceTemperatureK: number): number {
  return surfaceBalanceWPerM2(fireSets[basis], surfaceTemperatureK);
}
