import "server-only";
import { and, asc, desc, eq, gte, inArray, lt, lte, type SQL, sql } from "drizzle-orm";
import { alias } from "drizzle-orm/pg-core";
import { asPerson, type Database } from "@db/clients";
import { facility } from "@db/schema/app/facility";
import { screening } from "@db/schema/app/screening";
import { body, entry, head, origin } from "@db/schema/ledger/entry";
import { person } from "@db/schema/ledger/person";
import type { EntryRow, Page } from "@/contracts/views";
import type { StoredEntry } from "@/ledger/verify-entry";
import { entryRow } from "./entry-row";
import { entriesWithin, type LedgerReader } from "./reader";
import { recordNumber } from "@/contracts/record-name";

/** What the log can be asked for. `before` is the number of the last row of the page before. Times are UTC days, both included. */
export type EntryFilter = {
  record?: string;
  badge?: string;
  kind?: string;
  facilityId?: string;
  from?: string;
  to?: string;
  before?: number;
  limit: number;
};

export type Head = { origin: string; size: number; hash: string; at: string };

/** The newest entry, and the origin that the first one starts from. */
export async function getHead(readDatabase: Database): Promise<Head> {
  const [[start], [newest]] = await Promise.all([readDatabase.select().from(origin), readDatabase.select().from(head)]);
  return { origin: start!.origin, size: newest!.size, hash: newest!.hash.toString("hex"), at: newest!.at };
}

const about = alias(person, "about");
const columns = {
  seq: entry.seq,
  at: entry.at,
  kind: entry.kind,
  subject: entry.subject,
  hash: entry.hash,
  actorBadge: person.badge,
  aboutBadge: about.badge,
  facilityName: facility.name,
  number: screening.number,
};

/** Entries, newest first, a page at a time by entry number; never by offset. */
export async function listEntries(readDatabase: Database, reader: LedgerReader, filter: EntryFilter): Promise<Page<EntryRow>> {
  const wanted = and(entriesWithin(reader), ...conditions(filter));
  const [rows, total] = await Promise.all([
    described(readDatabase)
      .where(and(wanted, filter.before === undefined ? undefined : lt(entry.seq, filter.before)))
      .orderBy(desc(entry.seq))
      .limit(filter.limit + 1),
    wanted ? readDatabase.$count(entry, wanted) : getHead(readDatabase).then(({ size }) => size),
  ]);
  const page = rows.slice(0, filter.limit);
  return { rows: page.map(entryRow), total, next: rows.length > filter.limit ? page.at(-1)!.seq : null };
}

function described(readDatabase: Pick<Database, "select">) {
  return readDatabase
    .select(columns)
    .from(entry)
    .leftJoin(person, sql`${person.id} = case when ${entry.actor} <> 'system' then ${entry.actor}::uuid end`)
    .leftJoin(
      about,
      sql`${about.id} = case when ${entry.subject} like 'person:%' then ${entry.subjectId}::uuid
        when ${entry.subject} like 'member:%' then split_part(${entry.subject}, ':', 3)::uuid end`,
    )
    .leftJoin(
      facility,
      sql`${facility.id} = case when ${entry.subject} like 'facility:%' or ${entry.subject} like 'member:%' then ${entry.subjectId}::uuid end`,
    )
    .leftJoin(screening, sql`${screening.id} = case when ${entry.subject} like 'screening:%' then ${entry.subjectId}::uuid end`)
    .$dynamic();
}

function conditions({ record, badge, kind, facilityId, from, to }: EntryFilter): (SQL | undefined)[] {
  return [
    record === undefined
      ? undefined
      : sql`${entry.subjectId} = (select id::text from app.screening where number = ${recordNumber(record) ?? 0})`,
    badge === undefined
      ? undefined
      : sql`${entry.actor} = (select id::text from ledger.person where badge = ${badge.trim().toUpperCase()})`,
    kind === undefined ? undefined : inArray(entry.kind, kind.split(",")),
    facilityId === undefined
      ? undefined
      : sql`(${entry.subjectId} = ${facilityId} or ${entry.subjectId} in (
          select s.id::text from app.screening s join app.section c on c.id = s.section_id where c.facility_id::text = ${facilityId}))`,
    // As text: the written form sorts by time.
    from === undefined ? undefined : gte(entry.at, `${from}T00:00:00.000000Z`),
    to === undefined ? undefined : lte(entry.at, `${to}T23:59:59.999999Z`),
  ];
}

export type EntryDetail = EntryRow & {
  envelope: string;
  prev: string;
  commitment: string;
  /** See `StoredEntry`: "withheld" when this reader may not see it. */
  body: StoredEntry["body"];
  before: { seq: number; hash: string } | null;
  after: { seq: number; hash: string } | null;
};

/** One entry with its body, if the reader may see it, and its neighbours in the chain. Null when it is not there or out of reach. */
export async function getEntry(readDatabase: Database, reader: LedgerReader, seq: number): Promise<EntryDetail | null> {
  if (!Number.isSafeInteger(seq) || seq < 1) return null;
  return asPerson(readDatabase, reader.id, async (transaction) => {
    const [row] = await described(transaction).where(and(eq(entry.seq, seq), entriesWithin(reader)));
    if (!row) return null;
    const stored = await storedEntries(transaction, [seq - 1, seq, seq + 1]);
    const here = stored.find((one) => one.seq === seq)!;
    const neighbour = (at: number) => {
      const found = stored.find((one) => one.seq === at);
      return found ? { seq: found.seq, hash: found.hash } : null;
    };
    const { prev, commitment } = (
      await transaction.select({ prev: entry.prev, commitment: entry.commitment }).from(entry).where(eq(entry.seq, seq))
    )[0]!;
    return {
      ...entryRow(row),
      envelope: here.envelope,
      prev,
      commitment,
      body: here.body,
      before: neighbour(seq - 1),
      after: neighbour(seq + 1),
    };
  });
}

/**
 * A run of entries from `fromSeq` on, as `verifyLedger` takes them. The chain needs every entry, so the whole sequence of envelopes is
 * given to whoever may verify; bodies only to those who may read them.
 */
export async function listForVerification(
  readDatabase: Database,
  reader: LedgerReader,
  fromSeq: number,
  limit: number,
): Promise<StoredEntry[]> {
  return asPerson(readDatabase, reader.id, (transaction) =>
    storedEntries(transaction, { from: fromSeq, limit: Math.min(Math.max(limit, 1), 5000) }),
  );
}

async function storedEntries(
  transaction: Pick<Database, "select">,
  which: number[] | { from: number; limit: number },
): Promise<StoredEntry[]> {
  const query = transaction
    .select({
      seq: entry.seq,
      envelope: entry.envelope,
      hash: entry.hash,
      kind: entry.kind,
      actor: entry.actor,
      subject: entry.subject,
      at: entry.at,
      shown: body.seq,
      salt: body.salt,
      bytes: body.bytes,
    })
    .from(entry)
    .leftJoin(body, eq(body.seq, entry.seq))
    .orderBy(asc(entry.seq))
    .$dynamic();
  const rows = await (Array.isArray(which)
    ? query.where(inArray(entry.seq, which))
    : query.where(gte(entry.seq, which.from)).limit(which.limit));
  return rows.map(({ seq, envelope, hash, kind, actor, subject, at, shown, salt, bytes }) => ({
    seq,
    envelope,
    hash: hash.toString("hex"),
    mirrors: { kind, actor, subject, at },
    body: shown === null ? "withheld" : salt && bytes !== null ? { saltHex: salt.toString("hex"), text: bytes } : "redacted",
  }));
}
