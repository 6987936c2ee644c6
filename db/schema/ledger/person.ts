import { bigint, boolean, text, uuid } from "drizzle-orm/pg-core";
import type { Role } from "@/contracts/roles";
import { ledger } from "./ledger";

/** A person, as the entries say. Changes only through `ledger.record_event`. */
export const person = ledger.table("person", {
  id: uuid("id").primaryKey(),
  badge: text("badge").notNull(),
  printedName: text("printed_name").notNull(),
  role: text("role").$type<Role>().notNull(),
  active: boolean("active").notNull(),
  changedSeq: bigint("changed_seq", { mode: "number" }).notNull(),
});

/** Who belongs to which facility now. */
export const member = ledger
  .view("member", {
    facilityId: uuid("facility_id").notNull(),
    personId: uuid("person_id").notNull(),
  })
  .existing();

/** Who belonged when: an open membership has no `removedSeq`. */
export const membership = ledger.table("membership", {
  facilityId: uuid("facility_id").notNull(),
  personId: uuid("person_id").notNull(),
  addedSeq: bigint("added_seq", { mode: "number" }).notNull(),
  removedSeq: bigint("removed_seq", { mode: "number" }),
});

/** A change of role that one administrator has proposed and another has yet to confirm. */
export const roleProposal = ledger.table("role_proposal", {
  seq: bigint("seq", { mode: "number" }).primaryKey(),
  personId: uuid("person_id").notNull(),
  role: text("role").$type<Role>().notNull(),
  proposedBy: uuid("proposed_by").notNull(),
  confirmedSeq: bigint("confirmed_seq", { mode: "number" }),
});
