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
  "minimum-liquid-wall-temperature": {
    within: "The liquid-wetted wall stays {d} above its minimum design metal temperature{margin}.",
    near: "The liquid-wetted wall comes within {d} of its minimum design metal temperature{margin}.",
    beyond: "The liquid-wetted wall falls {d} below its minimum design metal temperature{margin}.",
    at: "The liquid-wetted wall comes down to its minimum design metal temperature{margin}.",
    open: "No minimum design metal temperature is entered, so the wall is not judged.",
    none: "No wall is in the balance, so the steel is not judged.",
  },
  solids: {
    within: "The fluid in the vessel stays {d} above the temperature at which part of it freezes.",
    near: "The fluid in the vessel comes within {d} of the temperature at which part of it freezes.",
    beyond: "The fluid in the vessel falls {d} below the temperature at which part of it freezes.",
    at: "The fluid in the vessel begins to freeze.",
    open: "Freezing in the vessel is not judged.",
    none: "Freezing in the vessel is not judged.",
  },
  "solids-behind-opening": {
    within: "The fluid behind the opening stays {d} above the temperature at which part of it freezes.",
    near: "The fluid behind the opening comes within {d} of the temperature at which part of it freezes.",
    beyond: "The fluid behind the opening falls {d} below the temperature at which part of it freezes.",
    at: "The fluid behind the opening begins to freeze.",
    open: "Freezing behind the opening is not judged.",
    none: "Freezing behind the opening is not judged.",
  },
  hydrate: {
    within: "The fluid stays {d} above the temperature at which hydrate is flagged.",
    near: "The fluid comes within {d} of the temperature at which hydrate is flagged.",
    beyond: "The fluid falls {d} below the temperature at which hydrate is flagged.",
    at: "The fluid comes down to the temperature at which hydrate is flagged.",
    open: "Hydrate is not judged.",
    none: "The hydrate correlations do not hold for this fluid, so hydrate is not judged.",
  },
  "liquid-carry-over": {
    within: "The swelled liquid stays {d} below the top of the vessel.",
    near: "The swelled liquid comes within {d} of the top of the vessel.",
    beyond: "The swelled liquid passes the top of the vessel by {d}.",
    at: "The swelled liquid reaches the top of the vessel.",
    open: "Liquid carried over is not judged.",
    none: "The shape of the vessel is not known, so liquid carried over is not judged.",
  },
  "least-strength-ratio": {
    within: "In the fire the strength of the steel stays {d} above its stress.",
    near: "In the fire the strength of the steel comes within {d} of its stress.",
    beyond: "In the fire the strength of the steel falls {d} below its stress.",
    at: "In the fire the strength of the steel comes down to its stress.",
    open: "The steel in the fire is not judged.",
    none: "The steel in the fire is not judged.",
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
