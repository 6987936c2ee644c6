import { formatQuantity } from "@/components/quantity/format";
import { shownUnit } from "@/components/quantity/shown-units";
import type { RecordContent } from "@/contracts/record-content";
import type { CaseRunView } from "@/contracts/views";
import type { AssessedLimit } from "@/engine/cases/blowdown-result";
import { quantityOfLimit, targetMissed, type Showing } from "./limit-rows";

export type Governing = { line: string; limit: AssessedLimit; atS: number | null };

/** The limit that decides a case, with its line and the moment of its figure; undefined where nothing could be judged. */
export function governingOf(recordCase: RecordContent["cases"][number], { result }: CaseRunView): Governing | undefined {
  const limit = result.limits.find(({ governs }) => governs);
  if (!limit || limit.value === undefined) return undefined;
  const { summary } = result;
  const moments: Record<AssessedLimit["id"], number | undefined> = {
    "time-to-target": undefined,
    "minimum-wall-temperature": summary.minimumWallTemperatureTimeS,
    "minimum-outlet-temperature": summary.minimumOutletTemperatureTimeS,
    "peak-vent-rate": summary.peakVentRateTimeS,
    "minimum-liquid-wall-temperature": undefined,
    solids: undefined,
    "solids-behind-opening": undefined,
    hydrate: undefined,
    "liquid-carry-over": undefined,
    "least-strength-ratio": result.steelInFire?.items.find((item) => item.governs)?.leastRatioTimeS,
  };
  return { line: recordCase.limits.find(({ id }) => id === limit.id)?.line ?? "–", limit, atS: moments[limit.id] ?? null };
}

/** The case whose verdict is the record's: the one the head of the sheet speaks of. */
export function decidingCase(
  content: RecordContent,
  runs: readonly CaseRunView[],
): { recordCase: RecordContent["cases"][number]; run: CaseRunView } | undefined {
  const recordCase = content.cases.find(({ verdict }) => verdict === content.verdict) ?? content.cases[0];
  const run = runs.find(({ letter }) => letter === recordCase?.letter);
  return recordCase && run ? { recordCase, run } : undefined;
}

/** The governing figure as words: the number large, unit and moment after it. */
export function governingWords(
  { limit, atS }: Governing,
  { result }: CaseRunView,
  { system }: Showing,
): { value: string; rest: string } {
  if (limit.id === "time-to-target" && targetMissed(result)) return { value: "–", rest: "target not reached" };
  const quantity = quantityOfLimit(limit);
  const { number, unit } = formatQuantity(quantity, limit.value, shownUnit(quantity, system));
  const moment = atS === null ? "" : ` at ${formatQuantity("time", atS, momentUnit(result.summary.endTimeS)).text}`;
  return { value: number, rest: `${unit}${moment}` };
}

/** Minutes, unless the whole run lasts less than three of them. */
export const momentUnit = (endTimeS: number): "min" | "s" => (endTimeS < 180 ? "s" : "min");
