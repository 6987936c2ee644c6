import "server-only";
import { desc, eq } from "drizzle-orm";
import type { Transaction } from "@db/clients";
import { draft } from "@db/schema/app/draft";
import { facility } from "@db/schema/app/facility";
import { screening } from "@db/schema/app/screening";
import { section } from "@db/schema/app/section";
import { revision } from "@db/schema/ledger/entry";
import type { Matter } from "@/server/auth/authorise";
import { isId } from "@/server/reading";
import { Refusal } from "@/server/refusal";

/** Where a screening stands: its place, its newest draft and what has been signed. Everything a decision about it needs. */
export async function findMatter(transaction: Transaction, screeningId: string) {
  if (!isId(screeningId)) return null;
  const [place] = await transaction
    .select({ screening, section, facility })
    .from(screening)
    .innerJoin(section, eq(section.id, screening.sectionId))
    .innerJoin(facility, eq(facility.id, section.facilityId))
    .where(eq(screening.id, screeningId));
  if (!place) return null;
  const [newestDraft] = await transaction
    .select()
    .from(draft)
    .where(eq(draft.screeningId, screeningId))
    .orderBy(desc(draft.rev))
    .limit(1);
  const signed = await transaction
    .select()
    .from(revision)
    .where(eq(revision.screeningId, screeningId))
    .orderBy(desc(revision.rev));
  return { ...place, newestDraft, signed };
}

export type Found = NonNullable<Awaited<ReturnType<typeof findMatter>>>;

export async function requireMatter(transaction: Transaction, screeningId: string): Promise<Found> {
  const found = await findMatter(transaction, screeningId);
  if (!found) throw new Refusal("not-found");
  return found;
}

/** The facts `authorise` asks for, about one revision. */
export function matterOf({ facility, newestDraft, signed }: Found, rev?: number): Matter {
  const about = signed.find((one) => one.rev === rev);
  const unsigned = !about && (rev === undefined || newestDraft?.rev === rev) ? newestDraft : undefined;
  return {
    facilityId: facility.id,
    signed: signed.length > 0,
    ...(about ? { authorId: about.author, contributors: about.contributors } : {}),
    ...(unsigned ? { authorId: unsigned.authorId, contributors: unsigned.contributors } : {}),
  };
}

/** The draft that may still be typed in: the newest revision, while nobody has signed it. */
export const openDraft = ({ newestDraft, signed }: Found) =>
  newestDraft && !signed.some(({ rev }) => rev === newestDraft.rev) ? newestDraft : undefined;
