import "server-only";
import { eq } from "drizzle-orm";
import { credential } from "@db/schema/app/account";
import { person } from "@db/schema/ledger/person";
import type { SignIn } from "@/contracts/requests";
import { passwordHolds } from "@/server/auth/passwords";
import { endSession, openSession, type Browser } from "@/server/auth/session";
import { clearAttempts, takeAttempt } from "@/server/auth/throttle";
import { viewerFromCookie, type Viewer } from "@/server/auth/viewer";
import { authorise } from "@/server/auth/authorise";
import { readDatabase, writeDatabase } from "@/server/database";
import { Refusal } from "@/server/refusal";
import { noteSecurityEvent } from "@/server/security/events";

/**
 * Opens a session for badge and password. An unknown badge costs as much time and is counted like a known one, and gets the same words.
 *
 * Returns  the sealed cookie and the viewer
 * Throws   Refusal "wrong-credentials", "account-locked", "account-disabled"
 */
export async function signIn({ badge, password }: SignIn, browser: Browser): Promise<{ sealed: string; viewer: Viewer }> {
  const [found] = await readDatabase().select().from(person).where(eq(person.badge, badge));
  const stored = found && (await passwordHashOf(found.id));
  const key = attemptKey(badge);
  try {
    await takeAttempt(key);
  } catch (error) {
    await noteSecurityEvent("sign-in-locked", found?.id ?? null, { badge });
    throw error;
  }
  if (!(await passwordHolds(password, stored)) || !found) {
    await noteSecurityEvent("sign-in-failed", found?.id ?? null, { badge });
    throw new Refusal("wrong-credentials");
  }
  await clearAttempts(key);
  // Told only to somebody who knows the password.
  if (!found.active) {
    await noteSecurityEvent("sign-in-disabled", found.id);
    throw new Refusal("account-disabled");
  }
  const sealed = await openSession(found.id, browser);
  const viewer = await viewerFromCookie(sealed);
  if (!viewer) throw new Error("the session that was just opened can't be read");
  await noteSecurityEvent("signed-in", found.id);
  return { sealed, viewer };
}

export async function signOut(viewer: Viewer): Promise<void> {
  authorise(viewer, "session.close");
  if (viewer.sessionId) await endSession(viewer.id, viewer.sessionId);
  await noteSecurityEvent("signed-out", viewer.id);
}

/** One counter for sign-in, for the password of a signature and for the old password of a change: guesses add up. */
export const attemptKey = (badge: string): string => `badge:${badge}`;

export async function passwordHashOf(personId: string): Promise<string | undefined> {
  const [row] = await writeDatabase()
    .select({ hash: credential.passwordHash })
    .from(credential)
    .where(eq(credential.personId, personId));
  return row?.hash;
}

/**
 * The password of somebody who is signed in, asked again.
 *
 * Throws   Refusal "wrong-credentials" or "account-locked"; counted like a failed sign-in
 */
export async function provePassword(
  viewer: Viewer,
  password: string,
  failure: "signature-password-failed" | "sign-in-failed",
): Promise<void> {
  const key = attemptKey(viewer.badge);
  await takeAttempt(key);
  if (!(await passwordHolds(password, await passwordHashOf(viewer.id)))) {
    await noteSecurityEvent(failure, viewer.id);
    throw new Refusal("wrong-credentials", { detail: "The password is not right. Nothing else you entered is lost." });
  }
  await clearAttempts(key);
}
