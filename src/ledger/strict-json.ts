import { CanonicalError, canonicalJson, type Json, maxBytes, maxDepth } from "./canonical-json";

/**
 * Parses JSON that somebody else wrote, refusing what `JSON.parse` lets pass: doubled keys (it keeps the last), and depth and size beyond
 * the limits. Throws CanonicalError; the syntax is JSON.parse's own.
 */
export function parseStrictJson(text: string): Json {
  if (text.length > maxBytes) throw new CanonicalError("", "is larger than 1 MiB");
  let value: Json;
  try {
    value = JSON.parse(text) as Json;
  } catch {
    throw new CanonicalError("", "is not JSON");
  }
  refuseDoubledKeys(text);
  return value;
}

/** Parses text that claims to be canonical: any byte that is not where RFC 8785 puts it is refused. */
export function parseCanonicalJson(text: string): Json {
  const value = parseStrictJson(text);
  if (canonicalJson(value) !== text) throw new CanonicalError("", "is not in canonical form (RFC 8785)");
  return value;
}

// The text is known to be JSON here, so a scan for strings and brackets is enough: a string followed by a colon is a key.
const token = /"[^"\\]*(?:\\.[^"\\]*)*"|[{}[\]]/gs;

const colon = /\s*:/y;

function refuseDoubledKeys(text: string): void {
  const open: (Set<string> | null)[] = [];
  for (const { 0: found, index } of text.matchAll(token)) {
    if (found === "{" || found === "[") {
      open.push(found === "{" ? new Set() : null);
      if (open.length > maxDepth) throw new CanonicalError("", `is nested more than ${maxDepth} deep`);
    } else if (found === "}" || found === "]") {
      open.pop();
    } else {
      const keys = open.at(-1);
      colon.lastIndex = index + found.length;
      if (!keys || !colon.test(text)) continue;
      const key = JSON.parse(found) as string;
      if (keys.has(key)) throw new CanonicalError(key, "stands twice in one object");
      keys.add(key);
    }
  }
}
