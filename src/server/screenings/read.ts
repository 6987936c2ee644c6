import "server-only";
import { and, desc, eq, sql } from "drizzle-orm";
import type { Transaction } from "@db/clients";
import { draft } from "@db/schema/app/draft";
import { screening } from "@db/schema/app/screening";
import { entry, revision } from "@db/schema/ledger/entry";
import { person } from "@db/schema/ledger/person";
import type { DraftView, PreparedView, ScreeningView } from "@/contracts/views";
import { mayDo } from "@/server/auth/authorise";
import type { Viewer } from "@/server/auth/viewer";
import { reading } from "@/server/reading";
import { storedRecord, storedRuns } from "./content";
import { findMatter, matterOf, openDraft, type Found } from "./matter";
import { permissions } from "./permissions";
import { newestEntry, selectRows, stateOf, toRow } from "./rows";
import { listSignatures, remarksOf } from "./signatures";

export { listScreenings } from "./list";

type DraftRow = typeof draft.$inferSelect;

/**
 * One revision of a screening with everything its sheet shows.
 *
 * rev      the revision; the newest that the viewer may see where it is left out
 * Returns  null when it is not there or not open to the viewer
 */
export async function getScreening(viewer: Viewer, screeningId: string, rev?: number): Promise<ScreeningView | null> {
  const signedOnly = viewer.role === "auditor";
  return reading(
    viewer,
    async (transaction) => {
      const found = await findMatter(transaction, screeningId);
      if (!found || !mayDo(viewer, "screening.read", matterOf(found))) return null;
      const revisions = await listRevisions(transaction, screeningId, signedOnly);
      const shown = revisions.find((one) => one.rev === (rev ?? revisions[0]?.rev));
      if (!shown) return null;

      const [row] = await selectRows(transaction, signedOnly ? "signed" : "any", eq(screening.id, screeningId));
      const [kept] = await transaction
        .select()
        .from(draft)
        .where(and(eq(draft.screeningId, screeningId), eq(draft.rev, shown.rev)));
      if (!row || !kept) return null;
      const signed = found.signed.find((one) => one.rev === shown.rev);
      const base = toRow({ ...row, rev: shown.rev, state: shown.state, prepared: kept.prepared });
      const { may, whyNot } = permissions(viewer, found, shown.rev);
      return {
        ...base,
        author: signed ? await authorOf(transaction, signed.author) : await authorOf(transaction, kept.authorId),
        changedAt: shown.changedAt,
        revisions,
        draft: mayDo(viewer, "draft.read", matterOf(found)) ? await draftView(transaction, viewer, found, kept) : null,
        prepared: await preparedView(transaction, kept, signed?.contentSha256),
        signatures: await listSignatures(transaction, screeningId, shown.rev),
        may,
        whyNot,
      };
    },
    signedOnly ? { beyondDrafts: true } : {},
  );
}

/** The draft of the newest revision; null when there is none or it is not open to the viewer. */
export async function getDraft(viewer: Viewer, screeningId: string): Promise<DraftView | null> {
  return reading(viewer, async (transaction) => {
    const found = await findMatter(transaction, screeningId);
    if (!found?.newestDraft || !mayDo(viewer, "draft.read", matterOf(found))) return null;
    return draftView(transaction, viewer, found, found.newestDraft);
  });
}

async function listRevisions(
  transaction: Transaction,
  screeningId: string,
  signedOnly: boolean,
): Promise<ScreeningView["revisions"]> {
  const rows = await transaction
    .select({ rev: draft.rev, state: stateOf, updatedAt: draft.updatedAt, signedSeq: revision.signedSeq, entryAt: entry.at })
    .from(draft)
    .leftJoin(revision, and(eq(revision.screeningId, draft.screeningId), eq(revision.rev, draft.rev)))
    .leftJoin(entry, sql`${entry.seq} = ${newestEntry}`)
    .where(eq(draft.screeningId, screeningId))
    .orderBy(desc(draft.rev));
  return rows
    .filter(({ signedSeq }) => !signedOnly || signedSeq !== null)
    .map(({ rev, state, updatedAt, entryAt }) => ({ rev, state, changedAt: entryAt ?? updatedAt.toISOString() }));
}

async function draftView(transaction: Transaction, viewer: Viewer, found: Found, kept: DraftRow): Promise<DraftView> {
  const { badge } = await authorOf(transaction, kept.updatedBy);
  return {
    screeningId: kept.screeningId,
    rev: kept.rev,
    document: kept.document,
    version: kept.version,
    updatedAt: kept.updatedAt.toISOString(),
    updatedBy: badge,
    editable: openDraft(found)?.rev === kept.rev && mayDo(viewer, "draft.edit", matterOf(found)),
    answers: await remarksOf(transaction, kept.screeningId, kept.replacesRev),
  };
}

async function preparedView(
  transaction: Transaction,
  kept: DraftRow,
  signedSha256: string | undefined,
): Promise<PreparedView | null> {
  const contentSha256 = signedSha256 ?? kept.preparedSha256;
  if (!contentSha256 || !kept.preparedAt || kept.preparedVersion === null) return null;
  const content = await storedRecord(transaction, contentSha256);
  return {
    contentSha256,
    content,
    runs: await storedRuns(transaction, content),
    computedAt: kept.preparedAt.toISOString(),
    draftVersion: kept.preparedVersion,
    stale: !signedSha256 && kept.preparedVersion !== kept.version,
  };
}

async function authorOf(transaction: Transaction, personId: string): Promise<{ id: string; badge: string }> {
  const [found] = await transaction.select({ id: person.id, badge: person.badge }).from(person).where(eq(person.id, personId));
  return found ?? { id: personId, badge: "–" };
}
