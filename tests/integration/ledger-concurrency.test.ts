import { eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { entry } from "@db/schema/ledger/entry";
import { verifyLedger } from "@/ledger/verify-ledger";
import { getHead, listForVerification } from "@/server/ledger/read";
import { countersignRevision, recordEvent, signRevision } from "@/server/ledger/write";
import {
  type Made,
  makeFirstAdministrator,
  makePerson,
  makePreparedDraft,
  makeScene,
  makeScreening,
  openPage,
  sign,
} from "../makers";
import { freshDatabase, type TestDatabase } from "./database";

let db: TestDatabase;
let administrator: Made;

beforeAll(async () => {
  db = await freshDatabase("concurrency");
  administrator = await makeFirstAdministrator(db.databases);
});
afterAll(() => db?.drop());

const times = <T>(count: number, work: (index: number) => Promise<T>) =>
  Promise.all(Array.from({ length: count }, (_, index) => work(index)));

describe("many at once", () => {
  it("makes one entry of 20 equal calls, with 20 equal receipts", async () => {
    const { engineer, screeningId, shown } = await makeScene(db.databases, administrator);
    const page = await openPage(db.databases, "sign", { screeningId, rev: 1, by: engineer, shown });
    const receipts = await times(20, () => signRevision(db.databases, { ...page, acknowledged: ["C1"] }));

    expect(new Set(receipts.map(({ seq, leaf, at }) => `${seq} ${leaf} ${at}`)).size).toBe(1);
    expect(receipts.filter(({ repeated }) => !repeated)).toHaveLength(1);
    expect(await db.databases.read.select().from(entry).where(eq(entry.idem, page.idempotencyKey))).toHaveLength(1);
  });

  it("refuses the same key for something else", async () => {
    const person = await makePerson(db.databases, administrator, "engineer");
    const event = {
      actor: administrator.id,
      kind: "person_disabled",
      subject: `person:${person.id}`,
      idempotencyKey: `key-${person.id}`,
      body: { badge: person.badge, reason: "left" },
    } as const;
    const first = await recordEvent(db.databases.sign, event);
    expect(await recordEvent(db.databases.sign, event)).toEqual({ ...first, repeated: true });
    await expect(
      recordEvent(db.databases.sign, { ...event, body: { ...event.body, reason: "left early" } }),
    ).rejects.toMatchObject({
      code: "repeat-differs",
    });
  });

  it("chains 50 signatures given at once without a gap or a fork", async () => {
    const { engineer, sectionId } = await makeScene(db.databases, administrator);
    const pages = [];
    for (let i = 0; i < 50; i++) {
      const { id: screeningId } = await makeScreening(db.databases, sectionId, engineer);
      const shown = await makePreparedDraft(db.databases, { screeningId, rev: 1, by: engineer });
      pages.push(await openPage(db.databases, "sign", { screeningId, rev: 1, by: engineer, shown }));
    }
    const before = await getHead(db.databases.read);
    const receipts = await Promise.all(pages.map((page) => signRevision(db.databases, { ...page, acknowledged: ["C1"] })));
    const head = await getHead(db.databases.read);

    expect(head.size).toBe(before.size + 50);
    expect(receipts.map(({ seq }) => seq).sort((a, b) => a - b)).toEqual(
      Array.from({ length: 50 }, (_, i) => before.size + 1 + i),
    );
    const entries = await listForVerification(db.databases.read, { id: "system", role: "system" }, 1, 5000);
    const verdict = await verifyLedger(entries, { origin: head.origin, knownHeads: [{ seq: head.size, hash: head.hash }] });
    expect(verdict).toMatchObject({ holds: true, size: head.size, head: head.hash, broken: [] });
  });

  it("lets one of many countersignatures win", async () => {
    const { engineer, approver, screeningId, shown } = await makeScene(db.databases, administrator);
    await sign(db.databases, { screeningId, rev: 1, by: engineer, shown });
    const pages = await times(20, () => openPage(db.databases, "countersign", { screeningId, rev: 1, by: approver, shown }));
    const outcomes = await Promise.allSettled(
      pages.map((page) => countersignRevision(db.databases, { ...page, acknowledged: ["C1"], conditions: [] })),
    );
    expect(outcomes.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
    for (const outcome of outcomes) {
      if (outcome.status === "rejected") expect(outcome.reason).toMatchObject({ code: "already-decided" });
    }
  });

  it("waits out a held head lock and records the act once", async () => {
    const { engineer, screeningId, shown } = await makeScene(db.databases, administrator);
    const page = await openPage(db.databases, "sign", { screeningId, rev: 1, by: engineer, shown });
    const holder = await db.pools.superuser.connect();
    try {
      await holder.query("begin");
      await holder.query("select from ledger.head for update");
      const pending = signRevision(db.databases, { ...page, acknowledged: ["C1"] });
      setTimeout(() => void holder.query("rollback"), 400);
      expect((await pending).repeated).toBe(false);
    } finally {
      holder.release(true);
    }
  });
});
