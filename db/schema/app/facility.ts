import { boolean, doublePrecision, jsonb, text, timestamp, uuid } from "drizzle-orm/pg-core";
import type { LimitPolicy } from "@/contracts/policy";
import { app } from "./app";

/** A site. Membership is by facility and lives in `ledger.membership`, because each change of it is an entry. */
export const facility = app.table("facility", {
  id: uuid("id").primaryKey().defaultRandom(),
  code: text("code").notNull().unique(),
  name: text("name").notNull(),
  /** Invented data; marked as demo wherever it shows. */
  demo: boolean("demo").notNull().default(false),
  /** Pa absolute; turns gauge readings of the form into absolute pressures. */
  barometricPressurePa: doublePrecision("barometric_pressure_pa").notNull(),
  policy: jsonb("policy").$type<LimitPolicy>().notNull(),
  createdBy: uuid("created_by").notNull(),
  createdAt: timestamp("created_at", { withTimezone: true }).notNull().defaultNow(),
});
