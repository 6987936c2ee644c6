import "server-only";
import { createHash, randomBytes } from "node:crypto";
import { and, desc, eq, gt, inArray, isNull, ne, sql } from "drizzle-orm";
import { credential, personSetting, session } from "@db/schema/app/account";
import { member, person } from "@db/schema/ledger/person";
import type { Role } from "@/contracts/roles";
import { readDatabase, writeDatabase } from "@/server/database";
import { absoluteLifeS, idleLifeS, sealSessionId, unsealSessionId } from "./cookie";

export const mostSessions = 5;
/** A session's last use is written at most this often; reading must not mean a write on every request. */
const touchEveryS = 60;

export type LoadedSession = {
  id: string;
  badge: string;
  printedName: string;
  role: Role;
  active: boolean;
  mustChangePassword: boolean;
  units: "SI" | "US";
  /** How the person likes the sheet; null where they never chose. */
  theme: "light" | "dark" | "system" | null;
  facilityIds: ReadonlySet<string>;
  sessionId: string;
};

const idHash = (id: string): string => createHash("sha256").update(id).digest("hex");

/** A session that still counts: not ended, not too old, used within the idle time. */
const alive = () =>
  and(
    isNull(session.revokedAt),
    gt(session.expiresAt, sql`now()`),
    gt(session.lastSeenAt, sql`now() - make_interval(secs => ${idleLifeS})`),
  );

/** The session behind a sealed cookie with its person as of now, or null. A disabled person has no session. */
export async function loadSession(sealed: string | undefined): Promise<LoadedSession | null> {
  const id = await unsealSessionId(sealed);
  if (!id) return null;
  const sessionId = idHash(id);
  const [row] = await writeDatabase()
    .select({
      personId: session.personId,
      idleS: sql<number>`extract(epoch from now() - ${session.lastSeenAt})::float8`,
      mustChange: credential.mustChange,
      units: personSetting.units,
      theme: personSetting.theme,
    })
    .from(session)
    .innerJoin(credential, eq(credential.personId, session.personId))
    .leftJoin(personSetting, eq(personSetting.personId, session.personId))
    .where(and(eq(session.idSha256, sessionId), alive()));
  if (!row) return null;

  const [who, facilities] = await Promise.all([
    readDatabase().select().from(person).where(eq(person.id, row.personId)),
    readDatabase().select({ id: member.facilityId }).from(member).where(eq(member.personId, row.personId)),
    row.idleS > touchEveryS
      ? writeDatabase()
          .update(session)
          .set({ lastSeenAt: sql`now()` })
          .where(eq(session.idSha256, sessionId))
      : undefined,
  ]);
  const found = who[0];
  if (!found?.active) return null;
  return {
    id: found.id,
    badge: found.badge,
    printedName: found.printedName,
    role: found.role,
    active: found.active,
    mustChangePassword: row.mustChange,
    units: row.units ?? "SI",
    theme: row.theme,
    facilityIds: new Set(facilities.map((facility) => facility.id)),
    sessionId,
  };
}

export type Browser = { userAgent: string; network: string | null };

/** Opens a session and returns the sealed cookie. The oldest sessions beyond the limit end. */
export async function openSession(personId: string, browser: Browser): Promise<string> {
  const id = randomBytes(32).toString("base64url");
  await writeDatabase().transaction(async (transaction) => {
    await transaction.insert(session).values({
      idSha256: idHash(id),
      personId,
      expiresAt: sql`now() + make_interval(secs => ${absoluteLifeS})`,
      userAgent: browser.userAgent.slice(0, 200),
      ipNet: browser.network,
    });
    const kept = await transaction
      .select({ id: session.idSha256 })
      .from(session)
      .where(and(eq(session.personId, personId), alive()))
      .orderBy(desc(session.createdAt), desc(session.idSha256));
    const over = kept.slice(mostSessions).map((row) => row.id);
    if (over.length > 0) {
      await transaction
        .update(session)
        .set({ revokedAt: sql`now()` })
        .where(inArray(session.idSha256, over));
    }
  });
  return sealSessionId(id);
}

/** Ends one session of a person. False when it was not theirs, or had ended. */
export async function endSession(personId: string, sessionId: string): Promise<boolean> {
  const ended = await writeDatabase()
    .update(session)
    .set({ revokedAt: sql`now()` })
    .where(and(eq(session.idSha256, sessionId), eq(session.personId, personId), isNull(session.revokedAt)))
    .returning({ id: session.idSha256 });
  return ended.length > 0;
}

/** Ends all sessions of a person, save perhaps the one in use. */
export async function endSessions(personId: string, exceptSessionId?: string | null): Promise<void> {
  await writeDatabase()
    .update(session)
    .set({ revokedAt: sql`now()` })
    .where(
      and(
        eq(session.personId, personId),
        isNull(session.revokedAt),
        exceptSessionId ? ne(session.idSha256, exceptSessionId) : undefined,
      ),
    );
}

export async function listSessions(personId: string) {
  return writeDatabase()
    .select({ id: session.idSha256, createdAt: session.createdAt, lastSeenAt: session.lastSeenAt, userAgent: session.userAgent })
    .from(session)
    .where(and(eq(session.personId, personId), alive()))
    .orderBy(desc(session.lastSeenAt));
}
