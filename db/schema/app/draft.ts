import { check, index, integer, jsonb, primaryKey, text, timestamp, uuid } from "drizzle-orm/pg-core";
import { sql } from "drizzle-orm";
import type { DraftDocument } from "@/contracts/draft";
import type { Verdict } from "@/contracts/record-content";
import type { Ebb } from "@/contracts/views";
import { app } from "./app";
import { screening } from "./screening";

/** What lists and sheets show of the server's own run without opening its stored bytes. */
export type PreparedSummary = {
  engineVersion: string;
  verdict: Verdict;
  sentence: string;
  ebb: Ebb | null;
  /** Hashes of the stored bytes in `ledger.content`. */
  runs: { letter: string; caseSha256: string; resultSha256: string; confirmationSha256: string }[];
};

/**
 * One revision being worked on, as typed. Rows are visible to members of the facility only (row rules; see `asPerson` in db/clients.ts).
 *
 * `contributors` grows by itself: a trigger adds the author and everyone who saves, so nobody who had a hand in it can countersign.
 * Once the revision is signed the row is frozen. `preparedVersion` must equal `version` when it is signed.
 */
export const draft = app.table(
  "draft",
  {
    screeningId: uuid("screening_id")
      .notNull()
      .references(() => screening.id),
    rev: integer("rev").notNull(),
    authorId: uuid("author_id").notNull(),
    document: jsonb("document").$type<DraftDocument>().notNull(),
    /** Grows by one with each save; a save that names another base version is a conflict. */
    version: integer("version").notNull().default(1),
    contributors: uuid("contributors")
      .array()
      .notNull()
      .default(sql`'{}'`),
    /** The revision this one replaces, and why; null for the first. */
    replacesRev: integer("replaces_rev"),
    reason: text("reason"),
    createdAt: timestamp("created_at", { withTimezone: true }).notNull().defaultNow(),
    updatedBy: uuid("updated_by").notNull(),
    updatedAt: timestamp("updated_at", { withTimezone: true }).notNull().defaultNow(),
    /** `version` that the stored run was computed from. */
    preparedVersion: integer("prepared_version"),
    /** SHA-256 of the record content in `ledger.content`; the hash the signing page shows. */
    preparedSha256: text("prepared_sha256"),
    preparedAt: timestamp("prepared_at", { withTimezone: true }),
    prepared: jsonb("prepared").$type<PreparedSummary>(),
  },
  (table) => [
    primaryKey({ columns: [table.screeningId, table.rev] }),
    index("draft_by_author").on(table.authorId, table.updatedAt.desc()),
    check("draft_rev_from_one", sql`${table.rev} >= 1`),
    check("draft_version_from_one", sql`${table.version} >= 1`),
    check("draft_prepared_sha256", sql`${table.preparedSha256} ~ '^[0-9a-f]{64}$'`),
    check(
      "draft_prepared_together",
      sql`num_nulls(${table.prepared}, ${table.preparedSha256}, ${table.preparedVersion}, ${table.preparedAt}) in (0, 4)`,
    ),
    check("draft_reason_with_replacement", sql`(${table.rev} = 1) = (${table.replacesRev} is null)`),
  ],
);
