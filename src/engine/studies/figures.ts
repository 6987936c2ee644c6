/** The governing figures that studies compare, and one run of a study. */
import { runBlowdown } from "../cases/blowdown/run-blowdown";
import type { BlowdownCase } from "../cases/blowdown-case";
import type { BlowdownSeries, LimitId } from "../cases/blowdown-result";
import type { FigureHead, FigureId, Figures, Outcome, StudyCurve } from "../cases/study-case";
import { EngineError } from "../errors";

export const figureHeads: readonly FigureHead[] = [
  { id: "timeToTargetPressureS", title: "Time to target pressure", unit: "s" },
  { id: "minimumWallTemperatureK", title: "Lowest wall temperature", unit: "K" },
  { id: "minimumFluidTemperatureK", title: "Lowest fluid temperature", unit: "K" },
  { id: "minimumOutletTemperatureK", title: "Lowest temperature behind the opening", unit: "K" },
  { id: "peakVentRateKgPerS", title: "Peak vent load", unit: "kg/s" },
  { id: "ventedMassKg", title: "Mass vented", unit: "kg" },
  { id: "endTimeS", title: "End of the run", unit: "s" },
];

const figureOfLimit: Partial<Record<LimitId, FigureId>> = {
  "time-to-target": "timeToTargetPressureS",
  "minimum-wall-temperature": "minimumWallTemperatureK",
  "minimum-outlet-temperature": "minimumOutletTemperatureK",
  "peak-vent-rate": "peakVentRateKgPerS",
};

/** Of a run's curves, for a band: about this many points. */
const curvePoints = 80;

export type StudyOptions = { onProgress?: (part: number) => void; isCancelled?: () => boolean };

/** A refusal of the engine is an outcome like any other; being cancelled is not. */
export function outcomeOf(index: number, blowdown: BlowdownCase, options: StudyOptions & { withCurve?: boolean }): Outcome {
  try {
    const { summary, verdict, limits, series, numerics } = runBlowdown(blowdown, {
      coarse: true,
      figuresOnly: true,
      ...(options.isCancelled ? { isCancelled: options.isCancelled } : {}),
    });
    const figures: Figures = {};
    for (const { id } of figureHeads) if (summary[id] !== undefined) figures[id] = summary[id];
    const inHand: Figures = {};
    for (const limit of limits) {
      const id = figureOfLimit[limit.id];
      if (id && limit.inHand !== undefined) inHand[id] = limit.inHand;
    }
    return {
      index,
      evaluations: numerics.evaluations,
      figures,
      verdict,
      inHand,
      ...(options.withCurve ? { curve: curveOf(series) } : {}),
    };
  } catch (error) {
    if (!(error instanceof EngineError) || error.code === "cancelled") throw error;
    return { index, evaluations: 0, refused: { code: error.code, message: error.message } };
  }
}

function curveOf({ timeS, pressurePa, fluidTemperatureK, gasWallTemperatureK }: BlowdownSeries): StudyCurve {
  const every = Math.max(Math.floor(timeS.length / curvePoints), 1);
  const keep = (list: number[]): number[] => list.filter((_, i) => i % every === 0 || i === list.length - 1);
  return {
    timeS: keep(timeS),
    pressurePa: keep(pressurePa),
    fluidTemperatureK: keep(fluidTemperatureK),
    ...(gasWallTemperatureK ? { wallTemperatureK: keep(gasWallTemperatureK) } : {}),
  };
}

/** The figure that bars are sorted by: the steel where the run has any, then the time to the target, then the fluid. */
export function leadingFigure(figures: Figures): FigureId {
  const wanted: FigureId[] = ["minimumWallTemperatureK", "timeToTargetPressureS", "minimumFluidTemperatureK"];
  return wanted.find((id) => figures[id] !== undefined) ?? "endTimeS";
}
