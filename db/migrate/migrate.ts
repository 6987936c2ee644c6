import { randomBytes } from "node:crypto";
import { join } from "node:path";
import { Client, type ClientConfig } from "pg";
import { applyAppMigrations, pendingAppMigrations } from "./app-migrations";
import { closeStaleWindows, closeWindow, openWindow } from "./ddl-window";
import { MigrationFailure } from "./failure";
import { ensureLogins, type Login } from "./logins";
import { applySuperuserMigration, pendingSuperuserMigrations, readSuperuserMigrations } from "./superuser-migrations";

export type MigrateOptions = {
  /** A superuser's address, over the local socket or 127.0.0.1; its database is only used to make the other one. */
  superuserUrl: string;
  database: string;
  passwords: Record<Login, string>;
  /** Name of the installation in the origin of its record; drawn at random when left out, fixed for ever after. */
  installation?: string;
  /** Folder that holds db/superuser and drizzle; the folder of the program when left out. */
  root?: string;
  superuserFolder?: string;
};

export type MigrateResult = { created: boolean; superuser: string[]; app: string[]; origin: string };

/** Any constant serves, as long as every migration of the product takes the same one. */
const lockKey = 7_203_115;

/**
 * Brings a cluster to where this version needs it: roles, database, the record, the working tables. Safe to run again and at the same
 * time from several places; with nothing to do it only looks.
 *
 * Throws MigrationFailure with one line that says what to do.
 */
export async function migrate(options: MigrateOptions): Promise<MigrateResult> {
  const root = options.root ?? process.cwd();
  if (!/^[a-z][a-z0-9_]{0,62}$/.test(options.database)) {
    throw new MigrationFailure(`"${options.database}" is no database name. Use lower-case letters, digits and underscores.`);
  }
  const created = await ensureDatabase(options);

  const superuser = await connect({ connectionString: options.superuserUrl }, options.database);
  try {
    await superuser.query("select pg_advisory_lock($1)", [lockKey]);
    return { created, ...(await bringUp(superuser, options, root)) };
  } finally {
    await superuser.end();
  }
}

async function ensureDatabase({ superuserUrl, database, passwords }: MigrateOptions): Promise<boolean> {
  const superuser = await connect({ connectionString: superuserUrl });
  try {
    const { rows: who } = await superuser.query<{ rolsuper: boolean }>(
      "select rolsuper from pg_catalog.pg_roles where rolname = session_user",
    );
    if (!who[0]?.rolsuper) throw new MigrationFailure("EBBMARK_SUPERUSER_URL must name a superuser.");
    await superuser.query("select pg_advisory_lock($1)", [lockKey]);
    await ensureLogins(superuser, passwords);
    const { rowCount } = await superuser.query("select from pg_catalog.pg_database where datname = $1", [database]);
    if (rowCount) return false;
    await superuser.query(`create database ${database} template template0 encoding 'UTF8'`);
    return true;
  } finally {
    await superuser.end();
  }
}

async function bringUp(superuser: Client, options: MigrateOptions, root: string): Promise<Omit<MigrateResult, "created">> {
  const appFolder = join(root, "drizzle");
  if (!(await exists(superuser, "guard.migration"))) {
    await superuser.query(
      `begin;
       create schema guard;
       create table guard.migration (name text primary key, sha256 text not null, applied_at timestamptz not null default clock_timestamp());
       commit`,
    );
  }
  const files = await readSuperuserMigrations(options.superuserFolder ?? join(root, "db", "superuser"));
  const pending = await pendingSuperuserMigrations(superuser, files);

  // The first run makes the structure before the freeze exists, founds the record, and only then opens windows that the record can tell of.
  const founded = (await exists(superuser, "ledger.head")) && (await superuser.query("select from ledger.head")).rowCount === 1;
  let window: number | undefined;
  try {
    if (founded) await closeStaleWindows(superuser);
    if (founded && pending.length > 0) window = await openWindow(superuser, `superuser migrations to ${pending.at(-1)!.name}`);
    for (const migration of pending) await applySuperuserMigration(superuser, migration);
    if (!founded) {
      const installation = options.installation ?? randomBytes(6).toString("hex");
      await superuser.query("select ledger.found($1)", [`ebbmark.${installation}/ledger`]);
    }

    const app = await pendingAppMigrations(superuser, appFolder);
    if (app.length > 0) {
      window ??= await openWindow(superuser, `app migrations to ${app.at(-1)!}`);
      const owner = await connect(
        { host: superuser.host, port: superuser.port, user: "eb_owner", password: options.passwords.eb_owner },
        options.database,
      );
      try {
        await applyAppMigrations(superuser, owner, appFolder);
      } finally {
        await owner.end();
      }
    }
    const { rows } = await superuser.query<{ origin: string }>("select origin from ledger.origin");
    return { superuser: pending.map(({ name }) => name), app, origin: rows[0]!.origin };
  } finally {
    if (window !== undefined) await closeWindow(superuser, window);
  }
}

async function exists(client: Client, name: string): Promise<boolean> {
  const { rows } = await client.query<{ there: boolean }>("select to_regclass($1) is not null as there", [name]);
  return rows[0]!.there;
}

async function connect(config: ClientConfig, database?: string): Promise<Client> {
  const parsed = new Client({ ...config, application_name: "ebbmark migrate", connectionTimeoutMillis: 10_000 });
  const client = database
    ? new Client({
        host: parsed.host,
        port: parsed.port,
        user: parsed.user,
        password: parsed.password ?? undefined,
        database,
        application_name: "ebbmark migrate",
        connectionTimeoutMillis: 10_000,
      })
    : parsed;
  try {
    await client.connect();
    return client;
  } catch (error) {
    throw new MigrationFailure(
      `Can't connect to PostgreSQL at ${client.host}:${client.port} as ${client.user}: ${error instanceof Error ? error.message : String(error)}`,
      { cause: error },
    );
  }
}
