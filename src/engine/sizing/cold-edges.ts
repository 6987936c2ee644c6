/** Where the coldest steel crosses its limit along a row of bores: above the warm stretch that a fire can use, and below it where it is cold again. */
import type { SizingEdge, SizingPoint } from "../cases/sizing-case";
import { bracketedRoot } from "../ode/bracketed-root";
import type { LookUp } from "./look-up";
import type { SizingLimits } from "./sizing-limits";

/** Of the bore, relative. */
const edgeTolerance = 5e-4;
const aside = 1e-3;

export function coldEdges(
  curve: readonly SizingPoint[],
  { minimumWallTemperatureK: limit = 0 }: SizingLimits,
  smallestM: number | undefined,
  lookUp: LookUp,
): { largest?: SizingEdge; coldBelow?: SizingEdge } {
  const known = curve.filter((point) => point.minimumWallTemperatureK !== undefined);
  const stretches = warmStretches(known.map((point) => (point.minimumWallTemperatureK ?? 0) > limit));
  // The first that reaches beyond the smallest bore, or else the one of the largest bores.
  const chosen =
    stretches.find(({ to }) => to === known.length - 1 || (known[to + 1]?.diameterM ?? 0) > (smallestM ?? 0)) ?? stretches.at(-1);
  if (!chosen) return {};
  const between = (i: number): SizingEdge => edgeBetween(known[i]?.diameterM ?? 0, known[i + 1]?.diameterM ?? 0, limit, lookUp);
  return {
    ...(chosen.to < known.length - 1 ? { largest: between(chosen.to) } : {}),
    ...(chosen.from > 0 ? { coldBelow: between(chosen.from - 1) } : {}),
  };
}

/** Runs of neighbours that are all warm enough, by index. */
function warmStretches(warm: readonly boolean[]): { from: number; to: number }[] {
  const found: { from: number; to: number }[] = [];
  warm.forEach((one, i) => {
    const last = found.at(-1);
    if (!one) return;
    if (last && last.to === i - 1) last.to = i;
    else found.push({ from: i, to: i });
  });
  return found;
}

/** Loosely first, then at the case's tolerance in a bracket a little wider than the loose runs' error. */
function edgeBetween(lowM: number, highM: number, limit: number, lookUp: LookUp): SizingEdge {
  const loose = (lnD: number): number => lookUp.looseSteelK(Math.exp(lnD)) - limit;
  const tight = (lnD: number): number => lookUp.tightSteelK(Math.exp(lnD)) - limit;
  const rootOf = (f: (x: number) => number, a: number, b: number): number | undefined => {
    const [fa, fb] = [f(a), f(b)];
    return fa * fb <= 0 ? bracketedRoot(f, { a, fa, b, fb }, edgeTolerance) : undefined;
  };
  const [a, b] = [Math.log(lowM), Math.log(highM)];
  const near = rootOf(loose, a, b) ?? (a + b) / 2;
  const lnD = rootOf(tight, Math.max(near - 2e-3, a), Math.min(near + 2e-3, b)) ?? rootOf(tight, a, b) ?? near;
  const diameterM = Math.exp(lnD);
  const confirmed = [diameterM * (1 - aside), diameterM * (1 + aside)].map((bore) => ({
    diameterM: bore,
    value: lookUp.tightSteelK(bore),
  }));
  return { diameterM, governedBy: "cold-steel", value: lookUp.tightSteelK(diameterM), limit, unit: "K", confirmed };
}
