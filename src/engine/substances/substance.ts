import type { HeatCapacity } from "./heat-capacity";

/** One component as the equations of state see it, whether from the library, estimated or the user's own. */
export interface Substance {
  id: string;
  name: string;
  origin: "library" | "pseudo" | "custom";
  molarMassKgPerMol: number;
  criticalTemperatureK: number;
  criticalPressurePa: number;
  acentricFactor: number;
  /** Only transport properties need it; estimated from the acentric factor where it is not held. */
  criticalVolumeM3PerMol?: number;
  heatCapacity: HeatCapacity;
  /** Where the heat-capacity form was fitted; outside it the form extrapolates and a warning is due. */
  heatCapacityRangeK: readonly [number, number];
  triplePointK?: number;
  /** Sentences a reader of the result must see. */
  notes: readonly string[];
}
