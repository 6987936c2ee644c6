import { createHash } from "node:crypto";
import { readdir, readFile } from "node:fs/promises";
import { join } from "node:path";
import type { Client } from "pg";
import { MigrationFailure } from "./failure";

export type SuperuserMigration = { name: string; sql: string; sha256: string };

/** Files `NNNN_name.sql` of a folder, in order, numbered without a gap. */
export async function readSuperuserMigrations(folder: string): Promise<SuperuserMigration[]> {
  const names = (await readdir(folder)).filter((name) => name.endsWith(".sql")).sort();
  for (const [index, name] of names.entries()) {
    if (!new RegExp(`^${String(index + 1).padStart(4, "0")}_[a-z0-9_]+\\.sql$`).test(name)) {
      throw new MigrationFailure(`${name} in ${folder} is out of order. Name it ${String(index + 1).padStart(4, "0")}_….sql.`);
    }
  }
  return Promise.all(
    names.map(async (name) => {
      const sql = await readFile(join(folder, name), "utf8");
      return { name, sql, sha256: createHash("sha256").update(sql).digest("hex") };
    }),
  );
}

/** Those not applied yet. Throws when an applied one was edited or is gone: a change is a new file. */
export async function pendingSuperuserMigrations(superuser: Client, all: SuperuserMigration[]): Promise<SuperuserMigration[]> {
  const { rows } = await superuser.query<{ name: string; sha256: string }>(
    "select name, sha256 from guard.migration order by name",
  );
  for (const applied of rows) {
    const file = all.find(({ name }) => name === applied.name);
    if (!file)
      throw new MigrationFailure(`${applied.name} was applied to this database and is missing here. Use a version that has it.`);
    if (file.sha256 !== applied.sha256) {
      throw new MigrationFailure(
        `${applied.name} was edited after it was applied. Put the file back and write the change as a new one.`,
      );
    }
  }
  const applied = new Set(rows.map(({ name }) => name));
  return all.filter(({ name }) => !applied.has(name));
}

/** Applies one file in a transaction of its own, with its checksum. */
export async function applySuperuserMigration(superuser: Client, { name, sql, sha256 }: SuperuserMigration): Promise<void> {
  await superuser.query("begin");
  try {
    await superuser.query(sql);
    await superuser.query("reset role");
    await superuser.query("insert into guard.migration (name, sha256) values ($1, $2)", [name, sha256]);
    await superuser.query("commit");
  } catch (error) {
    await superuser.query("rollback");
    throw new MigrationFailure(`${name} failed: ${error instanceof Error ? error.message : String(error)}`, { cause: error });
  }
}
