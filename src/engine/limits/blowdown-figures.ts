/** The figures of a blowdown that limits are held against, with the words of each line. */
import type { BlowdownCase } from "../cases/blowdown-case";
import type { BlowdownSeries, BlowdownSummary } from "../cases/blowdown-result";
import type { Figure } from "./assess";

/**
 * Time to the target: a run that ends below the target has it; one that was still above it when the allowed time was over is past the
 * limit by what it had used; one that was cut short before that says nothing.
 */
export function blowdownFigures(blowdown: BlowdownCase, summary: BlowdownSummary, series: BlowdownSeries): Figure[] {
  const { limits = {} } = blowdown;
  return [
    targetTime(blowdown, summary),
    ...lowestWalls({ ...blowdown, limits }, summary, series),
    lowestOutlet(limits, summary),
    peakRate(blowdown, summary, series),
  ];
}

type Limits = NonNullable<BlowdownCase["limits"]>;

function targetTime({ limits = {}, vessel }: BlowdownCase, summary: BlowdownSummary): Figure {
  const { targetTimeS, targetPressurePa } = limits;
  const figure: Figure = { id: "time-to-target", title: "Time to target pressure", unit: "s", sense: "at-most", required: false };
  if (targetTimeS === undefined || targetPressurePa === undefined)
    return { ...figure, note: `No target pressure and time entered. ${usualPractice(vessel.wall)}` };
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

const atmospherePa = 101325;

/** API Std 521 as read in public sources; a wall that is thinner than the rule says so. */
function usualPractice(wall: BlowdownCase["vessel"]["wall"]): string {
  const half = wall?.designPressurePa === undefined ? undefined : atmospherePa + (wall.designPressurePa - atmospherePa) / 2;
  const here = half === undefined ? "" : `, here ${Math.round(half)} Pa absolute`;
  const thin = wall && wall.thicknessM < 0.025 ? ` This wall has ${(1000 * wall.thicknessM).toPrecision(3)} mm.` : "";
  return `Usual practice in a fire: half of the design pressure${here}, in about 15 min, for walls of about 25 mm or more.${thin}`;
}

/** One line for the wall, or one each for its gas-wetted and liquid-wetted zone where the two differ. */
function lowestWalls(given: WallGiven, summary: BlowdownSummary, series: BlowdownSeries): Figure[] {
  const { gasWallTemperatureK: gas, liquidWallTemperatureK: liquid } = series;
  const differ = gas && liquid && gas.some((T, i) => Math.abs(T - (liquid[i] ?? T)) > 0.01);
  const whole = lowestWall(given, summary);
  if (!differ) return [whole];
  const zone = (id: Figure["id"], title: string, column: number[]): Figure => ({
    ...whole,
    id,
    title,
    value: Math.min(...column),
  });
  return [
    zone("minimum-wall-temperature", "Lowest wall temperature, gas-wetted", gas),
    zone("minimum-liquid-wall-temperature", "Lowest wall temperature, liquid-wetted", liquid),
  ];
}

type WallGiven = Pick<BlowdownCase, "vessel" | "heat"> & { limits: Limits };

function lowestWall({ limits, vessel, heat }: WallGiven, summary: BlowdownSummary): Figure {
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

/** Measured flow of saturated liquid through short openings stands up to this much above equilibrium flow (full-scale tests, 1.25 ± 0.14 and more). */
const disposalAllowance = 1.5;

function peakRate({ limits = {}, release }: BlowdownCase, summary: BlowdownSummary, series: BlowdownSeries): Figure {
  const figure: Figure = { id: "peak-vent-rate", title: "Peak vent load", unit: "kg/s", sense: "at-most", required: false };
  const wet = release.from !== "vapour" && series.vapourMoleFraction.some((share) => share < 1);
  const value = summary.peakVentRateKgPerS * (wet ? disposalAllowance : 1);
  const allowance = wet
    ? `Computed ${summary.peakVentRateKgPerS.toPrecision(3)} kg/s, times ${disposalAllowance}: a short opening passes more boiling liquid than flow in equilibrium.`
    : undefined;
  if (limits.ventCapacityKgPerS === undefined)
    return { ...figure, value, note: ["No limit entered.", allowance].filter(Boolean).join(" ") };
  return { ...figure, value, limit: limits.ventCapacityKgPerS, ...(allowance ? { note: allowance } : {}) };
}
