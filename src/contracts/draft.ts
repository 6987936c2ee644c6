/**
 * The draft of a screening: what was typed, line by line, with its unit, its SI value and its source.
 *
 * A draft may hold anything a person can type; it is judged line by line when a case is made of it (`draft-to-case.ts`), so that nothing
 * typed is ever lost to a rule.
 */
import { z } from "zod";
import type { Line, LineKey, LineNo, LineReader } from "./lines/line";
import { partByNumber } from "./lines/parts";
import { lineByNo, lineKey, lines, parseLineKey } from "./lines/registry";

export const sourceKinds = ["sheet", "measured", "derived", "assumed"] as const;

export const sourceSchema = z.strictObject({ kind: z.enum(sourceKinds), note: z.string().max(300) });
export type Source = z.infer<typeof sourceSchema>;

/** `si` is null while what was typed is not a number in its unit, and for texts and choices. */
export const lineValueSchema = z.strictObject({
  typed: z.string().max(1000),
  unit: z.string().max(24).nullable(),
  si: z.number().nullable(),
  source: sourceSchema.nullable(),
});
export type LineValue = z.infer<typeof lineValueSchema>;

export const compositionRowSchema = z.strictObject({
  id: z.string().min(1).max(40),
  /** As reported, mol %. */
  typed: z.string().max(40),
  molePercent: z.number().min(0).max(1000).nullable(),
});
export type CompositionRow = z.infer<typeof compositionRowSchema>;

export const compositionSchema = z.strictObject({
  rows: z.array(compositionRowSchema).max(60),
  /** Set by the engineer's own act; a sum that is not 100 % is never scaled silently. */
  normalised: z.boolean(),
  source: sourceSchema.nullable(),
});

export const caseKinds = ["cold-blowdown", "fire-blowdown"] as const;
export type CaseKind = (typeof caseKinds)[number];
export const caseKindWords: Record<CaseKind, string> = { "cold-blowdown": "Cold blowdown", "fire-blowdown": "Fire blowdown" };
export const mostCases = 12;

export const draftDocumentSchema = z.strictObject({
  format: z.literal("ebbmark-draft/1"),
  cases: z
    .array(z.strictObject({ letter: z.string().regex(/^[A-Z]$/), kind: z.enum(caseKinds) }))
    .min(1)
    .max(mostCases),
  lines: z.record(
    z.string().refine((key) => parseLineKey(key) !== undefined, "there is no such line"),
    lineValueSchema,
  ),
  composition: compositionSchema,
});
export type DraftDocument = z.infer<typeof draftDocumentSchema>;

/** A new draft: choices and assumed values as the registry gives them, everything else empty. */
export function newDraft(title: string): DraftDocument {
  const draft: DraftDocument = {
    format: "ebbmark-draft/1",
    cases: [{ letter: "A", kind: "cold-blowdown" }],
    lines: {},
    composition: { rows: [], normalised: false, source: null },
  };
  draft.lines["1.10"] = { typed: title, unit: null, si: null, source: null };
  return withInitials(draft);
}

/**
 * The draft with the registry's choices and assumed values in every line that nobody has touched: lines of a case just added, lines that came
 * after the draft was begun. What was typed, emptied or chosen stays.
 */
export function withInitials(draft: DraftDocument): DraftDocument {
  const added: DraftDocument["lines"] = {};
  for (const { key, line } of everyKey(draft)) {
    const value = key in draft.lines ? undefined : initialValue(line);
    if (value) added[key] = value;
  }
  return Object.keys(added).length === 0 ? draft : { ...draft, lines: { ...draft.lines, ...added } };
}

function initialValue(line: Line): LineValue | undefined {
  if (line.kind === "choice" && line.initial) return { typed: line.initial, unit: null, si: null, source: null };
  if (line.kind === "text" && line.initialText) return { typed: line.initialText, unit: null, si: null, source: null };
  if (line.kind === "quantity" && line.initial) {
    // Shown in SI until the engineer types: the form writes the figure in the unit in use.
    return { typed: "", unit: line.shown.SI, si: line.initial.si, source: { kind: "assumed", note: line.initial.why } };
  }
  return undefined;
}

/** Reads other lines for `asked` rules, within one case and one item. */
export function lineReader(draft: DraftDocument, letter = "A", item = 1): LineReader {
  const value = (no: LineNo, of = letter) => draft.lines[lineKey(lineByNo(no), of, item)];
  return {
    choice: (no) => value(no)?.typed || undefined,
    si: (no) => value(no)?.si ?? undefined,
    inAnyCase: (no, choice) => draft.cases.some((one) => value(no, one.letter)?.typed === choice),
  };
}

export const isAsked = (line: Line, draft: DraftDocument, letter = "A", item = 1): boolean =>
  line.asked?.(lineReader(draft, letter, item)) ?? true;

export type LinePlace = { key: LineKey; line: Line; letter: string; item: number };

/** Keys of all lines of a draft, asked for or not, in registry order, with the case letters and items written out. */
function everyKey(draft: DraftDocument): LinePlace[] {
  return lines.flatMap((line) => {
    const cases = partByNumber(line.part).perCase ? draft.cases : draft.cases.slice(0, 1);
    return cases.map(({ letter }) => ({ key: lineKey(line, letter), line, letter, item: 1 }));
  });
}

/** Keys of all lines a draft asks for now. */
export const askedKeys = (draft: DraftDocument): LinePlace[] =>
  everyKey(draft).filter(({ line, letter, item }) => isAsked(line, draft, letter, item));

/** Those of one case: its own lines of parts 5 to 7, and the lines that stand for all cases. */
export const askedKeysOf = (draft: DraftDocument, letter: string): LinePlace[] =>
  askedKeys(draft).filter((place) => place.letter === letter || !partByNumber(place.line.part).perCase);
