import { bigint, integer, text, uuid } from "drizzle-orm/pg-core";
import { bytea, ledger } from "./ledger";

/** One entry. Everything but `seq` and `envelope` is generated from the envelope by the database. */
export const entry = ledger.table("entry", {
  seq: bigint("seq", { mode: "number" }).primaryKey(),
  envelope: text("envelope").notNull(),
  /** Leaf hash: SHA-256 of 0x00 and the envelope. */
  hash: bytea("hash").notNull(),
  kind: text("kind").notNull(),
  /** A person id, or "system". */
  actor: text("actor").notNull(),
  subject: text("subject").notNull(),
  subjectId: text("subject_id").notNull(),
  /** UTC with microseconds, as written: 2026-12-01T15:40:12.481233Z. */
  at: text("at").notNull(),
  idem: text("idem").notNull(),
  prev: text("prev").notNull(),
  /** Body commitment, hex. */
  commitment: text("commitment").notNull(),
});

/** Canonical body and its salt; both null after a redaction. Row rules hide bodies from people who may not read them. */
export const body = ledger.table("body", {
  seq: bigint("seq", { mode: "number" }).primaryKey(),
  salt: bytea("salt"),
  bytes: text("bytes"),
});

/** The newest entry; one row. */
export const head = ledger.table("head", {
  size: bigint("size", { mode: "number" }).notNull(),
  hash: bytea("hash").notNull(),
  at: text("at").notNull(),
});

export const origin = ledger.table("origin", { origin: text("origin").notNull() });

/** Stored bytes by their own SHA-256: record contents, cases, results. Added once, never changed. */
export const content = ledger.table("content", {
  sha256: text("sha256").primaryKey(),
  mediaType: text("media_type").notNull(),
  bytes: bytea("bytes").notNull(),
});

export const revisionStates = ["signed", "countersigned", "returned", "superseded", "withdrawn"] as const;

/** Where each signed revision stands; a projection of the entries. */
export const revision = ledger.table("revision", {
  screeningId: uuid("screening_id").notNull(),
  rev: integer("rev").notNull(),
  state: text("state", { enum: revisionStates }).notNull(),
  author: uuid("author").notNull(),
  contributors: uuid("contributors").array().notNull(),
  contentSha256: text("content_sha256").notNull(),
  signedSeq: bigint("signed_seq", { mode: "number" }).notNull(),
  decidedBy: uuid("decided_by"),
  decidedSeq: bigint("decided_seq", { mode: "number" }),
  /** Entry that superseded or withdrew it. */
  closedSeq: bigint("closed_seq", { mode: "number" }),
});
