/** Numbers with a unit and a range, and the words that refuse what does not fit. */
export type NumberRange = { unit: string; min?: number; max?: number; above?: number; below?: number };

/** A value that does not fit, in words. */
export function describe(input: unknown): string {
  if (input === undefined) return "This is missing.";
  if (input === null) return "This is null, which stands for nothing here.";
  if (typeof input === "number" && !Number.isFinite(input)) return "This is not a finite number.";
  if (typeof input === "string") return `"${input.length > 40 ? `${input.slice(0, 40)}…` : input}" is not what belongs here.`;
  return `A ${Array.isArray(input) ? "list" : typeof input} does not belong here.`;
}

export const isInRange = (value: number, { min, max, above, below }: NumberRange): boolean =>
  !(min !== undefined && value < min) &&
  !(max !== undefined && value > max) &&
  !(above !== undefined && value <= above) &&
  !(below !== undefined && value >= below);

/** "above 0 and below 1 m" */
export function rangeWords({ unit, min, max, above, below }: NumberRange): string {
  const low = min !== undefined ? `from ${min}` : above !== undefined ? `above ${above}` : undefined;
  const high = max !== undefined ? `to ${max}` : below !== undefined ? `below ${below}` : undefined;
  const suffix = unit === "" ? "" : ` ${unit}`;
  if (low === undefined) return high === undefined ? `in${suffix || " plain figures"}` : `${high}${suffix}`;
  if (high === undefined) return `${low}${suffix}`;
  return `${low} ${high.startsWith("to") ? high : `and ${high}`}${suffix}`;
}
