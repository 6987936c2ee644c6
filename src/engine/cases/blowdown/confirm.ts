/** How far the governing figures move when the run is done again at a tenfold tighter tolerance. */
import type { BlowdownResult, BlowdownSummary, Confirmation } from "../blowdown-result";

const figures: { id: keyof BlowdownSummary; title: string; unit: string }[] = [
  { id: "timeToTargetPressureS", title: "Time to target pressure", unit: "s" },
  { id: "minimumWallTemperatureK", title: "Lowest wall temperature", unit: "K" },
  { id: "minimumFluidTemperatureK", title: "Lowest fluid temperature", unit: "K" },
  { id: "minimumOutletTemperatureK", title: "Lowest temperature behind the opening", unit: "K" },
  { id: "peakVentRateKgPerS", title: "Peak vent load", unit: "kg/s" },
  { id: "ventedMassKg", title: "Mass vented", unit: "kg" },
  { id: "endTimeS", title: "End of the run", unit: "s" },
];

export function confirm(result: BlowdownResult, tighter: BlowdownResult): Confirmation {
  return {
    relativeTolerance: tighter.numerics.relativeTolerance,
    figures: figures.flatMap(({ id, title, unit }) => {
      const value = result.summary[id];
      const confirmed = tighter.summary[id];
      if (typeof value !== "number" || typeof confirmed !== "number") return [];
      return [{ id, title, unit, value, confirmed, change: confirmed - value }];
    }),
    result: tighter,
  };
}
