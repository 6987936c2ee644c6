import "server-only";
import { type SQL, sql } from "drizzle-orm";
import type { Database } from "@db/clients";
import { asRefusal, isPassing } from "./as-refusal";

/** What an act of the record answers with. `repeated`: the act had been recorded before; this is its first receipt. */
export type Receipt = { seq: number; at: string; leaf: string; commitment: string; repeated: boolean };

/** Mail filed in the same transaction as the entry. {{seq}}, {{at}} and {{leaf}} are replaced by those of the receipt. */
export type ReceiptMail = { to: string; subject: string; text: string; html?: string };

const attempts = 3;

/**
 * Calls one of the record's functions. Calls carry an idempotency key, so a lost connection is answered by calling again: if the act was
 * recorded before the reply was lost, the first receipt comes back.
 *
 * Throws Refusal
 */
export async function callLedger(signDatabase: Database, call: SQL): Promise<Receipt> {
  for (let attempt = 1; ; attempt++) {
    try {
      const { rows } = await signDatabase.execute<{
        seq: string;
        at: string;
        leaf: string;
        commitment: string;
        repeated: boolean;
      }>(sql`select seq, at, leaf, commitment, repeated from ${call}`);
      const row = rows[0]!;
      return { ...row, seq: Number(row.seq) };
    } catch (error) {
      if (attempt >= attempts || !isPassing(error)) throw asRefusal(error);
      await new Promise((resolve) => setTimeout(resolve, 100 * attempt));
    }
  }
}
