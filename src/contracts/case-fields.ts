/** The small parts of a case schema: numbers with a unit and a range, choices, and the sentences they refuse with. */
import { z } from "zod";

export type NumberRange = { unit: string; min?: number; max?: number; above?: number; below?: number };

/** A number of the document. Every refusal says what is wrong, the range that holds and what to do. */
export function quantity(range: NumberRange) {
  const holds = inRange(range);
  return z
    .number({ error: ({ input }) => `${describe(input)} Give a number ${rangeWords(range)}.` })
    .refine(holds, { error: ({ input }) => `${String(input)} is out of range. Give a number ${rangeWords(range)}.` });
}

/** One word of a list. */
export function choice<const Words extends readonly [string, ...string[]]>(words: Words) {
  return z.enum(words, { error: ({ input }) => `${describe(input)} Use one of ${words.map((word) => `"${word}"`).join(", ")}.` });
}

export function text(maxLength: number) {
  return z
    .string({ error: ({ input }) => `${describe(input)} Give a text.` })
    .refine((value) => value.length <= maxLength, { error: `This is longer than ${maxLength} characters. Shorten it.` });
}

export function describe(input: unknown): string {
  if (input === undefined) return "This is missing.";
  if (input === null) return "This is null, which stands for nothing here.";
  if (typeof input === "number" && !Number.isFinite(input)) return "This is not a finite number.";
  if (typeof input === "string") return `"${input.length > 40 ? `${input.slice(0, 40)}…` : input}" is not what belongs here.`;
  return `A ${Array.isArray(input) ? "list" : typeof input} does not belong here.`;
}

const inRange =
  ({ min, max, above, below }: NumberRange) =>
  (value: number): boolean =>
    !(min !== undefined && value < min) &&
    !(max !== undefined && value > max) &&
    !(above !== undefined && value <= above) &&
    !(below !== undefined && value >= below);

function rangeWords({ unit, min, max, above, below }: NumberRange): string {
  const low = min !== undefined ? `from ${min}` : above !== undefined ? `above ${above}` : undefined;
  const high = max !== undefined ? `to ${max}` : below !== undefined ? `below ${below}` : undefined;
  const suffix = unit === "" ? "" : ` ${unit}`;
  if (low === undefined) return high === undefined ? `in${suffix || " plain figures"}` : `${high}${suffix}`;
  if (high === undefined) return `${low}${suffix}`;
  return `${low} ${high.startsWith("to") ? high : `and ${high}`}${suffix}`;
}

export const pressure = quantity({ unit: "Pa absolute", above: 0, max: 1e9 });
export const temperature = quantity({ unit: "K", above: 0, max: 5000 });
export const fraction = quantity({ unit: "", min: 0, max: 1 });
