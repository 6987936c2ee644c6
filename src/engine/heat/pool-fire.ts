/**
 * Heat taken up by the liquid-wetted surface of a vessel in an open pool fire.
 *
 *   Q = C F A^0.82        C = 43 200 (adequate drainage and fire-fighting), 70 900 (otherwise)
 *
 * Source   API Std 521 / ISO 23251, empirical wetted-area law (constants confirmed in public readings; the licensed standard prevails)
 * Holds    open pool of hydrocarbon-like fuel; not a jet fire, not a confined or embanked one
 * areaM2   inside area below the liquid level, within reach of the flames (the caller's business)
 * environmentFactor  F, 1 for a bare vessel
 * Returns  Q [W]
 * Checks   fire.test.ts
 */
export type Drainage = "adequate" | "inadequate";

export const poolFireConstant: Record<Drainage, number> = { adequate: 43200, inadequate: 70900 };

export const poolFireHeatW = (wettedAreaM2: number, drainage: Drainage, environmentFactor: number): number =>
  wettedAreaM2 <= 0 ? 0 : poolFireConstant[drainage] * environmentFactor * wettedAreaM2 ** 0.82;
