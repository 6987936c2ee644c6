import { bigint, index, jsonb, text, timestamp, uuid } from "drizzle-orm/pg-core";
import { app } from "./app";

/** The security log: sign-ins, refusals, changed passwords. Rows are added and never edited; it is no part of the record. */
export const securityEvent = app.table(
  "security_event",
  {
    id: bigint("id", { mode: "number" }).primaryKey().generatedAlwaysAsIdentity(),
    at: timestamp("at", { withTimezone: true }).notNull().defaultNow(),
    kind: text("kind").notNull(),
    personId: uuid("person_id"),
    details: jsonb("details").$type<Record<string, unknown>>().notNull(),
  },
  (table) => [index("security_event_by_person").on(table.personId, table.id.desc())],
);
