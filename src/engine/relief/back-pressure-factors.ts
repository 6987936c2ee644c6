/**
 * Factors of balanced-bellows devices against back pressure in % of set (gauge), as read from the published curves to about ±0.02 and held in
 * an open fluid library. A maker's curve for the device replaces them.
 */
const backPressurePercent = [15, 20, 25, 30, 35, 40, 45, 50] as const;
const gas = {
  10: [1, 1, 1, 0.998, 0.946, 0.869, 0.78, 0.695],
  16: [1, 1, 1, 1, 1, 0.981, 0.942, 0.906],
  21: [1, 1, 1, 1, 1, 1, 1, 1],
} as const;
const liquid = [1, 0.972, 0.919, 0.868, 0.818, 0.768, 0.718, 0.666] as const;

export const overpressurePercents = ["10", "16", "21"] as const;
export type OverpressurePercent = (typeof overpressurePercents)[number];

/** Above this the curves end. */
export const highestBackPressureFraction = 0.5;

/** Kb for gas. `fraction` is back pressure over set pressure, both gauge; held at its ends. */
export const gasBackPressureFactor = (fraction: number, overpressure: OverpressurePercent): number =>
  read(gas[Number(overpressure) as keyof typeof gas], fraction);

/** Kw for liquid. */
export const liquidBackPressureFactor = (fraction: number): number => read(liquid, fraction);

function read(values: readonly number[], fraction: number): number {
  const percent = Math.min(Math.max(fraction * 100, backPressurePercent[0]), 50);
  const after = Math.max(
    backPressurePercent.findIndex((one) => one >= percent),
    1,
  );
  const [x0 = 0, x1 = 1, y0 = 1, y1 = 1] = [
    backPressurePercent[after - 1],
    backPressurePercent[after],
    values[after - 1],
    values[after],
  ];
  return y0 + ((y1 - y0) * (percent - x0)) / (x1 - x0);
}
