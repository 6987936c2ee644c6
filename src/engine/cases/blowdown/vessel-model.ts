/** What a blowdown case says, resolved into the numbers that the balance works with. */
import type { FluidModel } from "../../eos/fluid-model";
import { EngineError } from "../../errors";
import { measureVessel, type MeasuredVessel } from "../../vessel/geometry";
import { outsideHeat, type OutsideHeat } from "../../heat/outside-heat";
import type { BlowdownCase, OutletPlace } from "../blowdown-case";
import { makeReleasePath, type ReleasePath } from "./release-path";
import { solidCurves, type SolidCurve } from "./solid-check";
import type { Settled } from "../../start/settle-out";
import { startOf, type StartState } from "./start-state";
import { makeWall, type Wall } from "./wall";
import type { ZoneExchange } from "./zones/zoned-balance";

/** Still vapour over still liquid; boiling and rain within a second. */
const defaultExchange: ZoneExchange = { coefficientWPerM2K: 20, relaxationTimeS: 1 };

export type VesselModel = {
  fluid: FluidModel;
  vessel: MeasuredVessel;
  start: StartState;
  /** How several vessels came to the start together. */
  settled: Settled | undefined;
  wall: Wall | undefined;
  film: "none" | "correlations" | { coefficientWPerM2K: number };
  /** Multiplies films from correlations. */
  filmFactor: number;
  insideAreaM2: number;
  outside: OutsideHeat;
  /** Which part of the inside the outside heats. */
  outsideActsOn: "wetted" | "all";
  /** Vapour and liquid with a temperature each. */
  zones: ZoneExchange | undefined;
  /** The first is the case's `release`. */
  paths: ReleasePath[];
  /** The lowest of all paths. */
  backPressurePa: number;
  /** Where the first path starts. */
  from: OutletPlace;
  solids: SolidCurve[];
};

export function makeVesselModel(blowdown: BlowdownCase): VesselModel {
  const { release, releases: others = [], heat, vessel: given } = blowdown;
  const vessel = measureVessel(given.geometry);
  const { fluid, spec, start, settled } = startOf(blowdown, vessel.volumeM3);
  if (!(release.backPressurePa < start.pressurePa)) {
    throw new EngineError(
      "invalid-case",
      `The back pressure must be below the pressure at start, ${Math.round(start.pressurePa)} Pa, or nothing leaves.`,
      {},
      "release.backPressurePa",
    );
  }
  const walled = heat.wall.model !== "none";
  return {
    fluid,
    vessel,
    start,
    settled,
    wall: walled && given.wall ? makeWall(heat.wall.model, given.wall, vessel, start.temperatureK) : undefined,
    film: !walled ? "none" : heat.inside.model === "constant" ? heat.inside : heat.inside.model,
    filmFactor: heat.inside.model === "correlations" ? (heat.inside.factor ?? 1) : 1,
    insideAreaM2: vessel.innerAreaM2 ?? 0,
    outside: outsideHeat(blowdown, vessel),
    outsideActsOn: heat.outside.model === "pool-fire" ? "wetted" : "all",
    zones: blowdown.zones === "separate" ? { ...defaultExchange, ...blowdown.zoneExchange } : undefined,
    paths: [makeReleasePath(fluid, release, "release"), ...others.map((one, i) => makeReleasePath(fluid, one, `releases[${i}]`))],
    backPressurePa: Math.min(release.backPressurePa, ...others.map((one) => one.backPressurePa)),
    from: release.from,
    solids: solidCurves(spec),
  };
}
