/** Stored energy and stand-off of a pneumatic pressure test (ASME PCC-2 article 501). */

/** Energy of one kilogram of TNT in the article [J]. */
export const tntJPerKg = 4_266_920;
/** Surroundings in the article [Pa]. */
const articleSurroundingsPa = 101_000;

/** E = 2.5 p_t V (1 − (p_a/p_t)^0.286) [J], air or nitrogen; p_t absolute [Pa]. */
export const pressureTestEnergyJ = (testPressurePa: number, volumeM3: number): number =>
  2.5 * testPressurePa * volumeM3 * (1 - (articleSurroundingsPa / testPressurePa) ** 0.286);

/** R = R_scaled (2 TNT)^(1/3) [m], R_scaled in m/kg^(1/3). */
export const testDistanceM = (tntKg: number, scaledDistance: number): number => scaledDistance * Math.cbrt(2 * tntKg);

/** Fixed distances of the article: 30 m up to 135.5 MJ, 60 m up to 271 MJ; above, by the formula alone. */
export function fixedDistanceM(energyJ: number): number {
  if (energyJ <= 135.5e6) return 30;
  return energyJ <= 271e6 ? 60 : 0;
}
