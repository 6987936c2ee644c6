import "server-only";
import { eq, sql } from "drizzle-orm";
import { authThrottle } from "@db/schema/app/account";
import { writeDatabase } from "@/server/database";
import { Refusal } from "@/server/refusal";

const freeFailures = 5;
const firstWaitS = 30;
const longestWaitS = 3600;
/** After so many failures in a row only an administrator helps, by a new first password. */
export const hardStop = 50;

/**
 * Seconds an account waits after `failures` wrong passwords in a row: none up to four, 30 s from the fifth, doubling to an hour.
 *
 * Source   NIST SP 800-63B-4, 3.2.2: a verifier limits consecutive failures (at most 100); the steps are ours.
 */
export function waitAfterS(failures: number): number {
  if (failures < freeFailures) return 0;
  return Math.min(longestWaitS, firstWaitS * 2 ** (failures - freeFailures));
}

/**
 * Takes one attempt before the password is looked at. The attempt counts as a failure until `clearAttempts` says otherwise, and the row is
 * locked while it is counted, so guesses sent at the same moment are counted one by one.
 *
 * Throws   Refusal "account-locked" with the seconds to wait.
 */
export async function takeAttempt(key: string): Promise<void> {
  const wait = await writeDatabase().transaction(async (transaction) => {
    await transaction.insert(authThrottle).values({ key }).onConflictDoNothing();
    const [row] = await transaction
      .select({
        failures: authThrottle.failures,
        waitS: sql<number>`coalesce(ceil(extract(epoch from ${authThrottle.blockedUntil} - clock_timestamp())), 0)::int`,
      })
      .from(authThrottle)
      .where(eq(authThrottle.key, key))
      .for("update");
    if (!row) throw new Error("the counter of attempts vanished while it was locked");
    if (row.failures >= hardStop) return "closed";
    if (row.waitS > 0) return row.waitS;
    const nextWaitS = waitAfterS(row.failures + 1);
    await transaction
      .update(authThrottle)
      .set({
        failures: row.failures + 1,
        blockedUntil: nextWaitS > 0 ? sql`clock_timestamp() + make_interval(secs => ${nextWaitS})` : null,
      })
      .where(eq(authThrottle.key, key));
    return 0;
  });
  if (wait === "closed") {
    throw new Refusal("account-locked", {
      detail: `${hardStop} wrong passwords in a row have closed this account. An administrator opens it with a new first password.`,
    });
  }
  if (wait > 0) throw new Refusal("account-locked", { detail: `Wait ${waitWords(wait)}, then try again.`, retryAfterS: wait });
}

/** The password was right: the count starts again. The row stays, because another attempt may hold it at this moment. */
export async function clearAttempts(key: string): Promise<void> {
  await writeDatabase().update(authThrottle).set({ failures: 0, blockedUntil: null }).where(eq(authThrottle.key, key));
}

/** "30 s", "2 min": rounded up, so that waiting as long as told is enough. */
export const waitWords = (seconds: number): string => (seconds < 120 ? `${seconds} s` : `${Math.ceil(seconds / 60)} min`);
