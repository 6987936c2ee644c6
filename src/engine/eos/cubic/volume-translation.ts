import type { FluidSpec } from "../../cases/fluid-spec";
import { EngineError } from "../../errors";
import { gasConstant as R } from "../../gas-constant";
import type { InteractionFamily } from "../../substances/interaction";
import { findLibraryRow } from "../../substances/library";
import type { Substance } from "../../substances/substance";

/**
 * Volume shift of a cubic equation: v = v_cubic − c. Phase equilibria are unchanged; h shifts by −c p, u and s not at all.
 *
 *   SRK   c = 0.40768 (R Tc/pc)(0.29441 − Z_RA)
 *   PR    c = 0.50033 (R Tc/pc)(0.25969 − Z_RA)
 *
 * Source   Peneloux, Rauzy and Freze, Fluid Phase Equilib. 8 (1982) 7-23; for PR Jhaveri and Youngren, SPE Reservoir Eng. 3
 *          (1988) 1033 (constants from memory).
 * Returns  c [m³/mol]
 * Checks   M1-07 in departures.checks.test.ts
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

/**
 * The c_i [m³/mol] that a fluid document asks for, with what a reader must know; undefined where it asks for none.
 *
 * Throws   EngineError "not-applicable" for an equation that no volume shift was published for
 */
export function volumeShift(
  { volumeTranslation = "none" }: FluidSpec,
  substances: readonly Substance[],
  family: InteractionFamily | undefined,
): { c: Float64Array; notes: string[] } | undefined {
  if (volumeTranslation === "none") return undefined;
  if (!family) throw notTranslated("van der Waals and Redlich-Kwong");
  let estimated = 0;
  const c = Float64Array.from(substances, ({ id, origin, acentricFactor, criticalTemperatureK, criticalPressurePa }) => {
    const row = volumeTranslation === "library" && origin === "library" ? findLibraryRow(id) : undefined;
    if (row) return family === "PR" ? row.volumeTranslation.PR_m3_per_mol : row.volumeTranslation.SRK_m3_per_mol;
    estimated++;
    return penelouxShift(family, { criticalTemperatureK, criticalPressurePa, rackettZ: yamadaGunnRackettZ(acentricFactor) });
  });
  const basis =
    estimated === 0
      ? "fitted to the saturated liquid at 0.7 of each critical temperature"
      : estimated === substances.length
        ? "by Peneloux from the acentric factor"
        : "fitted to saturated liquids, and by Peneloux for components that are not in the library";
  return {
    c,
    notes: [
      `Volumes are shifted (${basis}); phase equilibria, internal energies and entropies at given temperature and pressure stay.`,
    ],
  };
}

/** The refusal for an equation without a published shift. */
export function notTranslated(equations: string): EngineError {
  return new EngineError(
    "not-applicable",
    `${equations} take no volume translation; leave volumeTranslation out, or choose Soave-Redlich-Kwong or Peng-Robinson`,
    {},
    "fluid.volumeTranslation",
  );
}
