import type { PhaseKind } from "../flash/equilibrium";
import type { FluidSpec } from "./fluid-spec";
import type { StateSummary } from "./path-case";
import type { Warning } from "./warning";

/** kind "flash": the equilibrium state that a pair of quantities fixes. */
export type FlashCase = {
  format: "ebbmark-case/1";
  kind: "flash";
  title?: string;
  fluid: FluidSpec;
} & FlashSpecification;

export type FlashSpecification =
  | { specification: "PT"; pressurePa: number; temperatureK: number }
  | { specification: "PH"; pressurePa: number; enthalpyJPerMol: number }
  | { specification: "PS"; pressurePa: number; entropyJPerMolK: number }
  | { specification: "UV"; internalEnergyJPerMol: number; molarVolumeM3PerMol: number }
  | { specification: "TQ"; temperatureK: number; vapourMoleFraction: number }
  | { specification: "PQ"; pressurePa: number; vapourMoleFraction: number };

export interface FlashState extends StateSummary {
  internalEnergyJPerMol: number;
  enthalpyJPerMol: number;
  entropyJPerMolK: number;
  densityKgPerM3: number;
  /** One phase only. */
  soundSpeedMPerS?: number;
}

export interface FlashPhase {
  kind: PhaseKind;
  moleFraction: number;
  composition: Record<string, number>;
  compressibility: number;
  densityKgPerM3: number;
  fugacityCoefficients: Record<string, number>;
}

export interface FlashResult {
  format: "ebbmark-result/1";
  kind: "flash";
  state: FlashState;
  phases: FlashPhase[];
  warnings: Warning[];
}
