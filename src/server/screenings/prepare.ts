import "server-only";
import { and, eq, sql } from "drizzle-orm";
import { draft, type PreparedSummary } from "@db/schema/app/draft";
import type { BlowdownCase } from "@/engine/cases/blowdown-case";
import { lineKeyOfPath } from "@/contracts/draft-back-links";
import { caseFromDraft } from "@/contracts/draft-to-case";
import type { DraftDocument } from "@/contracts/draft";
import { ebbOf } from "@/contracts/ebb";
import type { RecordContent } from "@/contracts/record-content";
import type { PreparedView } from "@/contracts/views";
import { canonicalJson } from "@/ledger/canonical-json";
import { faultOfText } from "@/ledger/text-rules";
import { authorise } from "@/server/auth/authorise";
import type { Viewer } from "@/server/auth/viewer";
import { writeDatabase } from "@/server/database";
import { runTwice } from "@/server/engine/run-in-thread";
import { putContent } from "@/server/ledger/write";
import { reading, writing } from "@/server/reading";
import { orNotFound, Refusal } from "@/server/refusal";
import { storedRecord } from "./content";
import { matterOf, openDraft, requireMatter, type Found } from "./matter";
import { getDraft, getScreening } from "./read";
import { composeRecord, type StoredRun } from "./record";

const json = "application/json";

/**
 * Computes a draft in full: every case and its confirmation in a thread, then case, result, confirmation and record content stored as bytes
 * under their own hashes. What the signing page shows, and what a signature names, is this and nothing the browser computed.
 *
 * Throws   Refusal "draft-changed" when the draft is not the version asked for, "invalid-request" with the lines that stand in the way,
 *          "cannot-compute" with the engine's reason, "busy"
 */
export async function prepareScreening(
  viewer: Viewer,
  screeningId: string,
  { draftVersion }: { draftVersion: number },
): Promise<PreparedView> {
  const { found, before } = await reading(viewer, async (transaction) => {
    const matter = await requireMatter(transaction, screeningId);
    authorise(viewer, "draft.compute", matterOf(matter));
    const replaced = matter.signed.find(({ rev }) => rev === matter.newestDraft?.replacesRev);
    return { found: matter, before: replaced ? await storedRecord(transaction, replaced.contentSha256) : null };
  });
  const open = openDraft(found);
  if (!open) throw new Refusal("wrong-state", { detail: "This revision is signed. A change makes the next one." });
  if (open.version !== draftVersion) throw await changedMeanwhile(viewer, screeningId);

  const documents = casesOf(open.document, found);
  const runs: StoredRun[] = [];
  for (const { letter, document } of documents) runs.push(await runAndStore(letter, document));
  const content = composeRecord(found, open, runs, before);
  const contentSha256 = await putContent(writeDatabase(), json, canonicalJson(content));

  const kept = await writing(viewer, (transaction) =>
    transaction
      .update(draft)
      .set({
        prepared: summaryOf(content, runs),
        preparedSha256: contentSha256,
        preparedVersion: draftVersion,
        preparedAt: sql`now()`,
      })
      .where(and(eq(draft.screeningId, screeningId), eq(draft.rev, open.rev), eq(draft.version, draftVersion)))
      .returning({ rev: draft.rev }),
  );
  if (kept.length === 0) throw await changedMeanwhile(viewer, screeningId);
  return orNotFound((await getScreening(viewer, screeningId, open.rev))?.prepared ?? null);
}

/** The case documents of a draft, or a refusal that names every line in the way. */
function casesOf(document: DraftDocument, { facility }: Found): { letter: string; document: BlowdownCase }[] {
  const problems = new Map<string, string>();
  for (const { line, message } of unwritable(document)) problems.set(line, message);
  const documents = document.cases.flatMap(({ letter }) => {
    const made = caseFromDraft(document, letter, facility);
    for (const line of made.missing) problems.set(line, "This line is empty. Enter a value.");
    for (const { line, message } of made.problems) problems.set(line, message);
    return made.document ? [{ letter, document: made.document }] : [];
  });
  if (problems.size === 0) return documents;
  const [first = ""] = problems.keys();
  const count = problems.size === 1 ? `Line ${first} stands` : `${problems.size} lines stand, the first is ${first},`;
  throw new Refusal("invalid-request", {
    detail: `${count} in the way of a run.`,
    problems: [...problems].map(([path, message]) => ({ path, message })),
  });
}

/** Texts that may not stand in a record. */
function unwritable({ lines, composition }: DraftDocument): { line: string; message: string }[] {
  const texts = [
    ...Object.entries(lines).flatMap(([line, { typed, source }]) => [
      { line, text: typed },
      { line, text: source?.note ?? "" },
    ]),
    ...composition.rows.map(({ typed }) => ({ line: "3.01", text: typed })),
    { line: "3.01", text: composition.source?.note ?? "" },
  ];
  return texts.flatMap(({ line, text }) => {
    const fault = faultOfText(text);
    return fault ? [{ line, message: `The text ${fault}. Type it again without pasting.` }] : [];
  });
}

async function runAndStore(letter: string, document: BlowdownCase): Promise<StoredRun> {
  const computed = await runTwice(document).catch((error: unknown) => {
    throw error instanceof Refusal ? citedByLine(error, letter) : error;
  });
  const [caseSha256, resultSha256, confirmationSha256] = [
    await putContent(writeDatabase(), json, computed.caseText),
    await putContent(writeDatabase(), json, computed.resultText),
    await putContent(writeDatabase(), json, computed.confirmationText),
  ];
  if (caseSha256 !== computed.caseSha256)
    throw new Error(`the stored case hashes to ${caseSha256}, the engine says ${computed.caseSha256}`);
  return { letter, marginK: document.limits?.minimumMetalMarginK ?? 0, computed, caseSha256, resultSha256, confirmationSha256 };
}

/** What the engine refuses by a path of the case, cited at the line it was made from. */
function citedByLine(refusal: Refusal, letter: string): Refusal {
  const { problems, ...rest } = refusal.parts;
  if (!problems) return refusal;
  return new Refusal(refusal.code, {
    ...rest,
    problems: problems.map(({ path, message }) => ({ path: lineKeyOfPath(path, letter) ?? path, message })),
  });
}

function summaryOf(content: RecordContent, runs: readonly StoredRun[]): PreparedSummary {
  const governing = content.cases.find(({ verdict }) => verdict === content.verdict);
  const shown = runs.find(({ letter }) => letter === governing?.letter) ?? runs[0];
  return {
    engineVersion: content.engineVersion,
    verdict: content.verdict,
    sentence: content.sentence,
    ebb: shown ? ebbOf(JSON.parse(shown.computed.caseText) as BlowdownCase, shown.computed.result) : null,
    runs: runs.map(({ letter, caseSha256, resultSha256, confirmationSha256 }) => ({
      letter,
      caseSha256,
      resultSha256,
      confirmationSha256,
    })),
  };
}

async function changedMeanwhile(viewer: Viewer, screeningId: string): Promise<Refusal> {
  const current = await getDraft(viewer, screeningId);
  const detail = current ? `${current.updatedBy} saved version ${current.version} at ${current.updatedAt}.` : undefined;
  return new Refusal("draft-changed", { detail, current });
}
