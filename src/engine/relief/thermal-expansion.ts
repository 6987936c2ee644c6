/** Blocked-in liquid that is heated (API Std 521 forms, re-derived). */

/** Volume flow that must leave, q = α Q/(ρ c) [m³/s]: expansion coefficient [1/K], heat [W], density [kg/m³], specific heat [J/(kg K)]. */
export const expansionFlowM3PerS = (expansionPerK: number, heatW: number, densityKgPerM3: number, specificHeat: number): number =>
  (expansionPerK * heatW) / (densityKgPerM3 * specificHeat);

/**
 * Pressure rise of a full, tight pipe per kelvin [Pa/K]:
 * dp/dT = (α_v − 3 α_l)/(χ + d/(2 E s) (2.5 − 2ν)), thin-walled elastic pipe with closed ends.
 */
export function blockedInRisePaPerK(given: {
  liquidExpansionPerK: number;
  pipeExpansionPerK: number;
  compressibilityPerPa: number;
  diameterM: number;
  thicknessM: number;
  elasticModulusPa: number;
  poissonRatio: number;
}): number {
  const { liquidExpansionPerK, pipeExpansionPerK, compressibilityPerPa, diameterM, thicknessM } = given;
  const stretch = (diameterM / (2 * given.elasticModulusPa * thicknessM)) * (2.5 - 2 * given.poissonRatio);
  return (liquidExpansionPerK - 3 * pipeExpansionPerK) / (compressibilityPerPa + stretch);
}
