export interface PressurePoint {
  pressure: number;
  slope: number;
}

const maximumSteps = 100;

/**
 * Density of the dense root of p(ρ) = p: Newton from above. Along a liquid branch p(ρ) is convex, so steps from a denser point
 * never pass the root; where the slope turns negative first, there is no dense root.
 *
 * evaluate   fills `point` at a density
 * start      a density above the root (raised until it is)
 * Returns    ρ, or undefined
 */
export function denseRoot(
  evaluate: (rho: number) => void,
  point: PressurePoint,
  p: number,
  start: number,
  ceiling: number,
): number | undefined {
  let rho = Math.min(start, ceiling);
  for (let k = 0; k < 60; k++) {
    evaluate(rho);
    if (point.pressure >= p && point.slope > 0) break;
    if (rho >= ceiling) return undefined;
    rho = Math.min(rho * 1.04, ceiling);
    if (k === 59) return undefined;
  }
  return newton(evaluate, point, p, rho, 0, rho);
}

/** Density of the thin root: Newton from below, where p(ρ) of a gas is concave. */
export function thinRoot(
  evaluate: (rho: number) => void,
  point: PressurePoint,
  p: number,
  start: number,
  ceiling: number,
): number | undefined {
  let rho = start;
  for (let k = 0; k < 60; k++) {
    evaluate(rho);
    if (point.pressure <= p && point.slope > 0) break;
    rho *= 0.8;
    if (k === 59) return undefined;
  }
  return newton(evaluate, point, p, rho, rho, ceiling);
}

function newton(
  evaluate: (rho: number) => void,
  point: PressurePoint,
  p: number,
  start: number,
  floor: number,
  ceiling: number,
): number | undefined {
  let rho = start;
  let low = floor;
  let high = ceiling;
  let previous = Infinity;
  for (let step = 0; step < maximumSteps; step++) {
    const excess = point.pressure - p;
    // Between the spinodals the slope is negative: the branch has ended without a root.
    if (!(point.slope > 0)) return undefined;
    const change = excess / point.slope;
    const relative = Math.abs(change) / rho;
    if (relative < 1e-15 || (relative < 1e-12 && relative >= 0.5 * previous)) return rho;
    if (excess > 0) high = Math.min(high, rho);
    else low = Math.max(low, rho);
    previous = relative;
    let next = rho - change;
    if (!(next > low && next < high)) next = low > 0 && high < Infinity ? 0.5 * (low + high) : 0.5 * rho;
    if (!(next > 0) || high - low < 1e-15 * high) return rho;
    rho = next;
    evaluate(rho);
  }
  return undefined;
}
