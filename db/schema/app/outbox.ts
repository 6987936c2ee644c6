import { index, integer, text, timestamp, uuid } from "drizzle-orm/pg-core";
import { sql } from "drizzle-orm";
import { app } from "./app";

/** Mail waiting to go. Rows are made in the transaction of the act they tell of; the sender claims them and keeps the Message-ID on retries. */
export const outbox = app.table(
  "outbox",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    messageId: text("message_id").notNull().unique(),
    to: text("to").notNull(),
    subject: text("subject").notNull(),
    text: text("text").notNull(),
    html: text("html"),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull().defaultNow(),
    nextAttemptAt: timestamp("next_attempt_at", { withTimezone: true }).notNull().defaultNow(),
    attempts: integer("attempts").notNull().default(0),
    lastError: text("last_error"),
    sentAt: timestamp("sent_at", { withTimezone: true }),
    /** Given up after a day of retries; readiness turns red until somebody looks. */
    deadAt: timestamp("dead_at", { withTimezone: true }),
  },
  (table) => [
    index("outbox_waiting")
      .on(table.nextAttemptAt)
      .where(sql`sent_at is null and dead_at is null`),
  ],
);
