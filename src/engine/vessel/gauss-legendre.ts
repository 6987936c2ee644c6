/**
 * Nodes and weights of Gauss-Legendre quadrature on [-1, 1].
 *
 * Source   Abramowitz and Stegun (1964), 25.4.29 to 25.4.30; nodes by Newton's method on the Legendre recurrence
 * points   number of nodes
 * Returns  nodes[points], weights[points]
 */
function gaussLegendre(points: number): { nodes: number[]; weights: number[] } {
  const nodes: number[] = [];
  const weights: number[] = [];
  for (let i = 1; i <= points; i++) {
    let x = Math.cos((Math.PI * (i - 0.25)) / (points + 0.5));
    let slope = 1;
    for (let k = 0; k < 100; k++) {
      let [before, now] = [1, x];
      for (let j = 2; j <= points; j++) [before, now] = [now, ((2 * j - 1) * x * now - (j - 1) * before) / j];
      slope = (points * (x * now - before)) / (x * x - 1);
      const step = now / slope;
      x -= step;
      if (Math.abs(step) < 1e-16) break;
    }
    nodes.push(x);
    weights.push(2 / ((1 - x * x) * slope * slope));
  }
  return { nodes, weights };
}

const rule = gaussLegendre(32);

/**
 * ∫ f(p) dp from `from` to `to`, with the nodes drawn to both ends by p = mid − half·cos(πu), so that a square-root kink at an end
 * (a liquid surface that just touches a ring of the head) costs no accuracy.
 */
export function integral(f: (p: number) => number, from: number, to: number): number {
  const half = (to - from) / 2;
  let sum = 0;
  rule.nodes.forEach((node, i) => {
    const angle = (Math.PI * (node + 1)) / 2;
    const p = from + half * (1 - Math.cos(angle));
    sum += (rule.weights[i] ?? 0) * f(p) * half * Math.sin(angle);
  });
  return (sum * Math.PI) / 2;
}
