import "server-only";
import { type SQL, sql } from "drizzle-orm";
import type { Database } from "@db/clients";
import { canonicalJson, type Json } from "@/ledger/canonical-json";
import type {
  CountersignStatement,
  EventBodies,
  EventKind,
  ReturnStatement,
  SignStatement,
  Statement,
  TwoPersonRule,
  WithdrawStatement,
} from "@/ledger/statements";
import { callLedger, type Receipt, type ReceiptMail } from "./call";
import { asRefusal } from "./as-refusal";
import {
  acknowledgedCautions,
  commonStatement,
  type Databases,
  draftFacts,
  signedEntry,
  type SigningRequest,
  storedRecordContent,
} from "./statement";

/*
 * Acts of the record. Callers have authorised them and have proved the open signing page (`proveCeremony`); the database checks all of it
 * again and files entry, state and mail together or not at all. All throw Refusal.
 */

/** Stores bytes under their own SHA-256 and returns it. Storing the same bytes again is no change. */
export async function putContent(writeDatabase: Database, mediaType: string, bytes: Uint8Array | string): Promise<string> {
  const stored = Buffer.from(bytes);
  try {
    const { rows } = await writeDatabase.execute<{ sha256: string }>(
      sql`select ledger.put_content(${mediaType}, ${stored}) as sha256`,
    );
    return rows[0]!.sha256;
  } catch (error) {
    throw asRefusal(error);
  }
}

export async function signRevision(
  databases: Databases,
  request: SigningRequest & { acknowledged: string[]; mail?: ReceiptMail[] },
): Promise<Receipt> {
  const [common, content, facts] = await Promise.all([
    commonStatement(databases, "sign", request),
    storedRecordContent(databases.read, request.shownSha256),
    draftFacts(databases.read, request),
  ]);
  const statement: SignStatement = {
    ...common,
    ...facts,
    cautions: acknowledgedCautions(content, request.acknowledged),
    engineVersion: content.engineVersion,
    sentence: content.sentence,
    verdict: content.verdict,
  };
  return file(databases, sql`ledger.sign`, request, statement);
}

export async function countersignRevision(
  databases: Databases,
  request: SigningRequest & { acknowledged: string[]; conditions: string[]; mail?: ReceiptMail[] },
): Promise<Receipt> {
  const [common, content, signed] = await Promise.all([
    commonStatement(databases, "countersign", request),
    storedRecordContent(databases.read, request.shownSha256),
    signedEntry(databases.read, request),
  ]);
  const cautions = acknowledgedCautions(content, request.acknowledged);
  const statement: CountersignStatement = { ...common, cautions, conditions: request.conditions, signed };
  return file(databases, sql`ledger.countersign`, request, statement);
}

export async function returnRevision(
  databases: Databases,
  request: SigningRequest & { remarks: { line: string; text: string }[]; mail?: ReceiptMail[] },
): Promise<Receipt> {
  const [common, signed] = await Promise.all([
    commonStatement(databases, "return", request),
    signedEntry(databases.read, request),
  ]);
  const statement: ReturnStatement = { ...common, remarks: request.remarks, signed };
  return file(databases, sql`ledger.return_`, request, statement);
}

export async function withdrawRevision(
  databases: Databases,
  request: SigningRequest & { reason: string; mail?: ReceiptMail[] },
): Promise<Receipt> {
  const statement: WithdrawStatement = { ...(await commonStatement(databases, "withdraw", request)), reason: request.reason };
  return file(databases, sql`ledger.withdraw`, request, statement);
}

function file(
  { sign }: Databases,
  fn: SQL,
  request: SigningRequest & { mail?: ReceiptMail[] },
  statement: Statement,
): Promise<Receipt> {
  const { personId, screeningId, rev, nonce, idempotencyKey, shownSha256, mail = [] } = request;
  const body = canonicalJson(statement);
  return callLedger(
    sign,
    sql`${fn}(${personId}, ${screeningId}, ${rev}, ${nonce}, ${idempotencyKey}, ${shownSha256}, ${body}, ${JSON.stringify(mail)})`,
  );
}

/** Files an event about people, roles, memberships, policies or engines; tables of people move with it. */
export async function recordEvent<Kind extends EventKind>(
  signDatabase: Database,
  event: {
    /** A person id, or "system" where the kind allows it. */
    actor: string;
    kind: Kind;
    /** See `subjectOf` in ledger/entry-kinds.ts. */
    subject: string;
    /** 8 to 80 letters, digits, hyphens or underscores; the same for every retry of one act. */
    idempotencyKey: string;
    body: EventBodies[Kind];
    mail?: ReceiptMail[];
  },
): Promise<Receipt> {
  const { actor, kind, subject, idempotencyKey, mail = [] } = event;
  const body = canonicalJson(event.body satisfies Json);
  return callLedger(
    signDatabase,
    sql`ledger.record_event(${actor}, ${kind}, ${subject}, ${idempotencyKey}, ${body}, ${JSON.stringify(mail)})`,
  );
}

/** What an entry about a role must say of the two-person rule at this moment. */
export async function twoPersonRule(readDatabase: Database): Promise<TwoPersonRule> {
  const { rows } = await readDatabase.execute<{ bound: boolean }>(
    sql`select count(*) >= 2 as bound from ledger.person where role = 'administrator' and active`,
  );
  return rows[0]?.bound ? "bound" : "not yet bound: one administrator";
}
