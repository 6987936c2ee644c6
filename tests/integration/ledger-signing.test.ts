import { and, eq } from "drizzle-orm";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { asPerson } from "@db/clients";
import { draft } from "@db/schema/app/draft";
import { outbox } from "@db/schema/app/outbox";
import { remark } from "@db/schema/app/remark";
import { entry, revision } from "@db/schema/ledger/entry";
import { countersignRevision, signRevision } from "@/server/ledger/write";
import {
  changeRole,
  countersign,
  disablePerson,
  giveBack,
  type Made,
  makeFirstAdministrator,
  makePerson,
  makePreparedDraft,
  makeScene,
  openPage,
  prepareDraft,
  saveDraft,
  sign,
  withdraw,
} from "../makers";
import { freshDatabase, type TestDatabase } from "./database";

let db: TestDatabase;
let administrator: Made;

beforeAll(async () => {
  db = await freshDatabase("signing");
  administrator = await makeFirstAdministrator(db.databases);
});
afterAll(() => db?.drop());

const scene = () => makeScene(db.databases, administrator);
const stateOf = async (screeningId: string, rev: number) =>
  (
    await db.databases.read
      .select()
      .from(revision)
      .where(and(eq(revision.screeningId, screeningId), eq(revision.rev, rev)))
  )[0];
const kindsOf = async (screeningId: string) =>
  (
    await db.databases.read.select({ kind: entry.kind }).from(entry).where(eq(entry.subjectId, screeningId)).orderBy(entry.seq)
  ).map(({ kind }) => kind);

