import "server-only";
import { and, eq } from "drizzle-orm";
import { draft } from "@db/schema/app/draft";
import { recordName } from "@/contracts/record-name";
import type { NewRevision } from "@/contracts/requests";
import { authorise } from "@/server/auth/authorise";
import type { Viewer } from "@/server/auth/viewer";
import { alreadyExists } from "@/server/database-refusal";
import { writing } from "@/server/reading";
import { Refusal } from "@/server/refusal";
import type { CreatedRevision } from "./create";
import { matterOf, requireMatter } from "./matter";
import { revisable } from "./permissions";

/**
 * Opens the next revision with the lines of the last one, once that was returned, countersigned or withdrawn. What was returned stays as it
 * is; its remarks are listed in the new draft to be answered.
 */
export async function newRevision(
  viewer: Viewer,
  screeningId: string,
  { fromRev, reason }: NewRevision,
): Promise<CreatedRevision> {
  return writing(viewer, async (transaction) => {
    const found = await requireMatter(transaction, screeningId);
    authorise(viewer, "screening.revise", matterOf(found));
    if (revisable(found) !== fromRev) {
      throw new Refusal("wrong-state", {
        detail: "A new revision starts from the newest one, after it was returned, countersigned or withdrawn.",
      });
    }
    const [last] = await transaction
      .select({ document: draft.document })
      .from(draft)
      .where(and(eq(draft.screeningId, screeningId), eq(draft.rev, fromRev)));
    if (!last) throw new Refusal("not-found");
    const rev = fromRev + 1;
    await transaction.insert(draft).values({
      screeningId,
      rev,
      authorId: viewer.id,
      updatedBy: viewer.id,
      document: last.document,
      replacesRev: fromRev,
      reason,
    });
    return { id: screeningId, record: recordName(found.screening.number), rev };
  }).catch(
    alreadyExists(
      "draft_screening_id_rev_pk",
      "fromRev",
      "Somebody has opened the next revision already. Read the screening again.",
    ),
  );
}
