import { randomUUID } from "node:crypto";
import { eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { member, person } from "@db/schema/ledger/person";
import type { Role } from "@/contracts/roles";
import { subjectOf } from "@/ledger/entry-kinds";
import type { EventBodies, EventKind } from "@/ledger/statements";
import { recordEvent, twoPersonRule } from "@/server/ledger/write";
import { addMember, changeRole, disablePerson, type Made, makeFacility, makeFirstAdministrator, makePerson } from "../makers";
import { freshDatabase, type TestDatabase } from "./database";

let db: TestDatabase;
let administrator: Made;

beforeAll(async () => {
  db = await freshDatabase("people");
  administrator = await makeFirstAdministrator(db.databases);
});
afterAll(() => db?.drop());

const rowOf = async ({ id }: Made) => (await db.databases.read.select().from(person).where(eq(person.id, id)))[0];
const event = <Kind extends EventKind>(actor: string, kind: Kind, subject: string, body: EventBodies[Kind]) =>
  recordEvent(db.databases.sign, { actor, kind, subject, idempotencyKey: randomUUID(), body });

describe("enrolling", () => {
  it("lets the installation enrol the first administrator and nobody after", async () => {
    const id = randomUUID();
    await expect(
      event("system", "person_enrolled", subjectOf.person(id), {
        badge: "D-900",
        printedName: "Second first",
        role: "administrator",
      }),
    ).rejects.toMatchObject({ code: "not-allowed" });
  });

  it("refuses a badge that is taken, and enrolling by anyone but an administrator", async () => {
    const engineer = await makePerson(db.databases, administrator, "engineer");
    const again = { badge: engineer.badge, printedName: "Other", role: "engineer" };
    await expect(event(administrator.id, "person_enrolled", subjectOf.person(randomUUID()), again)).rejects.toMatchObject({
      code: "already-exists",
    });
    await expect(
      event(engineer.id, "person_enrolled", subjectOf.person(randomUUID()), { ...again, badge: "E-901" }),
    ).rejects.toMatchObject({ code: "not-allowed" });
  });

  it.each([
    ["a badge of another form", "e114", "engineer"],
    ["a role that does not exist", "E-902", "operator"],
  ])("refuses %s", async (_what, badge, role) => {
    const call = event(administrator.id, "person_enrolled", subjectOf.person(randomUUID()), { badge, printedName: "X", role });
    await expect(call).rejects.toMatchObject({ code: "invalid-request" });
  });
});

describe("disabling", () => {
  it("takes effect with its entry, and can be undone by another", async () => {
    const engineer = await makePerson(db.databases, administrator, "engineer");
    await disablePerson(db.databases, administrator, engineer);
    expect(await rowOf(engineer)).toMatchObject({ active: false });
    await expect(disablePerson(db.databases, administrator, engineer)).rejects.toMatchObject({ code: "wrong-state" });
    await event(administrator.id, "person_reenabled", subjectOf.person(engineer.id), {
      badge: engineer.badge,
      reason: "came back",
    });
    expect(await rowOf(engineer)).toMatchObject({ active: true });
  });

  it("refuses to disable oneself, a stranger, or another badge than the subject's", async () => {
    const engineer = await makePerson(db.databases, administrator, "engineer");
    await expect(disablePerson(db.databases, administrator, administrator)).rejects.toMatchObject({ code: "not-allowed" });
    await expect(disablePerson(db.databases, administrator, { id: randomUUID(), badge: "E-1" })).rejects.toMatchObject({
      code: "not-found",
    });
    await expect(disablePerson(db.databases, administrator, { ...engineer, badge: "E-1" })).rejects.toMatchObject({
      code: "invalid-request",
    });
  });
});

describe("membership", () => {
  it("begins and ends by entries, and can begin again", async () => {
    const engineer = await makePerson(db.databases, administrator, "engineer");
    const site = await makeFacility(db.databases, administrator, [engineer]);
    const members = async () => (await db.databases.read.select().from(member).where(eq(member.facilityId, site.id))).length;
    expect(await members()).toBe(1);
    await expect(addMember(db.databases, administrator, site, engineer)).rejects.toMatchObject({ code: "already-exists" });
    const leave = { badge: engineer.badge, facility: site.name };
    await event(administrator.id, "member_removed", subjectOf.member(site.id, engineer.id), leave);
    expect(await members()).toBe(0);
    await expect(event(administrator.id, "member_removed", subjectOf.member(site.id, engineer.id), leave)).rejects.toMatchObject({
      code: "wrong-state",
    });
    await addMember(db.databases, administrator, site, engineer);
    expect(await members()).toBe(1);
    await expect(addMember(db.databases, administrator, { id: randomUUID(), name: "nowhere" }, engineer)).rejects.toMatchObject({
      code: "not-found",
    });
  });
});

describe("changing a role", () => {
  const propose = async (by: Made, target: Made, role: Role) =>
    event(by.id, "role_proposed", subjectOf.person(target.id), {
      badge: target.badge,
      from: "engineer",
      reason: "takes over",
      role,
      twoPersonRule: await twoPersonRule(db.databases.read),
    });
  const confirm = async (by: Made, target: Made, role: Role, proposed: number) =>
    event(by.id, "role_confirmed", subjectOf.person(target.id), {
      badge: target.badge,
      from: "engineer",
      proposed,
      role,
      twoPersonRule: await twoPersonRule(db.databases.read),
    });

  it("is done by the only administrator, and the entries say so", async () => {
    const engineer = await makePerson(db.databases, administrator, "engineer");
    expect(await twoPersonRule(db.databases.read)).toBe("not yet bound: one administrator");
    await changeRole(db.databases, { by: administrator, person: engineer, from: "engineer", role: "approver" });
    expect(await rowOf(engineer)).toMatchObject({ role: "approver" });
    await expect(
      event(administrator.id, "role_proposed", subjectOf.person(engineer.id), {
        badge: engineer.badge,
        from: "approver",
        reason: "x",
        role: "engineer",
        twoPersonRule: "bound",
      }),
    ).rejects.toMatchObject({ code: "wrong-state" });
  });

  it("takes two administrators as soon as there are two, and neither is the person it is about", async () => {
    const second = await makePerson(db.databases, administrator, "administrator");
    const engineer = await makePerson(db.databases, administrator, "engineer");
    expect(await twoPersonRule(db.databases.read)).toBe("bound");

    const { seq } = await propose(administrator, engineer, "approver");
    await expect(confirm(administrator, engineer, "approver", seq)).rejects.toMatchObject({ code: "own-work" });
    await expect(confirm(second, engineer, "auditor", seq)).rejects.toMatchObject({ code: "wrong-state" });
    await expect(confirm(second, engineer, "approver", seq - 1)).rejects.toMatchObject({ code: "wrong-state" });
    expect(await rowOf(engineer)).toMatchObject({ role: "engineer" });
    await confirm(second, engineer, "approver", seq);
    expect(await rowOf(engineer)).toMatchObject({ role: "approver" });
    await expect(confirm(second, engineer, "approver", seq)).rejects.toMatchObject({ code: "wrong-state" });

    await expect(propose(administrator, administrator, "engineer")).rejects.toMatchObject({ code: "not-allowed" });
    const aboutSecond = await propose(administrator, second, "engineer");
    await expect(confirm(second, second, "engineer", aboutSecond.seq)).rejects.toMatchObject({ code: "not-allowed" });
  });
});
