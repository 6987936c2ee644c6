import "server-only";
import { and, desc, eq, sql, type SQL } from "drizzle-orm";
import { draft } from "@db/schema/app/draft";
import { screening } from "@db/schema/app/screening";
import { revision } from "@db/schema/ledger/entry";
import type { DeskView } from "@/contracts/views";
import { authorise, mayDo } from "@/server/auth/authorise";
import type { Viewer } from "@/server/auth/viewer";
import { readDatabase } from "@/server/database";
import { getHead } from "@/server/ledger/read";
import { reading } from "@/server/reading";
import { scopeOf, workedOnBy } from "@/server/screenings/list";
import { selectRows, stateOf, toRow, type FoundRow } from "@/server/screenings/rows";

const mostRows = 50;

/** What waits on the viewer, what they work on, and how far the log has come. */
export async function getDesk(viewer: Viewer): Promise<DeskView> {
  authorise(viewer, "desk.read");
  const { size, hash, at } = await getHead(readDatabase());
  const log = { size, headHash: hash, lastAt: at };
  switch (viewer.role) {
    case "engineer":
      return { ...(await engineerDesk(viewer)), log };
    case "approver":
      return { ...(await approverDesk(viewer)), log };
    case "auditor":
      return { waits: [], yours: (await rowsWhere(viewer, undefined)).map(toRow), log };
    default:
      return { waits: [], yours: [], log };
  }
}

async function engineerDesk(viewer: Viewer): Promise<Pick<DeskView, "waits" | "yours">> {
  const rows = await rowsWhere(viewer, workedOnBy(viewer));
  const waits = rows.flatMap((row) => {
    const why = { returned: "Returned with remarks to answer.", computed: "Computed; review and sign." }[row.state as string];
    return why ? [{ ...toRow(row), why }] : [];
  });
  return { waits, yours: rows.map(toRow) };
}

async function approverDesk(viewer: Viewer): Promise<Pick<DeskView, "waits" | "yours">> {
  const signed = await rowsWhere(viewer, sql`${stateOf} = 'signed'`);
  const decides = ({ facility, contributors, author }: FoundRow) =>
    mayDo(viewer, "screening.countersign", { facilityId: facility.id, contributors, authorId: author.id });
  return {
    waits: signed
      .filter(decides)
      .map((row) => ({ ...toRow(row), why: `Signed by ${row.author.badge}; waits for your countersign.` })),
    yours: (await rowsWhere(viewer, eq(revision.decidedBy, viewer.id))).map(toRow),
  };
}

function rowsWhere(viewer: Viewer, where: SQL | undefined): Promise<FoundRow[]> {
  const scope = scopeOf(viewer);
  return reading(
    viewer,
    (transaction) =>
      selectRows(transaction, scope.which, and(scope.where, where))
        .orderBy(desc(draft.updatedAt), desc(screening.number))
        .limit(mostRows),
    scope.which === "signed" ? { beyondDrafts: true } : {},
  );
}
