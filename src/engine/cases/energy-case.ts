/** kind "energy": what the contents of a vessel can release, as plain types of the case document. */
import type { VesselShape } from "../vessel/geometry";
import type { StatePair } from "./blowdown-case";
import type { FluidSpec } from "./fluid-spec";
import type { Warning } from "./warning";

export const energyDefinitions = [
  "brode",
  "isentropic-ideal",
  "isothermal",
  "availability",
  "isentropic-real",
  "isentropic-real-less-atmosphere",
] as const;
export type EnergyDefinition = (typeof energyDefinitions)[number];

export type EnergyCase = {
  format: "ebbmark-case/1";
  kind: "energy";
  title?: string;
  fluid: FluidSpec;
  vessel: { geometry: VesselShape };
  start: StatePair;
  surroundingsPa: number;
  /** Which of the definitions the distances stand on. */
  standOffBy: EnergyDefinition;
  /** Part of the energy that becomes blast. */
  blastFraction: number;
  tntEnergyJPerKg: number;
  /** Side-on overpressures whose distance is asked for [Pa]. */
  overpressuresPa: number[];
};

export type HeldEnergy = {
  definition: EnergyDefinition;
  title: string;
  /** What it is for. */
  use: string;
  energyJ: number;
  tntKg: number;
};

export type StandOff = {
  overpressurePa: number;
  /** What an overpressure of this size typically does. */
  effect: string;
  /** Burst on the ground; the distance that counts. */
  distanceM: number;
  /** By the free-air curve with 1.8 times the charge, beside it. */
  distanceByFreeAirM: number;
  scaledDistance: number;
};

export type EnergyResult = {
  format: "ebbmark-result/1";
  kind: "energy";
  engineVersion: string;
  caseSha256: string;
  held: {
    volumeM3: number;
    massKg: number;
    pressurePa: number;
    temperatureK: number;
    vapourMoleFraction: number;
    vapourVolumeM3: number;
    /** Ideal-gas value of the vapour at this temperature; the ideal definitions stand on it. */
    heatCapacityRatio?: number;
  };
  energies: HeldEnergy[];
  /** The contents after expanding at constant entropy to the surroundings. */
  expanded: { temperatureK: number; vapourMoleFraction: number; workJPerKg: number; atmosphereJPerKg: number };
  standOff: StandOff[];
  /** The published rule for a pneumatic test at this pressure and volume, for comparison; absent where there is no vapour. */
  pressureTest?: { energyJ: number; tntKg: number; standOffM: number };
  warnings: Warning[];
  cautions: string[];
  numerics: { wallClockMs: number };
};
