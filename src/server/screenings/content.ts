import "server-only";
import { inArray } from "drizzle-orm";
import type { Transaction } from "@db/clients";
import { content } from "@db/schema/ledger/entry";
import { recordContentSchema, type RecordContent } from "@/contracts/record-content";
import type { CaseRunView } from "@/contracts/views";

/** Stored bytes as text, by hash. What is named and missing is a fault: bytes go in before anything names them. */
export async function storedTexts(transaction: Transaction, hashes: readonly string[]): Promise<Map<string, string>> {
  if (hashes.length === 0) return new Map();
  const rows = await transaction
    .select({ sha256: content.sha256, bytes: content.bytes })
    .from(content)
    .where(inArray(content.sha256, [...new Set(hashes)]));
  return new Map(rows.map(({ sha256, bytes }) => [sha256, bytes.toString("utf8")]));
}

export async function storedRecord(transaction: Transaction, sha256: string): Promise<RecordContent> {
  const text = (await storedTexts(transaction, [sha256])).get(sha256);
  if (text === undefined) throw new Error(`content ${sha256} is named but not stored`);
  return recordContentSchema.parse(JSON.parse(text));
}

/** Case and result of every case of a record, parsed from the stored bytes. */
export async function storedRuns(transaction: Transaction, record: RecordContent): Promise<CaseRunView[]> {
  const texts = await storedTexts(
    transaction,
    record.cases.flatMap(({ caseSha256, resultSha256 }) => [caseSha256, resultSha256]),
  );
  const parsed = <T>(sha256: string): T => {
    const text = texts.get(sha256);
    if (text === undefined) throw new Error(`content ${sha256} is named but not stored`);
    // Written by `prepareScreening` from the engine's own documents and named by hash since.
    return JSON.parse(text) as T;
  };
  return record.cases.map(({ letter, caseSha256, resultSha256 }) => ({
    letter,
    document: parsed<CaseRunView["document"]>(caseSha256),
    result: parsed<CaseRunView["result"]>(resultSha256),
  }));
}
