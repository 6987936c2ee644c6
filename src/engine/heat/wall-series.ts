/** Conduction through flat walls: resistances in series, and a slab whose one face changes at once. */

/** U of a flat wall [W/(m² K)]: 1/U = 1/h_i + Σ L/k + 1/h_o. */
export function overallCoefficient(
  insideWPerM2K: number,
  layers: readonly { thicknessM: number; conductivityWPerMK: number }[],
  outsideWPerM2K: number,
): number {
  const resistance = layers.reduce((sum, { thicknessM, conductivityWPerMK }) => sum + thicknessM / conductivityWPerMK, 0);
  return 1 / (1 / insideWPerM2K + resistance + 1 / outsideWPerM2K);
}

/**
 * Outer face of a slab whose inner face is held at a new temperature from time 0, the outer face insulated.
 *
 *   (T − T_i)/(T_0 − T_i) = (4/π) Σ (−1)^n/(2n+1) exp(−(2n+1)² π² α t/(4 L²))
 *
 * Source   Carslaw and Jaeger, Conduction of Heat in Solids, 2nd ed., section 3.4
 */
export function insulatedFaceTemperatureK(given: {
  thicknessM: number;
  diffusivityM2PerS: number;
  startK: number;
  innerFaceK: number;
  timeS: number;
}): number {
  const { thicknessM, diffusivityM2PerS, startK, innerFaceK, timeS } = given;
  const fourier = (diffusivityM2PerS * timeS) / thicknessM ** 2;
  // Below this the change has not got through, and the alternating series would need its terms without end.
  if (fourier < 1e-3) return startK;
  let sum = 0;
  for (let n = 0; n < 200; n++) {
    const odd = 2 * n + 1;
    const term = (Math.exp((-(odd ** 2) * Math.PI ** 2 * fourier) / 4) / odd) * (n % 2 === 0 ? 1 : -1);
    sum += term;
    if (Math.abs(term) < 1e-16) break;
  }
  return innerFaceK + (startK - innerFaceK) * (4 / Math.PI) * sum;
}
