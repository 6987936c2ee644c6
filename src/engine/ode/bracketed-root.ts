/**
 * Root of a function of one variable inside a bracket, without derivatives.
 *
 * Source   Brent, Algorithms for Minimization without Derivatives (1973), chapter 4 (inverse quadratic steps, bisection as safeguard).
 * Holds    f continuous with f(a) and f(b) of opposite sign; where f only jumps, the place of the jump is found by bisection
 * tolerance  absolute width of the last bracket
 * accept     the search also ends where |f| is no more than this
 * Returns  x with a sign change of f within `tolerance` of it
 * Throws   RangeError where the ends don't bracket (NaN included)
 */
export function bracketedRoot(
  f: (x: number) => number,
  bracket: { a: number; fa: number; b: number; fb: number },
  tolerance: number,
  accept = 0,
): number {
  let { a, fa, b, fb } = bracket;
  if (fa === 0) return a;
  if (fb === 0) return b;
  if (!(fa * fb < 0)) throw new RangeError(`f(${a}) = ${fa} and f(${b}) = ${fb} bracket no root`);

  let c = a;
  let fc = fa;
  let d = b - a;
  let e = d;
  for (let i = 0; i < 200; i++) {
    if (Math.abs(fc) < Math.abs(fb)) {
      [a, b, c] = [b, c, b];
      [fa, fb, fc] = [fb, fc, fb];
    }
    const near = 2 * Number.EPSILON * Math.abs(b) + tolerance / 2;
    const half = (c - b) / 2;
    if (Math.abs(half) <= near || Math.abs(fb) <= accept) return b;

    if (Math.abs(e) >= near && Math.abs(fa) > Math.abs(fb)) {
      const s = fb / fa;
      let p: number;
      let q: number;
      if (a === c) {
        p = 2 * half * s;
        q = 1 - s;
      } else {
        const r = fb / fc;
        const t = fa / fc;
        p = s * (2 * half * t * (t - r) - (b - a) * (r - 1));
        q = (t - 1) * (r - 1) * (s - 1);
      }
      if (p > 0) q = -q;
      else p = -p;
      if (2 * p < Math.min(3 * half * q - Math.abs(near * q), Math.abs(e * q))) {
        e = d;
        d = p / q;
      } else {
        d = half;
        e = half;
      }
    } else {
      d = half;
      e = half;
    }
    a = b;
    fa = fb;
    b += Math.abs(d) > near ? d : Math.sign(half) * near;
    fb = f(b);
    if (!Number.isFinite(fb)) throw new RangeError(`f(${b}) is not finite`);
    if (fb * fc > 0) {
      c = a;
      fc = fa;
      d = b - a;
      e = d;
    }
  }
  return b;
}
