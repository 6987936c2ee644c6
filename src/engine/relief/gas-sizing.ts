/**
 * Required area of a relief device for gas or vapour by the published sizing equations (API Std 520-1), evaluated in SI.
 *
 * The constants 0.03948 and 17.9 are the standard's, for kg/h, kPa, mm², K and kg/kmol; arguments and results here are SI.
 */
const kgPerHour = 3600;
const perKilopascal = 1e-3;
const squareMillimetre = 1e-6;

export type GasRelief = {
  massFlowKgPerS: number;
  molarMassKgPerMol: number;
  temperatureK: number;
  compressibility: number;
  heatCapacityRatio: number;
  relievingPressurePa: number;
  dischargeCoefficient: number;
  combinationFactor: number;
};

/** p2/p1 below which an ideal gas chokes: (2/(k+1))^(k/(k−1)). */
export const criticalPressureRatio = (k: number): number => (2 / (k + 1)) ** (k / (k - 1));

/** C of the standard, in √(kg kmol K)/(mm² h kPa): 0.03948 √(k (2/(k+1))^((k+1)/(k−1))). */
export const flowCoefficient = (k: number): number => 0.03948 * Math.sqrt(k * (2 / (k + 1)) ** ((k + 1) / (k - 1)));

/** A = W/(C Kd p1 Kb Kc) √(T Z/M) [m²], choked flow. */
export function gasCriticalAreaM2(given: GasRelief & { backPressureFactor: number }): number {
  const { massFlowKgPerS, molarMassKgPerMol, temperatureK, compressibility, heatCapacityRatio } = given;
  const { relievingPressurePa, dischargeCoefficient, combinationFactor, backPressureFactor } = given;
  const root = Math.sqrt((temperatureK * compressibility) / (molarMassKgPerMol * 1e3));
  const factors = dischargeCoefficient * backPressureFactor * combinationFactor;
  return (
    ((massFlowKgPerS * kgPerHour) / (flowCoefficient(heatCapacityRatio) * factors * relievingPressurePa * perKilopascal)) *
    root *
    squareMillimetre
  );
}

/** F2 = √( k/(k−1) r^(2/k) (1 − r^((k−1)/k))/(1 − r) ). */
export function subcriticalCoefficient(k: number, pressureRatio: number): number {
  const r = pressureRatio;
  return Math.sqrt(((k / (k - 1)) * r ** (2 / k) * (1 - r ** ((k - 1) / k))) / (1 - r));
}

/** A = 17.9 W/(F2 Kd Kc) √( Z T/(M p1 (p1 − p2)) ) [m²], conventional or pilot-operated device, flow not choked. */
export function gasSubcriticalAreaM2(given: GasRelief & { backPressurePa: number }): number {
  const { massFlowKgPerS, molarMassKgPerMol, temperatureK, compressibility, heatCapacityRatio } = given;
  const { relievingPressurePa, backPressurePa, dischargeCoefficient, combinationFactor } = given;
  const p1 = relievingPressurePa * perKilopascal;
  const p2 = backPressurePa * perKilopascal;
  const root = Math.sqrt((compressibility * temperatureK) / (molarMassKgPerMol * 1e3 * p1 * (p1 - p2)));
  const factors = subcriticalCoefficient(heatCapacityRatio, p2 / p1) * dischargeCoefficient * combinationFactor;
  return ((17.9 * massFlowKgPerS * kgPerHour) / factors) * root * squareMillimetre;
}
