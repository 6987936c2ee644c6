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
  return newton(evaluate, point, p, rho, 0, rho, false);
}

/**
 * Density of the thin root: Newton from below. Below the critical temperature p(ρ) of a gas is concave up to the spinodal, so
 * a step that passes the target has left the branch: multiparameter equations have further, meaningless loops behind it.
 *
 * subcritical   is that so at this temperature?
 */
export function thinRoot(
  evaluate: (rho: number) => void,
  point: PressurePoint,
  p: number,
  start: number,
  ceiling: number,
  subcritical: boolean,
): number | undefined {
  let rho = start;
  for (let k = 0; k < 60; k++) {
    evaluate(rho);
    if (point.pressure <= p && point.slope > 0) break;
    rho *= 0.8;
    if (k === 59) return undefined;
  }
  return newton(evaluate, point, p, rho, rho, ceiling, subcritical);
}

const scanSteps = 160;

/**
 * The rising places where p(ρ) crosses p, least dense first, from a walk over all densities: for isotherms so crooked that neither end leads
 * to a root (GERG-2008 for very unlike components, far from what it was fitted to).
 */
export function scannedRoots(evaluate: (rho: number) => void, point: PressurePoint, p: number, ceiling: number): number[] {
  const roots: number[] = [];
  let before = 0;
  let below = true;
  for (let k = 1; k <= scanSteps; k++) {
    const rho = ceiling * (k / scanSteps) ** 1.5;
    evaluate(rho);
    const isBelow = point.pressure < p;
    if (below && !isBelow) {
      let [low, high] = [before, rho];
      for (let half = 0; half < 200 && high - low > 1e-15 * high; half++) {
        const middle = 0.5 * (low + high);
        evaluate(middle);
        if (point.pressure < p) low = middle;
        else high = middle;
      }
      evaluate(high);
      if (point.slope > 0) roots.push(high);
    }
    below = isBelow;
    before = rho;
  }
  return roots;
}

function newton(
  evaluate: (rho: number) => void,
  point: PressurePoint,
  p: number,
  start: number,
  floor: number,
  ceiling: number,
  strict: boolean,
): number | undefined {
  let rho = start;
  let low = floor;
  let high = ceiling;
  let highSeen = false;
  let lowSeen = false;
  let previous = Infinity;
  for (let step = 0; step < maximumSteps; step++) {
    const excess = point.pressure - p;
    if (strict && excess > 1e-6 * p) return undefined;
    if (excess > 0) {
      high = Math.min(high, rho);
      highSeen = true;
    } else {
      low = Math.max(low, rho);
      lowSeen = true;
    }
    const closed = highSeen && lowSeen;
    const change = excess / point.slope;
    if (point.slope > 0) {
      const relative = Math.abs(change) / rho;
      if (relative < 1e-15 || (relative < 1e-12 && relative >= 0.5 * previous)) return rho;
      previous = relative;
    } else if (!closed) {
      return undefined; // between the spinodals, and no sign change was met: the branch has ended without a root
    }
    if (high - low < 1e-15 * high) return point.slope > 0 ? rho : undefined;
    let next = rho - change;
    if (!(point.slope > 0) || !(next > low && next < high)) next = low > 0 && high < Infinity ? 0.5 * (low + high) : 0.5 * rho;
    if (!(next > 0)) return undefined;
    rho = next;
    evaluate(rho);
  }
  return undefined;
}
