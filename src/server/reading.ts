import "server-only";
import { inArray, sql, type SQL } from "drizzle-orm";
import type { PgColumn } from "drizzle-orm/pg-core";
import { asPerson, type Transaction } from "@db/clients";
import { readDatabase, writeDatabase } from "./database";
import type { Viewer } from "./auth/viewer";

/**
 * Reads as the viewer: the database's own row rules apply beside the `where` of the query.
 *
 * Drafts are closed to auditors by those rules, yet lists of signed records need the summary kept with the frozen draft. Such reads pass
 * `beyondDrafts` and limit themselves to signed revisions in their `where`.
 */
export function reading<T>(
  viewer: Viewer,
  work: (transaction: Transaction) => Promise<T>,
  options: { beyondDrafts?: true } = {},
): Promise<T> {
  return asPerson(readDatabase(), options.beyondDrafts ? "system" : viewer.id, work);
}

export function writing<T>(viewer: Viewer, work: (transaction: Transaction) => Promise<T>): Promise<T> {
  return asPerson(writeDatabase(), viewer.id, work);
}

/** The part of a `where` that keeps a list within reach: everything, or these facilities, or nothing at all. */
export function within(reach: "all" | ReadonlySet<string>, facilityId: PgColumn): SQL | undefined {
  if (reach === "all") return undefined;
  return reach.size === 0 ? sql`false` : inArray(facilityId, [...reach]);
}

const uuid = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i;

/** What is no id can't be there; asking the database would end in a fault instead of a "not found". */
export const isId = (text: string): boolean => uuid.test(text);
