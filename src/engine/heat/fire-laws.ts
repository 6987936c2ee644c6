/** Published fire laws beside those of a blowdown: credits, unwetted vessels, comparison standards and furnace curves. */

/**
 * Environment factor of insulation that stays in place in a fire: F = (k/t)(904 − θ)/66 570, θ the process temperature [°C].
 * Source   API Std 521; the constant is from memory, the standard's table of k/t is confirmed
 */
export const insulationFactor = (conductanceWPerM2K: number, processTemperatureK: number): number =>
  (conductanceWPerM2K * (904 - (processTemperatureK - 273.15))) / 66_570;

/**
 * Relief rate of a gas-filled vessel in fire [kg/s]: W = 0.2772 √(M p1) A (T_w − T1)^1.25/T1^1.1506 [kg/h, kPa, m², K].
 * Source   API Std 521, SI form; the exponents are from memory
 */
export function unwettedReliefKgPerS(given: {
  molarMassKgPerMol: number;
  relievingPressurePa: number;
  relievingTemperatureK: number;
  wallTemperatureK: number;
  exposedAreaM2: number;
}): number {
  const { molarMassKgPerMol, relievingPressurePa, relievingTemperatureK, wallTemperatureK, exposedAreaM2 } = given;
  const root = Math.sqrt((molarMassKgPerMol * 1e3 * relievingPressurePa) / 1e3);
  return (
    (0.2772 * root * exposedAreaM2 * (wallTemperatureK - relievingTemperatureK) ** 1.25) / relievingTemperatureK ** 1.1506 / 3600
  );
}

/** Balance of a surface in flames [W/m²]: σ(α ε_f T_f⁴ − ε_s T_s⁴) + h (T_g − T_s). */
export function surfaceBalanceWPerM2(
  flame: {
    flameEmissivity: number;
    surfaceAbsorptivity: number;
    surfaceEmissivity: number;
    coefficientWPerM2K: number;
    flameTemperatureK: number;
    gasTemperatureK: number;
  },
  surfaceTemperatureK: number,
): number {
  const radiation =
    flame.surfaceAbsorptivity * flame.flameEmissivity * flame.flameTemperatureK ** 4 -
    flame.surfaceEmissivity * surfaceTemperatureK ** 4;
  return stefanBoltzmann * radiation + flame.coefficientWPerM2K * (flame.gasTemperatureK - surfaceTemperatureK);
}
const stefanBoltzmann = 5.670374e-8;

const wattPerBtuPerHour = 0.29307107;
const squareFoot = 0.3048 ** 2;

/** NFPA 30 / 29 CFR 1910.106 heat input [W] for a wetted area [m²]; other areas of wetting and other credits than API Std 521's. */
export function nfpaHeatW(wettedAreaM2: number, designAbove1Psig: boolean): number {
  const A = wettedAreaM2 / squareFoot;
  const btuPerHour = ((): number => {
    if (A <= 200) return 20_000 * A;
    if (A <= 1000) return 199_300 * A ** 0.566;
    if (A <= 2800) return 963_400 * A ** 0.338;
    return designAbove1Psig ? 21_000 * A ** 0.82 : 14_090_000;
  })();
  return btuPerHour * wattPerBtuPerHour;
}

/** Hydrocarbon curve of EN 1991-1-2 [K] at a time [s]. */
export function hydrocarbonFireK(timeS: number): number {
  const minutes = timeS / 60;
  return 293.15 + 1080 * (1 - 0.325 * Math.exp(-0.167 * minutes) - 0.675 * Math.exp(-2.5 * minutes));
}

/** Standard curve of EN 1991-1-2 (ISO 834) [K] at a time [s]. */
export const standardFireK = (timeS: number): number => 293.15 + 345 * Math.log10((8 * timeS) / 60 + 1);
