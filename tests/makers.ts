import { randomUUID } from "node:crypto";
import { and, eq, sql } from "drizzle-orm";
import { asPerson } from "@db/clients";
import { draft } from "@db/schema/app/draft";
import { facility } from "@db/schema/app/facility";
import { screening } from "@db/schema/app/screening";
import { section } from "@db/schema/app/section";
import { defaultPolicy } from "@/contracts/policy";
import { newDraft } from "@/contracts/draft";
import type { RecordContent } from "@/contracts/record-content";
import type { Role } from "@/contracts/roles";
import { canonicalJson } from "@/ledger/canonical-json";
import { subjectOf } from "@/ledger/entry-kinds";
import { openCeremony, proveCeremony } from "@/server/ledger/ceremony";
import { recordName } from "@/contracts/record-name";
import type { Databases } from "@/server/ledger/statement";
import {
  countersignRevision,
  putContent,
  recordEvent,
  returnRevision,
  signRevision,
  twoPersonRule,
  withdrawRevision,
} from "@/server/ledger/write";

/*
 * Rows for tests that need a database, made through the same writes as the product's own. Every maker makes new people and places, so
 * tests don't meet each other's.
 */

export type Made = { id: string; badge: string };

let badges = 100;

/** The administrator of a new installation, enrolled by the installation itself. */
export async function makeFirstAdministrator({ sign }: Databases): Promise<Made> {
  return enrol(sign, "system", "administrator");
}

export async function makePerson({ sign }: Databases, administrator: Made, role: Role): Promise<Made> {
  return enrol(sign, administrator.id, role);
}

const letters: Record<Role, string> = { engineer: "E", approver: "A", auditor: "U", administrator: "D" };

async function enrol(sign: Databases["sign"], actor: string, role: Role): Promise<Made> {
  const made = { id: randomUUID(), badge: `${letters[role]}-${badges++}` };
  await recordEvent(sign, {
    actor,
    kind: "person_enrolled",
    subject: subjectOf.person(made.id),
    idempotencyKey: `enrol-${made.id}`,
    body: { badge: made.badge, printedName: `Test person ${made.badge}`, role },
  });
  return made;
}

export async function disablePerson({ sign }: Databases, administrator: Made, person: Made): Promise<void> {
  await recordEvent(sign, {
    actor: administrator.id,
    kind: "person_disabled",
    subject: subjectOf.person(person.id),
    idempotencyKey: randomUUID(),
    body: { badge: person.badge, reason: "left the site" },
  });
}

/** Proposes and confirms; with two administrators or more give both. */
export async function changeRole(
  { read, sign }: Databases,
  { by, confirmedBy, person, from, role }: { by: Made; confirmedBy?: Made; person: Made; from: Role; role: Role },
): Promise<void> {
  const rule = await twoPersonRule(read);
  const common = { badge: person.badge, from, role, twoPersonRule: rule };
  const subject = subjectOf.person(person.id);
  const proposed = await recordEvent(sign, {
    actor: by.id,
    kind: "role_proposed",
    subject,
    idempotencyKey: randomUUID(),
    body: { ...common, reason: "takes over" },
  });
  await recordEvent(sign, {
    actor: (confirmedBy ?? by).id,
    kind: "role_confirmed",
    subject,
    idempotencyKey: randomUUID(),
    body: { ...common, proposed: proposed.seq },
  });
}

export async function makeFacility(
  { write, sign }: Databases,
  administrator: Made,
  members: Made[],
): Promise<{ id: string; name: string }> {
  const code = `T${badges++}`;
  const [made] = await write
    .insert(facility)
    .values({ code, name: `Test site ${code}`, barometricPressurePa: 101325, policy: defaultPolicy, createdBy: administrator.id })
    .returning({ id: facility.id, name: facility.name });
  for (const member of members) await addMember({ sign }, administrator, made!, member);
  return made!;
}

export async function addMember(
  { sign }: Pick<Databases, "sign">,
  administrator: Made,
  place: { id: string; name: string },
  member: Made,
): Promise<void> {
  await recordEvent(sign, {
    actor: administrator.id,
    kind: "member_added",
    subject: subjectOf.member(place.id, member.id),
    idempotencyKey: randomUUID(),
    body: { badge: member.badge, facility: place.name },
  });
}

export async function makeSection({ write }: Databases, facilityId: string, by: Made): Promise<string> {
  const [made] = await write
    .insert(section)
    .values({ facilityId, tag: `IS-${badges++}`, name: "Test section", createdBy: by.id })
    .returning({ id: section.id });
  return made!.id;
}

export async function makeScreening({ write }: Databases, sectionId: string, by: Made): Promise<{ id: string; number: number }> {
  const [made] = await write
    .insert(screening)
    .values({ sectionId, title: "Test screening", createdBy: by.id })
    .returning({ id: screening.id, number: screening.number });
  return made!;
}

/** A draft with stored content, as if the server had computed it. Returns the hash a signing page would show. */
export async function makePreparedDraft(
  databases: Databases,
  {
    screeningId,
    rev,
    by,
    alsoBy = [],
    reason = "wall thickness measured again",
  }: { screeningId: string; rev: number; by: Made; alsoBy?: Made[]; reason?: string },
): Promise<string> {
  const { write } = databases;
  await asPerson(write, by.id, (transaction) =>
    transaction.insert(draft).values({
      screeningId,
      rev,
      authorId: by.id,
      updatedBy: by.id,
      document: newDraft("Test screening"),
      replacesRev: rev > 1 ? rev - 1 : null,
      reason: rev > 1 ? reason : null,
    }),
  );
  for (const other of alsoBy) await saveDraft(databases, { screeningId, rev, by: other });
  return prepareDraft(databases, { screeningId, rev, by });
}

