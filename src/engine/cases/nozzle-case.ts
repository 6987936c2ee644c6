/** Critical or subcritical flow of an ideal nozzle from a stagnation state, as plain types of the case document. */
import type { FlowModel } from "./blowdown-case";
import type { FluidSpec } from "./fluid-spec";

export type NozzleCase = {
  format: "ebbmark-case/1";
  kind: "nozzle";
  title?: string;
  fluid: FluidSpec;
  stagnation: { pressurePa: number; temperatureK: number } | { pressurePa: number; vapourMoleFraction: number };
  backPressurePa: number;
  flowModel: FlowModel;
};

export type NozzleResult = {
  format: "ebbmark-result/1";
  kind: "nozzle";
  massFluxKgPerM2S: number;
  throatPressurePa: number;
  throatTemperatureK: number;
  choked: boolean;
  warnings: { code: string; message: string }[];
  cautions: string[];
};
