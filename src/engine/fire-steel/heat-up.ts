/**
 * A steel wall in a fire, as one temperature through its thickness.
 *
 *   ρ s dq/dt = fire(T) − inside(t, T),  q the heat content of the steel [J/kg]
 *
 * Heat content is the state, so that the peak of the specific heat near 735 °C costs no accuracy.
 * Source   energy balance; fourth-order Runge-Kutta, equal steps
 * Holds    until the steel fails; mean temperature of the wall (the outside is hotter by flux times thickness over twice the conductivity)
 * Returns  temperatures [K] at the times, steps + 1 of them from 0 to the horizon
 * Checks   heat-up.test.ts (M6-05)
 */
import type { Steel } from "../steels/steel";

export type WallInFire = {
  steel: Steel;
  thicknessM: number;
  startK: number;
  /** Into the outside at a wall temperature [W/m²]. */
  fireFluxWPerM2: (wallK: number) => number;
  /** Out of the inside at a time and wall temperature [W/m²]. */
  insideFluxWPerM2: (timeS: number, wallK: number) => number;
};

export function heatUp(
  { steel, thicknessM, startK, fireFluxWPerM2, insideFluxWPerM2 }: WallInFire,
  { fromS, untilS, steps }: { fromS: number; untilS: number; steps: number },
): { timeS: number[]; temperatureK: number[] } {
  const perArea = steel.densityKgPerM3 * thicknessM;
  const dt = (untilS - fromS) / steps;
  const rate = (t: number, q: number): number => {
    const T = steel.temperatureFromHeatContentK(q);
    return (fireFluxWPerM2(T) - insideFluxWPerM2(t, T)) / perArea;
  };
  let q = steel.heatContentJPerKg(startK);
  const timeS = [fromS];
  const temperatureK = [startK];
  for (let i = 0; i < steps; i++) {
    const t = fromS + i * dt;
    const k1 = rate(t, q);
    const k2 = rate(t + dt / 2, q + (dt / 2) * k1);
    const k3 = rate(t + dt / 2, q + (dt / 2) * k2);
    const k4 = rate(t + dt, q + dt * k3);
    q += (dt / 6) * (k1 + 2 * k2 + 2 * k3 + k4);
    timeS.push(t + dt);
    temperatureK.push(steel.temperatureFromHeatContentK(q));
  }
  return { timeS, temperatureK };
}
