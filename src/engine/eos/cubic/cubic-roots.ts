/**
 * Real roots w = v/b above 1 of a two-parameter cubic equation at given pressure, lowest first.
 *
 *   B (w − 1)(w + δ1)(w + δ2) − (w + δ1)(w + δ2) + α (w − 1) = 0,   B = p b/(R T),  α = a/(b R T)
 *
 * Source   the generic cubic of `cubic-equations.ts` cleared of fractions. Cardano places the roots, in Z = B w or, at low
 *          pressure, in ζ = 1/w: near zero pressure the two dense roots are a double root of the cubic in Z to within
 *          round-off, and the liquid would be lost. Newton in w then restores every digit.
 * Returns  the number of roots written to `roots` (1, 2 or 3); the middle one of three is unstable
 */
export function cubicRoots(B: number, alpha: number, delta1: number, delta2: number, roots: Float64Array): number {
  const sum = delta1 + delta2;
  const product = delta1 * delta2;
  let count: number;
  if (B < 0.02 && alpha > 3) {
    const lead = -(alpha + product * (1 + B));
    count = realRoots((B * (product - sum) - sum + alpha) / lead, (B * (sum - 1) - 1) / lead, B / lead, roots);
    if (count === 3) {
      const dense = roots[2]!;
      roots[2] = 1 / Math.max(roots[0]!, 0.5 * B); // ζ rises where w falls; the thin root may be all round-off
      roots[1] = 1 / roots[1]!;
      roots[0] = 1 / dense;
    } else {
      roots[0] = 1 / Math.max(roots[0]!, 0.5 * B);
    }
  } else {
    const A = alpha * B;
    const c2 = (sum - 1) * B - 1;
    const c1 = A + product * B * B - sum * B * (B + 1);
    count = realRoots(c2, c1, -(A * B + product * B * B * (B + 1)), roots);
    for (let k = 0; k < count; k++) roots[k] = roots[k]! / B;
  }
  let kept = 0;
  for (let k = 0; k < count; k++) {
    const w = polish(roots[k]!, B, alpha, sum, product);
    if (w > 1 && (kept === 0 || w > roots[kept - 1]!)) roots[kept++] = w;
  }
  return kept;
}

/** Roots of x³ + c2 x² + c1 x + c0 by Cardano, in rising order; 1 or 3 of them. */
function realRoots(c2: number, c1: number, c0: number, roots: Float64Array): number {
  const shift = c2 / 3;
  const q = shift * shift - c1 / 3;
  const r = shift * (shift * shift - c1 / 2) + c0 / 2;
  const discriminant = r * r - q * q * q;
  if (discriminant < 0) {
    const root = Math.sqrt(q);
    const angle = Math.acos(Math.max(-1, Math.min(1, r / (q * root)))) / 3;
    const third = (2 * Math.PI) / 3;
    // the cosine falls over [0, π]: these come out in rising order
    roots[0] = -2 * root * Math.cos(angle) - shift;
    roots[1] = -2 * root * Math.cos(angle - third) - shift;
    roots[2] = -2 * root * Math.cos(angle + third) - shift;
    return 3;
  }
  const s = -Math.sign(r || 1) * Math.cbrt(Math.abs(r) + Math.sqrt(discriminant));
  roots[0] = s + (s === 0 ? 0 : q / s) - shift;
  return 1;
}

/** Newton on the cleared cubic; a root that Cardano places is at most a few steps away. */
function polish(start: number, B: number, alpha: number, sum: number, product: number): number {
  let w = start > 1 ? start : 1 + 1e-9;
  for (let iteration = 0; iteration < 12; iteration++) {
    const Q = (w + sum) * w + product;
    const slopeQ = 2 * w + sum;
    const value = (B * (w - 1) - 1) * Q + alpha * (w - 1);
    const slope = B * Q + (B * (w - 1) - 1) * slopeQ + alpha;
    if (slope === 0) return w;
    const step = value / slope;
    const next = w - step;
    w = next > 1 ? next : (1 + w) / 2;
    if (Math.abs(step) <= 2e-16 * w) break;
    if (iteration >= 2 && Math.abs(step) <= 1e-14 * w) break;
  }
  return w;
}
