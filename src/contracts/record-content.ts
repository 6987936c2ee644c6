/**
 * The content of a record: everything a signature stands for, as one canonical JSON document.
 *
 * It is composed by the server when a screening is computed, stored as bytes, shown on the signing page and named by its SHA-256 in every
 * signature. Cases and results are stored beside it and named by theirs.
 */
import { z } from "zod";
import { caseKinds, sourceSchema } from "./draft";
import { limitPolicySchema } from "./policy";

const sha256 = z.string().regex(/^[0-9a-f]{64}$/);
export const verdicts = ["within", "near", "beyond", "open"] as const;
export const verdictSchema = z.enum(verdicts);
export type Verdict = z.infer<typeof verdictSchema>;

export const recordLineSchema = z.strictObject({
  line: z.string(),
  label: z.string(),
  /** What was typed, or the chosen word. */
  typed: z.string(),
  unit: z.string().nullable(),
  si: z.number().nullable(),
  siUnit: z.string().nullable(),
  source: sourceSchema.nullable(),
});

export const recordLimitSchema = z.strictObject({
  id: z.string(),
  line: z.string(),
  title: z.string(),
  value: z.number().nullable(),
  limit: z.number().nullable(),
  unit: z.string(),
  verdict: verdictSchema,
  governs: z.boolean(),
});

export const recordCaseSchema = z.strictObject({
  letter: z.string(),
  kind: z.enum(caseKinds),
  caseSha256: sha256,
  resultSha256: sha256,
  /** The second run at a tenfold tighter tolerance, and how far the governing figures moved. */
  confirmationSha256: sha256,
  confirmation: z.array(z.strictObject({ id: z.string(), change: z.number(), unit: z.string() })),
  verdict: verdictSchema,
  sentence: z.string(),
  limits: z.array(recordLimitSchema),
  warnings: z.array(z.strictObject({ code: z.string(), message: z.string() })),
});

export const recordContentSchema = z.strictObject({
  format: z.literal("ebbmark-record/1"),
  record: z.string(),
  rev: z.int(),
  title: z.string(),
  facility: z.strictObject({ id: z.string(), code: z.string(), name: z.string(), demo: z.boolean() }),
  section: z.strictObject({ id: z.string(), tag: z.string(), name: z.string() }),
  engineVersion: z.string(),
  barometricPressurePa: z.number(),
  policy: limitPolicySchema,
  lines: z.array(recordLineSchema),
  composition: z.array(z.strictObject({ id: z.string(), name: z.string(), typed: z.string(), moleFraction: z.number() })),
  compositionSource: sourceSchema.nullable(),
  cases: z.array(recordCaseSchema).min(1),
  verdict: verdictSchema,
  sentence: z.string(),
  /** In the words shown; each is acknowledged by its id. */
  cautions: z.array(z.strictObject({ id: z.string(), words: z.string() })).min(1),
  assumed: z.array(z.string()),
  changedSince: z.array(z.strictObject({ line: z.string(), before: z.string(), after: z.string() })),
  reason: z.string().nullable(),
});
export type RecordContent = z.infer<typeof recordContentSchema>;
export type RecordLimit = z.infer<typeof recordLimitSchema>;
