import { createHmac } from "node:crypto";
import { appendFile, cp, mkdtemp, rm, writeFile } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { MigrationFailure } from "@db/migrate/failure";
import { scramMatches, scramVerifier } from "@db/migrate/scram";
import { verifyLedger } from "@/ledger/verify-ledger";
import { getHead, listForVerification } from "@/server/ledger/read";
import { freshDatabase, type TestDatabase } from "./database";

let db: TestDatabase;
let folder: string;

beforeAll(async () => {
  db = await freshDatabase("migrations");
  folder = await mkdtemp(join(tmpdir(), "ebbmark-migrations-"));
  await cp("db/superuser", folder, { recursive: true });
});
afterAll(async () => {
  await rm(folder, { recursive: true, force: true });
  await db?.drop();
});

const kinds = async () => {
  const { rows } = await db.pools.superuser.query<{ kind: string; bytes: string }>(
    "select kind, bytes from ledger.entry join ledger.body using (seq) order by seq",
  );
  return rows.map(({ kind, bytes }) => `${kind} ${(JSON.parse(bytes) as { act?: string }).act ?? ""}`.trim());
};

describe("migrating", () => {
  it("founds the record, and tells it of the window in which the working tables were made", async () => {
    expect(await kinds()).toEqual(["genesis", "ddl_window opened", "ddl_window closed"]);
    const head = await getHead(db.databases.read);
    const entries = await listForVerification(db.databases.read, { id: "system", role: "system" }, 1, 10);
    expect(await verifyLedger(entries, { origin: head.origin })).toMatchObject({ holds: true, size: 3, head: head.hash });
    expect(head.origin).toBe("ebbmark.test.migrations/ledger");
  });

  it("changes nothing when run again, three times at once, in well under 1.5 s each", async () => {
    const head = await getHead(db.databases.read);
    const start = performance.now();
    const results = await Promise.all([db.migrateAgain(), db.migrateAgain(), db.migrateAgain()]);
    expect(performance.now() - start).toBeLessThan(3 * 1500);
    for (const result of results) expect(result).toMatchObject({ created: false, superuser: [], app: [] });
    expect(await getHead(db.databases.read)).toEqual(head);
  });

  it("applies a new superuser file in a window of its own", async () => {
    const name = "0010_note.sql";
    await writeFile(join(folder, name), "COMMENT ON SCHEMA ledger IS 'The record';\n");
    expect(await db.migrateAgain({ superuserFolder: folder })).toMatchObject({ superuser: [name], app: [] });
    expect((await kinds()).slice(3)).toEqual(["ddl_window opened", "ddl_window closed"]);
  });

  it("leaves nothing of a file that fails, and closes the window", async () => {
    await writeFile(join(folder, "0011_broken.sql"), "COMMENT ON SCHEMA ledger IS 'half';\nSELECT nothing FROM nowhere;\n");
    await expect(db.migrateAgain({ superuserFolder: folder })).rejects.toThrow(
      /^0011_broken\.sql failed: relation "nowhere" does not exist$/,
    );
    const { rows } = await db.pools.superuser.query("select obj_description('ledger'::regnamespace) as comment");
    expect(rows).toEqual([{ comment: "The record" }]);
    expect((await kinds()).slice(5)).toEqual(["ddl_window opened", "ddl_window closed"]);
    await rm(join(folder, "0011_broken.sql"));
  });

  it("refuses an applied file that was edited, that is gone, or that is numbered wrongly", async () => {
    await expect(db.migrateAgain()).rejects.toThrow(/0010_note\.sql was applied to this database and is missing here/);
    await appendFile(join(folder, "0003_ledger_rules.sql"), "-- one more line\n");
    const edited = db.migrateAgain({ superuserFolder: folder });
    await expect(edited).rejects.toThrow(MigrationFailure);
    await expect(edited).rejects.toThrow(/0003_ledger_rules\.sql was edited after it was applied/);
    await writeFile(join(folder, "0013_gap.sql"), "SELECT 1;\n");
    await expect(db.migrateAgain({ superuserFolder: folder })).rejects.toThrow(/0013_gap\.sql .* Name it 0011_/);
  });
});

