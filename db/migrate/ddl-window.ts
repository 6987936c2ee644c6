import type { Client } from "pg";

const minutes = 10;

/** Closes windows that an interrupted migration left open, then opens one. The entry is filed before anything can change. */
export async function openWindow(superuser: Client, reason: string): Promise<number> {
  await closeStaleWindows(superuser);
  return inTransaction(superuser, async () => {
    const { rows } = await superuser.query<{ id: number }>(
      `insert into guard.ddl_window (reason, until) values ($1, clock_timestamp() + interval '${minutes} minutes') returning id`,
      [reason],
    );
    const id = rows[0]!.id;
    await superuser.query("select ledger.record_ddl_window($1)", [id]);
    return id;
  });
}

export async function closeWindow(superuser: Client, id: number): Promise<void> {
  await inTransaction(superuser, async () => {
    await superuser.query("update guard.ddl_window set closed_at = clock_timestamp() where id = $1 and closed_at is null", [id]);
    await superuser.query("select ledger.record_ddl_window($1)", [id]);
  });
}

export async function closeStaleWindows(superuser: Client): Promise<void> {
  const { rows } = await superuser.query<{ id: number }>("select id from guard.ddl_window where closed_at is null order by id");
  for (const { id } of rows) await closeWindow(superuser, id);
}

async function inTransaction<T>(client: Client, work: () => Promise<T>): Promise<T> {
  await client.query("begin");
  try {
    const result = await work();
    await client.query("commit");
    return result;
  } catch (error) {
    await client.query("rollback");
    throw error;
  }
}
