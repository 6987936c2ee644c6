/**
 * Every kind an entry of this version may have, and what its subject names. Closed: a kind that is not here is a fault. A kind is added
 * by a new line here and in the database's own list, and never renamed.
 */
export const entryKinds = {
  genesis: { noun: "ledger", words: "Record founded" },
  ddl_window: { noun: "ledger", words: "Structure opened or closed for a migration" },
  clock_anomaly: { noun: "ledger", words: "Clock found behind the newest entry" },
  security_digest: { noun: "ledger", words: "Digest of the security log" },
  screening_signed: { noun: "screening", words: "Signed and handed over" },
  screening_countersigned: { noun: "screening", words: "Countersigned" },
  screening_returned: { noun: "screening", words: "Returned with remarks" },
  screening_superseded: { noun: "screening", words: "Superseded" },
  screening_withdrawn: { noun: "screening", words: "Withdrawn" },
  second_look_done: { noun: "screening", words: "Second look done" },
  replay_result: { noun: "screening", words: "Computed again" },
  export_made: { noun: "screening", words: "Exported" },
  person_enrolled: { noun: "person", words: "Enrolled" },
  person_disabled: { noun: "person", words: "Disabled" },
  person_reenabled: { noun: "person", words: "Enabled again" },
  role_proposed: { noun: "person", words: "Change of role proposed" },
  role_confirmed: { noun: "person", words: "Change of role confirmed" },
  member_added: { noun: "member", words: "Added to a facility" },
  member_removed: { noun: "member", words: "Removed from a facility" },
  policy_changed: { noun: "facility", words: "Limit policy changed" },
  engine_registered: { noun: "engine", words: "Engine registered" },
} as const;

export type EntryKind = keyof typeof entryKinds;
export type SubjectNoun = (typeof entryKinds)[EntryKind]["noun"];

export const isEntryKind = (text: string): text is EntryKind => Object.hasOwn(entryKinds, text);

const uuid = "[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}";
const subjectForms: Record<SubjectNoun, RegExp> = {
  ledger: /^ledger$/,
  screening: new RegExp(`^screening:${uuid}:[1-9][0-9]{0,8}$`),
  person: new RegExp(`^person:${uuid}$`),
  member: new RegExp(`^member:${uuid}:${uuid}$`),
  facility: new RegExp(`^facility:${uuid}$`),
  engine: /^engine:[A-Za-z0-9._-]{1,80}$/,
};

export const subjectFits = (kind: EntryKind, subject: string): boolean => subjectForms[entryKinds[kind].noun].test(subject);

export const subjectOf = {
  ledger: "ledger",
  screening: (screeningId: string, rev: number) => `screening:${screeningId}:${rev}`,
  person: (personId: string) => `person:${personId}`,
  member: (facilityId: string, personId: string) => `member:${facilityId}:${personId}`,
  facility: (facilityId: string) => `facility:${facilityId}`,
  engine: (engineVersion: string) => `engine:${engineVersion}`,
} as const;
