/**
 * What was typed and not yet kept by the server, written down in the browser at every change, so that a reload, a crash or a dropped
 * connection loses nothing. Each tab writes a page of its own per draft; it is torn out once the server has the draft.
 */
import { z } from "zod";
import { draftDocumentSchema, type DraftDocument } from "@/contracts/draft";
import { mergeDrafts, type Merge } from "./merge";

const pageSchema = z.strictObject({
  /** Version of the server's draft that this was typed on. */
  baseVersion: z.int(),
  base: draftDocumentSchema,
  document: draftDocumentSchema,
  /** Sent without hearing whether it arrived. */
  sent: z.array(draftDocumentSchema),
  at: z.string(),
});
export type JournalPage = z.infer<typeof pageSchema>;
export type FoundPage = JournalPage & { tab: string };

export type Store = Pick<Storage, "getItem" | "setItem" | "removeItem" | "key" | "length">;
/** Draft and revision that a page belongs to. */
export type JournalOf = { screeningId: string; rev: number };

const shelf = ({ screeningId, rev }: JournalOf) => `ebbmark-journal/${screeningId}/${rev}/`;

/** Pages of all tabs for one draft, oldest first. What can't be read is removed: it would never be readable. */
export function readJournal(store: Store, of: JournalOf): FoundPage[] {
  const names = Array.from({ length: store.length }, (_, at) => store.key(at)).filter((name) => name?.startsWith(shelf(of)));
  return names
    .flatMap((name) => {
      const page = name ? readPage(store, name) : undefined;
      return name && page ? [{ ...page, tab: name.slice(shelf(of).length) }] : [];
    })
    .sort((a, b) => (a.at < b.at ? -1 : 1));
}

function readPage(store: Store, name: string): JournalPage | undefined {
  try {
    return pageSchema.parse(JSON.parse(store.getItem(name) ?? "null"));
  } catch {
    store.removeItem(name);
    return undefined;
  }
}

/** False when the browser has no room or no right to store; the form then says that only the server keeps the lines. */
export function writeJournal(store: Store, of: JournalOf, tab: string, page: JournalPage): boolean {
  try {
    store.setItem(shelf(of) + tab, JSON.stringify(page));
    return true;
  } catch {
    return false;
  }
}

export const tearOut = (store: Store, of: JournalOf, tab: string): void => store.removeItem(shelf(of) + tab);

/**
 * Pages that never reached the server, brought together with what it holds now.
 *
 * pages     oldest first: where two tabs typed in one line, the later text counts
 * server    the draft as it stands there
 * Returns   the draft with all of it; lines that somebody else saved differently meanwhile are conflicts, for the person to choose
 */
export function bringBack(pages: readonly JournalPage[], server: DraftDocument): Merge {
  const conflicts = new Set<string>();
  let merged = server;
  for (const page of pages) {
    for (const line of mergeDrafts(page.base, page.document, server, page.sent).conflicts) conflicts.add(line);
    merged = mergeDrafts(page.base, page.document, merged, page.sent).merged;
  }
  return { merged, conflicts: [...conflicts], taken: [] };
}
