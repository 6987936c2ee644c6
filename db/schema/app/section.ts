import { text, timestamp, unique, uuid } from "drizzle-orm/pg-core";
import { app } from "./app";
import { facility } from "./facility";

/** An isolatable section: one or more vessels and pipe runs. It never moves to another facility. */
export const section = app.table(
  "section",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    facilityId: uuid("facility_id")
      .notNull()
      .references(() => facility.id),
    tag: text("tag").notNull(),
    name: text("name").notNull(),
    description: text("description").notNull().default(""),
    createdBy: uuid("created_by").notNull(),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull().defaultNow(),
  },
  (table) => [unique("section_tag_in_facility").on(table.facilityId, table.tag)],
);
