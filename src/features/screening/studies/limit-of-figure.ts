import type { CaseRunView } from "@/contracts/views";
import type { FigureId } from "@/engine/cases/study-case";
import type { LimitId } from "@/engine/cases/blowdown-result";

const limitIds: Partial<Record<FigureId, LimitId>> = {
  timeToTargetPressureS: "time-to-target",
  minimumWallTemperatureK: "minimum-wall-temperature",
  minimumOutletTemperatureK: "minimum-outlet-temperature",
  peakVentRateKgPerS: "peak-vent-rate",
};

export type FigureLimit = { at: number; pastWhen: "above" | "below"; governs: boolean };

/** The limit that a figure is held against in the run; undefined where none was entered. */
export function limitOfFigure({ result }: CaseRunView, id: FigureId): FigureLimit | undefined {
  const limit = result.limits.find((one) => one.id === limitIds[id]);
  if (limit?.limit === undefined) return undefined;
  return { at: limit.limit, pastWhen: limit.sense === "at-most" ? "above" : "below", governs: limit.governs };
}

/** The figure to draw: the one whose limit governs, else the lowest wall, else the lowest fluid. */
export function leadingFigureOf(run: CaseRunView, present: readonly FigureId[]): FigureId {
  return (
    present.find((id) => limitOfFigure(run, id)?.governs) ??
    (["minimumWallTemperatureK", "minimumFluidTemperatureK"] as const).find((id) => present.includes(id)) ??
    present[0] ??
    "minimumFluidTemperatureK"
  );
}
