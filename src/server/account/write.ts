import "server-only";
import { eq, sql } from "drizzle-orm";
import { credential, personSetting } from "@db/schema/app/account";
import type { ChangePassword, Preferences } from "@/contracts/requests";
import { authorise } from "@/server/auth/authorise";
import { checkNewPassword, hashPassword } from "@/server/auth/passwords";
import { endSession, endSessions } from "@/server/auth/session";
import type { Viewer } from "@/server/auth/viewer";
import { writeDatabase } from "@/server/database";
import { Refusal } from "@/server/refusal";
import { noteSecurityEvent } from "@/server/security/events";
import { provePassword } from "@/server/session/write";

/** Changes the viewer's own password. Every other session of theirs ends. */
export async function changePassword(viewer: Viewer, { current, next }: ChangePassword): Promise<void> {
  authorise(viewer, "account.change", { personId: viewer.id });
  checkNewPassword(next, viewer, "next");
  await provePassword(viewer, current, "sign-in-failed");
  if (current.normalize("NFKC") === next.normalize("NFKC")) {
    throw new Refusal("invalid-request", {
      problems: [{ path: "next", message: "This is the password in use. Choose another." }],
    });
  }
  const passwordHash = await hashPassword(next);
  await writeDatabase()
    .update(credential)
    .set({ passwordHash, mustChange: false, changedAt: sql`now()` })
    .where(eq(credential.personId, viewer.id));
  await endSessions(viewer.id, viewer.sessionId);
  await noteSecurityEvent("password-changed", viewer.id);
}

export async function changePreferences(viewer: Viewer, preferences: Preferences): Promise<void> {
  authorise(viewer, "account.change", { personId: viewer.id });
  if (Object.keys(preferences).length === 0) return;
  await writeDatabase()
    .insert(personSetting)
    .values({ personId: viewer.id, ...preferences })
    .onConflictDoUpdate({ target: personSetting.personId, set: preferences });
}

/** Ends one of the viewer's own sessions. */
export async function endOwnSession(viewer: Viewer, sessionId: string): Promise<void> {
  authorise(viewer, "account.change", { personId: viewer.id });
  if (!(await endSession(viewer.id, sessionId))) throw new Refusal("not-found");
  await noteSecurityEvent("session-ended", viewer.id);
}
