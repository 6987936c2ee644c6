/**
 * What a layer of passive fire protection lets through to the steel behind it.
 *
 *   surface fire   q_fire(T_o) = (T_o − T_s)/(t/k), T_o the fire side of the layer
 *   pool fire      F = k (904 − T)/(66 570 t), at most 1: the environment factor of the wetted-area law (T in °C, t in m, k in W/(m K))
 *
 * Source   heat conduction through a slab; API Std 521 / ISO 23251 for F (the constant from memory: 21 000 Btu/(h ft²) converts to 66 246, half a per cent more)
 * Holds    a layer that stays in place; its own heat content is left out, so that steel heats up sooner than it would. Jet fires erode what was not tested.
 * Checks   fire.test.ts
 */
import { bracketedRoot } from "../ode/bracketed-root";

export type FireProofing = { thicknessM: number; conductivityWPerMK: number };

const hottestK = 3000;

/** Flux into the steel [W/m²] at its surface temperature, of a fire whose flux falls as the surface that it meets heats up. */
export function fluxBehind(
  { thicknessM, conductivityWPerMK }: FireProofing,
  fireFlux: (surfaceK: number) => number,
  steelK: number,
): number {
  const resistance = thicknessM / conductivityWPerMK;
  const excess = (outerK: number): number => fireFlux(outerK) - (outerK - steelK) / resistance;
  const atSteel = excess(steelK);
  if (atSteel <= 0) return atSteel;
  const outerK = bracketedRoot(excess, { a: steelK, fa: atSteel, b: hottestK, fb: excess(hottestK) }, 1e-9);
  return (outerK - steelK) / resistance;
}

export const environmentFactorOf = ({ thicknessM, conductivityWPerMK }: FireProofing, temperatureK: number): number =>
  Math.min(Math.max((conductivityWPerMK * (904 - (temperatureK - 273.15))) / (66570 * thicknessM), 0), 1);
