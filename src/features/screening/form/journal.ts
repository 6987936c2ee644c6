/**
 * What was typed and not yet kept by the server, written down in the browser at every change, so that a reload, a crash or a dropped
 * connection loses nothing. One page per draft; it is torn out once the server has the draft.
 */
import { z } from "zod";
import { draftDocumentSchema } from "@/contracts/draft";

const pageSchema = z.strictObject({
  /** Version of the server's draft that this was typed on. */
  baseVersion: z.int(),
  base: draftDocumentSchema,
  document: draftDocumentSchema,
  at: z.string(),
});
export type JournalPage = z.infer<typeof pageSchema>;

const nameOf = (screeningId: string, rev: number) => `ebbmark-journal/${screeningId}/${rev}`;

type Store = Pick<Storage, "getItem" | "setItem" | "removeItem">;

/** Undefined when there is none, or when it can't be read (it is then removed: it would never be readable). */
export function readJournal(store: Store, screeningId: string, rev: number): JournalPage | undefined {
  const name = nameOf(screeningId, rev);
  const text = store.getItem(name);
  if (text === null) return undefined;
  try {
    return pageSchema.parse(JSON.parse(text));
  } catch {
    store.removeItem(name);
    return undefined;
  }
}

/** False when the browser has no room or no right to store; the form then says that only the server keeps the lines. */
export function writeJournal(store: Store, screeningId: string, rev: number, page: JournalPage): boolean {
  try {
    store.setItem(nameOf(screeningId, rev), JSON.stringify(page));
    return true;
  } catch {
    return false;
  }
}

export const tearOut = (store: Store, screeningId: string, rev: number): void => store.removeItem(nameOf(screeningId, rev));
