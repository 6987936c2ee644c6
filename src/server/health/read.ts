import "server-only";
import { sql } from "drizzle-orm";
import { readDatabase } from "@/server/database";
import { logLine } from "@/server/log-lines";

export type Health = { status: "ok" | "starting" | "failing"; database: boolean; migrated: boolean };

/** Whether the process can do its work: the database answers, and the record has been founded by the migrations. */
export async function readHealth(): Promise<Health> {
  try {
    const { rows } = await readDatabase().execute<{ migrated: boolean }>(
      sql`select to_regclass('ledger.head') is not null as migrated`,
    );
    const migrated = rows[0]?.migrated === true;
    return { status: migrated ? "ok" : "starting", database: true, migrated };
  } catch (error) {
    logLine().warn({ err: error }, "health: the database does not answer");
    return { status: "failing", database: false, migrated: false };
  }
}
