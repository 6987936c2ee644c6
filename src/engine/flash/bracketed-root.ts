import { EngineError } from "../errors";
import { bracketedRoot as brent } from "../ode/bracketed-root";

/**
 * A root of a continuous function between two points of opposite sign, or the engine's own refusal.
 *
 * within   absolute tolerance on x; the search also ends when |f| ≤ `accept`
 * what     names the root in a refusal
 * Throws   "no-convergence" when the ends have the same sign, or the function has no value on the way
 */
export function bracketedRoot(
  f: (x: number) => number,
  ends: { a: number; fa: number; b: number; fb: number },
  { within, accept = 0, what }: { within: number; accept?: number; what: string },
): number {
  const { a, fa, b, fb } = ends;
  if (fa !== 0 && fb !== 0 && !(fa * fb < 0))
    throw new EngineError("no-convergence", `${what}: no sign change in the range searched`, { a, fa, b, fb });
  const checked = (x: number): number => {
    const value = f(x);
    if (!Number.isFinite(value))
      throw new EngineError("no-convergence", `${what}: the search left the range where it has a value`, { x });
    return value;
  };
  return brent(checked, ends, within, accept);
}
