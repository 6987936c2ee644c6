import type { Json } from "./canonical-json";

/** What a signature means, in the words shown beside the button and stored with it. */
export const meanings = {
  sign: "I prepared this screening. The lines are entered as their sources give them, the assumed lines are marked, and I have read the cautions.",
  countersign:
    "I have read what was assumed and what governs. The screening may be used as the basis for review under the local code.",
  return: "I return this screening. My remarks say what has to be answered.",
  withdraw: "I withdraw this revision. It must not be used any longer.",
} as const;
export type SigningAct = keyof typeof meanings;

export type SigningMethod = "password" | "code" | "passkey";

export type SigningPerson = { badge: string; id: string; printedName: string; role: string };
export type SignedScreening = { id: string; record: string; rev: number };
export type AcknowledgedCaution = { id: string; words: string };

type Common<Act extends SigningAct> = {
  act: Act;
  authentication: { method: SigningMethod };
  /** How the person proved who they are, and under which policy, in the words shown ("Password again (demo policy)"). */
  factor: string;
  /** `sha256` names the stored record content, the bytes the signing page was drawn from. */
  content: { sha256: string };
  meaning: string;
  nonce: string;
  person: SigningPerson;
  screening: SignedScreening;
};

/** Body of `screening_signed`. */
export type SignStatement = Common<"sign"> & {
  cautions: AcknowledgedCaution[];
  /** Ids of all who worked on the revision, the signer among them, in ascending order. */
  contributors: string[];
  engineVersion: string;
  replaces: { contentSha256: string; reason: string; rev: number } | null;
  sentence: string;
  verdict: string;
};

type Decides = { signed: { leaf: string; seq: number } };

/** Body of `screening_countersigned`. */
export type CountersignStatement = Common<"countersign"> & Decides & { cautions: AcknowledgedCaution[]; conditions: string[] };

/** Body of `screening_returned`. */
export type ReturnStatement = Common<"return"> & Decides & { remarks: { line: string; text: string }[] };

/** Body of `screening_withdrawn`. */
export type WithdrawStatement = Common<"withdraw"> & { reason: string };

export type Statement = SignStatement | CountersignStatement | ReturnStatement | WithdrawStatement;

/** While fewer than two administrators exist, acts that take two are done by one, and say so. */
export type TwoPersonRule = "bound" | "not yet bound: one administrator";

/** Bodies of the events that `ledger.record_event` takes. `screening_*` kinds go through the signing functions instead. */
export type EventBodies = {
  person_enrolled: { badge: string; printedName: string; role: string };
  person_disabled: { badge: string; reason: string };
  person_reenabled: { badge: string; reason: string };
  role_proposed: { badge: string; from: string; reason: string; role: string; twoPersonRule: TwoPersonRule };
  /** `proposed`: number of the entry that proposed it. */
  role_confirmed: { badge: string; from: string; proposed: number; role: string; twoPersonRule: TwoPersonRule };
  member_added: { badge: string; facility: string };
  member_removed: { badge: string; facility: string };
  policy_changed: { facility: string; from: Json; to: Json; reason: string };
  engine_registered: { engineVersion: string; sha256: string };
  second_look_done: { equation: string; resultSha256: string; differences: Json };
  replay_result: { engineVersion: string; equal: boolean; resultSha256: string; differences: Json };
  export_made: { format: string; sha256: string };
  security_digest: { events: number; lastId: number; sha256: string };
};
export type EventKind = keyof EventBodies;
