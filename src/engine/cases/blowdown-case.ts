/** One blowdown of one vessel, as plain types of the case document. Meanings in docs/case-format.md. */
import type { VesselShape } from "../vessel/geometry";
import type { FluidSpec } from "./fluid-spec";

export type VesselGeometry = VesselShape;
export type Insulation = { thicknessM: number; conductivityWPerMK: number };

export type WallSpec = {
  /** Id of a wall material (`steels/steel.ts`). */
  steel: string;
  thicknessM: number;
  /** Given, they override geometry and the steel's table. */
  massKg?: number;
  specificHeatJPerKgK?: number;
  designPressurePa?: number;
  minimumDesignMetalTemperatureK?: number;
  insulation?: Insulation;
};

export type StartSpec =
  | { pressurePa: number; temperatureK: number }
  | { temperatureK: number; liquidVolumeFraction: number }
  | { pressurePa: number; liquidVolumeFraction: number };

export type FlowModel = "frozen" | "equilibrium";
export type OutletPlace = "vapour" | "liquid" | "whole";

type ReleaseCommon = {
  from: OutletPlace;
  backPressurePa: number;
  openingTimeS: number;
  flowModel: FlowModel;
  dischargeCoefficient: number;
};
export type OrificeRelease = ReleaseCommon & { path: "orifice"; diameterM: number };
export type ValveRelease = Omit<ReleaseCommon, "dischargeCoefficient"> & { path: "valve"; cv: number; xt: number };
export type SizedRelease = ReleaseCommon & { path: "sized"; targetPressurePa: number; targetTimeS: number };
export type ReleaseSpec = OrificeRelease | ValveRelease | SizedRelease;

export type InsideFilm = { model: "none" } | { model: "constant"; coefficientWPerM2K: number } | { model: "correlations" };
export type WallModel = { model: "none" } | { model: "lumped" } | { model: "conduction" };
export type Outside =
  | { model: "adiabatic" }
  | { model: "constant-heat"; heatW: number }
  | { model: "ambient"; temperatureK: number; coefficientWPerM2K: number }
  | { model: "pool-fire"; drainage: "adequate" | "inadequate"; environmentFactor: number }
  | { model: "surface-fire"; basis: "open-pool" | "confined-pool" | "jet"; heatFluxWPerM2?: number };

export type RunSpec = { stopTimeS: number; stopPressurePa: number; relativeTolerance: number };

/** Keys that are absent are not asked for, except where a limit is required (`limits/assess.ts`). Pressures absolute. */
export type LimitSpec = {
  targetPressurePa?: number;
  targetTimeS?: number;
  minimumMetalMarginK?: number;
  ventCapacityKgPerS?: number;
  minimumOutletTemperatureK?: number;
  /** Widens the band of "near", 10 K and 10 % where absent. */
  nearBandK?: number;
  nearBandFraction?: number;
};

export type BlowdownCase = {
  format: "ebbmark-case/1";
  kind: "blowdown";
  title?: string;
  fluid: FluidSpec;
  vessel: { geometry: VesselGeometry; wall?: WallSpec };
  start: StartSpec;
  release: ReleaseSpec;
  heat: { inside: InsideFilm; wall: WallModel; outside: Outside };
  run: RunSpec;
  limits?: LimitSpec;
};
