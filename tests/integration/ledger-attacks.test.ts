import type { Pool } from "pg";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { verifyLedger } from "@/ledger/verify-ledger";
import { getHead, listForVerification } from "@/server/ledger/read";
import { countersign, makeFirstAdministrator, makeScene, sign } from "../makers";
import { freshDatabase, type TestDatabase } from "./database";

/*
 * What each login, and the owner of the record itself, may try. Every statement must be refused: by a missing grant (42501) or by a rule of
 * the record (EB…). The list only grows.
 */

let db: TestDatabase;

beforeAll(async () => {
  db = await freshDatabase("attacks");
  const administrator = await makeFirstAdministrator(db.databases);
  const scene = await makeScene(db.databases, administrator);
  await sign(db.databases, { ...scene, rev: 1, by: scene.engineer });
  await countersign(db.databases, { ...scene, rev: 1, by: scene.approver });
});
afterAll(() => db?.drop());

const touchRecord = [
  "update ledger.entry set envelope = envelope",
  "update ledger.body set bytes = '{}'",
  "update ledger.head set size = 1",
  "update ledger.content set bytes = 'x'",
  "update ledger.person set role = 'approver'",
  "update ledger.person set active = true",
  "update ledger.revision set state = 'signed'",
  "update ledger.origin set origin = 'ebbmark.other/ledger'",
  "update ledger.kind set roles = '{engineer}'",
  "delete from ledger.entry",
  "delete from ledger.body",
  "delete from ledger.head",
  "delete from ledger.content",
  "delete from ledger.revision",
  "delete from ledger.person",
  "delete from ledger.membership",
  "truncate ledger.entry cascade",
  "truncate ledger.body",
  "truncate ledger.head",
  "truncate ledger.revision",
  "truncate ledger.content cascade",
  "insert into ledger.entry (seq, envelope) select size + 1, (select envelope from ledger.entry limit 1) from ledger.head",
  "insert into ledger.body (seq, salt, bytes) values (1, sha256('x'), '{}')",
  "insert into ledger.head (one, size, hash, at) values (false, 0, sha256('x'), '')",
  "insert into ledger.person (id, badge, printed_name, role, active, changed_seq) values (gen_random_uuid(), 'D-9', 'x', 'administrator', true, 1)",
  "insert into ledger.membership (facility_id, person_id, added_seq) select gen_random_uuid(), id, changed_seq from ledger.person limit 1",
  "insert into ledger.kind values ('invented', 'ledger', '{engineer}', 'event')",
];

const changeStructure = [
  "alter table ledger.entry disable trigger all",
  "alter table ledger.entry disable trigger user",
  "drop trigger grows_only on ledger.entry",
  "alter table ledger.entry rename to entry_old",
  "alter schema ledger rename to ledger_old",
  "drop schema ledger cascade",
  "drop table ledger.head",
  "create table app.mine (x int)",
  "create table public.mine (x int)",
  "create temporary table mine (x int)",
  "create schema mine",
  "create function app.mine() returns int language sql as 'select 1'",
  "create or replace function ledger.refuse_change() returns trigger language plpgsql as 'begin return new; end'",
  "alter function ledger.append_(text, text, text, text, text) owner to eb_owner",
  "grant all on ledger.entry to eb_write",
  "grant execute on function ledger.append_(text, text, text, text, text) to eb_sign",
  "alter table ledger.body disable row level security",
  "create extension pgcrypto",
  "drop event trigger structure_is_frozen",
  "alter event trigger structure_is_frozen disable",
  "insert into guard.ddl_window (reason, until) values ('mine', now() + interval '5 minutes')",
  "update guard.ddl_window set closed_at = null",
  "update guard.migration set sha256 = 'x'",
  "comment on table ledger.entry is 'mine'",
];

const becomeOther = [
  "set role eb_vault",
  "set role postgres",
  "set session authorization postgres",
  "grant eb_vault to current_user",
  "alter role current_user superuser",
  "alter role eb_read createdb",
  "create role mine superuser",
  "set session_replication_role = replica",
  "create database mine",
  "select pg_catalog.pg_read_file('/etc/passwd')",
  "copy (select 1) to program 'true'",
  "copy ledger.entry to '/tmp/out'",
  "select pg_catalog.lo_from_bytea(0, 'x')",
  "select pg_catalog.pg_terminate_backend(pid) from pg_stat_activity where usename = 'postgres'",
  "load 'auto_explain'",
];

const innerFunctions = [
  "select ledger.append_('screening_signed', 'system', 'ledger', 'attack-0001', '{}')",
  "select ledger.found('ebbmark.mine/ledger')",
  "select ledger.record_ddl_window(1)",
  "select ledger.use_ceremony('n', 'i', gen_random_uuid(), gen_random_uuid(), 1, 'sign', 's')",
  "select ledger.file_mail('[]', null)",
  "select ledger.lock_head()",
];

