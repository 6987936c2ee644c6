import "server-only";
import { fromSi, units } from "@/engine/units";
import { derivedValue } from "@/contracts/draft-derived";
import { askedKeys, withInitials, type DraftDocument, type LineValue, type Source } from "@/contracts/draft";
import type { SiteFacts } from "@/contracts/draft-to-case";
import { policyLimit } from "@/contracts/policy-limit";
import type { Line, LineKey, QuantityLine } from "@/contracts/lines/line";
import type { RecordContent } from "@/contracts/record-content";

type RecordLine = RecordContent["lines"][number];

/**
 * Every line a draft asks for, as it counts: what was typed, what the policy of the facility gives where nothing was, and what follows from
 * the dimensions. Lines that may stay empty and are, are left out.
 */
export function recordLines(given: DraftDocument, site: SiteFacts): RecordLine[] {
  const draft = withInitials(given);
  return askedKeys(draft).flatMap(({ key, line }) => {
    const value = draft.lines[key];
    switch (line.kind) {
      case "composition":
        return [];
      case "derived":
        return derived(draft, key, line);
      case "quantity":
        return quantity(key, line, value, site);
      case "choice": {
        const chosen = line.options.find((option) => option.value === value?.typed);
        return chosen ? [text(key, line, chosen.label, value?.source ?? null)] : [];
      }
      case "text":
        return value && value.typed.trim() !== "" ? [text(key, line, value.typed.trim(), value.source)] : [];
    }
  });
}

const text = (line: LineKey, { label }: Line, typed: string, source: Source | null): RecordLine => ({
  line,
  label,
  typed,
  unit: null,
  si: null,
  siUnit: null,
  source,
});

function quantity(key: LineKey, line: QuantityLine, value: LineValue | undefined, site: SiteFacts): RecordLine[] {
  if (value && value.si !== null) {
    const unit = value.unit ?? line.shown.SI;
    const typed = value.typed.trim() || figure(line, value.si, unit, site);
    return [{ line: key, label: line.label, typed, unit, si: value.si, siUnit: units[line.quantity].si, source: value.source }];
  }
  const given = policyLimit(line.no, site);
  if (given === undefined || given === null) return [];
  const unit = line.shown.SI;
  const source: Source = { kind: "sheet", note: `limit policy ${site.policy.name} rev ${site.policy.rev}` };
  return [
    {
      line: key,
      label: line.label,
      typed: figure(line, given, unit, site),
      unit,
      si: given,
      siUnit: units[line.quantity].si,
      source,
    },
  ];
}

/** Twelve significant digits show every typed figure as it was and hide the last bits of the arithmetic. */
function figure(
  { quantity: id }: Pick<QuantityLine, "quantity">,
  si: number,
  unit: string,
  { barometricPressurePa }: Pick<SiteFacts, "barometricPressurePa">,
): string {
  return String(Number(fromSi(id, si, unit, barometricPressurePa).toPrecision(12)));
}

function derived(draft: DraftDocument, key: LineKey, line: Line & { kind: "derived" }): RecordLine[] {
  const found = derivedValue(draft, line);
  if (!found) return [];
  return [
    {
      line: key,
      label: line.label,
      typed: String(Number(found.si.toPrecision(6))),
      unit: line.shown.SI,
      si: found.si,
      siUnit: units[line.quantity].si,
      source: { kind: "derived", note: found.from },
    },
  ];
}
