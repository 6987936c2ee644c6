/** A quantity as it is typed on a page of fluids: text and unit, read and shown without ever losing what was typed. */
import { formatForField } from "@/components/quantity/format";
import { shownAbsolutePressure, shownUnit } from "@/components/quantity/shown-units";
import { unitFits } from "@/components/quantity/unit-fits";
import type { UnitSystem } from "@/components/units/unit-system";
import type { StatePoint } from "@/engine/cases/path-case";
import { readQuantity } from "@/engine/read-quantity";

export type StateQuantity = "pressure" | "temperature";
export type Typed = { text: string; unit: string };
export type TypedState = Record<StateQuantity, Typed>;

export type ReadTyped = { si: number } | { problem: string } | { empty: true };

/** The bounds of the case format, with the words for a value past them. */
const bounds: Record<StateQuantity, { max: number; below: string; above: string }> = {
  pressure: {
    max: 1e9,
    below: "This is no pressure above vacuum. Check figure and unit.",
    above: "This is above 10\u202f000 bar. Check figure and unit.",
  },
  temperature: {
    max: 5000,
    below: "This is at or below absolute zero. Check figure and unit.",
    above: "This is above 5000 K. Check figure and unit.",
  },
};

const usualUnit = (quantity: StateQuantity, system: UnitSystem): string =>
  quantity === "pressure" ? shownAbsolutePressure[system] : shownUnit(quantity, system);

export const emptyState = (system: UnitSystem): TypedState => ({
  pressure: { text: "", unit: usualUnit("pressure", system) },
  temperature: { text: "", unit: usualUnit("temperature", system) },
});

/** A known state written into fields. */
export const typedState = ({ temperatureK, pressurePa }: StatePoint, system: UnitSystem): TypedState => ({
  pressure: written("pressure", pressurePa, usualUnit("pressure", system)),
  temperature: written("temperature", temperatureK, usualUnit("temperature", system)),
});

const written = (quantity: StateQuantity, si: number, unit: string, barometricPressurePa?: number): Typed => ({
  text: formatForField(quantity, si, unit, barometricPressurePa),
  unit,
});

export function readTyped(quantity: StateQuantity, { text, unit }: Typed, barometricPressurePa: number): ReadTyped {
  if (text.trim() === "") return { empty: true };
  const read = readQuantity(text, { quantity, unit, barometricPressurePa });
  if (!read.ok) return { problem: read.problem };
  const { max, below, above } = bounds[quantity];
  if (!(read.si > 0)) return { problem: below };
  return read.si > max ? { problem: above } : { si: read.si };
}

/** What the field shows in the system in use: the text as typed while its unit belongs there, else the same value converted. */
export function shownTyped(quantity: StateQuantity, typed: Typed, system: UnitSystem, barometricPressurePa: number): Typed {
  if (unitFits(typed.unit, system)) return typed;
  return inUnit(quantity, typed, usualUnit(quantity, system), barometricPressurePa);
}

/** The same value in another unit; text that can't be read stays as it is. */
export function inUnit(quantity: StateQuantity, typed: Typed, unit: string, barometricPressurePa: number): Typed {
  const read = readTyped(quantity, typed, barometricPressurePa);
  return "si" in read ? written(quantity, read.si, unit, barometricPressurePa) : { ...typed, unit };
}

/** A unit written behind the figure moves into the unit box: "319 psig" becomes 319, psig. */
export function unitApart(quantity: StateQuantity, typed: Typed, barometricPressurePa: number): Typed {
  if (!/[^\d\s.,+\-\u2212e]/i.test(typed.text)) return typed;
  const read = readQuantity(typed.text, { quantity, unit: typed.unit, barometricPressurePa });
  return read.ok ? { text: String(read.value), unit: read.unit } : typed;
}

/** The state that two fields give, or nothing while one of them can't be read. */
export function readState(state: TypedState, barometricPressurePa: number): StatePoint | undefined {
  const p = readTyped("pressure", state.pressure, barometricPressurePa);
  const T = readTyped("temperature", state.temperature, barometricPressurePa);
  return "si" in p && "si" in T ? { temperatureK: T.si, pressurePa: p.si } : undefined;
}
