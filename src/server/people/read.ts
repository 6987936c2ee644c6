import "server-only";
import { asc, desc, eq, isNull, max } from "drizzle-orm";
import { credential } from "@db/schema/app/account";
import { facility } from "@db/schema/app/facility";
import { securityEvent } from "@db/schema/app/security-event";
import { member, person, roleProposal } from "@db/schema/ledger/person";
import type { PersonDetailView } from "@/contracts/views";
import { authorise } from "@/server/auth/authorise";
import type { Viewer } from "@/server/auth/viewer";
import { readDatabase, writeDatabase } from "@/server/database";

/** Everybody who was ever enrolled, by badge. For administrators. */
export async function listPeople(viewer: Viewer): Promise<PersonDetailView[]> {
  authorise(viewer, "person.list");
  const read = readDatabase();
  const [people, memberships, credentials, signIns, proposals] = await Promise.all([
    read.select().from(person).orderBy(asc(person.badge)),
    read
      .select({ personId: member.personId, id: facility.id, name: facility.name })
      .from(member)
      .innerJoin(facility, eq(facility.id, member.facilityId))
      .orderBy(asc(facility.name)),
    writeDatabase().select({ personId: credential.personId, mustChange: credential.mustChange }).from(credential),
    read
      .select({ personId: securityEvent.personId, at: max(securityEvent.at) })
      .from(securityEvent)
      .where(eq(securityEvent.kind, "signed-in"))
      .groupBy(securityEvent.personId),
    read.select().from(roleProposal).where(isNull(roleProposal.confirmedSeq)).orderBy(desc(roleProposal.seq)),
  ]);
  return people.map(({ id, badge, printedName, role, active }) => {
    const proposed = proposals.find(({ personId }) => personId === id);
    return {
      id,
      badge,
      printedName,
      role,
      active,
      facilities: memberships
        .filter(({ personId }) => personId === id)
        .map(({ id: facilityId, name }) => ({ id: facilityId, name })),
      mustChangePassword: credentials.find(({ personId }) => personId === id)?.mustChange ?? false,
      lastSignIn: signIns.find(({ personId }) => personId === id)?.at?.toISOString() ?? null,
      proposedRole: proposed ? { role: proposed.role, mine: proposed.proposedBy === viewer.id } : null,
    };
  });
}

export async function getPerson(viewer: Viewer, personId: string): Promise<PersonDetailView | null> {
  return (await listPeople(viewer)).find(({ id }) => id === personId) ?? null;
}
