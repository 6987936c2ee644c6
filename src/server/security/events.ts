import "server-only";
import { securityEvent } from "@db/schema/app/security-event";
import { writeDatabase } from "@/server/database";

/** Closed list, so that a reader of the security log knows every word in it. */
export type SecurityEventKind =
  | "signed-in"
  | "sign-in-failed"
  | "sign-in-locked"
  | "sign-in-disabled"
  | "signed-out"
  | "session-ended"
  | "password-changed"
  | "password-set"
  | "signature-password-failed";

/** Adds a line to the security log. `details` never hold a secret. */
export async function noteSecurityEvent(
  kind: SecurityEventKind,
  personId: string | null,
  details: Record<string, string | number> = {},
): Promise<void> {
  await writeDatabase().insert(securityEvent).values({ kind, personId, details });
}
