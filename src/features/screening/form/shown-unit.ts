/** Which unit a line is shown in, and what then stands in its field. The stored text, unit and SI value never change by showing. */
import { formatForField, formatQuantity } from "@/components/quantity/format";
import { unitFits } from "@/components/quantity/unit-fits";
import type { UnitSystem } from "@/components/units/unit-system";
import type { LineValue } from "@/contracts/draft";
import type { QuantityLine } from "@/contracts/lines/line";
import { readQuantity } from "@/engine/read-quantity";

/** The unit chosen at the line, else the one typed in if it belongs to the system in use, else the line's usual one. */
export function shownUnitOf(line: QuantityLine, value: LineValue | undefined, system: UnitSystem, chosen?: string): string {
  if (chosen) return chosen;
  if (value?.unit && value.typed.trim() !== "" && unitFits(value.unit, system)) return value.unit;
  return line.shown[system];
}

/** Text of the field: what was typed while its unit is shown, else the SI value written in the unit shown. */
export function shownText(line: QuantityLine, value: LineValue | undefined, unit: string, barometricPressurePa: number): string {
  if (!value) return "";
  if (value.typed !== "" && (value.unit === unit || value.si === null)) return value.typed;
  return value.si === null ? "" : formatForField(line.quantity, value.si, unit, barometricPressurePa);
}

/** The stored value in the system that its field does not show, small under the label; nothing where both read alike. */
export function otherText(
  line: QuantityLine,
  value: LineValue | undefined,
  shown: string,
  barometricPressurePa: number,
): string | undefined {
  if (value?.si == null || line.shown.SI === line.shown.US) return undefined;
  const unit = line.shown[unitFits(shown, "SI") ? "US" : "SI"];
  return formatQuantity(line.quantity, value.si, unit, { barometricPressurePa }).text;
}

/** A unit written behind the figure moves into the unit box: "1.24 in" becomes 1.24, in. Undefined where there is nothing to move. */
export function unitTyped(
  line: QuantityLine,
  value: LineValue,
  barometricPressurePa: number,
): { typed: string; unit: string } | undefined {
  if (!/[^\d\s.,+\-\u2212e]/i.test(value.typed)) return undefined;
  const read = readQuantity(value.typed, { quantity: line.quantity, unit: value.unit ?? line.shown.SI, barometricPressurePa });
  return read.ok ? { typed: String(read.value), unit: read.unit } : undefined;
}
