import "server-only";
import type { LogFilter } from "@/contracts/requests";
import type { EntryRow, EntryView, Page, VerificationView } from "@/contracts/views";
import { reachOf, authorise } from "@/server/auth/authorise";
import type { Viewer } from "@/server/auth/viewer";
import { readDatabase } from "@/server/database";
import { getEntry as findEntry, getHead, listEntries, listForVerification } from "@/server/ledger/read";
import { factsOf } from "./facts";

/** The log, newest first, a page at a time. Engineers and approvers see what concerns their facilities and themselves. */
export async function listLog(viewer: Viewer, filter: Partial<LogFilter> = {}): Promise<Page<EntryRow>> {
  reachOf(viewer, "log.list");
  return listEntries(readDatabase(), viewer, { limit: 50, ...filter });
}

/** One entry with its place in the chain; its body where the viewer may read it. */
export async function getEntry(viewer: Viewer, seq: number): Promise<EntryView | null> {
  reachOf(viewer, "log.read");
  const found = await findEntry(readDatabase(), viewer, seq);
  if (!found) return null;
  const { body, before, after, prev, commitment, ...row } = found;
  const open = typeof body === "object" ? body : null;
  return {
    ...row,
    prevHash: prev,
    bodySha256: commitment,
    saltHex: open?.saltHex ?? null,
    body: open?.text ?? null,
    facts: factsOf(open?.text ?? null),
    neighbours: { before, after },
  };
}

/**
 * A run of entries for checking the chain in the browser. Every envelope, because the chain needs each; bodies only where the viewer may read
 * them.
 */
export async function listVerification(
  viewer: Viewer,
  { from, limit }: { from: number; limit: number },
): Promise<VerificationView> {
  authorise(viewer, "log.verify");
  const { origin, size, hash } = await getHead(readDatabase());
  const rows = await listForVerification(readDatabase(), viewer, from, limit);
  return {
    origin,
    head: { seq: size, hash },
    rows: rows.map(({ mirrors = { kind: "", actor: "", subject: "", at: "" }, ...row }) => ({ ...row, mirrors })),
  };
}
