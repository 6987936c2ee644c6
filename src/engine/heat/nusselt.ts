/** Published film correlations in dimensionless form. Ra, Pr, Re at the film temperature unless the source says otherwise. */

/** Churchill and Chu 1975, vertical plate, all Ra below 1e12, on the height. */
export const verticalPlateNusselt = (rayleigh: number, prandtl: number): number =>
  (0.825 + (0.387 * rayleigh ** (1 / 6)) / (1 + (0.492 / prandtl) ** (9 / 16)) ** (8 / 27)) ** 2;

/** Churchill and Chu 1975, horizontal cylinder, Ra below 1e12, on the diameter. */
export const horizontalCylinderNusselt = (rayleigh: number, prandtl: number): number =>
  (0.6 + (0.387 * rayleigh ** (1 / 6)) / (1 + (0.559 / prandtl) ** (9 / 16)) ** (8 / 27)) ** 2;

/** McAdams 1954, turbulent natural convection, 0.13 Ra^(1/3): the film coefficient has no length in it. */
export const turbulentNusselt = (rayleigh: number): number => 0.13 * Math.cbrt(rayleigh);

/** Churchill and Bernstein 1977, cylinder in cross-flow, Re Pr above 0.2, on the diameter. */
export const crossFlowNusselt = (reynolds: number, prandtl: number): number =>
  0.3 +
  ((0.62 * Math.sqrt(reynolds) * Math.cbrt(prandtl)) / (1 + (0.4 / prandtl) ** (2 / 3)) ** 0.25) *
    (1 + (reynolds / 282_000) ** (5 / 8)) ** 0.8;
