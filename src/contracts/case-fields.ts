/** The small parts of a case schema: numbers with a unit and a range, choices, and the sentences they refuse with. */
import { z } from "zod";
import { describe, isInRange, rangeWords, type NumberRange } from "@/engine/number-range";

export { describe } from "@/engine/number-range";

/** A number of the document. Every refusal says what is wrong, the range that holds and what to do. */
export function quantity(range: NumberRange) {
  return z
    .number({ error: ({ input }) => `${describe(input)} Give a number ${rangeWords(range)}.` })
    .refine((value) => isInRange(value, range), {
      error: ({ input }) => `${String(input)} is out of range. Give a number ${rangeWords(range)}.`,
    });
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

export const pressure = quantity({ unit: "Pa absolute", above: 0, max: 1e9 });
export const temperature = quantity({ unit: "K", above: 0, max: 5000 });
export const fraction = quantity({ unit: "", min: 0, max: 1 });

/** Mole fractions of components that each stand once. */
export function sumToOne(components: readonly { id: string; moleFraction: number }[], context: z.RefinementCtx): void {
  const sum = components.reduce((total, one) => total + one.moleFraction, 0);
  if (!(Math.abs(sum - 1) <= 1e-6))
    context.addIssue({ code: "custom", message: `The mole fractions sum to ${sum}. Make them sum to 1 within 1e-6.` });
  components.forEach(({ id }, i) => {
    if (components.findIndex((other) => other.id === id) < i)
      context.addIssue({ code: "custom", path: [i, "id"], message: `"${id}" stands twice. Add the two fractions and keep one.` });
  });
}