describe("the way of a revision", () => {
  it("is signed by its author and countersigned by another person, each an entry", async () => {
    const { engineer, approver, screeningId, shown } = await scene();
    const signed = await sign(db.databases, { screeningId, rev: 1, by: engineer, shown });
    const countersigned = await countersign(db.databases, { screeningId, rev: 1, by: approver, shown });

    expect(await stateOf(screeningId, 1)).toMatchObject({
      state: "countersigned",
      author: engineer.id,
      decidedBy: approver.id,
      signedSeq: signed.seq,
      decidedSeq: countersigned.seq,
      contentSha256: shown,
    });
    expect(await kindsOf(screeningId)).toEqual(["screening_signed", "screening_countersigned"]);
  });

  it("keeps its number when returned; the answer is the next revision, and countersigning that supersedes the first", async () => {
    const { engineer, approver, screeningId, shown } = await scene();
    await sign(db.databases, { screeningId, rev: 1, by: engineer, shown });
    const returned = await giveBack(db.databases, { screeningId, rev: 1, by: approver, shown });
    expect(await stateOf(screeningId, 1)).toMatchObject({ state: "returned", decidedSeq: returned.seq });
    expect(await db.databases.read.select().from(remark).where(eq(remark.screeningId, screeningId))).toMatchObject([
      { rev: 1, line: "4.05", text: "Which nameplate?", authorId: approver.id, entrySeq: returned.seq },
    ]);

    const answer = await makePreparedDraft(db.databases, { screeningId, rev: 2, by: engineer });
    await sign(db.databases, { screeningId, rev: 2, by: engineer, shown: answer });
    expect(await stateOf(screeningId, 1)).toMatchObject({ state: "returned" });
    await countersign(db.databases, { screeningId, rev: 2, by: approver, shown: answer });

    expect(await stateOf(screeningId, 1)).toMatchObject({ state: "superseded", decidedSeq: returned.seq });
    expect(await stateOf(screeningId, 2)).toMatchObject({ state: "countersigned" });
    expect(await kindsOf(screeningId)).toEqual([
      "screening_signed",
      "screening_returned",
      "screening_signed",
      "screening_countersigned",
      "screening_superseded",
    ]);
  });

  it("lets at most one revision stand countersigned", async () => {
    const { engineer, approver, screeningId, shown } = await scene();
    await sign(db.databases, { screeningId, rev: 1, by: engineer, shown });
    await countersign(db.databases, { screeningId, rev: 1, by: approver, shown });
    const next = await makePreparedDraft(db.databases, { screeningId, rev: 2, by: engineer });
    await sign(db.databases, { screeningId, rev: 2, by: engineer, shown: next });
    await countersign(db.databases, { screeningId, rev: 2, by: approver, shown: next });
    expect([await stateOf(screeningId, 1), await stateOf(screeningId, 2)].map((row) => row?.state)).toEqual([
      "superseded",
      "countersigned",
    ]);
  });

  it("is withdrawn by its author before a decision, and by an approver after", async () => {
    const first = await scene();
    await sign(db.databases, { ...first, rev: 1, by: first.engineer });
    await expect(withdraw(db.databases, { ...first, rev: 1, by: first.approver })).rejects.toMatchObject({ code: "not-allowed" });
    await withdraw(db.databases, { ...first, rev: 1, by: first.engineer });
    expect(await stateOf(first.screeningId, 1)).toMatchObject({ state: "withdrawn" });
    await expect(countersign(db.databases, { ...first, rev: 1, by: first.approver })).rejects.toMatchObject({
      code: "wrong-state",
    });

    const second = await scene();
    await sign(db.databases, { ...second, rev: 1, by: second.engineer });
    await countersign(db.databases, { ...second, rev: 1, by: second.approver });
    await expect(withdraw(db.databases, { ...second, rev: 1, by: second.engineer })).rejects.toMatchObject({
      code: "not-allowed",
    });
    await withdraw(db.databases, { ...second, rev: 1, by: second.approver });
    expect(await stateOf(second.screeningId, 1)).toMatchObject({ state: "withdrawn" });
  });

  it("files receipts in the same transaction, with the entry's own number and hash", async () => {
    const { engineer, screeningId, shown } = await scene();
    const page = await openPage(db.databases, "sign", { screeningId, rev: 1, by: engineer, shown });
    const mail = [{ to: "a@example.invalid", subject: "Entry {{seq}}", text: "Leaf {{leaf}} at {{at}}" }];
    const receipt = await signRevision(db.databases, { ...page, acknowledged: ["C1"], mail });
    const sent = await db.databases.write.select().from(outbox).where(eq(outbox.to, "a@example.invalid"));
    expect(sent).toMatchObject([
      { subject: `Entry ${receipt.seq}`, text: `Leaf ${receipt.leaf} at ${receipt.at}`, sentAt: null },
    ]);
    expect(sent[0]?.messageId).toMatch(/^<entry-\d+-1-[0-9a-f]{16}@test\.signing>$/);
  });
});

describe("two persons", () => {
  it("refuses a countersignature by the author, even after a change of role", async () => {
    const { engineer, screeningId, shown } = await scene();
    await sign(db.databases, { screeningId, rev: 1, by: engineer, shown });
    await expect(countersign(db.databases, { screeningId, rev: 1, by: engineer, shown })).rejects.toMatchObject({
      code: "not-allowed",
    });
    await changeRole(db.databases, { by: administrator, person: engineer, from: "engineer", role: "approver" });
    await expect(countersign(db.databases, { screeningId, rev: 1, by: engineer, shown })).rejects.toMatchObject({
      code: "own-work",
    });
    await expect(giveBack(db.databases, { screeningId, rev: 1, by: engineer, shown })).rejects.toMatchObject({
      code: "own-work",
    });
  });

  it("refuses a countersignature by anyone who saved the draft once", async () => {
    const { engineer, second, screeningId } = await scene();
    await saveDraft(db.databases, { screeningId, rev: 1, by: second });
    const shown = await prepareDraft(db.databases, { screeningId, rev: 1, by: engineer });
    await sign(db.databases, { screeningId, rev: 1, by: engineer, shown });
    expect((await stateOf(screeningId, 1))?.contributors).toEqual([engineer.id, second.id].sort());
    await changeRole(db.databases, { by: administrator, person: second, from: "engineer", role: "approver" });
    await expect(countersign(db.databases, { screeningId, rev: 1, by: second, shown })).rejects.toMatchObject({
      code: "own-work",
    });
  });

  it("keeps a contributor named even when a later save leaves them out", async () => {
    const { engineer, second, screeningId } = await scene();
    await saveDraft(db.databases, { screeningId, rev: 1, by: second });
    await expect(
      db.pools.write.query("update app.draft set contributors = '{}' where screening_id = $1", [screeningId]),
    ).rejects.toThrow(/permission denied/);
    await saveDraft(db.databases, { screeningId, rev: 1, by: engineer });
    const [row] = await asPerson(db.databases.read, engineer.id, (transaction) =>
      transaction.select().from(draft).where(eq(draft.screeningId, screeningId)),
    );
    expect(row?.contributors).toEqual([engineer.id, second.id].sort());
  });

  it("refuses a signature by an engineer who did not work on the draft", async () => {
    const { second, screeningId, shown } = await scene();
    await expect(sign(db.databases, { screeningId, rev: 1, by: second, shown })).rejects.toMatchObject({ code: "not-allowed" });
  });
});

