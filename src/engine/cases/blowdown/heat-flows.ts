/**
 * Heat between fluid, wall and surroundings at one instant [W].
 *
 *   inside, with the profile's resistance in series:  q_i = (T_mean − T_fluid − q_o L/(6k)) / (1/h + L/(3k))
 *
 * The outside flux is taken at the mean wall temperature, from which the outer surface differs by less than the film's own uncertainty.
 */
import type { VesselModel } from "./vessel-model";

export type HeatFlows = {
  fromWallW: number;
  fromOutsideW: number;
  /** Inner surface [K]; undefined without a wall. */
  innerSurfaceK: number | undefined;
};

export function heatFlows(model: VesselModel, fluidK: number, wallMeanK: number | undefined, liquidVolumeM3: number): HeatFlows {
  const { wall, filmWPerM2K, insideAreaM2, outside } = model;
  const fromOutsideW = outside(wallMeanK ?? fluidK, liquidVolumeM3);
  if (!wall || wallMeanK === undefined) return { fromWallW: 0, fromOutsideW, innerSurfaceK: undefined };
  const resistances = wall.resistances(wallMeanK);
  const qOut = insideAreaM2 > 0 ? fromOutsideW / insideAreaM2 : 0;
  const qIn = filmWPerM2K > 0 ? (wallMeanK - fluidK - qOut * resistances.coupling) / (1 / filmWPerM2K + resistances.inside) : 0;
  return {
    fromWallW: qIn * insideAreaM2,
    fromOutsideW,
    innerSurfaceK: wallMeanK - qIn * resistances.inside - qOut * resistances.coupling,
  };
}
