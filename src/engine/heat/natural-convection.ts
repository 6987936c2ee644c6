/**
 * Heat flux between a wall and the fluid that touches it, by turbulent natural convection.
 *
 *   Nu = 0.13 Ra^(1/3), so that h = 0.13 λ [g β |ΔT|/(ν a)]^(1/3) has no length in it;  β = −(∂p/∂T)_v / (v (∂p/∂v)_T)
 *
 * Source   McAdams, Heat Transmission, 3rd ed. (1954); recommended for vessels above about 0.2 m in dense gas
 * Holds    Ra 1e9 to 1e13; properties of the bulk. Known to about ±50 % in a vessel that is being emptied.
 * Returns  q(ΔT) [W/m²], ΔT = wall surface − fluid, positive into the fluid
 * Checks   inside-film.test.ts
 */
import type { FluidModel, PhaseState } from "../eos/fluid-model";
import { transportProperties } from "../transport/transport-properties";

const gravity = 9.80665;

export type FilmFlux = (temperatureDifferenceK: number) => number;

export function naturalConvection(fluid: FluidModel, phase: PhaseState, z: ArrayLike<number>): FilmFlux {
  const { viscosityPaS, conductivityWPerMK } = transportProperties(fluid, phase, z);
  const { densityKgPerM3: rho, molarVolumeM3PerMol: v, pressureByTemperature, pressureByVolume, heatCapacityPJPerMolK } = phase;
  const beta = Math.max(-pressureByTemperature / (v * pressureByVolume), 0);
  const diffusivity = (conductivityWPerMK * v) / heatCapacityPJPerMolK;
  const group = (gravity * beta * rho) / (viscosityPaS * diffusivity);
  const factor = 0.13 * conductivityWPerMK * Math.cbrt(group);
  return (dT) => factor * Math.cbrt(Math.abs(dT)) * dT;
}
