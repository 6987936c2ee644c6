import "server-only";
import { randomBytes } from "node:crypto";
import { and, eq, gt, isNull, lt, sql } from "drizzle-orm";
import type { Database } from "@db/clients";
import { ceremony, type CeremonyAct } from "@db/schema/app/ceremony";
import type { SigningMethod } from "@/ledger/statements";
import { Refusal } from "../refusal";

export type OpenedCeremony = { nonce: string; idempotencyKey: string; expiresAt: Date };

/**
 * Opens a signing page: for this person and session, on this revision, for this act, showing this content, for five minutes.
 * Callers have authorised the act already; the database asks again when it is used.
 */
export async function openCeremony(
  writeDatabase: Database,
  input: {
    personId: string;
    sessionIdSha256: string | null;
    screeningId: string;
    rev: number;
    act: CeremonyAct;
    shownSha256: string;
  },
): Promise<OpenedCeremony> {
  const row = {
    nonce: randomBytes(24).toString("base64url"),
    idempotencyKey: randomBytes(24).toString("base64url"),
    personId: input.personId,
    sessionId: input.sessionIdSha256,
    screeningId: input.screeningId,
    rev: input.rev,
    act: input.act,
    shownSha256: input.shownSha256,
  };
  await writeDatabase.delete(ceremony).where(lt(ceremony.expiresAt, sql`now() - interval '1 day'`));
  const [opened] = await writeDatabase.insert(ceremony).values(row).returning({ expiresAt: ceremony.expiresAt });
  return { nonce: row.nonce, idempotencyKey: row.idempotencyKey, expiresAt: opened!.expiresAt };
}

/**
 * Notes that the person gave the password (or code, or passkey) again on this page. Call it only after checking it.
 * A repeat after the page was used is let through: the record answers it with the first receipt.
 *
 * Throws Refusal "ceremony-expired"
 */
export async function proveCeremony(
  writeDatabase: Database,
  input: { nonce: string; personId: string; sessionIdSha256: string | null; method: SigningMethod },
): Promise<void> {
  const [open] = await writeDatabase.select().from(ceremony).where(eq(ceremony.nonce, input.nonce));
  if (!open || open.personId !== input.personId || open.sessionId !== input.sessionIdSha256) {
    throw new Refusal("ceremony-expired", { detail: "There is no such signing page in this session." });
  }
  if (open.usedAt) return;
  const proved = await writeDatabase
    .update(ceremony)
    .set({ method: input.method, provedAt: sql`now()` })
    .where(and(eq(ceremony.nonce, input.nonce), isNull(ceremony.usedAt), gt(ceremony.expiresAt, sql`now()`)))
    .returning({ nonce: ceremony.nonce });
  if (proved.length > 0) return;
  // A twin of this request may have used the page since it was read above; the record gives both the same receipt.
  const [since] = await writeDatabase.select({ usedAt: ceremony.usedAt }).from(ceremony).where(eq(ceremony.nonce, input.nonce));
  if (!since?.usedAt) {
    throw new Refusal("ceremony-expired", { detail: "The signing page was open for more than five minutes." });
  }
}
