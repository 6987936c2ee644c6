/** Heat radiation of a flame taken as a point (API Std 521). */

/** K = τ F Q/(4π D²) [W/m²]. */
export const radiationAtWPerM2 = (
  heatReleaseW: number,
  radiatedShare: number,
  transmissivity: number,
  distanceM: number,
): number => (transmissivity * radiatedShare * heatReleaseW) / (4 * Math.PI * distanceM ** 2);

/** D = √(τ F Q/(4π K)) [m]. */
export const distanceForRadiationM = (
  heatReleaseW: number,
  radiatedShare: number,
  transmissivity: number,
  fluxWPerM2: number,
): number => Math.sqrt((transmissivity * radiatedShare * heatReleaseW) / (4 * Math.PI * fluxWPerM2));

/** τ = 0.79 (100/RH)^(1/16) (30.5/D)^(1/16), D in m, RH in %; at most 1. */
export const transmissivity = (relativeHumidity: number, distanceM: number): number =>
  Math.min(0.79 * (1 / relativeHumidity) ** (1 / 16) * (30.5 / distanceM) ** (1 / 16), 1);

/** L = 0.00331 Q^0.4776 [m], the straight line of the standard's chart. */
export const flameLengthM = (heatReleaseW: number): number => 0.00331 * heatReleaseW ** 0.4776;
