import { linkSync, rmSync, writeFileSync } from "node:fs";
import { setTimeout as sleep } from "node:timers/promises";
import { isAlive, processIdentity } from "./process-identity.mjs";
import { readNote } from "./processes.mjs";

/**
 * Takes a lock that dies with its holder: a file that names the process. A stale one, left by a kill -9, is taken over.
 *
 * details  kept in the lock for whoever finds it held
 * Returns  `{ release }`, or `{ heldBy }` with the details of the living holder
 */
export function takeLock(file, details = {}) {
  const mine = { pid: process.pid, identity: processIdentity(process.pid), ...details };
  const draft = `${file}.${process.pid}`;
  for (;;) {
    writeFileSync(draft, JSON.stringify(mine), { mode: 0o600 });
    try {
      linkSync(draft, file); // fails when the lock exists, and is never seen half-written
      return { release: () => rmSync(file, { force: true }) };
    } catch (error) {
      if (error.code !== "EEXIST") throw error;
      const holder = readNote(file);
      if (holder && isAlive(holder)) return { heldBy: holder };
      rmSync(file, { force: true });
    } finally {
      rmSync(draft, { force: true });
    }
  }
}

/** Runs `work` under the lock, after waiting for another command of this checkout that holds it. */
export async function underLock(file, say, work) {
  let lock = takeLock(file);
  if (lock.heldBy) say(`Waiting for process ${lock.heldBy.pid}, which is at the same step …`);
  while (lock.heldBy) {
    await sleep(500);
    lock = takeLock(file);
  }
  try {
    return await work();
  } finally {
    lock.release();
  }
}
