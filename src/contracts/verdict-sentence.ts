/**
 * The sentence that stands at the head of a sheet: the thing, the distance left, the limit. It is stored with the record in these words.
 *
 * Distances are in SI (K, min, %), as stored words can't follow a reader's choice of units. A figure is never rounded across its limit.
 */
import type { AssessedLimit, BlowdownResult, LimitId } from "@/engine/cases/blowdown-result";
import type { Verdict } from "./record-content";

/** `none`: the run gave no such figure. */
type Wording = { within: string; near: string; beyond: string; at: string; open: string; none: string };

/** `{d}` is the distance to the limit, written out. */
const words: Record<LimitId, Wording> = {
  "minimum-wall-temperature": {
    within: "The wall stays {d} above its minimum design metal temperature{margin}.",
    near: "The wall comes within {d} of its minimum design metal temperature{margin}.",
    beyond: "The wall falls {d} below its minimum design metal temperature{margin}.",
    at: "The wall comes down to its minimum design metal temperature{margin}.",
    open: "No minimum design metal temperature is entered, so the wall is not judged.",
    none: "No wall is in the balance, so the steel is not judged.",
  },
  "time-to-target": {
    within: "The pressure reaches its target {d} before the time allowed is over.",
    near: "The pressure reaches its target only {d} before the time allowed is over.",
    beyond: "The pressure reaches its target {d} after the time allowed.",
    at: "The pressure reaches its target at the very end of the time allowed.",
    open: "No time to the target pressure is set, so the time is not judged.",
    none: "The pressure does not reach its target while it is computed.",
  },
  "minimum-outlet-temperature": {
    within: "The fluid leaving the opening stays {d} above its lowest temperature allowed.",
    near: "The fluid leaving the opening comes within {d} of its lowest temperature allowed.",
    beyond: "The fluid leaving the opening falls {d} below its lowest temperature allowed.",
    at: "The fluid leaving the opening comes down to its lowest temperature allowed.",
    open: "No lowest temperature is set for the fluid leaving the opening, so it is not judged.",
    none: "The fluid leaving the opening is not judged.",
  },
  "peak-vent-rate": {
    within: "The vent load stays {d} below its capacity.",
    near: "The vent load comes within {d} of its capacity.",
    beyond: "The vent load passes its capacity by {d}.",
    at: "The vent load comes up to its capacity.",
    open: "No vent capacity is set, so the load is not judged.",
    none: "The vent load is not judged.",
  },
};

type Judged = Pick<AssessedLimit, "id" | "value" | "limit" | "unit" | "sense" | "verdict">;

/**
 * marginK   kelvins that the limit of the wall stands above the minimum design metal temperature; named where it is not 0
 */
export function limitSentence({ id, value, limit, unit, sense, verdict }: Judged, marginK = 0): string {
  const wording = words[id];
  if (value === undefined) return wording.none;
  if (limit === undefined) return wording.open;
  const inHand = sense === "at-most" ? limit - value : value - limit;
  const template =
    inHand === 0
      ? wording.at
      : verdict === "open"
        ? wording.open
        : inHand < 0
          ? wording.beyond
          : wording[verdict === "near" ? "near" : "within"];
  return template
    .replace("{d}", distance(Math.abs(inHand), unit, limit))
    .replace("{margin}", marginK > 0 ? ` plus the margin of ${figure(marginK, 1)}\u00a0K` : "");
}

/** Distances under this are written with more decimals until they show; one that can't show at all is "less than". */
function distance(size: number, unit: Judged["unit"], limit: number): string {
  if (unit === "K") return `${figure(size, 1)}\u00a0K`;
  if (unit === "s") return size < 60 ? `${figure(size, 0)}\u00a0s` : `${figure(size / 60, 1)}\u00a0min`;
  return `${figure((100 * size) / limit, 0)}\u00a0%`;
}

/** Fixed decimals, with one more as long as a distance that is there would read as none; no more than six. */
function figure(size: number, decimals: number): string {
  for (let more = decimals; more <= 6; more++) {
    const text = size.toFixed(more);
    if (Number(text) > 0) return text.replace(/\B(?=(\d{3})+(?!\d))/g, size >= 10000 && more === 0 ? "\u202f" : "");
  }
  return "less than 0.000001";
}

/**
 * The sentence of a whole run: of the limit that governs; of the required limit that is missing, while nothing is past its limit.
 */
export function runSentence(
  { verdict, limits, summary }: Pick<BlowdownResult, "verdict" | "limits" | "summary">,
  marginK = 0,
): string {
  const governing = limits.find(({ governs }) => governs);
  const missing =
    limits.find(({ id, verdict: one }) => one === "open" && id === "minimum-wall-temperature") ??
    limits.find((one) => one.verdict === "open");
  const told = verdict === "open" ? (missing ?? governing) : (governing ?? missing);
  if (!told) return "No limit is set, so nothing is judged.";
  // Where the target was not reached the engine gives the end of the run for its time, so that the line can be judged; it is no arrival.
  const arrived = told.id !== "time-to-target" || summary.timeToTargetPressureS !== undefined || told.value === 0;
  return limitSentence(arrived ? told : { ...told, value: undefined }, marginK);
}

/** The verdict over several: past a limit counts most, then what is not judged, then near. */
export function worstVerdict(verdicts: readonly Verdict[]): Verdict {
  return (["beyond", "open", "near"] as const).find((one) => verdicts.includes(one)) ?? (verdicts.length > 0 ? "within" : "open");
}
