import { createHash, createHmac, pbkdf2Sync, randomBytes, timingSafeEqual } from "node:crypto";

const iterations = 4096; // what PostgreSQL itself uses

/**
 * A SCRAM-SHA-256 verifier as PostgreSQL stores it (RFC 5803), so that a password never travels in a statement and never meets the
 * server's log. Passwords are ASCII here, for which SASLprep changes nothing.
 */
export function scramVerifier(password: string, salt: Buffer = randomBytes(16)): string {
  const salted = pbkdf2Sync(password, salt, iterations, 32, "sha256");
  const clientKey = createHmac("sha256", salted).update("Client Key").digest();
  const storedKey = createHash("sha256").update(clientKey).digest("base64");
  const serverKey = createHmac("sha256", salted).update("Server Key").digest("base64");
  return `SCRAM-SHA-256$${iterations}:${salt.toString("base64")}$${storedKey}:${serverKey}`;
}

/** Whether a stored verifier is that of the password. */
export function scramMatches(verifier: string | null, password: string): boolean {
  const salt = verifier?.match(/^SCRAM-SHA-256\$4096:([A-Za-z0-9+/=]+)\$/)?.[1];
  if (!verifier || !salt) return false;
  const expected = Buffer.from(scramVerifier(password, Buffer.from(salt, "base64")));
  const found = Buffer.from(verifier);
  return expected.length === found.length && timingSafeEqual(expected, found);
}
