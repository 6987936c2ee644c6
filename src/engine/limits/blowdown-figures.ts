/** The figures of a blowdown that limits are held against, with the words of each line. */
import type { BlowdownCase } from "../cases/blowdown-case";
import type { BlowdownSummary } from "../cases/blowdown-result";
import type { Figure } from "./assess";

/**
 * Time to the target: a run that ends below the target has it; one that was still above it when the allowed time was over is past the
 * limit by what it had used; one that was cut short before that says nothing.
 */
export function blowdownFigures({ limits = {}, vessel, heat }: BlowdownCase, summary: BlowdownSummary): Figure[] {
  return [
    targetTime(limits, summary),
    lowestWall({ limits, vessel, heat }, summary),
    lowestOutlet(limits, summary),
    peakRate(limits, summary),
  ];
}

type Limits = NonNullable<BlowdownCase["limits"]>;

function targetTime({ targetTimeS, targetPressurePa }: Limits, summary: BlowdownSummary): Figure {
  const figure: Figure = { id: "time-to-target", title: "Time to target pressure", unit: "s", sense: "at-most", required: false };
  if (targetTimeS === undefined || targetPressurePa === undefined)
    return { ...figure, note: "No target pressure and time entered." };
  const reached = targetPressurePa >= summary.initialPressurePa ? 0 : summary.timeToTargetPressureS;
  if (reached !== undefined) return { ...figure, value: reached, limit: targetTimeS };
  if (summary.endTimeS >= targetTimeS)
    return { ...figure, value: summary.endTimeS, limit: targetTimeS, note: "Not reached; the time shown is the end of the run." };
  return {
    ...figure,
    limit: targetTimeS,
    note: "Not reached before the run ended, and the run ended before the time allowed. Compute for longer.",
  };
}

function lowestWall(
  { limits, vessel, heat }: Pick<BlowdownCase, "vessel" | "heat"> & { limits: Limits },
  summary: BlowdownSummary,
): Figure {
  const rated = vessel.wall?.minimumDesignMetalTemperatureK;
  const figure: Figure = {
    id: "minimum-wall-temperature",
    title: "Lowest wall temperature",
    unit: "K",
    sense: "at-least",
    required: true,
  };
  const limit = rated === undefined ? undefined : rated + (limits.minimumMetalMarginK ?? 0);
  if (heat.wall.model === "none")
    return { ...figure, limit, note: "No wall was in the balance: nothing is said about the steel." };
  const value = summary.minimumWallTemperatureK;
  return limit === undefined
    ? { ...figure, value, note: "No minimum design metal temperature entered." }
    : { ...figure, value, limit };
}

function lowestOutlet({ minimumOutletTemperatureK }: Limits, summary: BlowdownSummary): Figure {
  const figure: Figure = {
    id: "minimum-outlet-temperature",
    title: "Lowest temperature behind the opening",
    unit: "K",
    sense: "at-least",
    required: false,
  };
  const value = summary.minimumOutletTemperatureK;
  return minimumOutletTemperatureK === undefined
    ? { ...figure, value, note: "No limit entered." }
    : { ...figure, value, limit: minimumOutletTemperatureK };
}

function peakRate({ ventCapacityKgPerS }: Limits, summary: BlowdownSummary): Figure {
  const figure: Figure = { id: "peak-vent-rate", title: "Peak vent load", unit: "kg/s", sense: "at-most", required: false };
  const value = summary.peakVentRateKgPerS;
  return ventCapacityKgPerS === undefined
    ? { ...figure, value, note: "No limit entered." }
    : { ...figure, value, limit: ventCapacityKgPerS };
}
