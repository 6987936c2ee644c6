/**
 * Ideal-gas heat capacity of one component, in one of two published forms.
 *
 *   Planck-Einstein   cp0/R = c0 + Σ n x² eˣ/(eˣ − 1)²,  x = θ/T
 *                     plus Σ k T^q where a reference equation has such terms (q neither 0 nor −1)
 *   polynomial        cp0/R = a0 + a1 T + a2 T² + …,     T in K, one to eight coefficients
 */
export type HeatCapacity =
  | {
      form: "planck-einstein";
      c0: number;
      terms: readonly { n: number; thetaK: number }[];
      powers?: readonly { k: number; q: number }[];
    }
  | { form: "polynomial"; coefficients: readonly number[] };
