import "server-only";
import { asc, eq, type SQL } from "drizzle-orm";
import type { Transaction } from "@db/clients";
import { facility } from "@db/schema/app/facility";
import { section } from "@db/schema/app/section";
import type { SectionDetailView, SectionView } from "@/contracts/views";
import { mayDo, reachOf } from "@/server/auth/authorise";
import type { Viewer } from "@/server/auth/viewer";
import { isId, reading, within } from "@/server/reading";
import { listScreenings } from "@/server/screenings/read";

/** Sections of the viewer's facilities; all of them for auditors. */
export async function listSections(viewer: Viewer): Promise<SectionView[]> {
  const reach = reachOf(viewer, "section.list");
  return reading(viewer, (transaction) => load(transaction, within(reach, section.facilityId)));
}

/** A section with its newest screenings. Null when it is not there or not the viewer's. */
export async function getSection(viewer: Viewer, sectionId: string): Promise<SectionDetailView | null> {
  if (!isId(sectionId)) return null;
  const [found] = await reading(viewer, (transaction) => load(transaction, eq(section.id, sectionId)));
  if (!found || !mayDo(viewer, "section.read", { facilityId: found.facility.id })) return null;
  const { rows } = await listScreenings(viewer, { sectionId, limit: 200 });
  return { ...found, screenings: rows };
}

async function load(transaction: Transaction, which: SQL | undefined): Promise<SectionView[]> {
  return transaction
    .select({
      id: section.id,
      tag: section.tag,
      name: section.name,
      description: section.description,
      facility: { id: facility.id, code: facility.code, name: facility.name },
    })
    .from(section)
    .innerJoin(facility, eq(facility.id, section.facilityId))
    .where(which)
    .orderBy(asc(facility.code), asc(section.tag));
}
