import { sql } from "drizzle-orm";
import { index, integer, text, timestamp, uuid } from "drizzle-orm/pg-core";
import { app } from "./app";
import { section } from "./section";

/** Numbers are drawn when the first draft is made and never used again, so a gap is a number somebody gave up. */
export const screeningNumber = app.sequence("screening_number", { startWith: 1, minValue: 1 });

/** A numbered document with revisions; shown as SC-0001. It stays in the section it was made for. */
export const screening = app.table(
  "screening",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    number: integer("number")
      .notNull()
      .unique()
      .default(sql`nextval('app.screening_number')`),
    sectionId: uuid("section_id")
      .notNull()
      .references(() => section.id),
    title: text("title").notNull(),
    createdBy: uuid("created_by").notNull(),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull().defaultNow(),
  },
  (table) => [index("screening_by_section").on(table.sectionId, table.number.desc())],
);
