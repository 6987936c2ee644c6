import { gasConstant as R } from "../../gas-constant";

/**
 * Volume shift of a cubic equation: v = v_cubic − c. Phase equilibria are unchanged; h shifts by −c p, u and s not at all.
 *
 *   SRK   c = 0.40768 (R Tc/pc)(0.29441 − Z_RA)
 *   PR    c = 0.50033 (R Tc/pc)(0.25969 − Z_RA)
 *
 * Source   Peneloux, Rauzy and Freze, Fluid Phase Equilib. 8 (1982) 7-23; for PR Jhaveri and Youngren, SPE Reservoir Eng. 3
 *          (1988) 1033 (constants from memory).
 * Returns  c [m³/mol]
 * Checks   M1-07 in volume-translation.test.ts
 */
export function penelouxShift(
  family: "PR" | "SRK",
  constants: { criticalTemperatureK: number; criticalPressurePa: number; rackettZ: number },
): number {
  const { criticalTemperatureK: Tc, criticalPressurePa: pc, rackettZ } = constants;
  const volume = (R * Tc) / pc;
  return family === "SRK" ? 0.40768 * volume * (0.29441 - rackettZ) : 0.50033 * volume * (0.25969 - rackettZ);
}

/** Rackett compressibility where none is published: Z_RA = 0.29056 − 0.08775 ω (Yamada and Gunn, J. Chem. Eng. Data 18 (1973) 234). */
export function yamadaGunnRackettZ(acentricFactor: number): number {
  return 0.29056 - 0.08775 * acentricFactor;
}
