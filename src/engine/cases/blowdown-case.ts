/** One blowdown of one vessel, as plain types of the case document. Meanings in docs/case-format.md. */
import type { TailPipe } from "../flow/tail-pipe";
import type { FireBasis } from "../heat/surface-fire";
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
  /** Passive fire protection, its own heat content left out. */
  fireProofing?: Insulation;
};

/** What one vessel holds: two of pressure, temperature and level. */
export type StatePair =
  | { pressurePa: number; temperatureK: number }
  | { temperatureK: number; liquidVolumeFraction: number }
  | { pressurePa: number; liquidVolumeFraction: number };

/** The joined vessels equalise, with or without the heat of their steel. */
export type SettleOut = { settleOut: "adiabatic" | "with-steel" };

/** With `restAtTemperatureK` the section then stays closed in until everything has that temperature. */
export type StartSpec = (StatePair | SettleOut) & { restAtTemperatureK?: number };

/** One of several vessels or pipe runs that are joined into one section. */
export type SectionPart = {
  name?: string;
  geometry: VesselGeometry;
  wall?: WallSpec;
  /** Before they are joined. */
  start: StatePair;
  /** Over components of the fluid; left out, the fluid's own composition. */
  components?: { id: string; moleFraction: number }[];
  /** Left out, that of the vessel's contents. */
  wallTemperatureK?: number;
};

export type FlowModel = "frozen" | "equilibrium";
export type OutletPlace = "vapour" | "liquid" | "whole";

type ReleaseCommon = {
  from: OutletPlace;
  /** Behind the opening, or behind the tail pipe. */
  backPressurePa: number;
  openingTimeS: number;
  flowModel: FlowModel;
  dischargeCoefficient: number;
  opensAtS?: number;
  closesAtS?: number;
  tailPipe?: TailPipe;
};
export type OrificeRelease = ReleaseCommon & { path: "orifice"; diameterM: number };
export type ValveRelease = Omit<ReleaseCommon, "dischargeCoefficient"> & { path: "valve"; cv: number; xt: number };
export type SizedRelease = ReleaseCommon & { path: "sized"; targetPressurePa: number; targetTimeS: number };
/** Opens at the set pressure, shuts at the reseating pressure. */
export type ReliefRelease = ReleaseCommon & {
  path: "relief";
  areaM2: number;
  setPressurePa: number;
  reseatPressurePa: number;
};
export type ReleaseSpec = OrificeRelease | ValveRelease | SizedRelease | ReliefRelease;

export type InsideFilm =
  { model: "none" } | { model: "constant"; coefficientWPerM2K: number } | { model: "correlations"; factor?: number };
export type WallModel = { model: "none" } | { model: "lumped" } | { model: "conduction" };
export type Outside =
  | { model: "adiabatic" }
  | { model: "constant-heat"; heatW: number }
  | { model: "ambient"; temperatureK: number; coefficientWPerM2K: number }
  | {
      model: "pool-fire";
      drainage: "adequate" | "inadequate";
      environmentFactor: number;
      factor?: number;
      bottomAboveGroundM?: number;
    }
  | { model: "surface-fire"; basis: FireBasis; heatFluxWPerM2?: number; factor?: number };

export type RunSpec = { stopTimeS: number; stopPressurePa: number; relativeTolerance: number };

/** What the closed-in section warms up in, after the blowdown. */
export type AfterwardsSpec = { ambientTemperatureK?: number; coefficientWPerM2K?: number };

/** Steel that no liquid cools, in the fire of the case. Left out keys: `fire-steel/fire-steel.ts`. */
export type SteelInFireSpec = {
  basis?: FireBasis;
  /** Fixes the flux, which otherwise falls as the steel heats up. */
  heatFluxWPerM2?: number;
  /** Part of the hot strength that is counted on. */
  strengthFraction?: number;
  /** At 20 °C; left out, the steel's table. */
  tensileStrengthPa?: number;
  /** Delays of the opening that are looked at besides [s]. */
  lateByS?: number[];
  /** Besides the vessel itself: pipes at the vessel's pressure. */
  items?: { name: string; steel: string; insideDiameterM: number; thicknessM: number }[];
};

/** Keys that are absent are not asked for, except where a limit is required (`limits/assess.ts`). Pressures absolute. */
export type LimitSpec = {
  targetPressurePa?: number;
  targetTimeS?: number;
  minimumMetalMarginK?: number;
  ventCapacityKgPerS?: number;
  minimumOutletTemperatureK?: number;
  /** Free water is there, whatever the composition says: hydrate and ice are looked at. */
  waterPresent?: boolean;
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
  /** The vessels that `vessel` is made of, where there are several. */
  vessels?: SectionPart[];
  start: StartSpec;
  release: ReleaseSpec;
  /** Further ways out beside `release`. */
  releases?: Exclude<ReleaseSpec, SizedRelease>[];
  heat: { inside: InsideFilm; wall: WallModel; outside: Outside };
  /** "separate": vapour and liquid have a temperature each. Left out: in equilibrium. */
  zones?: "equilibrium" | "separate";
  /** Film at the surface between them, and the time within which a phase past its boundary boils or rains. */
  zoneExchange?: { coefficientWPerM2K?: number; relaxationTimeS?: number };
  run: RunSpec;
  limits?: LimitSpec;
  afterwards?: AfterwardsSpec;
  steelInFire?: SteelInFireSpec;
};
