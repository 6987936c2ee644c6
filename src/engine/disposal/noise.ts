/** Noise of a vent that discharges in the open (API Std 521 form). */

/** Speed of sound of the standard's form, 91.2 √(k T/M) [m/s]. */
export const soundSpeedMPerS = (k: number, temperatureK: number, molarMassKgPerMol: number): number =>
  91.2 * Math.sqrt((k * temperatureK) / (molarMassKgPerMol * 1e3));

/** The chart's intensity against pressure ratio [dB], as digitised in an open fluid library. Steep below a ratio of 3. */
export const chartIntensityDb = (pressureRatio: number): number =>
  pressureRatio < 2.92 ? 87.91 * Math.log10(pressureRatio) + 12.76 : 4.824 * Math.log10(pressureRatio) + 51.62;

export const steepBelowRatio = 3;
const addedWhereSteepDb = 3;

/** L at 30 m = L_chart + 10 log10(W c²/2) [dB], 3 dB added where the chart is too steep to read. */
export function levelAt30mDb(given: {
  massFlowKgPerS: number;
  heatCapacityRatio: number;
  temperatureK: number;
  molarMassKgPerMol: number;
  chartDb: number;
  pressureRatio: number;
}): number {
  const c = soundSpeedMPerS(given.heatCapacityRatio, given.temperatureK, given.molarMassKgPerMol);
  const added = given.pressureRatio < steepBelowRatio ? addedWhereSteepDb : 0;
  return given.chartDb + added + 10 * Math.log10((given.massFlowKgPerS * c ** 2) / 2);
}

/** −20 log10(r/30). */
export const levelAtDistanceDb = (levelAt30m: number, distanceM: number): number => levelAt30m - 20 * Math.log10(distanceM / 30);

/** 10 log10 Σ 10^(L/10). */
export const addLevelsDb = (levels: readonly number[]): number =>
  10 * Math.log10(levels.reduce((sum, level) => sum + 10 ** (level / 10), 0));
