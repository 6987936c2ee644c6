import { readFile } from "node:fs/promises";
import { join } from "node:path";
import { drizzle } from "drizzle-orm/node-postgres";
import { migrate } from "drizzle-orm/node-postgres/migrator";
import type { Client } from "pg";
import { MigrationFailure } from "./failure";

type Journal = { entries: { when: number; tag: string }[] };

/** Tags of generated migrations not applied yet; drizzle applies those younger than the newest applied one. */
export async function pendingAppMigrations(superuser: Client, folder: string): Promise<string[]> {
  const journal = JSON.parse(await readFile(join(folder, "meta", "_journal.json"), "utf8")) as Journal;
  const { rows: made } = await superuser.query<{ there: boolean }>(
    "select to_regclass('drizzle.__drizzle_migrations') is not null as there",
  );
  if (!made[0]?.there) return journal.entries.map(({ tag }) => tag);

  const { rows } = await superuser.query<{ newest: string | null }>(
    "select max(created_at) as newest from drizzle.__drizzle_migrations",
  );
  const newest = Number(rows[0]?.newest ?? -1);
  if (newest > Math.max(...journal.entries.map(({ when }) => when))) {
    throw new MigrationFailure("This database was migrated by a newer version. Use that version or a newer one.");
  }
  return journal.entries.filter(({ when }) => when > newest).map(({ tag }) => tag);
}

/** Applies them as the owner of schema `app`, who for this while may make schemas. */
export async function applyAppMigrations(superuser: Client, owner: Client, folder: string): Promise<void> {
  const { rows } = await superuser.query<{ name: string }>("select quote_ident(current_database()) as name");
  const name = rows[0]!.name;
  await superuser.query(`grant create on database ${name} to eb_owner`);
  try {
    await owner.query("set lock_timeout = '3s'");
    await migrate(drizzle(owner), { migrationsFolder: folder });
  } catch (error) {
    const cause = error instanceof Error && error.cause instanceof Error ? error.cause : error;
    throw new MigrationFailure(`A migration of schema app failed: ${cause instanceof Error ? cause.message : String(cause)}`, {
      cause: error,
    });
  } finally {
    await superuser.query(`revoke create on database ${name} from eb_owner`);
  }
}