/** A save by another hand. */
export async function saveDraft(
  { write }: Databases,
  { screeningId, rev, by }: { screeningId: string; rev: number; by: Made },
): Promise<void> {
  await asPerson(write, by.id, (transaction) =>
    transaction
      .update(draft)
      .set({ updatedBy: by.id, version: sql`${draft.version} + 1` })
      .where(ofRevision(screeningId, rev)),
  );
}

const ofRevision = (screeningId: string, rev: number) => and(eq(draft.screeningId, screeningId), eq(draft.rev, rev));

export async function prepareDraft(
  { read, write }: Databases,
  { screeningId, rev, by, note = "" }: { screeningId: string; rev: number; by: Made; note?: string },
): Promise<string> {
  const [{ number }] = (await read.select({ number: screening.number }).from(screening).where(eq(screening.id, screeningId))) as [
    { number: number },
  ];
  const stored = (kind: string) => putContent(write, "application/json", canonicalJson({ kind, note, number, rev }));
  const [caseSha256, resultSha256, confirmationSha256] = await Promise.all([
    stored("case"),
    stored("result"),
    stored("confirmation"),
  ]);
  const content = canonicalJson(recordContent({ record: recordName(number), rev, caseSha256, resultSha256, confirmationSha256 }));
  const sha256 = await putContent(write, "application/json", content);
  await asPerson(write, by.id, (transaction) =>
    transaction
      .update(draft)
      .set({
        updatedBy: by.id,
        preparedVersion: sql`${draft.version}`,
        preparedSha256: sha256,
        preparedAt: new Date(),
        prepared: {
          engineVersion: "test-1",
          verdict: "within",
          sentence: "Within: inner wall −20.0 °C.",
          ebb: null,
          runs: [{ letter: "A", caseSha256, resultSha256, confirmationSha256 }],
        },
      })
      .where(ofRevision(screeningId, rev)),
  );
  return sha256;
}

function recordContent(own: {
  record: string;
  rev: number;
  caseSha256: string;
  resultSha256: string;
  confirmationSha256: string;
}) {
  const { record, rev, ...hashes } = own;
  return {
    format: "ebbmark-record/1",
    record,
    rev,
    title: "Test screening",
    facility: { id: "f", code: "T", name: "Test site", demo: false },
    section: { id: "s", tag: "IS-1", name: "Test section" },
    engineVersion: "test-1",
    barometricPressurePa: 101325,
    policy: defaultPolicy,
    lines: [],
    composition: [],
    compositionSource: null,
    cases: [
      {
        letter: "A",
        kind: "cold-blowdown",
        ...hashes,
        confirmation: [],
        verdict: "within",
        sentence: "Within.",
        limits: [],
        warnings: [],
      },
    ],
    verdict: "within",
    sentence: "Within: inner wall −20.0 °C.",
    cautions: [{ id: "C1", words: "This is a screening. A licensed engineer reviews it." }],
    assumed: [],
    changedSince: [],
    reason: null,
  } satisfies RecordContent;
}

type Act = { screeningId: string; rev: number; by: Made; shown: string };

/** Opens a signing page and gives the password again, as far as the database can tell. */
export async function openPage(
  { write }: Databases,
  act: "sign" | "countersign" | "return" | "withdraw",
  { screeningId, rev, by, shown }: Act,
) {
  const opened = await openCeremony(write, { personId: by.id, sessionIdSha256: null, screeningId, rev, act, shownSha256: shown });
  await proveCeremony(write, { nonce: opened.nonce, personId: by.id, sessionIdSha256: null, method: "password" });
  return {
    personId: by.id,
    screeningId,
    rev,
    nonce: opened.nonce,
    idempotencyKey: opened.idempotencyKey,
    shownSha256: shown,
    factor: "Password again",
  };
}

export const sign = async (databases: Databases, act: Act) =>
  signRevision(databases, { ...(await openPage(databases, "sign", act)), acknowledged: ["C1"] });

export const countersign = async (databases: Databases, act: Act) =>
  countersignRevision(databases, { ...(await openPage(databases, "countersign", act)), acknowledged: ["C1"], conditions: [] });

export const giveBack = async (databases: Databases, act: Act, remarks = [{ line: "4.05", text: "Which nameplate?" }]) =>
  returnRevision(databases, { ...(await openPage(databases, "return", act)), remarks });

export const withdraw = async (databases: Databases, act: Act, reason = "vessel was replaced") =>
  withdrawRevision(databases, { ...(await openPage(databases, "withdraw", act)), reason });

/** A site with its people and one signed-ready screening: what most tests of the record start from. */
export async function makeScene(databases: Databases, administrator: Made) {
  const engineer = await makePerson(databases, administrator, "engineer");
  const second = await makePerson(databases, administrator, "engineer");
  const approver = await makePerson(databases, administrator, "approver");
  const site = await makeFacility(databases, administrator, [engineer, second, approver]);
  const sectionId = await makeSection(databases, site.id, engineer);
  const { id: screeningId, number } = await makeScreening(databases, sectionId, engineer);
  const shown = await makePreparedDraft(databases, { screeningId, rev: 1, by: engineer });
  return { administrator, engineer, second, approver, site, sectionId, screeningId, number, shown };
}
