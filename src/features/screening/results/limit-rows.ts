import type { LimitRow } from "@/components/verdict/limit-table";
import { formatAgainst, formatPercent, formatQuantity } from "@/components/quantity/format";
import { shownUnit } from "@/components/quantity/shown-units";
import type { UnitSystem } from "@/components/units/unit-system";
import type { RecordContent } from "@/contracts/record-content";
import type { CaseRunView } from "@/contracts/views";
import type { AssessedLimit } from "@/engine/cases/blowdown-result";
import type { QuantityId } from "@/engine/units";
import { defaultNearBand } from "@/engine/limits/assess";

export type Showing = { system: UnitSystem; barometricPressurePa: number };

const quantities: Record<AssessedLimit["unit"], QuantityId> = {
  s: "time",
  K: "temperature",
  "kg/s": "massRate",
  "1": "fraction",
};
const distanceOfLimit: Record<AssessedLimit["unit"], QuantityId> = {
  s: "time",
  K: "temperatureDifference",
  "kg/s": "massRate",
  "1": "fraction",
};

/** What value and limit are. */
export const quantityOfLimit = ({ unit, difference }: AssessedLimit): QuantityId =>
  (difference ? distanceOfLimit : quantities)[unit];

/** What lies between value and limit. */
export const distanceQuantity = ({ unit }: AssessedLimit): QuantityId => distanceOfLimit[unit];

/** The target was never reached: the engine then gives the end of the run for its time, so that the line can be judged. */
export const targetMissed = ({ limits, summary }: CaseRunView["result"]): boolean =>
  summary.timeToTargetPressureS === undefined &&
  limits.some(({ id, value }) => id === "time-to-target" && value !== undefined && value > 0);

/**
 * Limits of one case as shown, the governing one first.
 *
 * recordCase   gives each limit the number of its line
 */
export function limitRows(recordCase: RecordContent["cases"][number], run: CaseRunView, showing: Showing): LimitRow[] {
  const lineOf = new Map(recordCase.limits.map(({ id, line }) => [id, line]));
  return [...run.result.limits]
    .sort((a, b) => Number(b.governs) - Number(a.governs))
    .map((limit) => limitRow(limit, lineOf.get(limit.id) ?? "–", run, showing));
}

function limitRow(limit: AssessedLimit, no: string, run: CaseRunView, { system, barometricPressurePa }: Showing): LimitRow {
  const { value, limit: allowed, unit, sense, inHand, share, verdict, governs } = limit;
  const quantity = quantityOfLimit(limit);
  const symbol = shownUnit(quantity, system);
  const missed = limit.id === "time-to-target" && targetMissed(run.result);
  const pair =
    value !== undefined && allowed !== undefined ? formatAgainst(quantity, { si: value, limitSi: allowed }, symbol) : undefined;
  const one = (si: number | undefined) =>
    si === undefined ? null : formatQuantity(quantity, si, symbol, { barometricPressurePa }).text;
  const limitText = pair?.limit.text ?? one(allowed);
  const band = run.document.limits?.nearBandK ?? defaultNearBand.bandK;
  const distance = distanceOfLimit[unit];

  return {
    no,
    title: limitTitle(limit, run, { system, barometricPressurePa }),
    computed: missed ? "not reached" : (pair?.value.text ?? one(value)),
    limit: limitText && `${sense === "at-most" ? "at most" : "not below"} ${limitText}`,
    inHand:
      inHand === undefined || missed
        ? null
        : formatQuantity(distance, inHand, shownUnit(distance, system), { neverZero: true }).text,
    note:
      missed || inHand === undefined
        ? undefined
        : unit === "K"
          ? bandWords(band, system)
          : share === undefined
            ? undefined
            : formatPercent(1 - share),
    share: share ?? null,
    verdict,
    governs,
  };
}

export function limitTitle(
  { id, title }: AssessedLimit,
  { document }: CaseRunView,
  { system, barometricPressurePa }: Showing,
): string {
  const target = document.limits?.targetPressurePa;
  if (id !== "time-to-target" || target === undefined) return title;
  return `Time to ${formatQuantity("pressure", target, shownUnit("pressure", system), { barometricPressurePa }).text}`;
}

const bandWords = (kelvin: number, system: UnitSystem): string =>
  system === "SI" ? `band ${kelvin}\u00a0K` : `band ${Math.round(kelvin * 1.8 * 10) / 10}\u00a0°F difference`;
