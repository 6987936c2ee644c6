import type { PoolClient } from "pg";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { type LedgerVerdict, verifyLedger } from "@/ledger/verify-ledger";
import { getHead, type Head, listForVerification } from "@/server/ledger/read";
import { countersign, makeFirstAdministrator, makeScene, sign } from "../makers";
import { freshDatabase, type TestDatabase } from "./database";

/*
 * What the superuser of the database can do to the record once every rule inside it is switched off, and what verification says of it.
 * Each damage is done and undone in a database of its own.
 */

let db: TestDatabase;
let before: Head;

beforeAll(async () => {
  db = await freshDatabase("tampering");
  const administrator = await makeFirstAdministrator(db.databases);
  const scene = await makeScene(db.databases, administrator);
  await sign(db.databases, { ...scene, rev: 1, by: scene.engineer });
  await countersign(db.databases, { ...scene, rev: 1, by: scene.approver });
  before = await getHead(db.databases.read);
  const client = await db.pools.superuser.connect();
  await client.query("insert into guard.ddl_window (reason, until) values ('tampering', now() + interval '30 minutes')");
  for (const table of ["entry", "body", "head"]) await client.query(`alter table ledger.${table} disable trigger all`);
  await client.query("alter table ledger.entry drop constraint entry_check, drop constraint entry_envelope_check");
  client.release();
});
afterAll(() => db?.drop());

/** The verdict while the damage is there; rolled back after. */
async function verdictAfter(
  damage: (client: PoolClient) => Promise<unknown>,
  knownHeads: { seq: number; hash: string }[] = [],
): Promise<LedgerVerdict> {
  const client = await db.pools.superuser.connect();
  try {
    await client.query("begin");
    await damage(client);
    const { rows } = await client.query<{
      seq: string;
      envelope: string;
      hash: Buffer;
      salt: Buffer | null;
      bytes: string | null;
    }>(
      "select e.seq, e.envelope, e.hash, b.salt, b.bytes from ledger.entry e left join ledger.body b using (seq) order by e.seq",
    );
    const entries = rows.map(({ seq, envelope, hash, salt, bytes }) => ({
      seq: Number(seq),
      envelope,
      hash: hash.toString("hex"),
      body: salt && bytes !== null ? { saltHex: salt.toString("hex"), text: bytes } : ("redacted" as const),
    }));
    return await verifyLedger(entries, { origin: before.origin, knownHeads });
  } finally {
    await client.query("rollback");
    client.release();
  }
}

const last = () => before.size;

describe("a superuser with every rule switched off", () => {
  it("starts from a record that holds", async () => {
    expect(await verdictAfter(async () => undefined, [{ seq: last(), hash: before.hash }])).toMatchObject({
      holds: true,
      size: last(),
    });
  });

  it.each<[string, string, RegExp]>([
    [
      "edits a body",
      "update ledger.body set bytes = replace(bytes, 'engineer', 'approver') where seq = (select min(seq) from ledger.body where bytes like '%engineer%')",
      /is not the one the envelope commits to/,
    ],
    ["empties a body", "update ledger.body set bytes = null, salt = null where seq = 5", /The body is gone/],
    ["deletes a body row", "delete from ledger.body where seq = 5", /The body is gone/],
    ["changes a salt", "update ledger.body set salt = sha256('x') where seq = 6", /is not the one the envelope commits to/],
    [
      "rewrites an envelope, which hashes itself anew",
      "update ledger.entry set envelope = replace(envelope, 'screening_signed', 'screening_returned') where kind = 'screening_signed'",
      /The link to entry \d+ is broken/,
    ],
    [
      "backdates an entry",
      'update ledger.entry set envelope = regexp_replace(envelope, \'"at":"....\', \'"at":"2020\') where seq = (select max(seq) from ledger.entry)',
      /The time runs backwards/,
    ],
    [
      "swaps two entries",
      "update ledger.entry a set envelope = b.envelope from (values (5, 6), (6, 5)) v (x, y) join ledger.entry b on b.seq = v.y where a.seq = v.x",
      /The envelope calls itself entry/,
    ],
    [
      "breaks the form of an envelope",
      "update ledger.entry set envelope = replace(envelope, '\"v\":1', '\"v\":2') where seq = 7",
      /not written in the form of version 1/,
    ],
  ])("%s: found", async (_what, statement, told) => {
    const verdict = await verdictAfter((client) =>
      client
        .query(
          "alter table ledger.entry drop constraint entry_hash_key, drop constraint entry_idem_key, drop constraint entry_prev_key",
        )
        .then(() => client.query(statement)),
    );
    expect(verdict.holds).toBe(false);
    expect(verdict.broken.flatMap(({ faults }) => faults).join("\n")).toMatch(told);
  });

  it("drops an entry from the middle: found", async () => {
    const verdict = await verdictAfter((client) =>
      client.query(
        "set local session_replication_role = replica; delete from ledger.body where seq = 6; delete from ledger.entry where seq = 6",
      ),
    );
    expect(verdict.broken.flatMap(({ faults }) => faults)).toContain("Entry 6 is missing.");
  });

  it("cuts the end off and sets the head back: found only with a head kept elsewhere", async () => {
    const cut = (client: PoolClient) =>
      client.query(
        `set local session_replication_role = replica; delete from ledger.body where seq > ${last() - 1}; delete from ledger.entry where seq > ${last() - 1};
         update ledger.head set size = ${last() - 1}, hash = (select hash from ledger.entry where seq = ${last() - 1})`,
      );
    expect((await verdictAfter(cut)).holds).toBe(true);
    expect((await verdictAfter(cut, [{ seq: last(), hash: before.hash }])).faults).toEqual([
      `The ledger ends at entry ${last() - 1}; entry ${last()} is known from elsewhere, so its end was cut off.`,
    ]);
  });
});

describe("without damage", () => {
  it("the record reads as before", async () => {
    const entries = await listForVerification(db.databases.read, { id: "system", role: "system" }, 1, 5000);
    expect(await verifyLedger(entries, { origin: before.origin })).toMatchObject({ holds: true, head: before.hash });
  });
});
