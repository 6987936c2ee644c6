/**
 * Stress in a wall under pressure, its strength when hot, and the moment at which one meets the other.
 *
 *   σ = p_g (D + s)/(2 s)   cylinder, hoop;   half of it in a sphere            S = f σ_u k(T)
 *
 * Source   thin-wall hoop stress on the mean diameter; strength factors k of EN 1993-1-2 (table 3.1, annex C), see `steels/steel.ts`
 * Holds    static strength, no creep (more than about 15 min asks for a creep rule); no load from supports, bending or flanges
 * Checks   heat-up.test.ts (M6-06)
 */
import type { Steel } from "../steels/steel";

export type PressurePart = { steel: Steel; insideDiameterM: number; thicknessM: number; sphere: boolean };

const atmospherePa = 101325;

export function stressPa({ insideDiameterM: D, thicknessM: s, sphere }: PressurePart, pressurePa: number): number {
  const gaugePa = Math.max(pressurePa - atmospherePa, 0);
  return (gaugePa * (D + s)) / ((sphere ? 4 : 2) * s);
}

export type StrengthRule = { strengthFraction: number; tensileStrengthPa: number };

export const strengthPa = (steel: Steel, { strengthFraction, tensileStrengthPa }: StrengthRule, temperatureK: number): number =>
  strengthFraction * tensileStrengthPa * steel.strengthRatio(temperatureK);

/** First time at which a curve falls to another, on straight lines between points; undefined where it stays above. */
export function crossingTime(
  timeS: readonly number[],
  strength: readonly number[],
  stress: readonly number[],
): number | undefined {
  for (let i = 0; i < timeS.length; i++) {
    const spare = (strength[i] ?? 0) - (stress[i] ?? 0);
    if (spare > 0) continue;
    const before = i > 0 ? (strength[i - 1] ?? 0) - (stress[i - 1] ?? 0) : 0;
    if (i === 0 || before <= 0) return timeS[i];
    const [t0, t1] = [timeS[i - 1] ?? 0, timeS[i] ?? 0];
    return t0 + ((t1 - t0) * before) / (before - spare);
  }
  return undefined;
}
