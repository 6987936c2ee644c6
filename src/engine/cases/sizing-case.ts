/** kind "sizing": the bores between too slow in a fire and too cold for the steel, as plain types of the case document. */
import type { BlowdownCase } from "./blowdown-case";
import type { Warning } from "./warning";

export type SizingCase = {
  format: "ebbmark-case/1";
  kind: "sizing";
  title?: string;
  /** Its limits (or its sized release) name the target pressure and time. */
  fire?: BlowdownCase;
  /** Its wall's rated temperature, with the margin of its limits, is what the steel must keep above. */
  cold?: BlowdownCase;
  /** A bore that is looked at besides. */
  chosenDiameterM?: number;
  /** Bores looked at; left out, around the first edge. */
  rangeM?: [number, number];
};

/** Where one figure meets its limit, with runs on both sides at the tolerance of the case. */
export type SizingEdge = {
  diameterM: number;
  governedBy: "fire-time" | "cold-steel";
  value: number;
  limit: number;
  unit: "s" | "K";
  confirmed: { diameterM: number; value?: number }[];
};

export type SizingPoint = {
  diameterM: number;
  /** Absent: not reached. */
  timeToTargetS?: number;
  minimumWallTemperatureK?: number;
  peakVentRateFireKgPerS?: number;
  peakVentRateColdKgPerS?: number;
};

export type WindowState = "open" | "none" | "no-upper-edge" | "no-lower-edge" | "no-edge";

export type SizingResult = {
  format: "ebbmark-result/1";
  kind: "sizing";
  engineVersion: string;
  caseSha256: string;
  smallest?: SizingEdge;
  largest?: SizingEdge;
  /** The steel is too cold below this bore as well. */
  coldBelow?: SizingEdge;
  /** Edges that are there; both where `state` is "open". */
  window: { state: WindowState; fromM?: number; toM?: number; widthM?: number };
  sentence: string;
  chosen?: SizingPoint & { inWindow: boolean; timeInHandS?: number; steelInHandK?: number };
  /** By rising bore, for a chart. */
  curve: SizingPoint[];
  limits: { targetPressurePa?: number; targetTimeS?: number; minimumWallTemperatureK?: number; ventCapacityKgPerS?: number };
  /** The vent load in fire passes its capacity above this bore, read off the curve. */
  loadPassedAboveM?: number;
  warnings: Warning[];
  cautions: string[];
  cautionIds: string[];
  numerics: { runs: number; evaluations: number; wallClockMs: number };
};
