/** Cases that hold blowdown cases: the window of bores, and one blowdown many times. */
import { z } from "zod";
import type { BlowdownCase } from "@/engine/cases/blowdown-case";
import { equationIds } from "@/engine/cases/fluid-spec";
import { inputIds } from "@/engine/studies/inputs";
import { choice, describe, quantity, text } from "./case-fields";
import { diameter } from "./case-vessel";

type Blowdown = z.ZodType<BlowdownCase>;

const head = { format: z.literal("ebbmark-case/1", { error: 'Give "format": "ebbmark-case/1".' }), title: text(200).optional() };

export const sizingCase = (blowdown: Blowdown) =>
  z.strictObject({
    ...head,
    kind: z.literal("sizing"),
    fire: blowdown.optional(),
    cold: blowdown.optional(),
    chosenDiameterM: diameter.optional(),
    rangeM: z
      .tuple([diameter, diameter])
      .refine(([low, high]) => low < high, { error: "The range must rise: give the smaller bore first." })
      .optional(),
  });

const whole = (range: { min: number; max: number }) =>
  quantity({ unit: "", ...range }).refine(Number.isInteger, {
    error: ({ input }) => `${String(input)} is not a whole number. Give one.`,
  });

const listOf = <One extends z.ZodType>(one: One, what: string) =>
  z.array(one, { error: ({ input }) => `${describe(input)} Give a list of ${what}.` });

const low = quantity({ unit: "", min: -1000, max: 1000 });
const band = { input: choice(inputIds), low, high: low };
/** More samples than this belong to a study that is split. */
const mostSamples = 10_000;

export const studyCase = (blowdown: Blowdown) => {
  const study = { ...head, kind: z.literal("study"), of: blowdown };
  return z.discriminatedUnion(
    "study",
    [
      z.strictObject({
        ...study,
        study: z.literal("spread"),
        equations: listOf(choice(equationIds), "equations").min(1).optional(),
      }),
      z.strictObject({ ...study, study: z.literal("tornado"), inputs: listOf(z.strictObject(band), "inputs").optional() }),
      z.strictObject({
        ...study,
        study: z.literal("percentiles"),
        samples: whole({ min: 2, max: mostSamples }).default(100),
        seed: whole({ min: 0, max: 4294967295 }).default(1),
        inputs: listOf(
          z.strictObject({ ...band, distribution: choice(["triangular", "uniform", "lognormal"]), peak: low.optional() }),
          "inputs",
        ).optional(),
      }),
    ],
    { error: 'Use one of "spread", "tornado", "percentiles".' },
  );
};
