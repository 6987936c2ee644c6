import "server-only";
import { and, eq, sql, type SQL } from "drizzle-orm";
import type { Transaction } from "@db/clients";
import { draft } from "@db/schema/app/draft";
import { facility } from "@db/schema/app/facility";
import { screening } from "@db/schema/app/screening";
import { section } from "@db/schema/app/section";
import { entry, revision } from "@db/schema/ledger/entry";
import { person } from "@db/schema/ledger/person";
import { recordName } from "@/contracts/record-name";
import type { RevisionState, ScreeningRow } from "@/contracts/views";

/** A signed revision's own state; else "computed" while the stored run is of the lines as they stand, else "draft". */
export const stateOf = sql<RevisionState>`coalesce(${revision.state},
  case when ${draft.preparedVersion} = ${draft.version} then 'computed' else 'draft' end)`;

/** Newest revision of each screening, or the newest signed one. */
export const newest = (which: "any" | "signed"): SQL =>
  which === "any"
    ? sql`(select max(d.rev) from app.draft d where d.screening_id = ${screening.id})`
    : sql`(select max(r.rev) from ledger.revision r where r.screening_id = ${screening.id})`;

/** Who signed it; who began it while nobody has. */
const authorOf = sql`coalesce(${revision.author}, ${draft.authorId})`;
/** The entry that brought a signed revision to where it stands. */
export const newestEntry = sql`coalesce(${revision.closedSeq}, ${revision.decidedSeq}, ${revision.signedSeq})`;

export function selectRows(transaction: Transaction, which: "any" | "signed", where: SQL | undefined) {
  return transaction
    .select({
      id: screening.id,
      number: screening.number,
      title: screening.title,
      rev: draft.rev,
      state: stateOf,
      prepared: draft.prepared,
      updatedAt: draft.updatedAt,
      entryAt: entry.at,
      contributors: draft.contributors,
      section: { id: section.id, tag: section.tag, name: section.name },
      facility: { id: facility.id, code: facility.code, name: facility.name, demo: facility.demo },
      author: { id: person.id, badge: person.badge },
    })
    .from(screening)
    .innerJoin(section, eq(section.id, screening.sectionId))
    .innerJoin(facility, eq(facility.id, section.facilityId))
    .innerJoin(draft, and(eq(draft.screeningId, screening.id), sql`${draft.rev} = ${newest(which)}`))
    .leftJoin(revision, and(eq(revision.screeningId, screening.id), eq(revision.rev, draft.rev)))
    .leftJoin(entry, sql`${entry.seq} = ${newestEntry}`)
    .innerJoin(person, sql`${person.id} = ${authorOf}`)
    .where(where)
    .$dynamic();
}

export type FoundRow = Awaited<ReturnType<typeof selectRows>>[number];

export function toRow({
  id,
  number,
  title,
  rev,
  state,
  prepared,
  updatedAt,
  entryAt,
  section,
  facility,
  author,
}: FoundRow): ScreeningRow {
  return {
    id,
    record: recordName(number),
    rev,
    title,
    section,
    facility,
    state,
    verdict: prepared?.verdict ?? null,
    sentence: prepared?.sentence ?? null,
    ebb: prepared?.ebb ?? null,
    author,
    changedAt: entryAt ?? updatedAt.toISOString(),
  };
}
