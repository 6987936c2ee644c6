/**
 * One case document made of a draft, with what stands in the way.
 *
 * Three kinds of trouble, all cited by line: `missing` (asked for and empty), `problems` (typed, but not usable) and `withoutSource` (usable,
 * but nobody said where it comes from; it blocks signing, not computing).
 */
import type { BlowdownCase } from "@/engine/cases/blowdown-case";
import { askedKeysOf, withInitials, type DraftDocument, type LineValue } from "./draft";
import { assembleCase } from "./draft-assemble";
import { compositionSum } from "./draft-composition";
import { crossProblems } from "./draft-cross-checks";
import type { LineKey, QuantityLine } from "./lines/line";
import type { LimitPolicy } from "./policy";

export type LineProblem = { line: LineKey; message: string };

export type CaseFromDraft = {
  /** Present only when nothing is missing and nothing is wrong. */
  document?: BlowdownCase;
  missing: LineKey[];
  problems: LineProblem[];
  withoutSource: LineKey[];
};

export type SiteFacts = { barometricPressurePa: number; policy: LimitPolicy };

/** Sum of the composition may differ from 100 % by this much before normalising is refused as a mistake. */
export const compositionSlackPercent = 5;

/**
 * Makes the case of one letter.
 *
 * given, letter  the draft and the case's letter ("A")
 * site           barometric pressure and limit policy of the facility
 * Returns        the case with SI values, or every line that stands in the way
 */
export function caseFromDraft(given: DraftDocument, letter: string, site: SiteFacts): CaseFromDraft {
  const draft = withInitials(given);
  const asked = askedKeysOf(draft, letter);
  const missing: LineKey[] = [];
  const problems: LineProblem[] = [];
  const withoutSource: LineKey[] = [];

  for (const { key, line } of asked) {
    if (line.kind === "derived") continue;
    if (line.kind === "composition") {
      checkComposition(draft, key, { missing, problems, withoutSource });
      continue;
    }
    const value = draft.lines[key];
    if (isEmpty(value, line.kind === "quantity")) {
      if (!line.optional) missing.push(key);
      continue;
    }
    if (!value) continue;
    if (line.kind === "quantity") {
      const problem = quantityProblem(line, value);
      if (problem) problems.push({ line: key, message: problem });
    }
    if (line.kind === "choice" && !line.options.some((option) => option.value === value.typed)) {
      problems.push({ line: key, message: `“${value.typed}” is not one of the choices of this line. Choose again.` });
    }
    if (!line.sourceFree && line.kind === "quantity" && !value.source?.note.trim()) withoutSource.push(key);
  }

  const clear = missing.length === 0 && problems.length === 0;
  const crossed = clear ? crossProblems(draft, letter, site) : [];
  problems.push(...crossed);
  return {
    ...(clear && crossed.length === 0 ? { document: assembleCase(draft, letter, site) } : {}),
    missing,
    problems,
    withoutSource,
  };
}

const isEmpty = (value: LineValue | undefined, quantity: boolean) =>
  !value || (value.typed.trim() === "" && (!quantity || value.si === null));

function quantityProblem(line: QuantityLine, value: LineValue): string | undefined {
  if (value.si === null) return `“${value.typed}” is not a number with a unit of this line. Type a figure, for example 12.5.`;
  if (!Number.isFinite(value.si)) return "The figure is not finite. Type another.";
  const low = line.exclusiveMin ? value.si <= line.min : value.si < line.min;
  if (low || value.si > line.max) return outOfRange(line);
  return undefined;
}

/** Ranges are kept in SI; the form writes them in the unit in use beside this sentence. */
const outOfRange = (line: QuantityLine) =>
  `The value lies outside the range that holds for “${line.label.toLowerCase()}”. Check figure and unit.`;

function checkComposition(
  draft: DraftDocument,
  key: LineKey,
  out: Pick<CaseFromDraft, "missing" | "problems" | "withoutSource">,
): void {
  const { rows, normalised, source } = draft.composition;
  const bad = rows.find((row) => row.molePercent === null);
  if (bad) {
    out.problems.push({
      line: key,
      message: `The amount of ${bad.id.replaceAll("_", " ")}, “${bad.typed}”, is not a number. Type mol %, for example 4.5.`,
    });
    return;
  }
  const sum = compositionSum(draft);
  if (rows.length === 0 || sum === 0) {
    out.missing.push(key);
    return;
  }
  const doubled = rows.find((row, at) => rows.findIndex((other) => other.id === row.id) !== at);
  if (doubled)
    out.problems.push({
      line: key,
      message: `${doubled.id.replaceAll("_", " ")} stands twice. Add the two amounts and remove one row.`,
    });
  if (Math.abs(sum - 100) > compositionSlackPercent) {
    out.problems.push({
      line: key,
      message: `The amounts sum to ${sum.toFixed(3)} mol %, too far from 100 to scale. Check for a missing row or a wrong decimal.`,
    });
  } else if (Math.abs(sum - 100) > 1e-4 && !normalised) {
    out.problems.push({
      line: key,
      message: `The amounts sum to ${sum.toFixed(3)} mol %. Correct them, or choose “Normalise and keep both columns”.`,
    });
  }
  if (!source?.note.trim()) out.withoutSource.push(key);
}
