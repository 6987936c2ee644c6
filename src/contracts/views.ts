/** What reads hand to pages and to the API: minimal, already permitted, never a database row. Times are ISO 8601 in UTC. */
import type { BlowdownCase } from "@/engine/cases/blowdown-case";
import type { BlowdownResult } from "@/engine/cases/blowdown-result";
import type { DraftDocument } from "./draft";
import type { LimitPolicy } from "./policy";
import type { RecordContent, Verdict } from "./record-content";
import type { Role } from "./roles";

export type PersonView = { id: string; badge: string; printedName: string; role: Role; active: boolean };
export type PersonDetailView = PersonView & {
  facilities: { id: string; name: string }[];
  mustChangePassword: boolean;
  lastSignIn: string | null;
  /** A change of role that waits for a second administrator. `mine`: the viewer proposed it, so another one confirms. */
  proposedRole: { role: Role; mine: boolean } | null;
};

/** The signed-in person, as pages know them. */
export type ViewerView = PersonView & {
  mustChangePassword: boolean;
  units: "SI" | "US";
  theme: "light" | "dark" | "system" | null;
  demo: boolean;
};

export type SessionView = { id: string; startedAt: string; lastSeenAt: string; browser: string; current: boolean };
export type AccountView = { person: ViewerView; facilities: { id: string; name: string }[]; sessions: SessionView[] };
export type DemoAccountView = { badge: string; role: Role; printedName: string; password: string };

export type FacilityView = {
  id: string;
  code: string;
  name: string;
  demo: boolean;
  barometricPressurePa: number;
  policy: LimitPolicy;
  sections: number;
  members: PersonView[];
};

export type SectionView = {
  id: string;
  tag: string;
  name: string;
  description: string;
  facility: { id: string; code: string; name: string };
};
export type SectionDetailView = SectionView & { screenings: ScreeningRow[] };

export const revisionStates = ["draft", "computed", "signed", "countersigned", "returned", "superseded", "withdrawn"] as const;
export type RevisionState = (typeof revisionStates)[number];

/** Points of a record's own pressure curve: `x` in 0..1 of twice the allowed time, `y` in 0..1 of the start pressure; post at the target. */
export type Ebb = { x: number[]; y: number[]; postX: number | null; beyond: boolean };

export type ScreeningRow = {
  id: string;
  record: string;
  rev: number;
  title: string;
  section: { id: string; tag: string; name: string };
  facility: { id: string; code: string; name: string; demo: boolean };
  state: RevisionState;
  verdict: Verdict | null;
  sentence: string | null;
  ebb: Ebb | null;
  author: { id: string; badge: string };
  changedAt: string;
};

export type RemarkView = { line: string; text: string; by: string; at: string };

export type DraftView = {
  screeningId: string;
  rev: number;
  document: DraftDocument;
  version: number;
  updatedAt: string;
  updatedBy: string;
  /** The viewer may type here. */
  editable: boolean;
  /** Remarks of the return that this revision answers. */
  answers: RemarkView[];
};

export type CaseRunView = { letter: string; document: BlowdownCase; result: BlowdownResult };

/** What the server computed and stored; the signing page and the sheet are drawn from it. */
export type PreparedView = {
  contentSha256: string;
  content: RecordContent;
  runs: CaseRunView[];
  computedAt: string;
  draftVersion: number;
  /** The draft has moved on since. */
  stale: boolean;
};

export type SignatureView = {
  act: "signed" | "countersigned" | "returned" | "withdrawn";
  seq: number;
  at: string;
  badge: string;
  printedName: string;
  role: Role;
  meaning: string;
  method: string;
  hash: string;
  conditions: string[];
  remarks: RemarkView[];
};

export type ScreeningView = ScreeningRow & {
  revisions: { rev: number; state: RevisionState; changedAt: string }[];
  draft: DraftView | null;
  prepared: PreparedView | null;
  signatures: SignatureView[];
  /** What this viewer may do now. */
  may: { edit: boolean; compute: boolean; sign: boolean; decide: boolean; withdraw: boolean; revise: boolean };
  /** Why an approver may not decide, when that needs saying ("You prepared this revision."). */
  whyNot: string | null;
};

export type DeskView = {
  waits: (ScreeningRow & { why: string })[];
  yours: ScreeningRow[];
  log: { size: number; headHash: string | null; lastAt: string | null };
};

export type CeremonyView = {
  nonce: string;
  idempotencyKey: string;
  expiresAt: string;
  shownSha256: string;
  meaning: string;
  method: string;
};

export type ReceiptView = { seq: number; at: string; hash: string; contentSha256: string };

export type EntryRow = {
  seq: number;
  at: string;
  kind: string;
  subject: string;
  /** "E-114", or "server" for entries that no person made. */
  by: string;
  record: string | null;
  rev: number | null;
  /** One sentence: what happened. */
  what: string;
  hash: string;
};

export type EntryView = EntryRow & {
  envelope: string;
  prevHash: string;
  bodySha256: string;
  saltHex: string | null;
  /** Canonical body text, when the viewer may read it. */
  body: string | null;
  facts: { label: string; value: string }[];
  neighbours: { before: { seq: number; hash: string } | null; after: { seq: number; hash: string } | null };
};

/** One entry as the browser needs it to recompute the seal (a `StoredEntry` of the ledger library). */
export type VerificationRow = {
  seq: number;
  envelope: string;
  hash: string;
  mirrors: { kind: string; actor: string; subject: string; at: string };
  /** "withheld": this viewer may not read it, so it is not judged. */
  body: { saltHex: string; text: string } | "withheld" | "redacted";
};
/** A run of entries, with the origin the first one starts from and the newest entry known to the server. */
export type VerificationView = { origin: string; head: { seq: number; hash: string }; rows: VerificationRow[] };

export type Page<T> = { rows: T[]; total: number; next: number | null };
