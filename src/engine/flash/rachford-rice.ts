import { EngineError } from "../errors";

/**
 * Vapour fraction β from Σ z_i (K_i − 1)/(1 + β (K_i − 1)) = 0 for K-values that straddle 1.
 *
 * Source   Rachford and Rice, J. Pet. Technol. 4 (1952) 19; the root kept between the poles 1/(1 − Kmax) and 1/(1 − Kmin)
 *          (Whitson and Michelsen, Fluid Phase Equilib. 53 (1989) 51), so a β outside [0, 1] is an answer too.
 * Returns  β [-]; the function falls between the poles, so the bracketed Newton always closes
 * Throws   "no-convergence" when all K are on one side of 1
 */
export function rachfordRice(z: ArrayLike<number>, K: ArrayLike<number>, guess = 0.5): number {
  let largest = 0;
  let smallest = Infinity;
  for (let i = 0; i < z.length; i++) {
    if (z[i]! <= 0) continue;
    if (K[i]! > largest) largest = K[i]!;
    if (K[i]! < smallest) smallest = K[i]!;
  }
  if (!(largest > 1 && smallest < 1)) {
    throw new EngineError("no-convergence", "all K-values lie on one side of 1: there is no phase split", { largest, smallest });
  }
  let low = 1 / (1 - largest);
  let high = 1 / (1 - smallest);
  let beta = guess > low && guess < high ? guess : 0.5 * (Math.max(low, 0) + Math.min(high, 1));
  for (let iteration = 0; iteration < 200; iteration++) {
    let value = 0;
    let slope = 0;
    for (let i = 0; i < z.length; i++) {
      if (z[i]! <= 0) continue;
      const excess = K[i]! - 1;
      const share = excess / (1 + beta * excess);
      value += z[i]! * share;
      slope -= z[i]! * share * share;
    }
    if (value > 0) low = beta;
    else high = beta;
    const step = value / slope;
    let next = beta - step;
    if (!(next > low && next < high)) next = 0.5 * (low + high);
    if (Math.abs(next - beta) <= 1e-15 * Math.max(1, Math.abs(beta)) || value === 0) return next;
    beta = next;
  }
  return beta;
}
