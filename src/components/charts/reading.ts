import { withUnit, formatNumber } from "../quantity/format";
import type { CurveAxis, Curves } from "./curve";
import { valueAt } from "./curve-plugin";

export const writeValue = ({ unit, format }: CurveAxis, value: number): string =>
  withUnit(format?.(value) ?? formatNumber(value, { figures: 3 }), unit);

/** What the curves say at x, in one sentence of figures; ghosts are left out. */
export function readingAt({ x, y, series }: Curves, at: number): string {
  const values = series
    .filter(({ tone, label }) => tone !== "ghost" && label !== "")
    .flatMap((curve) => {
      const value = valueAt(curve, at);
      return value === null ? [] : [`${curve.label} ${writeValue(y, value)}`];
    });
  return [`at ${writeValue(x, at)}`, ...values].join(", ");
}

/** The next place of the reading post for a key, or undefined where the key means nothing here. Null takes the post away. */
export function moveReading(
  key: string,
  from: number | null,
  { min, max }: { min: number; max: number },
  fast: boolean,
): number | null | undefined {
  const step = ((max - min) / 100) * (fast ? 10 : 1);
  const clamp = (x: number) => Math.min(Math.max(x, min), max);
  switch (key) {
    case "ArrowRight":
      return clamp((from ?? min - step) + step);
    case "ArrowLeft":
      return clamp((from ?? max + step) - step);
    case "Home":
      return min;
    case "End":
      return max;
    case "Escape":
      return from === null ? undefined : null;
    default:
      return undefined;
  }
}
