/** The window between the edges, and the sentence that says it. */
import type { SizingEdge, SizingPoint, SizingResult } from "../cases/sizing-case";
import type { SizingLimits } from "./sizing-limits";

type Edges = { smallest: SizingEdge | undefined; largest: SizingEdge | undefined; coldBelow: SizingEdge | undefined };

export function windowOf({
  smallest,
  largest,
  coldBelow,
  curve,
  limits,
}: Edges & { curve: SizingPoint[]; limits: SizingLimits }): SizingResult["window"] {
  const limit = limits.minimumWallTemperatureK;
  const judged = curve.filter((point) => point.minimumWallTemperatureK !== undefined);
  const allTooCold =
    limit !== undefined && judged.length > 0 && judged.every((point) => (point.minimumWallTemperatureK ?? 0) <= limit);
  const lows = [smallest?.diameterM, coldBelow?.diameterM].filter((edge) => edge !== undefined);
  const fromM = lows.length > 0 ? Math.max(...lows) : undefined;
  const toM = largest?.diameterM;
  if (allTooCold || (fromM !== undefined && toM !== undefined && fromM >= toM))
    return { state: "none", ...(fromM === undefined ? {} : { fromM }), ...(toM === undefined ? {} : { toM }) };
  if (fromM !== undefined && toM !== undefined) return { state: "open", fromM, toM, widthM: toM - fromM };
  if (fromM !== undefined) return { state: "no-upper-edge", fromM };
  return toM === undefined ? { state: "no-edge" } : { state: "no-lower-edge", toM };
}

const mm = (metres: number): string => `${(1000 * metres).toPrecision(3)} mm`;

export function windowSentence(
  { state, fromM = 0, toM = 0 }: SizingResult["window"],
  { smallest, largest, coldBelow, bothAsked }: Edges & { bothAsked: boolean },
): string {
  switch (state) {
    case "open":
      return `A bore from ${mm(fromM)} to ${mm(toM)} works.`;
    case "none":
      return smallest && largest
        ? `No bore works: in the fire it must be at least ${mm(smallest.diameterM)}, and the cold steel allows at most ${mm(largest.diameterM)}.`
        : "No bore works: the steel gets too cold with every bore that was looked at.";
    case "no-upper-edge":
      return `A bore of ${mm(fromM)} or more works${bothAsked || coldBelow ? "; the steel stays warm enough with every larger bore that was looked at" : ""}.`;
    case "no-lower-edge":
      return `A bore of up to ${mm(toM)} keeps the steel warm enough.`;
    case "no-edge":
      return "The steel stays warm enough with every bore that was looked at.";
  }
}

/** The bore at which the load in the fire meets the capacity, on the straight line between logarithms. */
export function loadPassedAbove(curve: readonly SizingPoint[], capacityKgPerS: number | undefined): number | undefined {
  if (capacityKgPerS === undefined) return undefined;
  const loads = curve.flatMap(({ diameterM, peakVentRateFireKgPerS, peakVentRateColdKgPerS }) => {
    const load = peakVentRateFireKgPerS ?? peakVentRateColdKgPerS;
    return load === undefined ? [] : [{ x: Math.log(diameterM), y: Math.log(load) }];
  });
  const wanted = Math.log(capacityKgPerS);
  for (let i = 1; i < loads.length; i++) {
    const [a, b] = [loads[i - 1], loads[i]];
    if (a && b && a.y <= wanted && b.y > wanted) return Math.exp(a.x + ((b.x - a.x) * (wanted - a.y)) / (b.y - a.y));
  }
  return undefined;
}
