import { eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { asPerson } from "@db/clients";
import { draft } from "@db/schema/app/draft";
import type { Role } from "@/contracts/roles";
import { recordName } from "@/contracts/record-name";
import { verifyLedger } from "@/ledger/verify-ledger";
import { getEntry, getHead, listEntries, listForVerification } from "@/server/ledger/read";
import {
  countersign,
  type Made,
  makeFirstAdministrator,
  makePerson,
  makePreparedDraft,
  makeScene,
  makeScreening,
  sign,
} from "../makers";
import { freshDatabase, type TestDatabase } from "./database";

type Scene = Awaited<ReturnType<typeof makeScene>>;
let db: TestDatabase;
let administrator: Made;
let auditor: Made;
let here: Scene;
let elsewhere: Scene;
let signedSeq: number;

beforeAll(async () => {
  db = await freshDatabase("reading");
  administrator = await makeFirstAdministrator(db.databases);
  auditor = await makePerson(db.databases, administrator, "auditor");
  here = await makeScene(db.databases, administrator);
  elsewhere = await makeScene(db.databases, administrator);
  signedSeq = (await sign(db.databases, { ...here, rev: 1, by: here.engineer })).seq;
  await countersign(db.databases, { ...here, rev: 1, by: here.approver });
  await sign(db.databases, { ...elsewhere, rev: 1, by: elsewhere.engineer });
});
afterAll(() => db?.drop());

const as = ({ id }: Made, role: Role) => ({ id, role });
const list = (reader: Parameters<typeof listEntries>[1], filter: Partial<Parameters<typeof listEntries>[2]> = {}) =>
  listEntries(db.databases.read, reader, { limit: 200, ...filter });

describe("the list", () => {
  it("shows an auditor every entry, newest first, a page at a time, without overlap or gap", async () => {
    const head = await getHead(db.databases.read);
    const seen: number[] = [];
    let before: number | undefined;
    do {
      const page = await list(as(auditor, "auditor"), { limit: 7, before });
      expect(page.total).toBe(head.size);
      seen.push(...page.rows.map(({ seq }) => seq));
      before = page.next ?? undefined;
    } while (before !== undefined);
    expect(seen).toEqual(Array.from({ length: head.size }, (_, i) => head.size - i));
  });

  it("says who did what to which record", async () => {
    const { rows } = await list(as(auditor, "auditor"), { record: recordName(here.number) });
    expect(rows.map(({ by, record, rev, what }) => ({ by, record, rev, what }))).toEqual([
      { by: here.approver.badge, record: recordName(here.number), rev: 1, what: "Countersigned" },
      { by: here.engineer.badge, record: recordName(here.number), rev: 1, what: "Signed and handed over" },
    ]);
    const people = await list(as(auditor, "auditor"), { kind: "member_added", facilityId: here.site.id });
    expect(people.rows.map(({ what }) => what)).toContain(`${here.engineer.badge} added to ${here.site.name}`);
    expect((await list(as(auditor, "auditor"), { kind: "genesis" })).rows).toMatchObject([
      { seq: 1, by: "server", record: null, rev: null, what: "Record founded" },
    ]);
  });

  it("filters by badge, kind, facility and day", async () => {
    const reader = as(auditor, "auditor");
    expect((await list(reader, { badge: here.engineer.badge.toLowerCase() })).rows.map(({ seq }) => seq)).toEqual([signedSeq]);
    expect((await list(reader, { kind: "screening_signed,screening_countersigned" })).total).toBe(3);
    const inFacility = await list(reader, { facilityId: here.site.id });
    expect(inFacility.rows.map(({ subject }) => subject.split(":")[0])).toEqual([
      "screening",
      "screening",
      "member",
      "member",
      "member",
    ]);
    const today = new Date().toISOString().slice(0, 10);
    expect((await list(reader, { from: today, to: today })).total).toBe((await getHead(db.databases.read)).size);
    expect(await list(reader, { to: "2020-01-01" })).toEqual({ rows: [], total: 0, next: null });
    expect((await list(reader, { record: "SC-9999" })).rows).toEqual([]);
    expect((await list(reader, { badge: "X-1" })).rows).toEqual([]);
  });

  it("shows engineers and approvers only what is about their facilities and themselves", async () => {
    for (const [person, role] of [
      [here.engineer, "engineer"],
      [here.approver, "approver"],
    ] as const) {
      const { rows } = await list(as(person, role));
      const facilities = new Set(
        rows.filter(({ subject }) => subject.startsWith("member:")).map(({ subject }) => subject.split(":")[1]),
      );
      expect(facilities).toEqual(new Set([here.site.id]));
      expect(rows.map(({ record }) => record)).not.toContain(recordName(elsewhere.number));
      expect(rows.filter(({ subject }) => subject.startsWith("person:")).map(({ subject }) => subject)).toEqual([
        `person:${person.id}`,
      ]);
      expect(rows.filter(({ kind }) => kind === "screening_signed")).toHaveLength(1);
    }
  });
});

describe("one entry", () => {
  it("comes with its body and its neighbours for a member and an auditor", async () => {
    for (const reader of [as(auditor, "auditor"), as(here.approver, "approver")]) {
      const found = await getEntry(db.databases.read, reader, signedSeq);
      expect(found).toMatchObject({
        seq: signedSeq,
        by: here.engineer.badge,
        before: { seq: signedSeq - 1 },
        after: { seq: signedSeq + 1 },
      });
      expect(found?.prev).toBe(found?.before?.hash);
      expect(found?.body).toMatchObject({ text: expect.stringContaining(here.shown) as string });
    }
  });

  it("comes without its body for an administrator, and not at all for somebody of another facility", async () => {
    expect((await getEntry(db.databases.read, as(administrator, "administrator"), signedSeq))?.body).toBe("withheld");
    expect(await getEntry(db.databases.read, as(elsewhere.engineer, "engineer"), signedSeq)).toBeNull();
    expect(await getEntry(db.databases.read, as(auditor, "auditor"), 999_999)).toBeNull();
    expect(await getEntry(db.databases.read, as(auditor, "auditor"), Number.NaN)).toBeNull();
  });
});

describe("verification", () => {
  it("gives everybody the whole chain, and bodies to those who may read them", async () => {
    const head = await getHead(db.databases.read);
    const verdictFor = async (reader: Parameters<typeof listForVerification>[1]) => {
      const entries = [];
      for (let from = 1; from <= head.size; from += 5)
        entries.push(...(await listForVerification(db.databases.read, reader, from, 5)));
      return verifyLedger(entries, { origin: head.origin, knownHeads: [{ seq: head.size, hash: head.hash }] });
    };
    expect(await verdictFor(as(auditor, "auditor"))).toMatchObject({
      holds: true,
      withheld: 0,
      storyUpTo: head.size,
    });
    const mine = await verdictFor(as(here.engineer, "engineer"));
    expect(mine.holds, JSON.stringify(mine.broken)).toBe(true);
    expect(mine.withheld).toBeGreaterThan(0);
    expect(mine.storyUpTo).toBeLessThan(head.size);
    expect(await verdictFor(as(administrator, "administrator"))).toMatchObject({ holds: true });
  });
});

describe("row rules", () => {
  const draftsFor = (reader: string) =>
    asPerson(db.databases.read, reader, (transaction) =>
      transaction.select({ screeningId: draft.screeningId, rev: draft.rev }).from(draft),
    );

  it("show no draft and no body outside asPerson, whatever the query", async () => {
    expect(await db.databases.read.select().from(draft)).toEqual([]);
    expect((await db.pools.read.query("select count(*)::int as n from ledger.body")).rows).toEqual([{ n: 0 }]);
  });

  it("show drafts to members, signed ones to auditors, none to administrators or strangers, all to jobs", async () => {
    const { id: open } = await makeScreening(db.databases, here.sectionId, here.engineer);
    await makePreparedDraft(db.databases, { screeningId: open, rev: 1, by: here.engineer });
    const ids = async (reader: string) => (await draftsFor(reader)).map(({ screeningId }) => screeningId).sort();
    expect(await ids(here.approver.id)).toEqual([here.screeningId, open].sort());
    expect(await ids(elsewhere.engineer.id)).toEqual([elsewhere.screeningId]);
    expect(await ids(auditor.id)).toEqual([here.screeningId, elsewhere.screeningId].sort());
    expect(await ids(administrator.id)).toEqual([]);
    expect(await ids("nobody")).toEqual([]);
    expect(await ids("system")).toEqual([here.screeningId, elsewhere.screeningId, open].sort());
  });

  it("keep a stranger from writing a draft", async () => {
    const change = asPerson(db.databases.write, elsewhere.engineer.id, (transaction) =>
      transaction
        .update(draft)
        .set({ reason: null })
        .where(eq(draft.screeningId, here.screeningId))
        .returning({ rev: draft.rev }),
    );
    expect(await change).toEqual([]);
    await expect(
      makePreparedDraft(db.databases, { screeningId: here.screeningId, rev: 2, by: elsewhere.engineer }),
    ).rejects.toMatchObject({
      cause: { code: "42501" },
    });
  });

  it("the setting ends with its transaction", async () => {
    await draftsFor("system");
    const client = await db.pools.read.connect();
    try {
      const { rows } = await client.query<{ person: string | null }>("select current_setting('ebbmark.person', true) as person");
      expect(rows[0]?.person ?? "").toBe("");
    } finally {
      client.release();
    }
  });
});
