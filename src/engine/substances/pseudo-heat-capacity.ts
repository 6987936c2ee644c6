import type { HeatCapacity } from "./heat-capacity";

/**
 * Ideal-gas heat capacity of a petroleum fraction.
 *
 *   cp0 = −0.33886 + 0.02827 K − 0.26105 CF + 0.59332 ω CF
 *         + 1e-4 [ −(0.9291 − 1.1543 K + 0.0368 K²) + CF (4.56 − 9.48 ω) ] T + 1e-7 [ −1.6658 + CF (0.536 − 0.6828 ω) ] T²
 *   CF  = [ (12.8 − K)(10 − K)/(10 ω) ]²  for 10 < K < 12.8, else 0;   K = Tb^(1/3)/SG;   Btu/(lb °R), T in °R
 *
 * Source   Kesler and Lee 1976 (as above); the terms with CF are from memory.
 * Holds    about 255 to 922 K (0 to 1200 °F, from memory); n-octane and n-decane within 2.3 % from 300 to 500 K.
 */
export function keslerLeeHeatCapacity({ M, Tb, SG, omega }: { M: number; Tb: number; SG: number; omega: number }): HeatCapacity {
  const K = Math.cbrt(Tb) / SG;
  const CF = K > 10 && K < 12.8 ? (((12.8 - K) * (10 - K)) / (10 * omega)) ** 2 : 0;
  const perBtu = M / 1.985875279; // lb/lbmol over R in Btu/(lbmol °R)
  const rankine = 1.8;
  return {
    form: "polynomial",
    coefficients: [
      (-0.33886 + 0.02827 * K - 0.26105 * CF + 0.59332 * omega * CF) * perBtu,
      (-(0.9291 - 1.1543 * K + 0.0368 * K ** 2) + CF * (4.56 - 9.48 * omega)) * 1e-4 * perBtu * rankine,
      (-1.6658 + CF * (0.536 - 0.6828 * omega)) * 1e-7 * perBtu * rankine ** 2,
    ],
  };
}
