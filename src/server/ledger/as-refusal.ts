import "server-only";
import { type RefusalCode, refusals } from "@/contracts/refusals";
import { databaseErrorOf } from "../database-refusal";
import { Refusal } from "../refusal";

// Nothing was written, or it can't be told: the same key may be tried again. Lock and statement timeouts, deadlock, serialisation,
// shutdown, lost connections, too many connections.
const passing = new Set([
  ...["55P03", "57014", "40P01", "40001", "57P01", "57P02", "57P03", "08006", "08003", "53300", "25P03"],
  ...["ECONNREFUSED", "ECONNRESET", "EPIPE", "ETIMEDOUT"],
]);

export function isPassing(error: unknown): boolean {
  const found = databaseErrorOf(error);
  if (found) return passing.has(found.code);
  for (let at: unknown = error; at instanceof Error; at = at.cause) {
    if (/Connection terminated|timeout exceeded when trying to connect/.test(at.message)) return true;
  }
  return false;
}

/**
 * Turns a "no" of the record's functions into a refusal. They raise SQLSTATE EBnnn with the refusal's code as the message and the reason
 * as the detail. Anything that is not a "no" comes back as it is.
 */
export function asRefusal(error: unknown): unknown {
  const found = databaseErrorOf(error);
  if (found?.code.startsWith("EB") && Object.hasOwn(refusals, found.message)) {
    return new Refusal(found.message as RefusalCode, { detail: found.detail });
  }
  if (isPassing(error)) return new Refusal("record-unavailable", { retryAfterS: 2 });
  return error;
}
