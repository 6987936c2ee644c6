import "server-only";
import { eq } from "drizzle-orm";
import { draft } from "@db/schema/app/draft";
import { screening } from "@db/schema/app/screening";
import { section } from "@db/schema/app/section";
import { newDraft } from "@/contracts/draft";
import { recordName } from "@/contracts/record-name";
import type { CreateScreening } from "@/contracts/requests";
import { authorise } from "@/server/auth/authorise";
import type { Viewer } from "@/server/auth/viewer";
import { writing } from "@/server/reading";
import { Refusal } from "@/server/refusal";

export type CreatedRevision = { id: string; record: string; rev: number };

/** Begins a screening of a section: draws its number and opens the draft of revision 1. */
export async function createScreening(viewer: Viewer, { sectionId, title }: CreateScreening): Promise<CreatedRevision> {
  return writing(viewer, async (transaction) => {
    const [place] = await transaction.select({ facilityId: section.facilityId }).from(section).where(eq(section.id, sectionId));
    if (!place) throw new Refusal("not-found");
    authorise(viewer, "screening.create", place);
    const [made] = await transaction
      .insert(screening)
      .values({ sectionId, title, createdBy: viewer.id })
      .returning({ id: screening.id, number: screening.number });
    if (!made) throw new Error("the screening was not stored");
    await transaction
      .insert(draft)
      .values({ screeningId: made.id, rev: 1, authorId: viewer.id, updatedBy: viewer.id, document: newDraft(title) });
    return { id: made.id, record: recordName(made.number), rev: 1 };
  });
}
