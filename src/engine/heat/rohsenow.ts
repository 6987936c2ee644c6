/**
 * Nucleate boiling on a surface whose factor is known.
 *
 *   q = μ_l h_fg [g (ρ_l − ρ_v)/σ]^½ [c_p ΔT/(C_sf h_fg Pr^n)]³
 *
 * Source   Rohsenow, Trans. ASME 74 (1952) 969
 * Holds    C_sf from 0.006 to 0.013; n = 1 for water, 1.7 for other liquids. Uncertain to a factor of two where C_sf is not known.
 */
export function rohsenowFluxWPerM2(given: {
  liquidViscosityPaS: number;
  latentHeatJPerKg: number;
  liquidDensityKgPerM3: number;
  vapourDensityKgPerM3: number;
  surfaceTensionNPerM: number;
  liquidHeatCapacityJPerKgK: number;
  liquidPrandtl: number;
  superheatK: number;
  surfaceFactor: number;
  exponent: number;
}): number {
  const buoyancy = (9.80665 * (given.liquidDensityKgPerM3 - given.vapourDensityKgPerM3)) / given.surfaceTensionNPerM;
  const jakob = (given.liquidHeatCapacityJPerKgK * given.superheatK) / given.latentHeatJPerKg;
  return (
    given.liquidViscosityPaS *
    given.latentHeatJPerKg *
    Math.sqrt(buoyancy) *
    (jakob / (given.surfaceFactor * given.liquidPrandtl ** given.exponent)) ** 3
  );
}
