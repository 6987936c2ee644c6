import { sha256 } from "@noble/hashes/sha2.js";
import { bytesToHex, hexToBytes, utf8ToBytes } from "@noble/hashes/utils.js";

export { bytesToHex, hexToBytes, utf8ToBytes };

/** SHA-256 (FIPS 180-4) of the parts one after the other, lower-case hex. Text counts as its UTF-8 bytes. */
export function sha256Hex(...parts: (Uint8Array | string)[]): string {
  const hash = sha256.create();
  for (const part of parts) hash.update(typeof part === "string" ? utf8ToBytes(part) : part);
  return bytesToHex(hash.digest());
}
