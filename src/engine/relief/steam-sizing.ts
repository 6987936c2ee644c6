/** Required area for steam (API Std 520-1: Napier's equation with its correction), evaluated in SI. */

/** Above this the correction has no published value [Pa absolute]. */
export const highestSteamPressurePa = 22.057e6;
const napierHoldsToPa = 10.339e6;

/** K_N: 1 up to 10 339 kPa, then (0.02764 p1 − 1000)/(0.03324 p1 − 1061) with p1 in kPa. */
export function napierCorrection(relievingPressurePa: number): number {
  const p1 = relievingPressurePa / 1e3;
  return relievingPressurePa <= napierHoldsToPa ? 1 : (0.02764 * p1 - 1000) / (0.03324 * p1 - 1061);
}

/** A = 190.5 W/(p1 Kd Kb Kc K_N K_SH) [mm², kg/h, kPa], here in m², kg/s and Pa. */
export function steamAreaM2(given: {
  massFlowKgPerS: number;
  relievingPressurePa: number;
  dischargeCoefficient: number;
  backPressureFactor: number;
  combinationFactor: number;
  superheatFactor: number;
}): number {
  const { massFlowKgPerS, relievingPressurePa, dischargeCoefficient, backPressureFactor, combinationFactor } = given;
  const factors = dischargeCoefficient * backPressureFactor * combinationFactor * given.superheatFactor;
  const squareMillimetres =
    (190.5 * massFlowKgPerS * 3600) / ((relievingPressurePa / 1e3) * factors * napierCorrection(relievingPressurePa));
  return squareMillimetres * 1e-6;
}
