import "server-only";
import { type SQL, sql } from "drizzle-orm";
import type { Role } from "@/contracts/roles";
import { entry } from "@db/schema/ledger/entry";

/** Who reads the log, as `Viewer` and jobs know it. */
export type LedgerReader = { id: string; role: Role | "system" };

/**
 * The part of a `where` that keeps the log within reach: auditors, administrators and jobs see every entry, engineers and approvers those
 * about their facilities, about the screenings in them, and about themselves.
 */
export function entriesWithin({ id, role }: LedgerReader): SQL | undefined {
  if (role === "auditor" || role === "administrator" || role === "system") return undefined;
  return sql`(${entry.subjectId} in (
    select s.id::text from app.screening s join app.section c on c.id = s.section_id join ledger.member m on m.facility_id = c.facility_id
    where m.person_id = ${id}
    union all select m.facility_id::text from ledger.member m where m.person_id = ${id}
    union all select ${id}::text))`;
}
