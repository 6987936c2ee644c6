import "server-only";
import { asc, count, eq, inArray, type SQL } from "drizzle-orm";
import type { Transaction } from "@db/clients";
import { facility } from "@db/schema/app/facility";
import { section } from "@db/schema/app/section";
import { member, person } from "@db/schema/ledger/person";
import type { FacilityView, PersonView } from "@/contracts/views";
import { mayDo, reachOf } from "@/server/auth/authorise";
import type { Viewer } from "@/server/auth/viewer";
import { isId, reading, within } from "@/server/reading";

/** Facilities of the viewer; all of them for auditors and administrators. */
export async function listFacilities(viewer: Viewer): Promise<FacilityView[]> {
  const reach = reachOf(viewer, "facility.list");
  return reading(viewer, (transaction) => load(transaction, within(reach, facility.id)));
}

/** Null when it is not there or not the viewer's. */
export async function getFacility(viewer: Viewer, facilityId: string): Promise<FacilityView | null> {
  if (!isId(facilityId) || !mayDo(viewer, "facility.read", { facilityId })) return null;
  const [found] = await reading(viewer, (transaction) => load(transaction, eq(facility.id, facilityId)));
  return found ?? null;
}

async function load(transaction: Transaction, which: SQL | undefined): Promise<FacilityView[]> {
  const rows = await transaction.select().from(facility).where(which).orderBy(asc(facility.code));
  const ids = rows.map(({ id }) => id);
  if (ids.length === 0) return [];
  const sections = await transaction
    .select({ facilityId: section.facilityId, count: count() })
    .from(section)
    .where(inArray(section.facilityId, ids))
    .groupBy(section.facilityId);
  const members = await transaction
    .select({
      facilityId: member.facilityId,
      id: person.id,
      badge: person.badge,
      printedName: person.printedName,
      role: person.role,
      active: person.active,
    })
    .from(member)
    .innerJoin(person, eq(person.id, member.personId))
    .where(inArray(member.facilityId, ids))
    .orderBy(asc(person.badge));
  return rows.map(({ id, code, name, demo, barometricPressurePa, policy }) => ({
    id,
    code,
    name,
    demo,
    barometricPressurePa,
    policy,
    sections: sections.find(({ facilityId }) => facilityId === id)?.count ?? 0,
    members: members.filter(({ facilityId }) => facilityId === id).map(({ facilityId: _, ...view }): PersonView => view),
  }));
}
