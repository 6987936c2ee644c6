/** Two computed cases beside each other: which lines differ, and what moved. Pure; figures in SI. */
import { parseLineKey } from "@/contracts/lines/registry";
import type { RecordContent, Verdict } from "@/contracts/record-content";
import type { CaseRunView, PreparedView } from "@/contracts/views";
import type { AssessedLimit } from "@/engine/cases/blowdown-result";

export type Side = {
  /** "rev 1", "case B", "rev 2, case B": what tells it from the other. */
  name: string;
  content: RecordContent;
  recordCase: RecordContent["cases"][number];
  run: CaseRunView;
};

/** The side of one case; undefined where that case was not computed. */
export function sideOf(prepared: PreparedView, letter: string | undefined, name: (letter: string) => string): Side | undefined {
  const recordCase = prepared.content.cases.find((one) => one.letter === letter) ?? prepared.content.cases[0];
  const run = prepared.runs.find((one) => one.letter === recordCase?.letter);
  return recordCase && run ? { name: name(recordCase.letter), content: prepared.content, recordCase, run } : undefined;
}

type RecordLine = RecordContent["lines"][number];
export type ChangedLine = { no: string; label: string; from: RecordLine | undefined; to: RecordLine | undefined };

/** Lines whose value differs, in the order of the sheet; a line of another case is compared under its bare number. */
export function changedLines(from: Side, to: Side): ChangedLine[] {
  const [before, after] = [linesOf(from), linesOf(to)];
  return [...new Set([...after.keys(), ...before.keys()])]
    .map((no) => {
      const [one, other] = [before.get(no), after.get(no)];
      return { no, label: (other ?? one)?.label ?? "", from: one, to: other };
    })
    .filter(({ from: one, to: other }) => !sameValue(one, other))
    .sort((a, b) => a.no.localeCompare(b.no, "en", { numeric: true }));
}

/** Lines of a side under their bare numbers. */
export function linesOf({ content, recordCase }: Side): Map<string, RecordLine> {
  const own = content.lines.flatMap((line): [string, RecordLine][] => {
    const letter = parseLineKey(line.line)?.letter;
    // The title of the sheet says nothing about the run.
    if (line.line === "1.10" || (letter && letter !== recordCase.letter)) return [];
    return [[line.line.replace(/^[A-Z]/, ""), line]];
  });
  return new Map(own);
}

/** Figures by their SI value, so that 25.4 mm is no change from 1 in; words by the words. */
function sameValue(one: RecordLine | undefined, other: RecordLine | undefined): boolean {
  if (!one || !other) return one === other;
  if (one.si !== null && other.si !== null)
    return Math.abs(one.si - other.si) <= 1e-12 * Math.max(Math.abs(one.si), Math.abs(other.si));
  return one.typed === other.typed;
}

export const sameFluid = (from: Side, to: Side): boolean =>
  JSON.stringify(from.content.composition.map(({ id, moleFraction }) => [id, moleFraction])) ===
  JSON.stringify(to.content.composition.map(({ id, moleFraction }) => [id, moleFraction]));

export type Moved = {
  id: AssessedLimit["id"];
  line: string;
  from: AssessedLimit | undefined;
  to: AssessedLimit | undefined;
  governs: boolean;
};

/** Limits of both sides, the newer one's order; `governs` where it decides the newer side. */
export function movedLimits(from: Side, to: Side): Moved[] {
  const ids = [...new Set([...to.run.result.limits, ...from.run.result.limits].map(({ id }) => id))];
  const find = (side: Side, id: string) => side.run.result.limits.find((limit) => limit.id === id);
  return ids
    .map((id) => ({
      id,
      line: to.recordCase.limits.find((limit) => limit.id === id)?.line ?? "–",
      from: find(from, id),
      to: find(to, id),
      governs: find(to, id)?.governs ?? false,
    }))
    .filter(({ from: one, to: other }) => one?.value !== undefined || other?.value !== undefined);
}

const numbers = ["No", "One", "Two", "Three", "Four", "Five", "Six", "Seven", "Eight", "Nine", "Ten"];

/** The first line of the page: how many lines differ, and whether the verdict did. */
export function compareTitle(changed: number, from: Verdict, to: Verdict, words: Record<Verdict, string>): string {
  const count = `${numbers[changed] ?? changed} ${changed === 1 ? "line differs" : "lines differ"}`;
  return from === to ? `${count}; both are ${words[to]}` : `${count}; the verdict goes from ${words[from]} to ${words[to]}`;
}
