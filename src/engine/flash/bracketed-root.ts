import { EngineError } from "../errors";

/**
 * A root of a continuous function between two points of opposite sign.
 *
 * Source   Brent, Algorithms for Minimization without Derivatives (1973), chapter 4 (inverse quadratic steps, bisection kept).
 * within   absolute tolerance on x; the search also ends when |f| ≤ `accept`
 * Throws   "no-convergence" when the ends have the same sign
 */
export function bracketedRoot(
  f: (x: number) => number,
  ends: { a: number; fa: number; b: number; fb: number },
  { within, accept = 0, what }: { within: number; accept?: number; what: string },
): number {
  let { a, fa, b, fb } = ends;
  if (fa === 0) return a;
  if (fb === 0) return b;
  if (!(fa * fb < 0)) throw new EngineError("no-convergence", `${what}: no sign change in the range searched`, { a, fa, b, fb });
  let c = a;
  let fc = fa;
  let d = b - a;
  let e = d;
  for (let iteration = 0; iteration < 200; iteration++) {
    if (fb * fc > 0) {
      c = a;
      fc = fa;
      d = b - a;
      e = d;
    }
    if (Math.abs(fc) < Math.abs(fb)) {
      a = b;
      fa = fb;
      b = c;
      fb = fc;
      c = a;
      fc = fa;
    }
    const tolerance = 2e-16 * Math.abs(b) + 0.5 * within;
    const half = 0.5 * (c - b);
    if (Math.abs(half) <= tolerance || Math.abs(fb) <= accept) return b;
    if (Math.abs(e) >= tolerance && Math.abs(fa) > Math.abs(fb)) {
      const s = fb / fa;
      let p: number;
      let q: number;
      if (a === c) {
        p = 2 * half * s;
        q = 1 - s;
      } else {
        const r = fa / fc;
        const t = fb / fc;
        p = s * (2 * half * r * (r - t) - (b - a) * (t - 1));
        q = (r - 1) * (t - 1) * (s - 1);
      }
      if (p > 0) q = -q;
      p = Math.abs(p);
      if (2 * p < Math.min(3 * half * q - Math.abs(tolerance * q), Math.abs(e * q))) {
        e = d;
        d = p / q;
      } else {
        d = half;
        e = d;
      }
    } else {
      d = half;
      e = d;
    }
    a = b;
    fa = fb;
    b += Math.abs(d) > tolerance ? d : Math.sign(half) * tolerance;
    fb = f(b);
  }
  throw new EngineError("no-convergence", `${what}: the search for a root did not close`, { a: b, fa: fb });
}
