import "server-only";
import { assumedLinesCaution, type Caution } from "@/engine/cautions";
import { findLibraryRow } from "@/engine/substances/library";
import type { DraftDocument } from "@/contracts/draft";
import { moleFractions } from "@/contracts/draft-composition";
import type { SiteFacts } from "@/contracts/draft-to-case";
import { lineByNo, lineKey } from "@/contracts/lines/registry";
import type { LineNo } from "@/contracts/lines/line";
import type { RecordContent } from "@/contracts/record-content";
import { recordName } from "@/contracts/record-name";
import { runSentence, worstVerdict } from "@/contracts/verdict-sentence";
import type { LimitId } from "@/engine/cases/blowdown-result";
import type { ComputedTwice } from "@/server/engine/run-in-thread";
import type { Found } from "./matter";
import { recordLines } from "./record-lines";

/** One case, computed and stored. */
export type StoredRun = {
  letter: string;
  marginK: number;
  computed: ComputedTwice;
  caseSha256: string;
  resultSha256: string;
  confirmationSha256: string;
};

type Draft = NonNullable<Found["newestDraft"]>;

/**
 * Composes the content that a signature will stand for. Nothing in it comes from a clock or from chance: the same draft, site and engine
 * give the same bytes.
 *
 * before   content of the revision this one replaces, for what changed since
 */
export function composeRecord(
  found: Found,
  draft: Draft,
  runs: readonly StoredRun[],
  before: RecordContent | null,
): RecordContent {
  const { screening, section, facility } = found;
  const site: SiteFacts = facility;
  const lines = recordLines(draft.document, site);
  const composition = compositionRows(draft.document);
  const cases = runs.map((run) => recordCase(run, draft.document));
  const verdict = worstVerdict(cases.map((one) => one.verdict));
  const worst = cases.find((one) => one.verdict === verdict) ?? cases[0];
  const assumed = [
    ...lines.flatMap(({ line, source }) => (source?.kind === "assumed" ? [line] : [])),
    ...(draft.document.composition.source?.kind === "assumed" ? ["3.01"] : []),
  ];
  const content: RecordContent = {
    format: "ebbmark-record/1",
    record: recordName(screening.number),
    rev: draft.rev,
    title: draft.document.lines["1.10"]?.typed.trim() || screening.title,
    facility: { id: facility.id, code: facility.code, name: facility.name, demo: facility.demo },
    section: { id: section.id, tag: section.tag, name: section.name },
    engineVersion: runs[0]?.computed.result.engineVersion ?? "",
    barometricPressurePa: facility.barometricPressurePa,
    policy: facility.policy,
    lines,
    composition,
    compositionSource: draft.document.composition.source,
    cases: cases as RecordContent["cases"],
    verdict,
    sentence: (cases.length > 1 && worst ? `Case ${worst.letter}: ` : "") + (worst?.sentence ?? ""),
    cautions: standingCautions(runs, assumed.length),
    assumed,
    changedSince: [],
    reason: draft.reason,
  };
  return before ? { ...content, changedSince: changedSince(before, content) } : content;
}

/** Limits that the physics sets, and nobody enters, have no line of their own. */
const lineOfLimit: Partial<Record<LimitId, LineNo>> = {
  "time-to-target": "7.01",
  "minimum-wall-temperature": "7.02",
  "minimum-liquid-wall-temperature": "7.02",
  "minimum-outlet-temperature": "7.03",
  "peak-vent-rate": "7.04",
};

function recordCase({ letter, marginK, computed, ...hashes }: StoredRun, draft: DraftDocument): RecordContent["cases"][number] {
  const { result, confirmation } = computed;
  return {
    letter,
    kind: draft.cases.find((one) => one.letter === letter)?.kind ?? "cold-blowdown",
    ...hashes,
    confirmation: confirmation.figures.map(({ id, change, unit }) => ({ id, change, unit })),
    verdict: result.verdict,
    sentence: runSentence(result, marginK),
    limits: result.limits.map(({ id, title, value, limit, unit, verdict, governs }) => ({
      id,
      line: lineOf(id, letter),
      title,
      value: value ?? null,
      limit: limit ?? null,
      unit,
      verdict,
      governs,
    })),
    warnings: result.warnings.map(({ code, message }) => ({ code, message })),
  };
}

function lineOf(id: LimitId, letter: string): string {
  const no = lineOfLimit[id];
  return no ? lineKey(lineByNo(no), letter) : "–";
}

function compositionRows(draft: DraftDocument): RecordContent["composition"] {
  const typed = new Map(draft.composition.rows.map((row) => [row.id, row.typed]));
  return moleFractions(draft).map(({ id, moleFraction }) => ({
    id,
    name: findLibraryRow(id)?.name ?? id,
    typed: typed.get(id) ?? "",
    moleFraction,
  }));
}

/** The cautions of every case, each once, and C6 where lines rest on assumption; C1 to C7 first. */
function standingCautions(runs: readonly StoredRun[], assumedLines: number): Caution[] {
  const all = runs.flatMap(({ letter, computed: { result } }) =>
    result.cautionIds.map((id, at) => ({ id, words: result.cautions[at] ?? "", letter })),
  );
  const kept: { id: string; words: string }[] = [];
  for (const { id, words, letter } of all) {
    if (kept.some((one) => one.words === words)) continue;
    // The same caution in other words, for another case: it is acknowledged apart, so it needs a name of its own.
    kept.push({ id: kept.some((one) => one.id === id) ? `${id}-${letter}` : id, words });
  }
  if (assumedLines > 0) kept.push(assumedLinesCaution(assumedLines));
  const rank = ({ id }: { id: string }) => (id.startsWith("C") ? 0 : 1);
  return kept.sort((a, b) => rank(a) - rank(b) || (rank(a) === 0 ? a.id.localeCompare(b.id) : 0)) as Caution[];
}

/** Lines that read otherwise than in the revision before, in this one's order; a line that is gone has an en dash after. */
function changedSince(before: RecordContent, after: RecordContent): RecordContent["changedSince"] {
  const words = ({ typed, unit, source }: RecordContent["lines"][number]) =>
    `${typed}${unit && unit !== "–" ? ` ${unit}` : ""}${source ? `, ${source.kind}: ${source.note}` : ""}`;
  const mixture = ({ composition, compositionSource }: RecordContent) =>
    composition.map(({ id, typed }) => `${id} ${typed}`).join(", ") +
    (compositionSource ? `, ${compositionSource.kind}: ${compositionSource.note}` : "");
  const was = new Map(before.lines.map((line) => [line.line, words(line)]));
  const is = new Map(after.lines.map((line) => [line.line, words(line)]));
  was.set("3.01", mixture(before));
  is.set("3.01", mixture(after));
  return [...new Set([...is.keys(), ...was.keys()])].flatMap((line) => {
    const [one, other] = [was.get(line) ?? "–", is.get(line) ?? "–"];
    return one === other ? [] : [{ line, before: one, after: other }];
  });
}
