import "server-only";
import { randomUUID } from "node:crypto";
import { and, desc, eq, isNull, sql } from "drizzle-orm";
import { credential } from "@db/schema/app/account";
import { person, roleProposal } from "@db/schema/ledger/person";
import type { ChangePerson, InvitePerson } from "@/contracts/requests";
import type { Role } from "@/contracts/roles";
import type { PersonDetailView } from "@/contracts/views";
import { subjectOf } from "@/ledger/entry-kinds";
import { authorise } from "@/server/auth/authorise";
import { checkNewPassword, hashPassword } from "@/server/auth/passwords";
import { endSessions } from "@/server/auth/session";
import { clearAttempts } from "@/server/auth/throttle";
import type { Viewer } from "@/server/auth/viewer";
import { readDatabase, signDatabase, writeDatabase } from "@/server/database";
import { changeMembers } from "@/server/facilities/write";
import { recordEvent, twoPersonRule } from "@/server/ledger/write";
import { isId } from "@/server/reading";
import { Refusal } from "@/server/refusal";
import { noteSecurityEvent } from "@/server/security/events";
import { attemptKey } from "@/server/session/write";
import { getPerson } from "./read";

type Enrolment = { badge: string; printedName: string; role: Role; firstPassword: string };

/** Enrols a person with a first password that must be changed, and adds the memberships. Each is an entry. */
export async function invitePerson(viewer: Viewer, { facilityIds, ...enrolment }: InvitePerson): Promise<PersonDetailView> {
  const id = await enrolPerson(viewer, enrolment);
  for (const facilityId of new Set(facilityIds)) await changeMembers(viewer, facilityId, { act: "add", personId: id });
  const view = await getPerson(viewer, id);
  if (!view) throw new Error("the person just enrolled can't be read");
  return view;
}

/**
 * Enrols a person. Callable by the installation itself for the very first administrator.
 *
 * mustChange   true for a password that somebody else chose
 * Returns      the new person's id
 */
export async function enrolPerson(
  viewer: Viewer,
  { badge, printedName, role, firstPassword }: Enrolment,
  { mustChange = true }: { mustChange?: boolean } = {},
): Promise<string> {
  authorise(viewer, "person.enrol");
  checkNewPassword(firstPassword, { badge, printedName }, "firstPassword");
  const id = randomUUID();
  const passwordHash = await hashPassword(firstPassword);
  // Before the entry, so that a person who stands in the record can sign in; without the entry the row opens nothing.
  await writeDatabase().insert(credential).values({ personId: id, passwordHash, mustChange });
  await recordEvent(signDatabase(), {
    actor: viewer.id,
    kind: "person_enrolled",
    subject: subjectOf.person(id),
    idempotencyKey: `enrol-${id}`,
    body: { badge, printedName, role },
  });
  await noteSecurityEvent("password-set", id, { by: viewer.badge });
  return id;
}

/** Disables, enables, re-roles a person or sets a first password. Never one's own account. Their open sessions end at once. */
export async function changePerson(viewer: Viewer, personId: string, change: ChangePerson): Promise<PersonDetailView> {
  authorise(viewer, "person.change", { personId });
  const [target] = isId(personId) ? await readDatabase().select().from(person).where(eq(person.id, personId)) : [];
  if (!target) throw new Refusal("not-found");
  const { badge } = target;
  const event = { actor: viewer.id, subject: subjectOf.person(personId), idempotencyKey: randomUUID() };

  switch (change.act) {
    case "disable":
      await recordEvent(signDatabase(), { ...event, kind: "person_disabled", body: { badge, reason: change.reason } });
      break;
    case "re-enable":
      await recordEvent(signDatabase(), { ...event, kind: "person_reenabled", body: { badge, reason: change.reason } });
      break;
    case "change-role":
      await proposeRole(viewer, target, change);
      break;
    case "confirm-role":
      await confirmRole(viewer, target, change.role);
      break;
    case "set-password":
      await setFirstPassword(viewer, target, change.firstPassword);
      break;
  }
  if (change.act !== "re-enable") await endSessions(personId);
  const view = await getPerson(viewer, personId);
  if (!view) throw new Refusal("not-found");
  return view;
}

type Target = { id: string; badge: string; printedName: string; role: Role };

/** Proposes a change of role. With one administrator it is confirmed at once, and both entries say that the rule of two is not yet bound. */
async function proposeRole(viewer: Viewer, target: Target, { role, reason }: { role: Role; reason: string }): Promise<void> {
  const rule = await twoPersonRule(readDatabase());
  await recordEvent(signDatabase(), {
    actor: viewer.id,
    subject: subjectOf.person(target.id),
    idempotencyKey: randomUUID(),
    kind: "role_proposed",
    body: { badge: target.badge, from: target.role, role, reason, twoPersonRule: rule },
  });
  if (rule !== "bound") await confirmRole(viewer, target, role);
}

async function confirmRole(viewer: Viewer, target: Target, role: Role): Promise<void> {
  const [proposal] = await readDatabase()
    .select({ seq: roleProposal.seq })
    .from(roleProposal)
    .where(and(eq(roleProposal.personId, target.id), eq(roleProposal.role, role), isNull(roleProposal.confirmedSeq)))
    .orderBy(desc(roleProposal.seq))
    .limit(1);
  if (!proposal) throw new Refusal("wrong-state", { detail: `Nobody has proposed that ${target.badge} becomes ${role}.` });
  await recordEvent(signDatabase(), {
    actor: viewer.id,
    subject: subjectOf.person(target.id),
    idempotencyKey: randomUUID(),
    kind: "role_confirmed",
    body: {
      badge: target.badge,
      from: target.role,
      role,
      proposed: proposal.seq,
      twoPersonRule: await twoPersonRule(readDatabase()),
    },
  });
}

async function setFirstPassword(viewer: Viewer, target: Target, firstPassword: string): Promise<void> {
  checkNewPassword(firstPassword, target, "firstPassword");
  const passwordHash = await hashPassword(firstPassword);
  await writeDatabase()
    .update(credential)
    .set({ passwordHash, mustChange: true, changedAt: sql`now()` })
    .where(eq(credential.personId, target.id));
  await clearAttempts(attemptKey(target.badge));
  await noteSecurityEvent("password-set", target.id, { by: viewer.badge });
}
