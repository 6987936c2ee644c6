/**
 * How high a boiling liquid swells when vapour leaves above it.
 *
 *   j = W/(ρ_v A)       u = 1.53 [σ g (ρ_l − ρ_v)/ρ_l²]^¼       void = j/(2 u + C0 j)       swelled level = h/(1 − void),  C0 = 1.5
 *
 * Source   drift flux, churn-turbulent (1.53 and C0 from memory)
 * Holds    all vapour rises through the liquid: an upper bound where gas was there before. Liquids that foam swell more
 * Returns  the swelled level over the height of the vessel; 1 or more reaches an outlet at the top
 * Checks   carry-over.test.ts
 */
export type Swelling = {
  levelM: number;
  heightM: number;
  /** Of the liquid's surface. */
  surfaceM2: number;
  vapourRateKgPerS: number;
  vapourDensityKgPerM3: number;
  liquidDensityKgPerM3: number;
  surfaceTensionNPerM: number;
};

const gravity = 9.80665;
const distribution = 1.5;

export function swelledShare({
  levelM: h,
  heightM,
  surfaceM2: A,
  vapourRateKgPerS: W,
  vapourDensityKgPerM3: rhoV,
  liquidDensityKgPerM3: rhoL,
  surfaceTensionNPerM: sigma,
}: Swelling): number {
  if (h <= 0) return 0;
  if (h >= heightM || A <= 0 || rhoL <= rhoV) return 1;
  const j = W / (rhoV * A);
  const u = (1.53 * (Math.max(sigma, 0) * gravity * (rhoL - rhoV)) ** 0.25) / Math.sqrt(rhoL);
  const voidFraction = j / (2 * u + distribution * j);
  return h / (1 - voidFraction) / heightM;
}
