import fc from "fast-check";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { canonicalJson, type Json } from "@/ledger/canonical-json";
import { bodyCommitment } from "@/ledger/body";
import { entryKinds } from "@/ledger/entry-kinds";
import { genesisPrev, leafHash, parseEnvelope, serialiseEnvelope } from "@/ledger/envelope";
import { parseCanonicalJson } from "@/ledger/strict-json";
import { verifyLedger } from "@/ledger/verify-ledger";
import type { StoredEntry } from "@/ledger/verify-entry";
import { getHead, listForVerification } from "@/server/ledger/read";
import { recordEvent } from "@/server/ledger/write";
import {
  countersign,
  giveBack,
  type Made,
  makeFirstAdministrator,
  makePreparedDraft,
  makeScene,
  sign,
  withdraw,
} from "../makers";
import { freshDatabase, type TestDatabase } from "./database";

let db: TestDatabase;
let administrator: Made;

beforeAll(async () => {
  db = await freshDatabase("bytes");
  administrator = await makeFirstAdministrator(db.databases);
  const first = await makeScene(db.databases, administrator);
  await sign(db.databases, { ...first, rev: 1, by: first.engineer });
  await giveBack(db.databases, { ...first, rev: 1, by: first.approver }, [
    { line: "4.05", text: "Größe? “−29 °C” at 92 bar\nsecond line" },
  ]);
  const shown = await makePreparedDraft(db.databases, { screeningId: first.screeningId, rev: 2, by: first.engineer });
  await sign(db.databases, { screeningId: first.screeningId, rev: 2, by: first.engineer, shown });
  await countersign(db.databases, { screeningId: first.screeningId, rev: 2, by: first.approver, shown });
  await withdraw(db.databases, { screeningId: first.screeningId, rev: 2, by: first.approver, shown });
});
afterAll(() => db?.drop());

const system = { id: "system", role: "system" } as const;
const allEntries = () => listForVerification(db.databases.read, system, 1, 5000);
const verify = async (entries: StoredEntry[]) => verifyLedger(entries, { origin: (await getHead(db.databases.read)).origin });

describe("what the database wrote", () => {
  it("is byte for byte what the library writes", async () => {
    const entries = await allEntries();
    expect(entries.length).toBeGreaterThan(12);
    for (const { envelope, hash, body } of entries) {
      expect(serialiseEnvelope(parseEnvelope(envelope)!)).toBe(envelope);
      expect(leafHash(envelope)).toBe(hash);
      if (typeof body === "string") throw new Error("the body must be there");
      expect(canonicalJson(parseCanonicalJson(body.text))).toBe(body.text);
      expect(bodyCommitment(body.saltHex, body.text)).toBe(parseEnvelope(envelope)!.body);
    }
    expect(parseEnvelope(entries[0]!.envelope)!.prev).toBe(genesisPrev("ebbmark.test.bytes/ledger"));
    expect(new Set(entries.map(({ body }) => (typeof body === "string" ? "" : body.saltHex))).size).toBe(entries.length);
  });

  it("verifies, and the folded states are those of the tables", async () => {
    const verdict = await verify(await allEntries());
    expect(verdict).toMatchObject({ holds: true, broken: [], faults: [], withheld: 0 });
    const { rows: revisions } = await db.pools.read.query<{
      subject: string;
      state: string;
      author: string;
      decided_by: string | null;
    }>("select 'screening:' || screening_id || ':' || rev as subject, state, author, decided_by from ledger.revision");
    for (const { subject, state, author, decided_by } of revisions) {
      expect(verdict.fold.revisions.get(subject)).toMatchObject({ state, author, decidedBy: decided_by });
    }
    const { rows: persons } = await db.pools.read.query<{ id: string; badge: string; role: string; active: boolean }>(
      "select id, badge, role, active from ledger.person",
    );
    expect(verdict.fold.revisions.size).toBe(revisions.length);
    expect(
      [...verdict.fold.persons]
        .map(([id, { badge, role, active }]) => ({ id, badge, role, active }))
        .sort((a, b) => (a.id < b.id ? -1 : 1)),
    ).toEqual(persons.sort((a, b) => (a.id < b.id ? -1 : 1)));
  });

  it("knows the same kinds and subjects as the library", async () => {
    const { rows } = await db.pools.read.query<{ kind: string; noun: string }>("select kind, noun from ledger.kind");
    expect(Object.fromEntries(rows.map(({ kind, noun }) => [kind, noun]))).toEqual(
      Object.fromEntries(Object.entries(entryKinds).map(([kind, { noun }]) => [kind, noun])),
    );
  });
});

