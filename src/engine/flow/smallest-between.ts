/**
 * Place of the smallest value of a function between two points, without derivatives: parabolic steps, golden section as safeguard.
 *
 * Source   Brent, Algorithms for Minimization without Derivatives (1973), chapter 5 (localmin)
 * Holds    one minimum in the interval; a kink is found too
 * tolerance  relative to x, and a third of it absolute
 */
const golden = (3 - Math.sqrt(5)) / 2;

export function smallestBetween(f: (x: number) => number, from: number, to: number, tolerance: number): number {
  let [a, b] = [from, to];
  let x = a + golden * (b - a);
  let fx = f(x);
  let [w, fw, v, fv] = [x, fx, x, fx];
  let d = 0;
  let e = 0;
  for (let i = 0; i < 80; i++) {
    const middle = (a + b) / 2;
    const near = tolerance * Math.abs(x) + tolerance / 3;
    if (Math.abs(x - middle) <= 2 * near - (b - a) / 2) return x;
    let parabolic = false;
    if (Math.abs(e) > near) {
      const r = (x - w) * (fx - fv);
      let q = (x - v) * (fx - fw);
      let p = (x - v) * q - (x - w) * r;
      q = 2 * (q - r);
      if (q > 0) p = -p;
      else q = -q;
      if (Math.abs(p) < Math.abs((q * e) / 2) && p > q * (a - x) && p < q * (b - x)) {
        e = d;
        d = p / q;
        const u = x + d;
        if (u - a < 2 * near || b - u < 2 * near) d = x < middle ? near : -near;
        parabolic = true;
      }
    }
    if (!parabolic) {
      e = (x < middle ? b : a) - x;
      d = golden * e;
    }
    const u = x + (Math.abs(d) >= near ? d : Math.sign(d) * near);
    const fu = f(u);
    if (fu <= fx) {
      if (u < x) b = x;
      else a = x;
      [v, fv, w, fw, x, fx] = [w, fw, x, fx, u, fu];
    } else {
      if (u < x) a = u;
      else b = u;
      if (fu <= fw || w === x) [v, fv, w, fw] = [w, fw, u, fu];
      else if (fu <= fv || v === x || v === w) [v, fv] = [u, fu];
    }
  }
  return x;
}
