import "server-only";
import { eq } from "drizzle-orm";
import { ceremony, type CeremonyAct } from "@db/schema/app/ceremony";
import type { OpenCeremony } from "@/contracts/requests";
import type { CeremonyView } from "@/contracts/views";
import { meanings } from "@/ledger/statements";
import { authorise } from "@/server/auth/authorise";
import type { Act } from "@/server/auth/matrix";
import type { Viewer } from "@/server/auth/viewer";
import { writeDatabase } from "@/server/database";
import { env } from "@/server/env";
import { openCeremony, proveCeremony } from "@/server/ledger/ceremony";
import { reading } from "@/server/reading";
import { Refusal } from "@/server/refusal";
import { provePassword } from "@/server/session/write";
import { matterOf, openDraft, requireMatter, type Found } from "./matter";

/** How the person proves who they are when signing, in the words of the page. */
export const methodWords = (): string => (env().demo ? "Password again (demo policy)" : "Password again");

/**
 * Opens a signing page: five minutes, one use, for this person, session, revision and act, on the content as it is stored now.
 *
 * Throws   Refusal, with the reason why the act can't be done on this revision now
 */
export async function openSigningPage(viewer: Viewer, screeningId: string, { act, rev }: OpenCeremony): Promise<CeremonyView> {
  const found = await reading(viewer, (transaction) => requireMatter(transaction, screeningId));
  authoriseSigning(viewer, found, act, rev);
  const shownSha256 = shownContent(found, act, rev);
  const opened = await openCeremony(writeDatabase(), {
    personId: viewer.id,
    sessionIdSha256: viewer.sessionId,
    screeningId,
    rev,
    act,
    shownSha256,
  });
  return {
    nonce: opened.nonce,
    idempotencyKey: opened.idempotencyKey,
    expiresAt: opened.expiresAt.toISOString(),
    shownSha256,
    meaning: meanings[act],
    method: methodWords(),
  };
}

/** Authorises a signing act on one revision. A withdrawal is one of two acts, by what the revision is now. */
export function authoriseSigning(viewer: Viewer, found: Found, act: CeremonyAct, rev: number): void {
  // First whether it is there at all for this person, so that no refusal below tells a stranger that it is.
  authorise(viewer, "screening.read", matterOf(found));
  const state = found.signed.find((one) => one.rev === rev)?.state;
  const withdrawal: Act = state === "countersigned" ? "screening.withdraw-countersigned" : "screening.withdraw-signed";
  const acts = {
    sign: "screening.sign",
    countersign: "screening.countersign",
    return: "screening.return",
    withdraw: withdrawal,
  } as const;
  authorise(viewer, acts[act], matterOf(found, rev));
}

/** Hash of what the page shows: the computed content for a signature, the signed content for everything after it. */
function shownContent(found: Found, act: CeremonyAct, rev: number): string {
  const signed = found.signed.find((one) => one.rev === rev);
  if (act === "sign") {
    if (signed) throw new Refusal("wrong-state", { detail: "This revision is signed already." });
    const draft = openDraft(found);
    if (draft?.rev !== rev) throw new Refusal("not-found");
    if (!draft.preparedSha256 || draft.preparedVersion !== draft.version) throw new Refusal("not-computed");
    return draft.preparedSha256;
  }
  if (!signed) throw new Refusal("wrong-state", { detail: "This revision is not signed." });
  if (act !== "withdraw" && signed.state !== "signed")
    throw new Refusal("already-decided", { detail: `This revision is ${signed.state}.` });
  if (act === "withdraw" && signed.state !== "signed" && signed.state !== "countersigned") {
    throw new Refusal("wrong-state", { detail: `This revision is ${signed.state}.` });
  }
  return signed.contentSha256;
}

/**
 * The password, given again on an open page. Whether the page can still be used is asked first, so an expired page costs no attempt; a wrong
 * password leaves the page open. A page that was used already can only bring its first receipt again, so a retry is not asked twice.
 */
export async function proveOnPage(
  viewer: Viewer,
  { nonce, idempotencyKey, password }: { nonce: string; idempotencyKey: string; password: string },
): Promise<void> {
  const [open] = await writeDatabase()
    .select({
      personId: ceremony.personId,
      sessionId: ceremony.sessionId,
      key: ceremony.idempotencyKey,
      expiresAt: ceremony.expiresAt,
      usedAt: ceremony.usedAt,
    })
    .from(ceremony)
    .where(eq(ceremony.nonce, nonce));
  if (!open || open.personId !== viewer.id || open.sessionId !== viewer.sessionId || open.key !== idempotencyKey)
    throw new Refusal("ceremony-expired");
  if (open.usedAt) return;
  if (open.expiresAt <= new Date()) throw new Refusal("ceremony-expired");
  await provePassword(viewer, password, "signature-password-failed");
  await proveCeremony(writeDatabase(), { nonce, personId: viewer.id, sessionIdSha256: viewer.sessionId, method: "password" });
}
