/**
 * The whole run as one function of time.
 *
 * The solver's interpolant lives for one step only and is a polynomial of degree 19 at most; each accepted step is kept by its values at
 * 20 Chebyshev-Lobatto points, which give that polynomial back exactly, by the barycentric formula (Berrut and Trefethen, SIAM Review 46 (2004)).
 */
import type { AcceptedStep } from "../../ode/integrate";

const points = 20;
const nodes = Array.from({ length: points }, (_, j) => (1 - Math.cos((Math.PI * j) / (points - 1))) / 2);
const weights = nodes.map((_, j) => (j % 2 === 0 ? 1 : -1) * (j === 0 || j === points - 1 ? 0.5 : 1));

/** With the fluid's temperature at both ends, from which searches inside the step start. */
export type KeptStep = {
  t0: number;
  t1: number;
  values: number[][];
  temperaturesK: [number, number];
  /** What was evaluated at the coarse Chebyshev points while events were looked for (`run-fit.ts`). */
  samples: Float64Array[] | undefined;
};

export class DenseRun {
  readonly steps: KeptStep[] = [];

  keep({ t0, y0, t1, y1, at }: AcceptedStep, temperaturesK: [number, number], samples?: Float64Array[]): void {
    // An event at the very start of a segment leaves a step without length.
    if (!(t1 > t0)) return;
    const values = nodes.map((s, j) => (j === 0 ? [...y0] : j === points - 1 ? y1 : at(t0 + s * (t1 - t0))));
    this.steps.push({ t0, t1, values, temperaturesK, samples });
  }

  get endTimeS(): number {
    return this.steps.at(-1)?.t1 ?? 0;
  }

  /** A first guess of the fluid's temperature at a time of one step. */
  static guessK({ t0, t1, temperaturesK: [a, b] }: KeptStep, t: number): number {
    return a + ((b - a) * (t - t0)) / (t1 - t0);
  }

  /** State at a time of one step. */
  static inside(step: KeptStep, t: number): number[] {
    const s = (t - step.t0) / (step.t1 - step.t0);
    const first = step.values[0] ?? [];
    const sums = new Array<number>(first.length).fill(0);
    let total = 0;
    for (let j = 0; j < points; j++) {
      const distance = s - (nodes[j] ?? 0);
      if (distance === 0) return [...(step.values[j] ?? [])];
      const weight = (weights[j] ?? 0) / distance;
      total += weight;
      const value = step.values[j] ?? [];
      for (let i = 0; i < sums.length; i++) sums[i] = (sums[i] ?? 0) + weight * (value[i] ?? 0);
    }
    return sums.map((sum) => sum / total);
  }
}