const signCalls = [
  "select ledger.sign(gen_random_uuid(), gen_random_uuid(), 1, 'n', 'attack-0002', 's', '{}')",
  "select ledger.countersign(gen_random_uuid(), gen_random_uuid(), 1, 'n', 'attack-0003', 's', '{}')",
  "select ledger.return_(gen_random_uuid(), gen_random_uuid(), 1, 'n', 'attack-0004', 's', '{}')",
  "select ledger.withdraw(gen_random_uuid(), gen_random_uuid(), 1, 'n', 'attack-0005', 's', '{}')",
  `select ledger.record_event('system', 'person_enrolled', 'person:' || gen_random_uuid(), 'attack-0006', '{"badge":"D-8","printedName":"x","role":"administrator"}')`,
  "select ledger.record_event('system', 'ddl_window', 'ledger', 'attack-0007', '{}')",
  "select ledger.record_event('system', 'genesis', 'ledger', 'attack-0008', '{}')",
  "select ledger.record_event('system', 'screening_signed', 'screening:' || gen_random_uuid() || ':1', 'attack-0009', '{}')",
];

const readSecrets = [
  "select password_hash from app.credential",
  "select nonce from app.ceremony",
  "select text from app.outbox",
  "select key from app.auth_throttle",
  "select rolpassword from pg_catalog.pg_authid",
];

type Attacker = { who: string; pool: () => Pool; as?: string; tries: string[] };

const attackers: Attacker[] = [
  {
    who: "eb_read",
    pool: () => db.pools.read,
    tries: [
      ...[...touchRecord, ...changeStructure, ...becomeOther, ...innerFunctions, ...signCalls, ...readSecrets],
      "update app.draft set version = 2",
      "insert into app.outbox (message_id, \"to\", subject, text) values ('m', 't', 's', 'x')",
      "delete from app.session",
      "select nextval('app.screening_number')",
      "select ledger.put_content('text/plain', 'x')",
    ],
  },
  {
    who: "eb_write",
    pool: () => db.pools.write,
    tries: [
      ...[...touchRecord, ...changeStructure, ...becomeOther, ...innerFunctions, ...signCalls],
      "select bytes from ledger.body",
      "select rolpassword from pg_catalog.pg_authid",
      "update app.screening set section_id = gen_random_uuid()",
      "update app.section set facility_id = gen_random_uuid()",
      "update app.draft set author_id = gen_random_uuid()",
      "update app.draft set contributors = '{}'",
      "update app.ceremony set used_at = null",
      "update app.ceremony set person_id = gen_random_uuid()",
      "update app.security_event set kind = 'x'",
      "delete from app.security_event",
      "delete from app.remark",
      "delete from app.screening",
      "truncate app.draft",
    ],
  },
  {
    who: "eb_sign",
    pool: () => db.pools.sign,
    tries: [
      ...[...touchRecord, ...changeStructure, ...becomeOther, ...innerFunctions, ...signCalls, ...readSecrets],
      "select bytes from ledger.body",
      "select 1 from app.draft",
      "select ledger.put_content('text/plain', 'x')",
      "lock table ledger.head",
      "select from ledger.head for update",
    ],
  },
  {
    who: "eb_owner",
    pool: () => db.pools.owner,
    tries: [
      ...[...touchRecord, ...changeStructure, ...becomeOther, ...innerFunctions, ...signCalls],
      "select bytes from ledger.body",
      "alter table app.draft disable trigger guard_draft",
      "drop table app.draft",
      "drop policy members on app.draft",
      "create or replace function app.guard_draft() returns trigger language plpgsql as 'begin return new; end'",
      "alter table app.draft owner to eb_write",
      "grant all on all tables in schema app to eb_read",
    ],
  },
  {
    // Nobody can log in as the vault; this is what it could do if somebody found a way.
    who: "eb_vault, the owner of the record",
    pool: () => db.pools.superuser,
    as: "eb_vault",
    // Becoming another role is left out: the test reaches the vault from a superuser's session, which may always go back.
    tries: [...touchRecord, ...changeStructure, ...innerFunctions.slice(0, 3), ...signCalls],
  },
];

async function attempt({ pool, as }: Attacker, statement: string): Promise<string> {
  const client = await pool().connect();
  try {
    await client.query("set default_transaction_read_only = off");
    if (as) await client.query(`set session authorization ${as}`);
    if (!/create database|alter system/.test(statement)) await client.query("begin read write");
    await client.query(statement);
    // Deferred checks count as well.
    await client.query("set constraints all immediate");
    return "went through";
  } catch (error) {
    return (error as { code?: string }).code ?? String(error);
  } finally {
    await client.query("rollback").catch(() => undefined);
    client.release(true);
  }
}

// 42501: no privilege. EBnnn: a rule of the record or of the freeze.
const refused = /^(42501|EB\d{3})$/;

describe.each(attackers)("$who", (attacker) => {
  it.each(attacker.tries)("can't: %s", async (statement) => {
    expect(await attempt(attacker, statement)).toMatch(refused);
  });
});

describe("after all of it", () => {
  it("the record stands as before", async () => {
    const head = await getHead(db.databases.read);
    const entries = await listForVerification(db.databases.read, { id: "system", role: "system" }, 1, 5000);
    const verdict = await verifyLedger(entries, { origin: head.origin, knownHeads: [{ seq: head.size, hash: head.hash }] });
    expect(verdict).toMatchObject({ holds: true, broken: [], faults: [] });
  });
});
