import { createFold, type Fold } from "./fold";
import { type ChainPoint, chainStart, type StoredEntry, verifyEntry } from "./verify-entry";

export type EntryVerdict = { seq: number; holds: boolean; faults: string[] };

export type LedgerVerdict = {
  /** Entries seen. */
  size: number;
  head: string;
  holds: boolean;
  /** Entries that do not hold, with what is wrong, at most the first thousand. */
  broken: EntryVerdict[];
  brokenCount: number;
  /** What is wrong with the whole rather than with one entry. */
  faults: string[];
  /** Bodies this reader could not see, so that nobody takes them for checked. */
  withheld: number;
  /** The entry up to which the story was followed: who held which role, who decided on what. Less than `size` where a body can't be read. */
  storyUpTo: number;
  fold: Fold;
};

export type VerifyOptions = {
  origin: string;
  /** A head known from elsewhere: a printed record, a receipt, the database's head row. Without one a cut tail can't be seen. */
  knownHeads?: { seq: number; hash: string }[];
  /** Called after each entry; for progress. */
  onEntry?: (verdict: EntryVerdict) => void;
};

/**
 * Verifies a whole ledger, entry by entry, in order and from the first, in constant memory but for the states it folds.
 *
 * Source   docs/log-format.md
 * entries  every entry from 1 on
 * Returns  what holds and what does not, each fault a sentence
 */
export async function verifyLedger(
  entries: Iterable<StoredEntry> | AsyncIterable<StoredEntry>,
  options: VerifyOptions,
): Promise<LedgerVerdict> {
  const run = createVerification(options);
  for await (const entry of entries) run.push(entry);
  return run.finish();
}

/** The same, for callers that get the entries piece by piece. */
export function createVerification({ origin, knownHeads = [], onEntry }: VerifyOptions) {
  let point: ChainPoint = chainStart(origin);
  let withheld = 0;
  let brokenCount = 0;
  const broken: EntryVerdict[] = [];
  const fold = createFold();
  const waiting = new Map(knownHeads.map(({ seq, hash }) => [seq, hash]));
  const faults: string[] = [];
  let storyUpTo = 0;
  let storyKnown = true;

  const push = (entry: StoredEntry): EntryVerdict => {
    const check = verifyEntry(entry, point);
    point = check.next;
    if (entry.body === "withheld") withheld += 1;
    if (storyKnown) {
      const told = check.envelope && fold.push(check.envelope, check.body);
      storyKnown = told !== undefined;
      if (told) {
        check.faults.push(...told);
        storyUpTo = entry.seq;
      }
    }
    const known = waiting.get(entry.seq);
    if (known !== undefined) {
      waiting.delete(entry.seq);
      if (known !== entry.hash) faults.push(`Entry ${entry.seq} is another than the one known from elsewhere.`);
    }
    const verdict = { seq: entry.seq, holds: check.faults.length === 0, faults: check.faults };
    if (!verdict.holds) {
      brokenCount += 1;
      if (broken.length < 1000) broken.push(verdict);
    }
    onEntry?.(verdict);
    return verdict;
  };

  const finish = (): LedgerVerdict => {
    if (point.size === 0) faults.push("There is no entry at all.");
    for (const seq of waiting.keys()) {
      faults.push(`The ledger ends at entry ${point.size}; entry ${seq} is known from elsewhere, so its end was cut off.`);
    }
    waiting.clear();
    return {
      size: point.size,
      head: point.hash,
      holds: brokenCount === 0 && faults.length === 0,
      broken,
      brokenCount,
      faults: [...faults],
      withheld,
      storyUpTo,
      fold: fold.state,
    };
  };

  return { push, finish };
}