describe("the freeze", () => {
  it("refuses structure changes outside a window, of the superuser too, and in an expired one", async () => {
    const create = () => db.pools.superuser.query("create table app.late (x int)");
    await expect(create()).rejects.toMatchObject({ code: "EB403" });
    await db.pools.superuser.query(
      "insert into guard.ddl_window (reason, opened_at, until) values ('long ago', now() - interval '20 minutes', now() - interval '10 minutes')",
    );
    await expect(create()).rejects.toMatchObject({ code: "EB403" });
  });
});

describe("logins", () => {
  it("own nothing of the record and belong to no other role", async () => {
    const { rows: memberships } = await db.pools.superuser.query(
      "select from pg_auth_members m join pg_roles r on r.oid = m.member where r.rolname like 'eb\\_%'",
    );
    expect(memberships).toEqual([]);
    const { rows: owners } = await db.pools.superuser.query<{ owner: string; schema: string }>(
      `select distinct pg_get_userbyid(c.relowner) as owner, n.nspname as schema from pg_class c join pg_namespace n on n.oid = c.relnamespace
       where n.nspname in ('app', 'ledger', 'guard') order by schema`,
    );
    expect(owners).toEqual([
      { owner: "eb_owner", schema: "app" },
      { owner: "postgres", schema: "guard" },
      { owner: "eb_vault", schema: "ledger" },
    ]);
    const { rows: roles } = await db.pools.superuser.query<{ rolname: string; rolcanlogin: boolean; rolsuper: boolean }>(
      "select rolname, rolcanlogin, rolsuper from pg_roles where rolname like 'eb\\_%' order by rolname",
    );
    expect(roles.filter(({ rolsuper }) => rolsuper)).toEqual([]);
    expect(roles.filter(({ rolcanlogin }) => !rolcanlogin).map(({ rolname }) => rolname)).toEqual(["eb_vault"]);
  });

  it("leave no function of the record open to everybody, and pin the search path of each that runs as its owner", async () => {
    const { rows } = await db.pools.superuser.query(
      `select p.proname from pg_proc p join pg_namespace n on n.oid = p.pronamespace
       where n.nspname in ('ledger', 'guard')
         and (has_function_privilege('public', p.oid, 'execute')
           or not exists (select from unnest(p.proconfig) c where c like 'search_path=pg_catalog, pg_temp'))`,
    );
    expect(rows).toEqual([]);
  });

  it("every trigger of the record fires in every kind of session", async () => {
    const { rows } = await db.pools.superuser.query(
      `select c.relname, t.tgname from pg_trigger t join pg_class c on c.oid = t.tgrelid join pg_namespace n on n.oid = c.relnamespace
       where n.nspname = 'ledger' and not t.tgisinternal and t.tgenabled <> 'A'`,
    );
    expect(rows).toEqual([]);
  });
});

describe("password verifiers", () => {
  it("give the server signature of the example exchange in RFC 7677, section 3 (from memory)", () => {
    const verifier = scramVerifier("pencil", Buffer.from("W22ZaJ0SNY7soEsUEjb6gQ==", "base64"));
    const serverKey = Buffer.from(verifier.split(":").at(-1)!, "base64");
    const nonce = "rOprNGfwEbeRWgbNEkqO%hvYDpWUa2RaTCAfuxFIlj)hNlF$k0";
    const exchange = `n=user,r=rOprNGfwEbeRWgbNEkqO,r=${nonce},s=W22ZaJ0SNY7soEsUEjb6gQ==,i=4096,c=biws,r=${nonce}`;
    expect(createHmac("sha256", serverKey).update(exchange).digest("base64")).toBe(
      "6rriTRBi23WpRR/wtup+mMhUZUn/dB5nLTJRsjl95G4=",
    );
  });

  it("match their own password and no other", () => {
    const verifier = scramVerifier("pencil");
    expect(scramMatches(verifier, "pencil")).toBe(true);
    expect(scramMatches(verifier, "pencils")).toBe(false);
    expect(scramMatches(null, "pencil")).toBe(false);
  });
});
