import { bigint, index, integer, text, timestamp, uuid } from "drizzle-orm/pg-core";
import { app } from "./app";
import { screening } from "./screening";

/** A remark tied to a line. Those of a return are written by `ledger.return_` with the entry (`entrySeq`); others are comments. */
export const remark = app.table(
  "remark",
  {
    id: uuid("id").primaryKey().defaultRandom(),
    screeningId: uuid("screening_id")
      .notNull()
      .references(() => screening.id),
    rev: integer("rev").notNull(),
    line: text("line").notNull(),
    text: text("text").notNull(),
    authorId: uuid("author_id").notNull(),
    entrySeq: bigint("entry_seq", { mode: "number" }),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull().defaultNow(),
  },
  (table) => [index("remark_by_revision").on(table.screeningId, table.rev)],
);
