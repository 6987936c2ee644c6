/**
 * Force on an open discharge with gas leaving at the speed of sound (API Std 520-2 form; for screening).
 *
 * F = 129 W √(k T/((k+1) M)) + 0.1 A p2, with W [kg/s], T [K], M [kg/kmol], A [mm²] and p2 [bar gauge]; here in SI.
 */
export function reactionForceN(given: {
  massFlowKgPerS: number;
  heatCapacityRatio: number;
  temperatureK: number;
  molarMassKgPerMol: number;
  outletAreaM2: number;
  outletPressureGaugePa: number;
}): number {
  const { massFlowKgPerS, heatCapacityRatio: k, temperatureK, molarMassKgPerMol, outletAreaM2, outletPressureGaugePa } = given;
  const momentum = 129 * massFlowKgPerS * Math.sqrt((k * temperatureK) / ((k + 1) * molarMassKgPerMol * 1e3));
  return momentum + outletAreaM2 * outletPressureGaugePa;
}
