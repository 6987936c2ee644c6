import "server-only";
import { and, eq, sql } from "drizzle-orm";
import { draft } from "@db/schema/app/draft";
import { screening } from "@db/schema/app/screening";
import { deriveSi } from "@/contracts/derive-si";
import type { DraftDocument } from "@/contracts/draft";
import { draftDifferences } from "@/contracts/draft-differences";
import type { SaveDraft } from "@/contracts/requests";
import type { DraftView } from "@/contracts/views";
import { authorise } from "@/server/auth/authorise";
import type { Viewer } from "@/server/auth/viewer";
import { orNotFound, Refusal } from "@/server/refusal";
import { writing } from "@/server/reading";
import { matterOf, openDraft, requireMatter } from "./matter";
import { getDraft } from "./read";

/**
 * Keeps the draft as typed. SI values are derived here again from text, unit and the site's barometer.
 *
 * Throws   Refusal "draft-changed" when another save came first, with that draft and the lines that differ; "wrong-state" once signed
 */
export async function saveDraft(viewer: Viewer, screeningId: string, { baseVersion, document }: SaveDraft): Promise<DraftView> {
  const conflict = await writing(viewer, async (transaction) => {
    const found = await requireMatter(transaction, screeningId);
    authorise(viewer, "draft.edit", matterOf(found));
    const open = openDraft(found);
    if (!open) throw new Refusal("wrong-state", { detail: "This revision is signed. A change makes the next one." });

    const kept = deriveSi(normalised(document), found.facility.barometricPressurePa);
    const saved = await transaction
      .update(draft)
      .set({ document: kept, version: baseVersion + 1, updatedBy: viewer.id, updatedAt: sql`now()` })
      .where(and(eq(draft.screeningId, screeningId), eq(draft.rev, open.rev), eq(draft.version, baseVersion)))
      .returning({ version: draft.version });
    if (saved.length === 0) return kept;

    const title = kept.lines["1.10"]?.typed.trim();
    if (title && title !== found.screening.title) {
      await transaction
        .update(screening)
        .set({ title: title.slice(0, 120) })
        .where(eq(screening.id, screeningId));
    }
    return null;
  });
  const now = orNotFound(await getDraft(viewer, screeningId));
  if (conflict) throw draftChanged(conflict, now);
  return now;
}

/** Texts in normal form C, so that what looks alike is alike; nothing typed is dropped. */
function normalised(document: DraftDocument): DraftDocument {
  return JSON.parse(JSON.stringify(document).normalize("NFC")) as DraftDocument;
}

function draftChanged(mine: DraftDocument, theirs: DraftView): Refusal {
  const problems = draftDifferences(mine, theirs.document).map(({ line, before, after }) => ({
    path: line,
    message: `Yours: ${before}. Saved: ${after}.`,
  }));
  return new Refusal("draft-changed", {
    detail: `${theirs.updatedBy} saved version ${theirs.version} at ${theirs.updatedAt}. Choose line by line, then save again.`,
    problems,
    current: theirs,
  });
}
