/**
 * The curve behind the sign-in form: a rigid vessel of a perfect gas, adiabatic, empties through a choked opening.
 *
 *   p / p_0 = (1 + (κ − 1)/2 · t/τ) ^ (−2κ / (κ − 1))
 *
 * Source   mass and energy balance of a perfect gas with choked outflow; textbook result, from memory. A drawing, not a result: nothing
 *          is screened with it. The opening stays choked over all that is drawn.
 */
const kappa = 1.3;
const atmosphereBar = 1.01325;
const startBarGauge = 84;
const timeConstantMin = 6.6;

export const targetBarGauge = 6.9;
export const lastMinute = 24;

const startBar = startBarGauge + atmosphereBar;
const exponent = (2 * kappa) / (kappa - 1);

/** Gauge pressure in bar after `minutes`. */
export const pressureAt = (minutes: number): number =>
  startBar * (1 + ((kappa - 1) / 2) * (minutes / timeConstantMin)) ** -exponent - atmosphereBar;

/** Minutes until the target; the same relation the other way round. */
export const targetMinutes =
  (timeConstantMin * ((startBar / (targetBarGauge + atmosphereBar)) ** (1 / exponent) - 1)) / ((kappa - 1) / 2);
