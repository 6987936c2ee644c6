import type { PhaseKind } from "../flash/equilibrium";
import type { FluidSpec } from "./fluid-spec";
import type { Warning } from "./warning";

export interface StatePoint {
  temperatureK: number;
  pressurePa: number;
}

/** kind "path": a change of state, taken out to the ideal gas, across, and back. */
export interface PathCase {
  format: "ebbmark-case/1";
  kind: "path";
  title?: string;
  fluid: FluidSpec;
  from: StatePoint;
  to: StatePoint;
}

/** The three steps and their sum. `departureOut` = ideal minus real at `from`; `departureBack` = real minus ideal at `to`. */
export interface ThreeSteps {
  departureOut: number;
  idealGas: number;
  departureBack: number;
  total: number;
}

export interface StateSummary extends StatePoint {
  molarVolumeM3PerMol: number;
  compressibility: number;
  vapourMoleFraction: number;
  phase: PhaseKind | "two-phase";
}

export interface PathResult {
  format: "ebbmark-result/1";
  kind: "path";
  internalEnergyJPerMol: ThreeSteps;
  enthalpyJPerMol: ThreeSteps;
  entropyJPerMolK: ThreeSteps;
  from: StateSummary;
  to: StateSummary;
  warnings: Warning[];
}
