/** An ideal gas through a nozzle, and the emptying of a vessel that follows from it in closed form: for checks and for comparison. */
import { gasConstant } from "../gas-constant";

export type IdealGas = { molarMassKgPerMol: number; heatCapacityRatio: number; compressibility: number };

/** Mass flux [kg/(m² s)] from rest at p0, T0 to a back pressure; Z as a factor on the density. */
export function idealMassFlux(
  { molarMassKgPerMol: M, heatCapacityRatio: k, compressibility: Z }: IdealGas,
  pressurePa: number,
  temperatureK: number,
  backPressurePa: number,
): { massFluxKgPerM2S: number; choked: boolean } {
  const critical = (2 / (k + 1)) ** (k / (k - 1));
  const r = backPressurePa / pressurePa;
  const scale = pressurePa * Math.sqrt(M / (Z * gasConstant * temperatureK));
  if (r <= critical) return { massFluxKgPerM2S: scale * Math.sqrt(k) * (2 / (k + 1)) ** ((k + 1) / (2 * (k - 1))), choked: true };
  return {
    massFluxKgPerM2S: scale * Math.sqrt(((2 * k) / (k - 1)) * (r ** (2 / k) - r ** ((k + 1) / k))),
    choked: false,
  };
}

/**
 * Time to fall from p0 to p1 through a choked opening, without heat (adiabatic) and at constant temperature, and the adiabatic end.
 *
 *   p/p0 = [1 + (k−1)/2 · t/τ]^(−2k/(k−1)) and exp(−t/τ),   τ = m0/W0
 */
export function idealBlowdownTimes(given: {
  volumeM3: number;
  orificeAreaM2: number;
  dischargeCoefficient: number;
  gas: IdealGas;
  temperatureK: number;
  startPressurePa: number;
  endPressurePa: number;
}): { timeConstantS: number; adiabaticS: number; isothermalS: number; adiabaticEndK: number } {
  const { gas, temperatureK, startPressurePa, endPressurePa } = given;
  const { heatCapacityRatio: k } = gas;
  const mass = (startPressurePa * given.volumeM3 * gas.molarMassKgPerMol) / (gas.compressibility * gasConstant * temperatureK);
  const rate =
    given.dischargeCoefficient * given.orificeAreaM2 * idealMassFlux(gas, startPressurePa, temperatureK, 0).massFluxKgPerM2S;
  const timeConstantS = mass / rate;
  const ratio = startPressurePa / endPressurePa;
  return {
    timeConstantS,
    adiabaticS: ((2 * timeConstantS) / (k - 1)) * (ratio ** ((k - 1) / (2 * k)) - 1),
    isothermalS: timeConstantS * Math.log(ratio),
    adiabaticEndK: temperatureK * ratio ** (-(k - 1) / k),
  };
}
