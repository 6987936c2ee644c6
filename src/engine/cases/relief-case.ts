/** kind "relief": is a relief device large enough for one scenario, as plain types of the case document. */
import type { OrificeLetter } from "../relief/orifices";
import type { AssessedLimit, Verdict } from "./blowdown-result";
import type { FluidSpec } from "./fluid-spec";
import type { Warning } from "./warning";

export type ReliefDevice = {
  type: "conventional" | "balanced" | "pilot";
  setPressureGaugePa: number;
  /** Maximum allowable working pressure of what is protected; left out, the set pressure. */
  workingPressureGaugePa?: number;
  /** Devices of this kind that open together. */
  count: number;
  /** A rupture disk without a certified combination stands before it. */
  ruptureDisk: boolean;
  /** Standard orifice whose capacity is to be checked; left out, the first that is large enough. */
  orifice?: OrificeLetter;
};

/** Another fluid state that feeds the relief: what comes through a valve, a tube or a pump. */
export type FeedState = { pressurePa: number; temperatureK: number };
export type PassageSpec =
  { path: "orifice"; diameterM: number; dischargeCoefficient: number } | { path: "valve"; cv: number; xt: number };

export type ReliefScenario =
  /** Fire on a wetted vessel: boiling at the relieving pressure. */
  | { scenario: "fire-wetted"; wettedAreaM2: number; drainage: "adequate" | "inadequate"; environmentFactor: number }
  /** Fire on a gas-filled vessel. */
  | { scenario: "fire-unwetted"; exposedAreaM2: number; wallTemperatureK: number; normal: FeedState }
  /** The whole inlet flow, at a temperature. */
  | { scenario: "blocked-outlet"; massFlowKgPerS: number; temperatureK: number }
  /** Gas from a high-pressure side through a level valve, or a control valve that fails open; less what still leaves. */
  | { scenario: "gas-blow-by" | "valve-failure"; upstream: FeedState; through: PassageSpec; leavesKgPerS: number }
  /** Both ends of one tube. */
  | { scenario: "tube-rupture"; upstream: FeedState; tubeInsideDiameterM: number; dischargeCoefficient: number }
  /** Blocked-in liquid that is heated. */
  | { scenario: "thermal-expansion"; heatW: number; temperatureK: number }
  /** The same by the sun. */
  | { scenario: "ambient-heating"; projectedAreaM2: number; fluxWPerM2: number; absorptivity: number; temperatureK: number }
  /** Boiling by a given heat load, such as lost cooling. */
  | { scenario: "heat-load"; heatW: number };

export type ReliefCase = {
  format: "ebbmark-case/1";
  kind: "relief";
  title?: string;
  fluid: FluidSpec;
  device: ReliefDevice;
  relief: ReliefScenario;
  /** Total back pressure at the outlet while relieving, absolute; superimposed and built-up. */
  backPressurePa: number;
  /** Part of it that is there before the device opens, absolute. */
  superimposedPa: number;
  /** Inlet line: the loss at rated flow is held against 3 % of the set pressure. */
  inlet?: { diameterM: number; resistanceCoefficient: number };
};

export type SizingMethod =
  | "real-gas-isentropic"
  | "api-gas-critical"
  | "api-gas-subcritical"
  | "api-gas-ideal"
  | "api-steam"
  | "api-liquid"
  | "equilibrium-isentropic"
  | "omega-two-phase"
  | "omega-subcooled";

export type SizedArea = {
  method: SizingMethod;
  title: string;
  requiredAreaM2: number;
  massFluxKgPerM2S?: number;
  dischargeCoefficient: number;
  /** The area that counts. */
  governs: boolean;
  note?: string;
};

export type ReliefLimitId = "relief-area" | "back-pressure" | "inlet-loss" | "set-pressure";
export type ReliefLimit = Omit<AssessedLimit, "id" | "unit"> & { id: ReliefLimitId; unit: "m²" | "Pa" };

export type ReliefResult = {
  format: "ebbmark-result/1";
  kind: "relief";
  engineVersion: string;
  caseSha256: string;
  scenario: ReliefScenario["scenario"];
  massFlowKgPerS: number;
  /** How the flow was found, in one sentence with its source. */
  basis: string;
  heatW?: number;
  latentHeatJPerKg?: number;
  relieving: {
    pressurePa: number;
    accumulatedPressureGaugePa: number;
    temperatureK: number;
    phase: "vapour" | "liquid" | "two-phase";
    vapourMassFraction: number;
    densityKgPerM3: number;
    molarMassKgPerMol: number;
    compressibility?: number;
    heatCapacityRatio?: number;
    saturationPressurePa?: number;
  };
  sizing: SizedArea[];
  requiredAreaM2: number;
  designation: OrificeLetter;
  /** Of one device. */
  orificeAreaM2: number;
  devices: number;
  /** What the chosen orifices pass at the relieving pressure. */
  ratedMassFlowKgPerS: number;
  backPressureFactor: number;
  inletLossPa?: number;
  verdict: Verdict;
  limits: ReliefLimit[];
  warnings: Warning[];
  cautions: string[];
  numerics: { wallClockMs: number };
};
