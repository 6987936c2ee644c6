/**
 * SI values of a draft from what was typed: the one place where typed text becomes a number. The browser runs it while typing and the
 * server runs it again on every save, so a stored value never rests on the browser's word.
 */
import { readQuantity } from "@/engine/read-quantity";
import { unitSymbols } from "@/engine/units";
import type { DraftDocument, LineValue } from "./draft";
import type { Line } from "./lines/line";
import { parseLineKey } from "./lines/registry";

/**
 * barometricPressurePa   of the site; turns gauge readings into absolute pressures
 * Returns                the draft with `si` and `molePercent` as the typed text and unit give them, null where the text is no such number
 */
export function deriveSi(draft: DraftDocument, barometricPressurePa: number): DraftDocument {
  const lines: DraftDocument["lines"] = {};
  for (const [key, value] of Object.entries(draft.lines)) {
    const line = parseLineKey(key)?.line;
    lines[key] = line ? { ...value, si: siOf(line, value, barometricPressurePa) } : value;
  }
  const rows = draft.composition.rows.map((row) => ({ ...row, molePercent: molePercentOf(row.typed) }));
  return { ...draft, lines, composition: { ...draft.composition, rows } };
}

/**
 * SI value of one line as it stands; null for texts, choices and what is no number in a unit of the line. A line nobody typed in keeps the
 * value the registry gave it; once emptied by hand (`si` null) it stays empty.
 */
export function siOf(
  line: Line,
  { typed, unit, si }: Pick<LineValue, "typed" | "unit" | "si">,
  barometricPressurePa: number,
): number | null {
  if (line.kind !== "quantity") return null;
  if (typed.trim() === "") return line.initial && si === line.initial.si ? line.initial.si : null;
  const inUse = unit !== null && unitSymbols(line.quantity).includes(unit) ? unit : line.shown.SI;
  const read = readQuantity(typed, { quantity: line.quantity, unit: inUse, barometricPressurePa });
  return read.ok ? read.si : null;
}

/** mol % of one row of the composition; null where the text is no such number. */
export function molePercentOf(typed: string): number | null {
  const read = readQuantity(typed, { quantity: "fraction", unit: "%" });
  if (!read.ok || read.value < 0) return null;
  const percent = read.unit === "%" ? read.value : read.value * 100;
  return percent <= 1000 ? percent : null;
}
