import { faultOfText } from "./text-rules";

/** What JSON can say and a record may hold. */
export type Json = null | boolean | number | string | readonly Json[] | { readonly [key: string]: Json };

export class CanonicalError extends Error {
  override name = "CanonicalError";
  constructor(
    readonly path: string,
    readonly fault: string,
  ) {
    super(`${path || "the value"} ${fault}`);
  }
}

export const maxDepth = 32;
export const maxBytes = 1_048_576;

/**
 * Canonical JSON text of a value.
 *
 * Source   RFC 8785: keys in order of their UTF-16 units, no white space, numbers as ECMAScript writes them.
 * Holds    beyond the RFC we refuse what it would drop or let pass: undefined, functions, dates and other objects, integers beyond
 *          ±(2^53−1), texts that `faultOfText` names, depth over 32, more bytes than the limit. −0 becomes 0, as the RFC has it.
 * value    any JSON value
 * limit    bytes allowed; 1 MiB for bodies of entries, more for stored contents such as curves
 * Returns  text; its UTF-8 bytes are what is hashed
 * Throws   CanonicalError with the path of the offending member
 */
export function canonicalJson(value: Json, limit = maxBytes): string {
  const text = write(value, "", 1);
  // UTF-8 is never shorter than UTF-16 counts units, so the cheap test comes first.
  if (text.length > limit || new TextEncoder().encode(text).length > limit) {
    throw new CanonicalError("", `is larger than ${limit / 1_048_576} MiB`);
  }
  return text;
}

function write(value: unknown, path: string, depth: number): string {
  if (depth > maxDepth) throw new CanonicalError(path, `is nested more than ${maxDepth} deep`);
  switch (typeof value) {
    case "boolean":
      return String(value);
    case "number":
      return writeNumber(value, path);
    case "string":
      return writeText(value, path);
    case "object":
      if (value === null) return "null";
      if (Array.isArray(value)) return writeArray(value, path, depth);
      return writeObject(value, path, depth);
    default:
      throw new CanonicalError(path, `is ${typeof value}, which JSON can't say`);
  }
}

function writeNumber(value: number, path: string): string {
  if (!Number.isFinite(value)) throw new CanonicalError(path, "is not a finite number");
  if (Number.isInteger(value) && Math.abs(value) > Number.MAX_SAFE_INTEGER && Math.abs(value) < 1e21) {
    throw new CanonicalError(path, "is an integer beyond ±(2^53−1)");
  }
  return JSON.stringify(value);
}

function writeText(value: string, path: string): string {
  const fault = faultOfText(value);
  if (fault) throw new CanonicalError(path, fault);
  return JSON.stringify(value);
}

function writeArray(items: unknown[], path: string, depth: number): string {
  const written: string[] = [];
  // Not `map`: it skips holes.
  for (let i = 0; i < items.length; i++) written.push(write(items[i], `${path}[${i}]`, depth + 1));
  return `[${written.join(",")}]`;
}

function writeObject(value: object, path: string, depth: number): string {
  const prototype: unknown = Object.getPrototypeOf(value);
  if (prototype !== Object.prototype && prototype !== null) throw new CanonicalError(path, "is not a plain object");
  if (Object.getOwnPropertySymbols(value).length > 0) throw new CanonicalError(path, "has a key that is not text");
  const members = Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1));
  const written = members.map(([key, member]) => {
    const at = path ? `${path}.${key}` : key;
    return `${writeText(key, at)}:${write(member, at, depth + 1)}`;
  });
  return `{${written.join(",")}}`;
}
