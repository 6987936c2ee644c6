/**
 * Functions of one variable on 9 or 17 Chebyshev-Lobatto points of an interval: value, integral, and how well they are resolved.
 *
 *   s_j = (1 − cos(π j/n))/2,  n = 8 or 16; every second point of the finer set is a point of the coarser
 *
 * Source   Trefethen, Approximation Theory and Approximation Practice (2013), chapters 3 (coefficients), 5 (barycentric formula), 19
 *          (Clenshaw-Curtis quadrature)
 */
export const coarseCount = 9;
export const fineCount = 17;

export type PointSet = { count: number; places: Float64Array; weights: Float64Array; quadrature: Float64Array };

const makeSet = (count: number): PointSet => {
  const n = count - 1;
  const places = Float64Array.from({ length: count }, (_, j) => (1 - Math.cos((Math.PI * j) / n)) / 2);
  const weights = Float64Array.from({ length: count }, (_, j) => (j % 2 === 0 ? 1 : -1) * (j === 0 || j === n ? 0.5 : 1));
  const quadrature = Float64Array.from({ length: count }, (_, j) => {
    let sum = 1;
    for (let k = 1; k <= n / 2; k++) sum -= ((k === n / 2 ? 1 : 2) * Math.cos((2 * Math.PI * k * j) / n)) / (4 * k * k - 1);
    return ((j === 0 || j === n ? 1 : 2) * sum) / (2 * n);
  });
  return { count, places, weights, quadrature };
};

export const coarse = makeSet(coarseCount);
export const fine = makeSet(fineCount);
export const pointSet = (count: number): PointSet => (count === coarseCount ? coarse : fine);

/** Value at a place from 0 to 1. */
export function valueAt(values: ArrayLike<number>, place: number): number {
  const { count, places, weights } = pointSet(values.length);
  let sum = 0;
  let total = 0;
  for (let j = 0; j < count; j++) {
    const distance = place - places[j]!;
    if (distance === 0) return values[j]!;
    const weight = weights[j]! / distance;
    total += weight;
    sum += weight * values[j]!;
  }
  return sum / total;
}

const shares = new Float64Array(fineCount);

/** What each point contributes to the value at a place: shared scratch, overwritten by the next call. */
export function cardinal(count: number, place: number): Float64Array {
  const { places, weights } = pointSet(count);
  shares.fill(0);
  let total = 0;
  for (let j = 0; j < count; j++) {
    const distance = place - places[j]!;
    if (distance === 0) {
      shares.fill(0);
      shares[j] = 1;
      return shares;
    }
    shares[j] = weights[j]! / distance;
    total += shares[j]!;
  }
  for (let j = 0; j < count; j++) shares[j] = shares[j]! / total;
  return shares;
}

export function nearestPlace(count: number, place: number): number {
  const { places } = pointSet(count);
  let nearest = 0;
  for (let j = 1; j < count; j++) if (Math.abs(places[j]! - place) < Math.abs(places[nearest]! - place)) nearest = j;
  return nearest;
}

/** Integral over the interval from 0 to 1. */
export function integralOf(values: ArrayLike<number>): number {
  const { count, quadrature } = pointSet(values.length);
  let sum = 0;
  for (let j = 0; j < count; j++) sum += quadrature[j]! * values[j]!;
  return sum;
}

/** Size of the last two Chebyshev coefficients: what the points leave unresolved is about as much, or less. */
export function unresolved(values: ArrayLike<number>): number {
  const n = values.length - 1;
  let last = 0;
  let before = 0;
  for (let j = 0; j <= n; j++) {
    const share = j === 0 || j === n ? 0.5 : 1;
    const sign = j % 2 === 0 ? 1 : -1;
    last += share * sign * values[j]!;
    before += share * sign * Math.cos((Math.PI * j) / n) * values[j]!;
  }
  return Math.abs(last) / n + (2 * Math.abs(before)) / n;
}
