import { EngineError } from "../errors";

export interface TemperatureSearch {
  target: number;
  /** Round-off scale of the value beside its slope times T (the gas constant for energies, 0 for entropies). */
  scale: number;
  guess: number;
  range: readonly [number, number];
  quantity: string;
}

const maximumIterations = 100;

/**
 * The temperature at which a rising function of temperature reaches its target: Newton, kept inside a closing bracket.
 *
 * value(T)   evaluates the function and leaves the state for `slope`
 * slope()    derivative at the temperature last evaluated, positive
 * Returns    the temperature of the last evaluation, which is the answer
 * Throws     "no-convergence" where the function jumps over the target or never reaches it inside the range
 */
export function solveTemperature(search: TemperatureSearch, value: (T: number) => number, slope: () => number): number {
  const { target, guess, range } = search;
  let low = range[0];
  let high = range[1];
  let T = guess > low && guess < high ? guess : 0.5 * (Math.max(low, 200) + Math.min(high, 400));
  let previous = Infinity;
  for (let iteration = 0; iteration < maximumIterations; iteration++) {
    const residual = value(T) - target;
    const derivative = slope();
    const step = residual / derivative;
    if (residual === 0 || Math.abs(step) <= 1e-15 * T) return T;
    // Newton has reached round-off when its steps stop shrinking.
    if (Math.abs(step) <= 1e-13 * T && Math.abs(step) >= 0.5 * Math.abs(previous)) return T;
    if (residual > 0) high = T;
    else low = T;
    if (high - low <= 4e-16 * T) break;
    let next = T - step;
    const limit = 0.35 * T;
    if (!(derivative > 0) || !(next > low && next < high)) next = 0.5 * (low + high);
    else if (Math.abs(next - T) > limit && iteration > 0) next = T + Math.sign(next - T) * limit;
    if (Math.abs(next - T) > 0.5 * Math.abs(previous) && iteration > 20) next = 0.5 * (low + high);
    previous = step;
    T = next;
  }
  const reached = value(T);
  const gap = Math.abs(reached - target);
  if (gap <= 1e-10 * Math.max(Math.abs(target), search.scale * T, slope() * T)) return T;
  throw new EngineError(
    "no-convergence",
    `no single phase has this ${search.quantity}; the search closed at ${T} K without reaching it`,
    { temperatureK: T, target, reached, iterations: maximumIterations },
  );
}