describe("canonical form in the database", () => {
  const inDatabase = async (values: string[]): Promise<string[]> => {
    const { rows } = await db.pools.superuser.query<{ text: string }>(
      "select ledger.canonical(v::jsonb) as text from unnest($1::text[]) with ordinality u (v, n) order by n",
      [values],
    );
    return rows.map(({ text }) => text);
  };

  it("writes doubles as ECMAScript does", async () => {
    const special = [
      0,
      -0,
      1,
      -1,
      0.1,
      1e21,
      1e23,
      1e-6,
      1e-7,
      5e-324,
      1.7976931348623157e308,
      2 ** 53 - 1,
      1 / 3,
      4.35,
      123456789012345680000,
      0.000001234,
    ];
    const random = fc.sample(fc.double({ noNaN: true, noDefaultInfinity: true }), { numRuns: 4000, seed: 20261201 });
    const doubles = [...special, ...random, ...random.map((x) => Number(x.toPrecision(6)))].filter(
      (x) => !(Number.isInteger(x) && Math.abs(x) > Number.MAX_SAFE_INTEGER && Math.abs(x) < 1e21),
    );
    const written = doubles.map((x) => canonicalJson([x]));
    expect(await inDatabase(written)).toEqual(written);
  });

  it("writes objects, lists and texts as the library does", async () => {
    const text = fc.string({ unit: "grapheme", maxLength: 12 }).map((s) => s.normalize("NFC"));
    const key = fc.stringMatching(/^[A-Za-z][A-Za-z0-9_]{0,6}$/);
    const { value } = fc.letrec<{ value: Json }>((tie) => ({
      value: fc.oneof(
        { maxDepth: 4 },
        text,
        fc.integer(),
        fc.boolean(),
        fc.constant(null),
        fc.array(tie("value"), { maxLength: 4 }),
        fc.dictionary(key, tie("value"), { maxKeys: 5 }),
      ),
    }));
    const accepted = fc.sample(value, { numRuns: 2000, seed: 20261202 }).flatMap((sample) => {
      try {
        return [canonicalJson(sample)];
      } catch {
        return []; // a text that both refuse; the refusals have tests of their own
      }
    });
    expect(accepted.length).toBeGreaterThan(1500);
    expect(await inDatabase(accepted)).toEqual(accepted);
  });

  it.each([
    ["white space", '{"badge": "E-1"}'],
    ["keys out of order", '{"printedName":"x","badge":"E-1"}'],
    ["a doubled key", '{"badge":"E-1","badge":"E-2"}'],
    ["a number in other notation", '{"badge":1.0}'],
    ["more digits than needed", '{"badge":0.1000000000000000055}'],
    ["minus zero", '{"badge":-0}'],
    ["an escape where none is needed", '{"badge":"\\u0041"}'],
    ["a control character", '{"badge":"\\u0001"}'],
    ["a mark that turns the reading direction", '{"badge":"\u202e"}'],
    ["a text that is not in normal form C", '{"badge":"e\u0301"}'],
    ["no object", '["badge"]'],
    ["no JSON", "badge"],
    ["33 levels", `{"a":${"[".repeat(32)}${"]".repeat(32)}}`],
    ["more than a mebibyte", `{"a":"${"x".repeat(1_048_576)}"}`],
  ])("refuses a body with %s", async (_what, body) => {
    const call = db.pools.sign.query("select ledger.record_event($1, 'member_added', $2, $3, $4)", [
      administrator.id,
      `member:${administrator.id}:${administrator.id}`,
      "canonical-refusal",
      body,
    ]);
    await expect(call).rejects.toMatchObject({ code: "EB422" });
  });
});

describe("a clock that was set back", () => {
  it("is noted once, and no entry is dated before the one it follows", async () => {
    // The newest entry is dated into the future by the one who can: a superuser, past the rules of the record.
    const client = await db.pools.superuser.connect();
    const before = await getHead(db.databases.read);
    try {
      await client.query("begin");
      await client.query("insert into guard.ddl_window (reason, until) values ('test', now() + interval '1 minute')");
      await client.query("alter table ledger.head disable trigger all");
      await client.query(
        "update ledger.head set at = to_char((clock_timestamp() + interval '90 seconds') at time zone 'UTC', 'YYYY-MM-DD\"T\"HH24:MI:SS.US\"Z\"')",
      );
      await client.query(
        "alter table ledger.head enable always trigger moves_by_one, enable always trigger keeps_rows, enable always trigger no_truncate",
      );
      await client.query("update guard.ddl_window set closed_at = now()");
      await client.query("commit");
    } finally {
      client.release();
    }
    const ahead = await getHead(db.databases.read);
    for (const key of ["clock-test-1", "clock-test-2"]) {
      await recordEvent(db.databases.sign, {
        actor: "system",
        kind: "security_digest",
        subject: "ledger",
        idempotencyKey: key,
        body: { events: 0, lastId: 0, sha256: "0".repeat(64) },
      });
    }
    const entries = (await allEntries()).filter(({ seq }) => seq > before.size);
    expect(entries.map(({ mirrors }) => mirrors?.kind)).toEqual(["clock_anomaly", "security_digest", "security_digest"]);
    expect(entries.map(({ mirrors }) => mirrors?.at)).toEqual([ahead.at, ahead.at, ahead.at]);
    expect((await verify(await allEntries())).holds).toBe(true);
  });
});
