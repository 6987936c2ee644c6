/**
 * The wall as one lump: its heat content is the state, its temperature follows from it.
 *
 *   E(T) = m ∫ c dT from the start;  dE/dt = heat from outside − heat to the fluid
 *
 * Holds    Biot number h s/k well below 0.1; above that the inner surface is colder than the lump (a warning says so)
 */
import { EngineError } from "../../errors";
import { steelById, steelIds, type Steel, type SteelId } from "../../steels/steel";
import type { MeasuredVessel } from "../../vessel/geometry";
import type { WallSpec } from "../blowdown-case";

export type WallLump = {
  massKg: number;
  steel: Steel;
  /** Heat content above the start [J] and back. */
  energyAtJ: (temperatureK: number) => number;
  temperatureAtK: (energyJ: number) => number;
  /** Does the specific heat come from the steel's table? */
  fromTable: boolean;
};

export function makeWallLump(wall: WallSpec, vessel: MeasuredVessel, startTemperatureK: number): WallLump {
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
  const c = wall.specificHeatJPerKgK;
  if (c !== undefined) {
    return {
      massKg,
      steel,
      fromTable: false,
      energyAtJ: (T) => massKg * c * (T - startTemperatureK),
      temperatureAtK: (E) => startTemperatureK + E / (massKg * c),
    };
  }
  const q0 = steel.heatContentJPerKg(startTemperatureK);
  return {
    massKg,
    steel,
    fromTable: true,
    energyAtJ: (T) => massKg * (steel.heatContentJPerKg(T) - q0),
    temperatureAtK: (E) => steel.temperatureFromHeatContentK(q0 + E / massKg),
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
