import { sql } from "drizzle-orm";
import { drizzle, type NodePgDatabase } from "drizzle-orm/node-postgres";
import { Pool } from "pg";

/** One login per purpose: a fault in a list page runs on a login that can change nothing. */
export const purposes = ["read", "write", "sign"] as const;
export type Purpose = (typeof purposes)[number];
export type DatabaseUrls = Record<Purpose, string>;

export type Database = NodePgDatabase;
export type Transaction = Parameters<Parameters<Database["transaction"]>[0]>[0];

type Client = { pool: Pool; database: Database };
type Holder = { ebbmarkClients?: Map<string, Client> };

const poolSize: Record<Purpose, number> = { read: 12, write: 12, sign: 6 };

/**
 * The database under one login. The pool is made on first use and kept on `globalThis`, so hot reloading does not leak connections
 * and importing this file opens nothing.
 */
export function databaseFor(purpose: Purpose, urls: DatabaseUrls): Database {
  return clientFor(purpose, urls[purpose]).database;
}

function clientFor(purpose: Purpose, url: string): Client {
  const holder = globalThis as Holder;
  const clients = (holder.ebbmarkClients ??= new Map());
  const key = `${purpose} ${url}`;
  const existing = clients.get(key);
  if (existing) return existing;

  const pool = new Pool({
    connectionString: url,
    max: poolSize[purpose],
    connectionTimeoutMillis: 5_000,
    idleTimeoutMillis: 30_000,
    application_name: `ebbmark ${purpose}`,
  });
  // A backend that ends while idle (a restart of the database) must not end the process; the pool replaces it.
  pool.on("error", () => undefined);
  const client = { pool, database: drizzle(pool) };
  clients.set(key, client);
  return client;
}

/** Ends every pool; for scripts and for shutdown. */
export async function closeDatabases(): Promise<void> {
  const holder = globalThis as Holder;
  const clients = [...(holder.ebbmarkClients?.values() ?? [])];
  holder.ebbmarkClients?.clear();
  await Promise.all(clients.map(({ pool }) => pool.end()));
}

/** "system" is for jobs and seeds that act for nobody. */
export type Reader = string | "system";

/**
 * Runs `work` in a transaction that carries who is reading. Drafts and entry bodies have row rules keyed to it: outside `asPerson` they
 * show no row at all, inside they show what that person may see. A belt against a forgotten filter, not a replacement for `authorise`.
 */
export async function asPerson<T>(
  database: Database,
  reader: Reader,
  work: (transaction: Transaction) => Promise<T>,
): Promise<T> {
  return database.transaction(async (transaction) => {
    await transaction.execute(sql`select set_config('ebbmark.person', ${reader}, true)`);
    return work(transaction);
  });
}
