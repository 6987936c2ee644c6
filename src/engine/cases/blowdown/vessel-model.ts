/** What a blowdown case says, resolved into the numbers that the balance works with. Refuses what cannot be computed yet, by name. */
import type { FluidModel } from "../../eos/fluid-model";
import { createFluidModel } from "../../eos/create-fluid-model";
import { EngineError } from "../../errors";
import { measureVessel, type MeasuredVessel } from "../../vessel/geometry";
import type { BlowdownCase, FlowModel, OrificeRelease, OutletPlace } from "../blowdown-case";
import { solidCurves, type SolidCurve } from "./solid-check";
import { startState, type StartState } from "./start-state";
import { makeWallLump, type WallLump } from "./wall-lump";

export type VesselModel = {
  fluid: FluidModel;
  vessel: MeasuredVessel;
  start: StartState;
  wall: WallLump | undefined;
  /** Inside film times inside area [W/K]; zero without one. */
  filmWPerK: number;
  outside: (wallOrFluidTemperatureK: number) => number;
  /** Discharge coefficient times bore area [m²], fully open. */
  effectiveAreaM2: number;
  openingTimeS: number;
  backPressurePa: number;
  flowModel: FlowModel;
  from: OutletPlace;
  solids: SolidCurve[];
};

export function makeVesselModel(blowdown: BlowdownCase): VesselModel {
  const { release, heat, vessel: given } = blowdown;
  const orifice = computable(blowdown);
  const fluid = createFluidModel(blowdown.fluid);
  const vessel = measureVessel(given.geometry);
  const start = startState(fluid, blowdown.start, vessel.volumeM3);
  if (!(release.backPressurePa < start.pressurePa)) {
    throw new EngineError(
      "invalid-case",
      `The back pressure must be below the pressure at start, ${Math.round(start.pressurePa)} Pa, or nothing leaves.`,
      {},
      "release.backPressurePa",
    );
  }
  const walled = heat.wall.model === "lumped";
  const area = vessel.innerAreaM2 ?? 0;
  return {
    fluid,
    vessel,
    start,
    wall: walled && given.wall ? makeWallLump(given.wall, vessel, start.temperatureK) : undefined,
    filmWPerK: walled && heat.inside.model === "constant" ? heat.inside.coefficientWPerM2K * area : 0,
    outside: outsideHeat(blowdown, area),
    effectiveAreaM2: (orifice.dischargeCoefficient * Math.PI * orifice.diameterM ** 2) / 4,
    openingTimeS: release.openingTimeS,
    backPressurePa: release.backPressurePa,
    flowModel: release.flowModel,
    from: release.from,
    solids: solidCurves(blowdown.fluid),
  };
}

/** Heat from outside [W], into the wall, or into the fluid where there is no wall. */
function outsideHeat({ heat: { outside } }: BlowdownCase, areaM2: number): (temperatureK: number) => number {
  if (outside.model === "constant-heat") return () => outside.heatW;
  if (outside.model === "ambient") return (T) => outside.coefficientWPerM2K * areaM2 * (outside.temperatureK - T);
  return () => 0;
}

function computable({ release, heat, vessel }: BlowdownCase): OrificeRelease {
  const refuse = (path: string, what: string): never => {
    throw new EngineError(
      "not-applicable",
      `${what} can't be computed yet. Choose another model, or wait for a later version.`,
      {},
      path,
    );
  };
  if (heat.wall.model === "conduction") refuse("heat.wall.model", "Heat conduction through the wall");
  if (heat.inside.model === "correlations") refuse("heat.inside.model", "An inside film from correlations");
  if (heat.outside.model === "pool-fire" || heat.outside.model === "surface-fire") refuse("heat.outside.model", "A fire outside");
  if (vessel.wall?.insulation && heat.outside.model === "ambient")
    refuse("vessel.wall.insulation", "Insulation between wall and surroundings");
  if (release.from !== "vapour")
    refuse("release.from", `An outlet from the ${release.from === "liquid" ? "liquid" : "whole contents"}`);
  return release.path === "orifice"
    ? release
    : refuse("release.path", release.path === "valve" ? "A control valve" : "A search for the bore");
}
