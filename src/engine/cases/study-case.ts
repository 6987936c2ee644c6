/** kind "study": one blowdown many times, to see what its figures rest on. Plain types of the case document. */
import type { FitnessVerdict } from "../eos/fitness-rules";
import type { InputId } from "../studies/inputs";
import type { BlowdownCase } from "./blowdown-case";
import type { Verdict } from "./blowdown-result";
import type { EquationId } from "./fluid-spec";
import type { Warning } from "./warning";

export type StudyInput = { input: InputId; low: number; high: number };
export type Distribution = "triangular" | "uniform" | "lognormal";
/** `peak`: the likeliest value of a triangle. */
export type SampledInput = StudyInput & { distribution: Distribution; peak?: number };

type Head = { format: "ebbmark-case/1"; kind: "study"; title?: string; of: BlowdownCase };
export type SpreadStudy = Head & { study: "spread"; equations?: EquationId[] };
export type TornadoStudy = Head & { study: "tornado"; inputs?: StudyInput[] };
export type PercentileStudy = Head & { study: "percentiles"; samples: number; seed: number; inputs?: SampledInput[] };
export type StudyCase = SpreadStudy | TornadoStudy | PercentileStudy;

export type FigureId =
  | "timeToTargetPressureS"
  | "minimumWallTemperatureK"
  | "minimumFluidTemperatureK"
  | "minimumOutletTemperatureK"
  | "peakVentRateKgPerS"
  | "ventedMassKg"
  | "endTimeS";
export type Figures = Partial<Record<FigureId, number>>;
export type FigureHead = { id: FigureId; title: string; unit: "s" | "K" | "kg/s" | "kg" };

/** What one run of a study leaves behind. */
export type Outcome = { index: number; evaluations: number } & (
  { figures: Figures; verdict: Verdict; inHand: Figures; curve?: StudyCurve } | { refused: { code: string; message: string } }
);
export type StudyCurve = { timeS: number[]; pressurePa: number[]; fluidTemperatureK: number[]; wallTemperatureK?: number[] };

export type SpreadEntry = {
  equation: EquationId;
  title: string;
  /** The worse of what holds at the start and at the end of the run. */
  fitness: FitnessVerdict;
  notes: string[];
  used: boolean;
  /** Counted in the ranges: computed, and fit or used. */
  inSpread: boolean;
  figures?: Figures;
  verdict?: Verdict;
  curve?: StudyCurve;
  refused?: string;
};
export type FigureRange = FigureHead & {
  used?: number;
  low: number;
  high: number;
  spread: number;
  /** Distance to the limit of the equation in use, and the part of it that the spread takes up. */
  inHand?: number;
  share?: number;
};

export type TornadoBar = {
  input: InputId;
  title: string;
  mode: "factor" | "shift";
  unit: string;
  low: number;
  high: number;
  /** Absent figures: not reached, or the run was refused. */
  atLow?: Figures;
  atHigh?: Figures;
  refused?: { atLow?: string; atHigh?: string };
  /** Difference between the two for each figure that both have. */
  width: Figures;
};

export type PercentileRow = FigureHead & {
  /** Absent where so many samples did not reach the figure that the percentile lies among them. */
  p10?: number;
  p50?: number;
  p90?: number;
  low: number;
  high: number;
  mean: number;
  notReached: number;
};

type ResultHead = {
  format: "ebbmark-result/1";
  kind: "study";
  engineVersion: string;
  caseSha256: string;
  figures: FigureHead[];
  base: { figures: Figures; verdict: Verdict };
  sentence: string;
  warnings: Warning[];
  cautions: string[];
  cautionIds: string[];
  numerics: { runs: number; evaluations: number; wallClockMs: number };
};
export type SpreadResult = ResultHead & {
  study: "spread";
  entries: SpreadEntry[];
  ranges: FigureRange[];
  verdictsDiffer: boolean;
};
export type TornadoResult = ResultHead & { study: "tornado"; bars: TornadoBar[]; sortedBy: FigureId; notVaried: InputId[] };
export type PercentileResult = ResultHead & {
  study: "percentiles";
  seed: number;
  inputs: (SampledInput & { title: string; mode: "factor" | "shift"; unit: string })[];
  samples: {
    asked: number;
    computed: number;
    failed: { index: number; code: string; message: string; inputs: Partial<Record<InputId, number>> }[];
  };
  percentiles: PercentileRow[];
  verdicts: Record<Verdict, number>;
  rows: { index: number; inputs: Partial<Record<InputId, number>>; figures: Figures; verdict: Verdict }[];
};
export type StudyResult = SpreadResult | TornadoResult | PercentileResult;