describe("who may act", () => {
  it("refuses a disabled person, a wrong role and somebody from another facility", async () => {
    const { engineer, approver, screeningId, shown } = await scene();
    const elsewhere = await scene();
    await expect(sign(db.databases, { screeningId, rev: 1, by: approver, shown })).rejects.toMatchObject({ code: "not-allowed" });
    await sign(db.databases, { screeningId, rev: 1, by: engineer, shown });
    await expect(countersign(db.databases, { screeningId, rev: 1, by: elsewhere.approver, shown })).rejects.toMatchObject({
      code: "not-found",
    });
    const auditor = await makePerson(db.databases, administrator, "auditor");
    for (const by of [administrator, auditor]) {
      await expect(countersign(db.databases, { screeningId, rev: 1, by, shown })).rejects.toMatchObject({ code: "not-allowed" });
    }
    await disablePerson(db.databases, administrator, approver);
    await expect(countersign(db.databases, { screeningId, rev: 1, by: approver, shown })).rejects.toMatchObject({
      code: "account-disabled",
    });
  });
});

describe("what is signed is what was shown", () => {
  it("refuses a draft that changed, or was computed again, after the page was opened", async () => {
    const { engineer, screeningId, shown } = await scene();
    const page = await openPage(db.databases, "sign", { screeningId, rev: 1, by: engineer, shown });
    await saveDraft(db.databases, { screeningId, rev: 1, by: engineer });
    await expect(signRevision(db.databases, { ...page, acknowledged: ["C1"] })).rejects.toMatchObject({ code: "not-computed" });
    const again = await prepareDraft(db.databases, { screeningId, rev: 1, by: engineer, note: "other result" });
    expect(again).not.toBe(shown);
    await expect(signRevision(db.databases, { ...page, acknowledged: ["C1"] })).rejects.toMatchObject({
      code: "content-changed",
    });
  });

  it("refuses a decision on other content than was signed", async () => {
    const { engineer, approver, screeningId, shown } = await scene();
    const other = await scene();
    await sign(db.databases, { screeningId, rev: 1, by: engineer, shown });
    await expect(countersign(db.databases, { screeningId, rev: 1, by: approver, shown: other.shown })).rejects.toMatchObject({
      code: "content-changed",
    });
  });

  it("refuses content of another record", async () => {
    const mine = await scene();
    const other = await scene();
    await db.pools.owner.query("update app.draft set prepared_sha256 = $2 where screening_id = $1", [
      mine.screeningId,
      other.shown,
    ]);
    await expect(
      sign(db.databases, { screeningId: mine.screeningId, rev: 1, by: mine.engineer, shown: other.shown }),
    ).rejects.toMatchObject({
      code: "content-changed",
    });
  });

  it("refuses a signature while a caution is not acknowledged", async () => {
    const { engineer, screeningId, shown } = await scene();
    const page = await openPage(db.databases, "sign", { screeningId, rev: 1, by: engineer, shown });
    await expect(signRevision(db.databases, { ...page, acknowledged: [] })).rejects.toMatchObject({ code: "invalid-request" });
  });

  it("refuses edits of a draft once it is signed", async () => {
    const { engineer, screeningId, shown } = await scene();
    await sign(db.databases, { screeningId, rev: 1, by: engineer, shown });
    await expect(saveDraft(db.databases, { screeningId, rev: 1, by: engineer })).rejects.toMatchObject({
      cause: { code: "EB409" },
    });
    await expect(
      asPerson(db.databases.write, engineer.id, (transaction) =>
        transaction.delete(draft).where(eq(draft.screeningId, screeningId)),
      ),
    ).rejects.toMatchObject({ cause: { code: "EB409" } });
  });
});

