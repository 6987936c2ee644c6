import { bodyCommitment } from "./body";
import { parseCanonicalJson } from "./strict-json";
import { isEntryKind, subjectFits } from "./entry-kinds";
import { type Envelope, genesisPrev, leafHash, parseEnvelope } from "./envelope";

/** An entry as it was stored. Mirrors are the columns that lists filter by; they must say what the envelope says. */
export type StoredEntry = {
  seq: number;
  envelope: string;
  hash: string;
  mirrors?: { kind: string; actor: string; subject: string; at: string };
  /** "withheld": this reader may not see it, so it is not judged. "redacted": taken out by an entry that says so. */
  body: { saltHex: string; text: string } | "withheld" | "redacted";
};

/** Where the chain stands before an entry. */
export type ChainPoint = { size: number; hash: string; at: string };

export const chainStart = (origin: string): ChainPoint => ({ size: 0, hash: genesisPrev(origin), at: "" });

export type EntryCheck = {
  envelope: Envelope | undefined;
  body: Record<string, unknown> | undefined;
  faults: string[];
  next: ChainPoint;
};

/**
 * Holds one stored entry against the entry before it. Reads nothing but its arguments; every fault is a sentence.
 *
 * The chain goes on from what the entry itself hashes to, so that one altered entry shows as one, and as a broken link at the next.
 */
export function verifyEntry(entry: StoredEntry, before: ChainPoint): EntryCheck {
  const faults: string[] = [];
  const leaf = leafHash(entry.envelope);
  const envelope = parseEnvelope(entry.envelope);
  if (leaf !== entry.hash) faults.push("The envelope does not hash to the stored hash.");
  if (entry.seq !== before.size + 1) faults.push(gap(before.size, entry.seq));

  if (!envelope) {
    faults.push("The envelope is not written in the form of version 1.");
    return { envelope, body: undefined, faults, next: { size: entry.seq, hash: leaf, at: before.at } };
  }
  if (envelope.seq !== entry.seq) faults.push(`The envelope calls itself entry ${envelope.seq}.`);
  if (envelope.prev !== before.hash) {
    faults.push(
      before.size === 0 ? "The first entry does not start from the origin." : `The link to entry ${before.size} is broken.`,
    );
  }
  if (envelope.at < before.at) faults.push("The time runs backwards.");
  if (!isEntryKind(envelope.kind)) faults.push(`There is no entry kind "${envelope.kind}" in this version.`);
  else if (!subjectFits(envelope.kind, envelope.subject))
    faults.push(`An entry of kind ${envelope.kind} can't be about ${envelope.subject}.`);
  faults.push(...mirrorFaults(entry, envelope));

  const { body, fault } = readBody(entry, envelope);
  if (fault) faults.push(fault);
  return { envelope, body, faults, next: { size: entry.seq, hash: leaf, at: envelope.at } };
}

function gap(size: number, seq: number): string {
  if (seq <= size) return `Entry ${seq} stands after entry ${size}.`;
  return seq === size + 2 ? `Entry ${size + 1} is missing.` : `Entries ${size + 1} to ${seq - 1} are missing.`;
}

function mirrorFaults({ mirrors }: StoredEntry, envelope: Envelope): string[] {
  if (!mirrors) return [];
  return (["kind", "actor", "subject", "at"] as const)
    .filter((key) => mirrors[key] !== envelope[key])
    .map((key) => `The list says ${key} ${mirrors[key]}; the envelope says ${envelope[key]}.`);
}

function readBody({ body }: StoredEntry, envelope: Envelope): { body?: Record<string, unknown>; fault?: string } {
  if (body === "withheld") return {};
  // Nothing in this version can redact, so a body that is gone is a fault.
  if (body === "redacted") return { fault: "The body is gone, and no entry says that it was redacted." };
  if (!/^[0-9a-f]{64}$/.test(body.saltHex)) return { fault: "The salt is not 32 bytes." };
  if (bodyCommitment(body.saltHex, body.text) !== envelope.body)
    return { fault: "The body is not the one the envelope commits to." };
  try {
    const value = parseCanonicalJson(body.text);
    if (value !== null && typeof value === "object" && !Array.isArray(value)) return { body: value as Record<string, unknown> };
    return { fault: "The body is not an object." };
  } catch (error) {
    return { fault: `The body ${error instanceof Error ? error.message : String(error)}.` };
  }
}
