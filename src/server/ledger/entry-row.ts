import "server-only";
import type { EntryRow } from "@/contracts/views";
import { type EntryKind, entryKinds } from "@/ledger/entry-kinds";
import { recordName } from "@/contracts/record-name";

export type EntryColumns = {
  seq: number;
  at: string;
  kind: string;
  subject: string;
  hash: Buffer;
  actorBadge: string | null;
  /** Badge of the person the entry is about. */
  aboutBadge: string | null;
  facilityName: string | null;
  number: number | null;
};

/** A row of the log, from what the envelope says; no body is opened for it. */
export function entryRow({ seq, at, kind, subject, hash, actorBadge, aboutBadge, facilityName, number }: EntryColumns): EntryRow {
  const rev = subject.startsWith("screening:") ? Number(subject.split(":")[2]) : null;
  return {
    seq,
    at,
    kind,
    subject,
    by: actorBadge ?? "server",
    record: number === null ? null : recordName(number),
    rev,
    what: sentence(kind as EntryKind, { aboutBadge, facilityName, subject }),
    hash: hash.toString("hex"),
  };
}

function sentence(
  kind: EntryKind,
  { aboutBadge, facilityName, subject }: Pick<EntryColumns, "aboutBadge" | "facilityName" | "subject">,
): string {
  switch (kind) {
    case "member_added":
      return `${aboutBadge} added to ${facilityName ?? "a facility"}`;
    case "member_removed":
      return `${aboutBadge} removed from ${facilityName ?? "a facility"}`;
    case "policy_changed":
      return `Limit policy of ${facilityName ?? "a facility"} changed`;
    case "engine_registered":
      return `Engine ${subject.slice("engine:".length)} registered`;
    case "role_proposed":
    case "role_confirmed":
    case "person_enrolled":
    case "person_disabled":
    case "person_reenabled":
      return `${aboutBadge}: ${entryKinds[kind].words.toLowerCase()}`;
    default:
      return entryKinds[kind]?.words ?? kind;
  }
}