describe("decisions", () => {
  it("refuses a second decision, and a return without a remark", async () => {
    const { engineer, approver, screeningId, shown } = await scene();
    await sign(db.databases, { screeningId, rev: 1, by: engineer, shown });
    await expect(giveBack(db.databases, { screeningId, rev: 1, by: approver, shown }, [])).rejects.toMatchObject({
      code: "invalid-request",
    });
    await expect(
      giveBack(db.databases, { screeningId, rev: 1, by: approver, shown }, [{ line: "4.05", text: "  " }]),
    ).rejects.toMatchObject({
      code: "invalid-request",
    });
    await countersign(db.databases, { screeningId, rev: 1, by: approver, shown });
    await expect(countersign(db.databases, { screeningId, rev: 1, by: approver, shown })).rejects.toMatchObject({
      code: "already-decided",
    });
    await expect(giveBack(db.databases, { screeningId, rev: 1, by: approver, shown })).rejects.toMatchObject({
      code: "already-decided",
    });
  });

  it("refuses signing a revision twice, and skipping one", async () => {
    const { engineer, screeningId, shown } = await scene();
    await sign(db.databases, { screeningId, rev: 1, by: engineer, shown });
    await expect(sign(db.databases, { screeningId, rev: 1, by: engineer, shown })).rejects.toMatchObject({ code: "wrong-state" });
    const third = await makePreparedDraft(db.databases, { screeningId, rev: 3, by: engineer });
    await expect(sign(db.databases, { screeningId, rev: 3, by: engineer, shown: third })).rejects.toMatchObject({
      code: "wrong-state",
    });
  });
});

describe("the signing page", () => {
  it("is good for one act, one person, one record, and only after the password was given again", async () => {
    const { engineer, second, approver, screeningId, shown } = await scene();
    const act = { screeningId, rev: 1, by: engineer, shown };
    const page = await openPage(db.databases, "sign", act);
    await db.pools.owner.query("update app.ceremony set method = null, proved_at = null where nonce = $1", [page.nonce]);
    await expect(signRevision(db.databases, { ...page, acknowledged: ["C1"] })).rejects.toMatchObject({
      code: "ceremony-expired",
    });

    const expired = await openPage(db.databases, "sign", act);
    await db.pools.owner.query("update app.ceremony set expires_at = now() - interval '1 second' where nonce = $1", [
      expired.nonce,
    ]);
    await expect(signRevision(db.databases, { ...expired, acknowledged: ["C1"] })).rejects.toMatchObject({
      code: "ceremony-expired",
    });

    const foreign = await openPage(db.databases, "sign", { ...act, by: second });
    await expect(signRevision(db.databases, { ...foreign, personId: engineer.id, acknowledged: ["C1"] })).rejects.toMatchObject({
      code: "ceremony-expired",
    });

    await signRevision(db.databases, { ...(await openPage(db.databases, "sign", act)), acknowledged: ["C1"] });
    const wrongAct = await openPage(db.databases, "return", { ...act, by: approver });
    await expect(countersignRevision(db.databases, { ...wrongAct, acknowledged: ["C1"], conditions: [] })).rejects.toMatchObject({
      code: "ceremony-expired",
    });
  });
});
