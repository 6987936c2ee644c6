import type { CurveAxis, Curves } from "./curve";

export type AxisScale = { min: number; max: number; ticks: number[] };

/**
 * Ticks at round values inside [min, max], at most `most` of them beside the origin.
 *
 * most   upper bound on the number of ticks, zero not counted; 1 or more
 */
export function roundTicks(min: number, max: number, most: number): number[] {
  if (!(max > min)) return [min];
  const step = roundStep(max - min, most);
  const first = Math.ceil(min / step - 1e-9);
  const last = Math.floor(max / step + 1e-9);
  // Multiples, not sums: 0.1 added three times is not 0.3.
  return Array.from({ length: last - first + 1 }, (_, i) => Number(((first + i) * step).toPrecision(12)));
}

/** Smallest of 1, 2, 3, 5 times a power of ten that cuts the span into at most `most` parts. */
function roundStep(span: number, most: number): number {
  const rough = span / most;
  const power = 10 ** Math.floor(Math.log10(rough));
  const factor = [1, 2, 3, 5, 10].find((candidate) => candidate * power >= rough * (1 - 1e-9)) ?? 10;
  return factor * power;
}

/** Scale of time: from first to last point, unless fixed; ticks lie inside. */
export function timeScale({ x, series, limits = [] }: Curves, most = 5): AxisScale {
  const [low, high] = extent([
    ...series.flatMap((curve) => [curve.x[0], curve.x.at(-1)]),
    ...limits.filter((limit) => limit.axis === "x").map((limit) => limit.at),
  ]);
  const min = x.min ?? (x.fromZero === false ? low : Math.min(low, 0));
  const max = x.max ?? (high > min ? high : min + 1);
  return { min, max, ticks: roundTicks(min, max, most) };
}

/** Scale of the values: holds all curves, marks and limits, widened to round ends. */
export function valueScale({ y, series, bands = [], limits = [], marks = [] }: Curves, most = 5): AxisScale {
  const [low, high] = extent([
    ...series.flatMap((curve) => curve.y),
    ...bands.flatMap(({ low: lower, high: upper }) => [...lower, ...upper]),
    ...marks.map((mark) => mark.y),
    ...limits.filter((limit) => limit.axis === "y").map((limit) => limit.at),
  ]);
  if (y.log) return decades(low, high);
  const bottom = y.min ?? (y.fromZero ? Math.min(0, low) : low);
  const top = y.max ?? (high > bottom ? high : bottom + 1);
  const step = roundStep(top - bottom, most);
  const min = y.min ?? Math.floor(bottom / step + 1e-9) * step;
  const max = y.max ?? Math.ceil(top / step - 1e-9) * step;
  return { min, max, ticks: roundTicks(min, max, most + 1) };
}

/** Whole steps of ten around the values. */
function decades(low: number, high: number): AxisScale {
  const first = Math.floor(Math.log10(low > 0 ? low : 0.1) + 1e-9);
  const last = Math.max(Math.ceil(Math.log10(high > 0 ? high : 1) - 1e-9), first + 1);
  const ticks = Array.from({ length: last - first + 1 }, (_, i) => Number((10 ** (first + i)).toPrecision(1)));
  return { min: ticks[0] ?? 0.1, max: ticks.at(-1) ?? 1, ticks };
}

/** Lowest and highest finite value; 0 and 1 where there is none, so that empty axes can be drawn. */
function extent(values: readonly (number | undefined)[]): [number, number] {
  let low = Infinity;
  let high = -Infinity;
  for (const value of values) {
    if (value === undefined || !Number.isFinite(value)) continue;
    if (value < low) low = value;
    if (value > high) high = value;
  }
  return low <= high ? [low, high] : [0, 1];
}

/** "pressure, bar(g)"; a pure number has no unit. */
export const axisTitle = ({ name, unit, log }: CurveAxis): string =>
  `${unit && unit !== "–" ? `${name}, ${unit}` : name}${log ? ", log scale" : ""}`;
