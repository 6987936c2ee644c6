import { hexToBytes, sha256Hex } from "./sha256";

/** Commitment to a body: SHA-256("ebbmark/body/v1\n" ‖ salt ‖ body), hex. The salt keeps a short body that was redacted from being guessed. */
export function bodyCommitment(saltHex: string, body: string): string {
  if (!/^[0-9a-f]{64}$/.test(saltHex)) throw new RangeError("A salt is 32 bytes in lower-case hex.");
  return sha256Hex("ebbmark/body/v1\n", hexToBytes(saltHex), body);
}

/** Name of stored bytes: their plain SHA-256, so that any tool can check it. */
export const contentHash = (bytes: Uint8Array | string): string => sha256Hex(bytes);
