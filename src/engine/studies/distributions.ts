/**
 * Values of an input at a cumulative probability.
 *
 *   uniform      x = a + (b − a) P
 *   triangular   x = a + √[P (b − a)(c − a)] below the peak c, b − √[(1 − P)(b − a)(b − c)] above
 *   lognormal    ln x normal, with `low` and `high` as its 5 % and 95 % points
 *
 * Source   textbooks; inverse normal by Acklam's rational approximation (relative error below 1.2e-9)
 * Checks   latin-hypercube.test.ts
 */
import type { SampledInput } from "../cases/study-case";

/** `middle` is the input as the case has it, and the peak of a triangle that names none; it is held to the range. */
export function valueAt({ distribution, low: a, high: b, peak }: SampledInput, middle: number, probability: number): number {
  switch (distribution) {
    case "uniform":
      return a + (b - a) * probability;
    case "lognormal": {
      const mean = (Math.log(a) + Math.log(b)) / 2;
      const sigma = (Math.log(b) - Math.log(a)) / (2 * ninetyFive);
      return Math.exp(mean + sigma * inverseNormal(probability));
    }
    case "triangular": {
      const c = Math.min(Math.max(peak ?? middle, a), b);
      if (b === a) return a;
      return probability < (c - a) / (b - a)
        ? a + Math.sqrt(probability * (b - a) * (c - a))
        : b - Math.sqrt((1 - probability) * (b - a) * (b - c));
    }
  }
}

const ninetyFive = 1.6448536269514722;

const A = [-39.69683028665376, 220.9460984245205, -275.9285104469687, 138.357751867269, -30.66479806614716, 2.506628277459239];
const B = [-54.47609879822406, 161.5858368580409, -155.6989798598866, 66.80131188771972, -13.28068155288572, 1];
const C = [
  -0.007784894002430293, -0.3223964580411365, -2.400758277161838, -2.549732539343734, 4.374664141464968, 2.938163982698783,
];
const D = [0.007784695709041462, 0.3224671290700398, 2.445134137142996, 3.754408661907416, 1];
const tail = 0.02425;

export function inverseNormal(p: number): number {
  if (p > 1 - tail) return -inverseNormal(1 - p);
  if (p < tail) {
    const q = Math.sqrt(-2 * Math.log(p));
    return polynomial(C, q) / polynomial(D, q);
  }
  const q = p - 0.5;
  return (polynomial(A, q * q) * q) / polynomial(B, q * q);
}

const polynomial = (coefficients: readonly number[], x: number): number => coefficients.reduce((sum, c) => sum * x + c, 0);
