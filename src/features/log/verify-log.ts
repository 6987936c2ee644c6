/** Checking the log in the reader's own browser: every entry from the first, in order, with the same rules as everywhere. */
import { endpoints } from "@/contracts/paths";
import type { VerificationView } from "@/contracts/views";
import { getJson } from "@/features/query/fetch-json";
import { createVerification, type EntryVerdict, type LedgerVerdict } from "@/ledger/verify-ledger";
import { chainStart, verifyEntry } from "@/ledger/verify-entry";

const chunk = 250;

export type Progress = { checked: number; of: number; verdicts: EntryVerdict[] };
export type LogVerdict = LedgerVerdict & { verdicts: EntryVerdict[] };

/**
 * Fetches and checks the whole log, a run of entries at a time, so that the page stays alive and the check can be cancelled.
 *
 * The newest entry that the server names at the start must be found at its place: a log whose end was cut off between two answers shows.
 */
export async function verifyLog(onProgress: (progress: Progress) => void, signal: AbortSignal): Promise<LogVerdict> {
  const verdicts: EntryVerdict[] = [];
  let page = await pageFrom(1, signal);
  const { origin, head } = page;
  const run = createVerification({
    origin,
    knownHeads: head.seq > 0 ? [head] : [],
    onEntry: (verdict) => verdicts.push(verdict),
  });
  while (page.rows.length > 0) {
    for (const row of page.rows) run.push(row);
    onProgress({ checked: verdicts.length, of: Math.max(head.seq, verdicts.length), verdicts: [...verdicts] });
    const last = page.rows.at(-1)?.seq ?? 0;
    // Entries may be added while we read; they are checked too, until there are none left.
    page = await pageFrom(last + 1, signal);
  }
  return { ...run.finish(), verdicts };
}

export type OneVerdict = EntryVerdict & { withheld: boolean; first: boolean };

/**
 * Checks one entry: that its envelope hashes to its seal, that it holds the seal of the entry before it as that entry itself hashes, and
 * that its body is the one committed to. Says nothing of the entries further back.
 */
export async function verifyOne(seq: number, signal?: AbortSignal): Promise<OneVerdict> {
  const from = Math.max(1, seq - 1);
  const { origin, rows } = await pageFrom(from, signal, seq - from + 1);
  const entry = rows.find((row) => row.seq === seq);
  if (!entry) return { seq, holds: false, faults: [`The server has no entry ${seq}.`], withheld: false, first: seq === 1 };
  const before = rows.find((row) => row.seq === seq - 1);
  if (seq > 1 && !before) return { seq, holds: false, faults: [`Entry ${seq - 1} is missing.`], withheld: false, first: false };
  const point = before ? verifyEntry(before, { size: before.seq - 1, hash: "", at: "" }).next : chainStart(origin);
  const { faults } = verifyEntry(entry, point);
  return { seq, holds: faults.length === 0, faults, withheld: entry.body === "withheld", first: seq === 1 };
}

const pageFrom = (from: number, signal?: AbortSignal, limit = chunk) =>
  getJson<VerificationView>(`${endpoints.verification}?from=${from}&limit=${limit}`, signal);
