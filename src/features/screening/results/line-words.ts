import { formatQuantity, withUnit } from "@/components/quantity/format";
import type { RecordContent } from "@/contracts/record-content";
import { parseLineKey } from "@/contracts/lines/registry";
import { partByNumber, type Part } from "@/contracts/lines/parts";
import type { Showing } from "./limit-rows";

type RecordLine = RecordContent["lines"][number];

/**
 * A line's value in the units shown, and what was typed where that reads otherwise.
 *
 * Returns  `typed` null where the value stands as it was typed
 */
export function lineWords(
  { line, typed, unit, si }: RecordLine,
  { system, barometricPressurePa }: Showing,
): { value: string; typed: string | null } {
  const known = parseLineKey(line)?.line;
  const asTyped = withUnit(typed.replace(/^-/, "\u2212"), unit ?? "");
  if (si === null || (known?.kind !== "quantity" && known?.kind !== "derived")) return { value: asTyped, typed: null };
  const shown = known.shown[system];
  if (shown === unit) return { value: asTyped, typed: null };
  const { text } = formatQuantity(known.quantity, si, shown, { barometricPressurePa });
  return { value: text, typed: asTyped };
}

/** The part of the form that a line stands in; undefined for a number nobody knows. */
export function partOfLine(key: string): Part | undefined {
  const line = parseLineKey(key)?.line;
  return line && partByNumber(line.part);
}
