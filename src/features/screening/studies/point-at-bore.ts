import type { SizingPoint, SizingResult } from "@/engine/cases/sizing-case";

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

/** The row of bores that was run with the edges put in, so that a curve meets its limit where the edge stands. */
export function curveWithEdges({ curve, smallest, largest, coldBelow }: SizingResult): SizingPoint[] {
  const edges = [smallest, largest, coldBelow].flatMap((edge): SizingPoint[] => {
    if (!edge || curve.some(({ diameterM }) => diameterM === edge.diameterM)) return [];
    const read = pointAtBore(curve, edge.diameterM);
    return [edge.unit === "s" ? { ...read, timeToTargetS: edge.value } : { ...read, minimumWallTemperatureK: edge.value }];
  });
  return [...curve, ...edges].sort((a, b) => a.diameterM - b.diameterM);
}
