import { check, index, integer, text, timestamp, uuid } from "drizzle-orm/pg-core";
import { sql } from "drizzle-orm";
import { app } from "./app";
import { session } from "./account";
import { screening } from "./screening";

export const ceremonyActs = ["sign", "countersign", "return", "withdraw"] as const;
export type CeremonyAct = (typeof ceremonyActs)[number];

/**
 * An open signing page: one person, one session, one revision, one act, one shown hash, for five minutes.
 *
 * `provedAt` and `method` are set once the person has re-entered the password (or code); `ledger.sign` and its siblings refuse without it
 * and set `usedAt` in the same transaction as the entry. Reaching the record therefore takes two logins, write and sign.
 */
export const ceremony = app.table(
  "ceremony",
  {
    nonce: text("nonce").primaryKey(),
    idempotencyKey: text("idempotency_key").notNull().unique(),
    personId: uuid("person_id").notNull(),
    sessionId: text("session_id").references(() => session.idSha256, { onDelete: "cascade" }),
    screeningId: uuid("screening_id")
      .notNull()
      .references(() => screening.id),
    rev: integer("rev").notNull(),
    act: text("act", { enum: ceremonyActs }).notNull(),
    shownSha256: text("shown_sha256").notNull(),
    method: text("method", { enum: ["password", "code", "passkey"] }),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull().defaultNow(),
    expiresAt: timestamp("expires_at", { withTimezone: true })
      .notNull()
      .default(sql`now() + interval '5 minutes'`),
    provedAt: timestamp("proved_at", { withTimezone: true }),
    usedAt: timestamp("used_at", { withTimezone: true }),
  },
  (table) => [
    index("ceremony_by_expiry").on(table.expiresAt),
    check("ceremony_method_with_proof", sql`(${table.method} is null) = (${table.provedAt} is null)`),
  ],
);
