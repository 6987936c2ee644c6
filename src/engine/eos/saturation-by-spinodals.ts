import type { SaturationVolumes } from "./fluid-model";

/** What a pure fluid's equation gives at one density: p [Pa], ∂p/∂ρ [Pa m³/mol], and G/(R T) up to a function of temperature. */
export interface IsothermPoint {
  pressure: number;
  slope: number;
  gibbs: number;
}

const steps = 240;
const iterations = 200;

/**
 * Saturated volumes close to the critical point, where Newton from an estimate falls into one phase: the isotherm's own spinodals bound the
 * saturation pressure, and inside those bounds equal Gibbs energies are found by bisection and Newton.
 *
 * evaluate   fills `point` at a density
 * critical   critical density [mol/m³]; the loop of the isotherm must lie between 0.2 and 2.2 of it, so T must be above about 0.9 Tc
 * Returns    undefined where the isotherm has no loop: the equation's own critical temperature is below T
 */
export function saturationBySpinodals(
  evaluate: (rho: number) => void,
  point: IsothermPoint,
  critical: number,
  RT: number,
): SaturationVolumes | undefined {
  const spinodals = loopOf(evaluate, point, critical);
  if (!spinodals) return undefined;
  const [thin, dense] = spinodals;
  evaluate(thin);
  let high = point.pressure;
  evaluate(dense);
  let low = Math.max(point.pressure, 0.3 * high);
  let p = 0.5 * (low + high);
  let previous = Infinity;
  for (let iteration = 0; iteration < iterations; iteration++) {
    const vapour = rootBetween(evaluate, point, p, 0, thin);
    const vapourGibbs = point.gibbs;
    const liquid = rootBetween(evaluate, point, p, dense, 3.5 * critical);
    const difference = point.gibbs - vapourGibbs; // falls with p, by v_v − v_l
    if (difference > 0) low = p;
    else high = p;
    const step = (difference * RT) / (1 / vapour - 1 / liquid);
    const change = Math.abs(step) / p;
    if (change < 1e-15 || (change < 1e-11 && change >= 0.5 * previous) || high - low < 1e-15 * p) {
      return { pressurePa: p, vapourVolume: 1 / vapour, liquidVolume: 1 / liquid };
    }
    previous = change;
    const next = p + step;
    p = next > low && next < high ? next : 0.5 * (low + high);
  }
  return undefined;
}

/** The densities between which the isotherm falls, from a walk over it; refined to where the slope is zero. */
function loopOf(evaluate: (rho: number) => void, point: IsothermPoint, critical: number): readonly [number, number] | undefined {
  let first = 0;
  let last = 0;
  let flattest = 0;
  let least = Infinity;
  const at = (k: number) => (0.2 + (2 * k) / steps) * critical;
  for (let k = 0; k <= steps; k++) {
    evaluate(at(k));
    if (point.slope < 0) {
      if (first === 0) first = k;
      last = k;
    }
    if (point.slope < least) {
      least = point.slope;
      flattest = k;
    }
  }
  if (first === 0) {
    // A loop narrower than a step shows at the flattest place, if anywhere.
    const inside = leastSlope(evaluate, point, at(flattest - 1), at(flattest + 1));
    evaluate(inside);
    if (!(point.slope < 0)) return undefined;
    return [slopeRoot(evaluate, point, at(flattest - 1), inside), slopeRoot(evaluate, point, at(flattest + 1), inside)];
  }
  return [slopeRoot(evaluate, point, at(first - 1), at(first)), slopeRoot(evaluate, point, at(last + 1), at(last))];
}

/** Golden-section search for the least slope. */
function leastSlope(evaluate: (rho: number) => void, point: IsothermPoint, a: number, b: number): number {
  const part = 0.6180339887498949;
  for (let k = 0; k < 60; k++) {
    const [x, y] = [b - part * (b - a), a + part * (b - a)];
    evaluate(x);
    const atX = point.slope;
    evaluate(y);
    if (atX < point.slope) b = y;
    else a = x;
  }
  return 0.5 * (a + b);
}

/** Bisection to the density of zero slope between a rising and a falling place; returns the rising side. */
function slopeRoot(evaluate: (rho: number) => void, point: IsothermPoint, rising: number, falling: number): number {
  let [up, down] = [rising, falling];
  for (let k = 0; k < 80 && Math.abs(up - down) > 1e-14 * up; k++) {
    const middle = 0.5 * (up + down);
    evaluate(middle);
    if (point.slope > 0) up = middle;
    else down = middle;
  }
  return up;
}

/** Density at a pressure on a rising branch between two densities; leaves `point` there. */
function rootBetween(evaluate: (rho: number) => void, point: IsothermPoint, p: number, low: number, high: number): number {
  let [a, b] = [low, high];
  let rho = 0.5 * (a + b);
  for (let k = 0; k < 200; k++) {
    evaluate(rho);
    const excess = point.pressure - p;
    if (excess > 0) b = rho;
    else a = rho;
    const next = rho - excess / point.slope;
    if (Math.abs(next - rho) < 1e-15 * rho || b - a < 1e-15 * rho) return rho;
    rho = point.slope > 0 && next > a && next < b ? next : 0.5 * (a + b);
  }
  return rho;
}
