/**
 * Gas through a control valve.
 *
 *   x = (p1 − p2)/p1, held to F_γ x_T     F_γ = γ/1.40     Y = 1 − x/(3 F_γ x_T)     W = N6 C Y √(x p1 ρ1)
 *   with C = C_v, N6 = 27.3 for W in kg/h, p1 in bar, ρ1 in kg/m³
 *
 * Source   IEC 60534-2-1, gas sizing, without fittings (F_p = 1)
 * Holds    a gas; γ is that of the ideal gas at T1. At high pressure the real gas departs from it by several per cent.
 * Returns  W [kg/s] fully open, whether it is choked, and the pressure in the vena contracta that belongs to x
 * Checks   control-valve.test.ts
 */
export type ValveFlow = { massFlowKgPerS: number; choked: boolean; pressureAtLimitPa: number };

const n6 = 27.3;

export function valveGasFlow({
  upstreamPressurePa: p1,
  downstreamPressurePa: p2,
  densityKgPerM3,
  gamma,
  cv,
  xt,
}: {
  upstreamPressurePa: number;
  downstreamPressurePa: number;
  densityKgPerM3: number;
  gamma: number;
  cv: number;
  xt: number;
}): ValveFlow {
  const limit = Math.min((gamma / 1.4) * xt, 0.999);
  const drop = Math.max((p1 - p2) / p1, 0);
  const x = Math.min(drop, limit);
  const expansion = 1 - x / (3 * limit);
  return {
    massFlowKgPerS: (n6 * cv * expansion * Math.sqrt(x * (p1 / 1e5) * densityKgPerM3)) / 3600,
    choked: drop >= limit,
    pressureAtLimitPa: p1 * (1 - limit),
  };
}
