import { sha256Hex } from "./sha256";

/** What the database says about an entry; it composes this itself, under a lock. Keys in canonical order. */
export type Envelope = {
  /** A person id, or "system". */
  actor: string;
  /** UTC, microseconds: 2026-12-01T15:40:12.481233Z. */
  at: string;
  /** Body commitment, hex. */
  body: string;
  idem: string;
  kind: string;
  /** Leaf hash of the entry before, hex. */
  prev: string;
  seq: number;
  subject: string;
  v: 1;
};

const form = new RegExp(
  '^\\{"actor":"([0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}|system)"' +
    ',"at":"([0-9]{4}-[0-9]{2}-[0-9]{2}T[0-9]{2}:[0-9]{2}:[0-9]{2}\\.[0-9]{6}Z)"' +
    ',"body":"([0-9a-f]{64})"' +
    ',"idem":"([A-Za-z0-9._:-]{8,120})"' +
    ',"kind":"([a-z][a-z_]{2,39})"' +
    ',"prev":"([0-9a-f]{64})"' +
    ',"seq":([1-9][0-9]{0,15})' +
    ',"subject":"([a-z]+(?::[A-Za-z0-9._-]{1,80}){0,3})"' +
    ',"v":1\\}$',
);

/**
 * Reads the text of an envelope. The form leaves one way to write each envelope, so reading is also the check of its bytes.
 * Returns undefined when the text is not an envelope of version 1.
 */
export function parseEnvelope(text: string): Envelope | undefined {
  const [, actor, at, body, idem, kind, prev, seq, subject] = form.exec(text) ?? [];
  if (!actor || !at || !body || !idem || !kind || !prev || !seq || !subject) return undefined;
  const number = Number(seq);
  if (!Number.isSafeInteger(number)) return undefined;
  return { actor, at, body, idem, kind, prev, seq: number, subject, v: 1 };
}

export function serialiseEnvelope({ actor, at, body, idem, kind, prev, seq, subject, v }: Envelope): string {
  const text = JSON.stringify({ actor, at, body, idem, kind, prev, seq, subject, v });
  if (!parseEnvelope(text)) throw new RangeError("A field of the envelope has characters outside its class.");
  return text;
}

/** Leaf hash: SHA-256(0x00 ‖ envelope), hex. The prefix is that of a leaf in RFC 6962, so a Merkle tree can be grown over the entries. */
export const leafHash = (envelope: string): string => sha256Hex(Uint8Array.of(0), envelope);

/** `prev` of the first entry: SHA-256 of the origin string. */
export const genesisPrev = (origin: string): string => sha256Hex(origin);
