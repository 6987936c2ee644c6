import type { SizingPoint } from "@/engine/cases/sizing-case";

type Column = Exclude<keyof SizingPoint, "diameterM">;
const columns: Column[] = ["timeToTargetS", "minimumWallTemperatureK", "peakVentRateFireKgPerS", "peakVentRateColdKgPerS"];

/** Figures at a bore on the straight lines between those that were run; a figure is left out where either neighbour lacks it. */
export function pointAtBore(curve: readonly SizingPoint[], diameterM: number): SizingPoint {
  const point: SizingPoint = { diameterM };
  const after = curve.findIndex((one) => one.diameterM >= diameterM);
  const [one, other] = [curve[Math.max(after - 1, 0)], curve[after]];
  if (!one || !other) return point;
  const part = other.diameterM === one.diameterM ? 0 : (diameterM - one.diameterM) / (other.diameterM - one.diameterM);
  for (const column of columns) {
    const [low, high] = [one[column], other[column]];
    if (low !== undefined && high !== undefined) point[column] = low + part * (high - low);
  }
  return point;
}
