import "server-only";
import { and, desc, eq, lt } from "drizzle-orm";
import { asPerson, type DatabaseUrls } from "@db/clients";
import type { Database } from "@db/clients";
import { ceremony } from "@db/schema/app/ceremony";
import { draft } from "@db/schema/app/draft";
import { screening } from "@db/schema/app/screening";
import { content, entry, revision } from "@db/schema/ledger/entry";
import { person } from "@db/schema/ledger/person";
import { type RecordContent, recordContentSchema } from "@/contracts/record-content";
import type { AcknowledgedCaution, SigningAct, SigningMethod, SigningPerson } from "@/ledger/statements";
import { meanings } from "@/ledger/statements";
import { Refusal } from "../refusal";
import { recordName } from "@/contracts/record-name";

/** One database for each login. */
export type Databases = Record<keyof DatabaseUrls, Database>;

/** What every signing request names. */
export type SigningRequest = {
  personId: string;
  screeningId: string;
  rev: number;
  nonce: string;
  idempotencyKey: string;
  /** The hash the signing page showed. */
  shownSha256: string;
  /** How the person proved who they are, in the words shown. */
  factor: string;
};

/** The members that all statements share, from what the database knows now. */
export async function commonStatement<Act extends SigningAct>({ read, write }: Databases, act: Act, request: SigningRequest) {
  const [who, [what], [open]] = await Promise.all([
    signingPerson(read, request.personId),
    read.select({ number: screening.number }).from(screening).where(eq(screening.id, request.screeningId)),
    write.select({ method: ceremony.method }).from(ceremony).where(eq(ceremony.nonce, request.nonce)),
  ]);
  if (!what) throw new Refusal("not-found", { detail: "There is no such screening." });
  if (!open?.method)
    throw new Refusal("ceremony-expired", { detail: "The signing page is not open, or the password was not given again." });
  return {
    act,
    authentication: { method: open.method satisfies SigningMethod },
    content: { sha256: request.shownSha256 },
    factor: request.factor,
    meaning: meanings[act],
    nonce: request.nonce,
    person: who,
    screening: { id: request.screeningId, record: recordName(what.number), rev: request.rev },
  };
}

async function signingPerson(read: Database, personId: string): Promise<SigningPerson> {
  const [found] = await read
    .select({ badge: person.badge, id: person.id, printedName: person.printedName, role: person.role })
    .from(person)
    .where(eq(person.id, personId));
  if (!found) throw new Refusal("not-allowed", { detail: "There is no such person." });
  return found;
}

/** The record content that a hash names, from its stored bytes. */
export async function storedRecordContent(read: Database, sha256: string): Promise<RecordContent> {
  const [stored] = await read.select({ bytes: content.bytes }).from(content).where(eq(content.sha256, sha256));
  if (!stored) throw new Refusal("content-changed", { detail: "The content shown is not stored." });
  return recordContentSchema.parse(JSON.parse(stored.bytes.toString("utf8")));
}

/** The cautions in the words shown, once each of them was ticked. */
export function acknowledgedCautions({ cautions }: RecordContent, acknowledged: string[]): AcknowledgedCaution[] {
  const missing = cautions.filter(({ id }) => !acknowledged.includes(id)).map(({ id }) => id);
  if (missing.length > 0) throw new Refusal("invalid-request", { detail: `Acknowledge ${missing.join(", ")} first.` });
  return cautions;
}

/** All who worked on a draft in order of id, and what the draft replaces. */
export async function draftFacts(read: Database, { personId, screeningId, rev }: SigningRequest) {
  const [found] = await asPerson(read, personId, (transaction) =>
    transaction
      .select({ contributors: draft.contributors, reason: draft.reason })
      .from(draft)
      .where(and(eq(draft.screeningId, screeningId), eq(draft.rev, rev))),
  );
  if (!found) throw new Refusal("not-found", { detail: "There is no such draft in a facility of this person." });
  const [before] = await read
    .select({ contentSha256: revision.contentSha256, rev: revision.rev })
    .from(revision)
    .where(and(eq(revision.screeningId, screeningId), lt(revision.rev, rev)))
    .orderBy(desc(revision.rev))
    .limit(1);
  return {
    contributors: [...found.contributors].sort(),
    replaces: before ? { contentSha256: before.contentSha256, reason: found.reason ?? "", rev: before.rev } : null,
  };
}

/** The signature a decision is about. */
export async function signedEntry(read: Database, { screeningId, rev }: SigningRequest): Promise<{ leaf: string; seq: number }> {
  const [found] = await read
    .select({ seq: entry.seq, hash: entry.hash })
    .from(revision)
    .innerJoin(entry, eq(entry.seq, revision.signedSeq))
    .where(and(eq(revision.screeningId, screeningId), eq(revision.rev, rev)));
  if (!found) throw new Refusal("not-found", { detail: "There is no such signed revision." });
  return { leaf: found.hash.toString("hex"), seq: found.seq };
}
