import { readFileSync } from "node:fs";
import { join } from "node:path";
import { describe, expect, it } from "vitest";
import { bodyCommitment } from "./body";
import { entryKinds } from "./entry-kinds";
import { genesisPrev, leafHash, parseEnvelope, serialiseEnvelope } from "./envelope";
import { parseCanonicalJson } from "./strict-json";
import { verifyLedger } from "./verify-ledger";

const page = readFileSync(join(import.meta.dirname, "../../docs/log-format.md"), "utf8");

/** A block of the example, by the name after its language. */
function block(name: string): string {
  const found = new RegExp("^```[a-z]+ " + name + "\\n(.*)\\n```$", "m").exec(page)?.[1];
  if (found === undefined) throw new Error(`docs/log-format.md has no block "${name}"`);
  return found;
}

const salts = [0, 32].map((first) => Buffer.from(Array.from({ length: 32 }, (_, i) => first + i)).toString("hex")) as [
  string,
  string,
];

describe("the example of docs/log-format.md", () => {
  it("starts from its origin", () => {
    expect(genesisPrev(block("origin"))).toBe(block("prev-1"));
    expect(parseEnvelope(block("envelope-1"))?.prev).toBe(block("prev-1"));
  });

  it.each([1, 2])("entry %d: body, commitment, envelope and leaf hash are recomputed", (seq) => {
    const body = block(`body-${seq}`);
    expect(() => parseCanonicalJson(body)).not.toThrow();
    expect(bodyCommitment(salts[seq - 1]!, body)).toBe(block(`commitment-${seq}`));
    const envelope = parseEnvelope(block(`envelope-${seq}`))!;
    expect(envelope).toMatchObject({ seq, body: block(`commitment-${seq}`) });
    expect(serialiseEnvelope(envelope)).toBe(block(`envelope-${seq}`));
    expect(leafHash(block(`envelope-${seq}`))).toBe(block(`leaf-${seq}`));
  });

  it("is a ledger that holds", async () => {
    const entries = [1, 2].map((seq) => ({
      seq,
      envelope: block(`envelope-${seq}`),
      hash: block(`leaf-${seq}`),
      body: { saltHex: salts[seq - 1]!, text: block(`body-${seq}`) },
    }));
    expect(await verifyLedger(entries, { origin: block("origin") })).toMatchObject({
      holds: true,
      size: 2,
      head: block("leaf-2"),
    });
  });
});

describe("the kinds of docs/log-format.md", () => {
  it("are those of the library, under the same subjects", () => {
    const rows = [...page.matchAll(/^\| `([a-z]+)(?::[^`]*)?` +\| (`[a-z_]+`(?:, `[a-z_]+`)*) +\|$/gm)];
    const told = rows.flatMap(([, noun, kinds]) =>
      [...kinds!.matchAll(/`([a-z_]+)`/g)].map(([, kind]) => [kind!, noun!] as const),
    );
    expect(Object.fromEntries(told)).toEqual(
      Object.fromEntries(Object.entries(entryKinds).map(([kind, { noun }]) => [kind, noun])),
    );
  });
});
