import "server-only";
import { and, count, desc, eq, lt, or, sql, type SQL } from "drizzle-orm";
import { draft } from "@db/schema/app/draft";
import { screening } from "@db/schema/app/screening";
import { section } from "@db/schema/app/section";
import { recordNumber } from "@/contracts/record-name";
import type { ScreeningFilter } from "@/contracts/requests";
import type { Page, ScreeningRow } from "@/contracts/views";
import { reachOf } from "@/server/auth/authorise";
import type { Viewer } from "@/server/auth/viewer";
import { isId, reading, within } from "@/server/reading";
import { selectRows, stateOf, toRow } from "./rows";

/**
 * One row a screening, newest number first, at its newest revision that the viewer may see: members see drafts, auditors what was signed.
 * Paged by number: `next` is the `before` of the following page.
 */
export async function listScreenings(viewer: Viewer, filter: Partial<ScreeningFilter> = {}): Promise<Page<ScreeningRow>> {
  const { limit = 50, before } = filter;
  const scope = scopeOf(viewer);
  const matching = and(scope.where, ...conditions(filter));

  return reading(
    viewer,
    async (transaction) => {
      const found = await selectRows(transaction, scope.which, and(matching, before ? lt(screening.number, before) : undefined))
        .orderBy(desc(screening.number))
        .limit(limit + 1);
      const all = selectRows(transaction, scope.which, matching).as("matching");
      const [counted] = await transaction.select({ total: count() }).from(all);
      const rows = found.slice(0, limit);
      return {
        rows: rows.map(toRow),
        total: counted?.total ?? 0,
        next: found.length > limit ? (rows.at(-1)?.number ?? null) : null,
      };
    },
    scope.which === "signed" ? { beyondDrafts: true } : {},
  );
}

/** Which screenings the viewer may list, and whether drafts count. */
export function scopeOf(viewer: Viewer): { which: "any" | "signed"; where: SQL | undefined } {
  const reach = reachOf(viewer, "screening.list");
  return { which: reach === "all" ? "signed" : "any", where: within(reach, section.facilityId) };
}

function conditions({ sectionId, facilityId, state, text }: Partial<ScreeningFilter>): (SQL | undefined)[] {
  const like = text ? `%${text.replace(/[\\%_]/g, "\\$&")}%` : undefined;
  const number = text ? recordNumber(text) : undefined;
  return [
    sectionId ? (isId(sectionId) ? eq(screening.sectionId, sectionId) : sql`false`) : undefined,
    facilityId ? (isId(facilityId) ? eq(section.facilityId, facilityId) : sql`false`) : undefined,
    state ? sql`${stateOf} = ${state}` : undefined,
    like
      ? or(
          sql`${screening.title} ilike ${like}`,
          sql`${section.tag} ilike ${like}`,
          sql`${section.name} ilike ${like}`,
          number ? eq(screening.number, number) : undefined,
        )
      : undefined,
  ];
}

/** Screenings whose newest revision the viewer began or worked on. */
export const workedOnBy = (viewer: Viewer): SQL => sql`${viewer.id} = any(${draft.contributors})`;
