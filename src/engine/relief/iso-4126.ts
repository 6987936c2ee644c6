/** Capacity of a safety device by ISO 4126-1, evaluated in SI. Kdr is the derated coefficient, 0.9 of the certified one. */
import { criticalPressureRatio } from "./gas-sizing";

type IsoGas = {
  flowAreaM2: number;
  deratedCoefficient: number;
  relievingPressurePa: number;
  temperatureK: number;
  compressibility: number;
  molarMassKgPerMol: number;
  heatCapacityRatio: number;
};

/** C = 3.948 √(k (2/(k+1))^((k+1)/(k−1))), for kg/h, bar, mm², K, kg/kmol. */
const isoCoefficient = (k: number): number => 3.948 * Math.sqrt(k * (2 / (k + 1)) ** ((k + 1) / (k - 1)));

/** Flow function of an ideal nozzle over its choked value; 1 where it chokes. */
export function subcriticalShare(k: number, pressureRatio: number): number {
  if (pressureRatio <= criticalPressureRatio(k)) return 1;
  const r = pressureRatio;
  const flow = Math.sqrt(((2 * k) / (k - 1)) * (r ** (2 / k) - r ** ((k + 1) / k)));
  return flow / Math.sqrt(k * (2 / (k + 1)) ** ((k + 1) / (k - 1)));
}

/** Q_m = p0 C A Kdr Kb √(M/(Z T)) [kg/s]. */
export function isoGasCapacityKgPerS(given: IsoGas & { backPressurePa: number }): number {
  const { flowAreaM2, deratedCoefficient, relievingPressurePa, temperatureK, compressibility, heatCapacityRatio } = given;
  const share = subcriticalShare(heatCapacityRatio, given.backPressurePa / relievingPressurePa);
  const root = Math.sqrt((given.molarMassKgPerMol * 1e3) / (compressibility * temperatureK));
  const perHour =
    (relievingPressurePa / 1e5) * isoCoefficient(heatCapacityRatio) * (flowAreaM2 * 1e6) * deratedCoefficient * share * root;
  return perHour / 3600;
}

/** Q_m = 1.61 Kdr Kv A √((p0 − pb)/v) [kg/s]. */
export function isoLiquidCapacityKgPerS(given: {
  flowAreaM2: number;
  deratedCoefficient: number;
  viscosityFactor: number;
  relievingPressurePa: number;
  backPressurePa: number;
  densityKgPerM3: number;
}): number {
  const { flowAreaM2, deratedCoefficient, viscosityFactor, relievingPressurePa, backPressurePa, densityKgPerM3 } = given;
  const drop = (relievingPressurePa - backPressurePa) / 1e5;
  return (1.61 * deratedCoefficient * viscosityFactor * flowAreaM2 * 1e6 * Math.sqrt(drop * densityKgPerM3)) / 3600;
}
