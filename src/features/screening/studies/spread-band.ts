/** Lowest and highest of several curves over one axis of time. */
import type { StudyCurve } from "@/engine/cases/study-case";
import { valueAtTime } from "../results/value-at-time";

type Column = "pressurePa" | "fluidTemperatureK" | "wallTemperatureK";

/**
 * Bands end where the first of the runs ends: behind that they would be of fewer equations.
 *
 * Returns   undefined where a curve lacks the column
 */
export function spreadBand(
  curves: readonly StudyCurve[],
  column: Column,
): { timeS: number[]; low: number[]; high: number[] } | undefined {
  const [first] = curves;
  if (!first || curves.some((curve) => curve[column] === undefined)) return undefined;
  const end = Math.min(...curves.map(({ timeS }) => timeS.at(-1) ?? 0));
  const timeS = [...first.timeS.filter((time) => time < end), end].filter((time, i, all) => time !== all[i - 1]);
  const at = timeS.map((time) =>
    curves.flatMap((curve) => {
      const value = valueAtTime(curve.timeS, curve[column] ?? [], time);
      return value === null ? [] : [value];
    }),
  );
  return { timeS, low: at.map((values) => Math.min(...values)), high: at.map((values) => Math.max(...values)) };
}
