/**
 * Heat between fluid, wall and surroundings at one instant [W].
 *
 * With a profile in the wall the inner surface differs from the mean by both fluxes:
 *
 *   T_s = T_mean − q_i L/(3k) − q_o L/(6k),   q_i = film(T_s − T_fluid)
 *
 * The outside flux is taken at the mean wall temperature, from which the outer surface differs by less than the film's own uncertainty.
 */
import { bracketedRoot } from "../../ode/bracketed-root";
import type { Contents } from "./contents";
import { correlatedFilmW } from "./inside-film";
import type { VesselModel } from "./vessel-model";

export type HeatFlows = {
  fromWallW: number;
  fromOutsideW: number;
  /** Inner surface [K]; undefined without a wall. */
  innerSurfaceK: number | undefined;
  /** That of the wetted part, where it has one of its own. */
  liquidSurfaceK?: number;
};

export function heatFlows(model: VesselModel, contents: Contents, wallMeanK: number | undefined): HeatFlows {
  const { wall, insideAreaM2: area, outside, fluid, vessel, film, filmFactor } = model;
  const { temperatureK: fluidK, liquidVolumeM3 } = contents;
  const fromOutsideW = outside(wallMeanK ?? fluidK, liquidVolumeM3);
  if (!wall || wallMeanK === undefined) return { fromWallW: 0, fromOutsideW, innerSurfaceK: undefined };

  const resistances = wall.resistances(wallMeanK);
  const still = wallMeanK - (area > 0 ? fromOutsideW / area : 0) * resistances.coupling;
  if (film === "none" || area === 0) return { fromWallW: 0, fromOutsideW, innerSurfaceK: still };
  if (film !== "correlations") {
    const qIn = film.coefficientWPerM2K > 0 ? (still - fluidK) / (1 / film.coefficientWPerM2K + resistances.inside) : 0;
    return { fromWallW: qIn * area, fromOutsideW, innerSurfaceK: still - qIn * resistances.inside };
  }
  const filmW = correlatedFilmW(fluid, vessel, contents);
  const heatAt = (dT: number): number => filmFactor * filmW(dT);
  const surface = surfaceTemperature(heatAt, { stillK: still, fluidK, resistanceKPerW: resistances.inside / area });
  return { fromWallW: heatAt(surface - fluidK), fromOutsideW, innerSurfaceK: surface };
}

/** T_s + R Q(T_s − T_fluid) = T_still: the left side rises, and T_s lies between the two temperatures. */
export function surfaceTemperature(
  heatAt: (dT: number) => number,
  { stillK, fluidK, resistanceKPerW }: { stillK: number; fluidK: number; resistanceKPerW: number },
): number {
  if (resistanceKPerW === 0 || stillK === fluidK) return stillK;
  const excess = (T: number): number => T + resistanceKPerW * heatAt(T - fluidK) - stillK;
  return bracketedRoot(excess, { a: fluidK, fa: excess(fluidK), b: stillK, fb: excess(stillK) }, 1e-11 * stillK);
}
