import "server-only";
import { asc, inArray } from "drizzle-orm";
import { facility } from "@db/schema/app/facility";
import type { AccountView } from "@/contracts/views";
import { authorise } from "@/server/auth/authorise";
import { listSessions } from "@/server/auth/session";
import { viewerView, type Viewer } from "@/server/auth/viewer";
import { readDatabase } from "@/server/database";

/** The viewer's own account: facilities and open sessions. */
export async function getAccount(viewer: Viewer): Promise<AccountView> {
  authorise(viewer, "account.read", { personId: viewer.id });
  const ids = [...viewer.facilityIds];
  const [facilities, sessions] = await Promise.all([
    ids.length === 0
      ? []
      : readDatabase()
          .select({ id: facility.id, name: facility.name })
          .from(facility)
          .where(inArray(facility.id, ids))
          .orderBy(asc(facility.name)),
    listSessions(viewer.id),
  ]);
  return {
    person: viewerView(viewer),
    facilities,
    sessions: sessions.map(({ id, createdAt, lastSeenAt, userAgent }) => ({
      id,
      startedAt: createdAt.toISOString(),
      lastSeenAt: lastSeenAt.toISOString(),
      browser: userAgent,
      current: id === viewer.sessionId,
    })),
  };
}
