/**
 * The wall as one state: its heat content.
 *
 *   E(T) = m ∫ c dT from the start;  dE/dt = heat from outside − heat to the fluid
 *
 * "lumped"      one temperature throughout
 * "conduction"  the profile across the thickness L that belongs to the two fluxes (parabolic, quasi-steady), about the same mean temperature:
 *               T_inside = T_mean − q_i L/(3k) − q_o L/(6k),  T_outside = T_inside + (q_i + q_o) L/(2k)
 *               with q_i leaving to the fluid and q_o entering from outside
 *
 * Source   heat conduction in a slab, third-order quasi-steady profile (static condensation of the fast modes)
 * Holds    lumped: Biot number h L/k well below 0.1. Profile: times longer than L²/(π² a), 6 s for 25 mm of steel
 */
import { EngineError } from "../../errors";
import { steelById, steelIds, type Steel, type SteelId } from "../../steels/steel";
import type { MeasuredVessel } from "../../vessel/geometry";
import type { WallModel, WallSpec } from "../blowdown-case";

export type Wall = {
  massKg: number;
  steel: Steel;
  /** Heat content above the start [J] and back. */
  energyAtJ: (temperatureK: number) => number;
  temperatureAtK: (energyJ: number) => number;
  /** Half-thickness resistances [m² K/W] of the profile; zero for a lump. */
  resistances: (meanTemperatureK: number) => { inside: number; coupling: number };
  /** Does the specific heat come from the steel's table? */
  fromTable: boolean;
  /** Time after which the profile holds [s]; zero for a lump. */
  slowestModeS: number;
};

export function makeWall(model: WallModel["model"], wall: WallSpec, vessel: MeasuredVessel, startTemperatureK: number): Wall {
  const steel = findSteel(wall.steel);
  const volume = wall.massKg === undefined ? vessel.wallVolume(wall.thicknessM) : undefined;
  const massKg = wall.massKg ?? (volume === undefined ? undefined : volume * steel.densityKgPerM3);
  if (massKg === undefined) {
    throw new EngineError(
      "invalid-case",
      "The mass of the wall follows from neither its mass nor the inside area. Give one of them.",
      {},
      "vessel.wall.massKg",
    );
  }
  const L = wall.thicknessM;
  const shape =
    model === "conduction"
      ? {
          resistances: (T: number) => ({
            inside: L / (3 * steel.conductivityWPerMK(T)),
            coupling: L / (6 * steel.conductivityWPerMK(T)),
          }),
          slowestModeS:
            (L * L * steel.densityKgPerM3 * steel.specificHeatJPerKgK(startTemperatureK)) /
            (Math.PI ** 2 * steel.conductivityWPerMK(startTemperatureK)),
        }
      : { resistances: () => ({ inside: 0, coupling: 0 }), slowestModeS: 0 };
  const c = wall.specificHeatJPerKgK;
  if (c !== undefined) {
    return {
      massKg,
      steel,
      fromTable: false,
      energyAtJ: (T) => massKg * c * (T - startTemperatureK),
      temperatureAtK: (E) => startTemperatureK + E / (massKg * c),
      ...shape,
    };
  }
  const q0 = steel.heatContentJPerKg(startTemperatureK);
  return {
    massKg,
    steel,
    fromTable: true,
    energyAtJ: (T) => massKg * (steel.heatContentJPerKg(T) - q0),
    temperatureAtK: (E) => steel.temperatureFromHeatContentK(q0 + E / massKg),
    ...shape,
  };
}

function findSteel(id: string): Steel {
  const known = steelIds.find((steel): steel is SteelId => steel === id);
  if (!known)
    throw new EngineError(
      "invalid-case",
      `There is no wall material "${id}". Use one of ${steelIds.join(", ")}.`,
      {},
      "vessel.wall.steel",
    );
  return steelById(known);
}
