import "server-only";
import type { Role } from "@/contracts/roles";

/**
 * Who may do what: the whole answer, as data. `authorise` reads it, the address table is checked against it, and a test keeps a frozen
 * copy, so that a change here is always a decision.
 *
 *   Y  yes                                  M  member of the facility
 *   O  own: the person, or the author       C  member who had a hand in the revision
 *   N  member who had no hand in it         S  any facility, once something is signed
 *   X  anybody but oneself                  E  envelopes, and the bodies that are no screening
 *   -  no
 */
export type Rule = "Y" | "M" | "O" | "C" | "N" | "S" | "X" | "E" | "-";

type Row = readonly [engineer: Rule, approver: Rule, auditor: Rule, administrator: Rule];

const rows = {
  "session.read": ["Y", "Y", "Y", "Y"],
  "session.close": ["Y", "Y", "Y", "Y"],
  "account.read": ["O", "O", "O", "O"],
  "account.change": ["O", "O", "O", "O"],
  "desk.read": ["Y", "Y", "Y", "Y"],
  "person.list": ["-", "-", "-", "Y"],
  "person.enrol": ["-", "-", "-", "Y"],
  "person.change": ["-", "-", "-", "X"],
  "facility.list": ["M", "M", "Y", "Y"],
  "facility.read": ["M", "M", "Y", "Y"],
  "facility.create": ["-", "-", "-", "Y"],
  "member.change": ["-", "-", "-", "X"],
  "section.list": ["M", "M", "Y", "-"],
  "section.read": ["M", "M", "Y", "-"],
  "section.create": ["M", "-", "-", "-"],
  "screening.list": ["M", "M", "S", "-"],
  "screening.read": ["M", "M", "S", "-"],
  "screening.create": ["M", "-", "-", "-"],
  "draft.read": ["M", "M", "-", "-"],
  "draft.edit": ["M", "-", "-", "-"],
  "draft.compute": ["M", "-", "-", "-"],
  "screening.sign": ["C", "-", "-", "-"],
  "screening.countersign": ["-", "N", "-", "-"],
  "screening.return": ["-", "N", "-", "-"],
  "screening.withdraw-signed": ["O", "-", "-", "-"],
  "screening.withdraw-countersigned": ["-", "N", "-", "-"],
  "screening.revise": ["M", "-", "-", "-"],
  "calculation.run": ["Y", "Y", "-", "-"],
  "log.list": ["M", "M", "Y", "E"],
  "log.read": ["M", "M", "Y", "E"],
  "log.verify": ["Y", "Y", "Y", "Y"],
} as const satisfies Record<string, Row>;

export type Act = keyof typeof rows;
export const acts = Object.keys(rows) as Act[];

const column: Record<Role, 0 | 1 | 2 | 3> = { engineer: 0, approver: 1, auditor: 2, administrator: 3 };

export const ruleFor = (act: Act, role: Role): Rule => rows[act][column[role]];

/** What a job without a person may do: enrol the first people. Everything else needs somebody who signed in. */
export const systemActs: readonly Act[] = ["person.enrol"];

/** What strangers may do. */
export const openActs = ["health.read", "session.open"] as const;
export type OpenAct = (typeof openActs)[number];
