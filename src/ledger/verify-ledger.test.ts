import { beforeAll, describe, expect, it } from "vitest";
import { bodyCommitment } from "./body";
import { canonicalJson, type Json } from "./canonical-json";
import { type Envelope, genesisPrev, leafHash, serialiseEnvelope } from "./envelope";
import { sha256Hex } from "./sha256";
import type { StoredEntry } from "./verify-entry";
import { verifyLedger } from "./verify-ledger";

const origin = "ebbmark.test/ledger";
const id = (n: number) => `00000000-0000-4000-8000-${String(n).padStart(12, "0")}`;
const [administrator, engineer, approver, colleague, screening, facility] = [1, 2, 3, 4, 5, 6].map(id) as [
  string,
  string,
  string,
  string,
  string,
  string,
];
const subject = `screening:${screening}:1`;
const content = sha256Hex("content");

type Act = { actor: string; kind: string; subject: string; body: Json };

/** Chains acts as the database does, with salts and times that follow from the number. */
function chain(acts: Act[]): StoredEntry[] {
  let prev = genesisPrev(origin);
  return acts.map(({ actor, kind, subject, body }, index) => {
    const seq = index + 1;
    const saltHex = sha256Hex(`salt ${seq}`);
    const text = canonicalJson(body);
    const at = `2026-12-01T10:00:00.${String(seq).padStart(6, "0")}Z`;
    const envelope = serialiseEnvelope({
      actor,
      at,
      body: bodyCommitment(saltHex, text),
      idem: `key-${seq}-test`,
      kind,
      prev,
      seq,
      subject,
      v: 1,
    });
    prev = leafHash(envelope);
    return { seq, envelope, hash: prev, mirrors: { kind, actor, subject, at }, body: { saltHex, text } };
  });
}

const enrol = (actor: string, person: string, badge: string, role: string): Act => ({
  actor,
  kind: "person_enrolled",
  subject: `person:${person}`,
  body: { badge, printedName: badge, role },
});
const statement = (person: string, more: { [key: string]: Json }): Json => ({
  content: { sha256: content },
  person: { id: person },
  screening: { id: screening, rev: 1 },
  ...more,
});
const signed: Act = {
  actor: engineer,
  kind: "screening_signed",
  subject,
  body: statement(engineer, { contributors: [engineer, colleague] }),
};
const countersigned: Act = {
  actor: approver,
  kind: "screening_countersigned",
  subject,
  body: statement(approver, { conditions: [] }),
};

const people: Act[] = [
  { actor: "system", kind: "genesis", subject: "ledger", body: { format: "ebbmark-ledger/1", origin } },
  enrol("system", administrator, "D-1", "administrator"),
  enrol(administrator, engineer, "E-1", "engineer"),
  enrol(administrator, approver, "A-1", "approver"),
  enrol(administrator, colleague, "A-2", "approver"),
  { actor: administrator, kind: "member_added", subject: `member:${facility}:${engineer}`, body: { badge: "E-1" } },
];
const story = [...people, signed, countersigned];

const faultsOf = async (entries: StoredEntry[], more: Partial<Parameters<typeof verifyLedger>[1]> = {}) => {
  const verdict = await verifyLedger(entries, { origin, ...more });
  return {
    holds: verdict.holds,
    told: [...verdict.broken.flatMap(({ seq, faults }) => faults.map((fault) => `${seq}: ${fault}`)), ...verdict.faults],
  };
};

const flip = (text: string, at: number) => text.slice(0, at) + (text[at] === "0" ? "1" : "0") + text.slice(at + 1);
const at = (entries: StoredEntry[], seq: number): StoredEntry => entries[seq - 1]!;
const bodyOf = (entry: StoredEntry) => entry.body as { saltHex: string; text: string };

let whole: StoredEntry[];
beforeAll(() => {
  whole = chain(story);
});
const copy = () => structuredClone(whole);

describe("a ledger nobody touched", () => {
  it("holds, and its states fold", async () => {
    const seen: number[] = [];
    const verdict = await verifyLedger(whole, {
      origin,
      knownHeads: [{ seq: 8, hash: at(whole, 8).hash }],
      onEntry: ({ seq }) => seen.push(seq),
    });
    expect(verdict).toMatchObject({ holds: true, size: 8, head: at(whole, 8).hash, broken: [], faults: [], withheld: 0 });
    expect(verdict.fold.revisions.get(subject)).toEqual({
      state: "countersigned",
      author: engineer,
      contributors: [engineer, colleague],
      contentSha256: content,
      decidedBy: approver,
    });
    expect(verdict.fold.members).toEqual(new Set([`${facility} ${engineer}`]));
    expect(seen).toEqual([1, 2, 3, 4, 5, 6, 7, 8]);
  });

  it("holds for a reader who may not see the bodies, who is told how many that were", async () => {
    const entries = copy().map((entry) => ({ ...entry, body: "withheld" as const }));
    expect(await verifyLedger(entries, { origin })).toMatchObject({ holds: true, withheld: 8, storyUpTo: 0 });
  });

  it("follows the story up to the first body that can't be read, and says so", async () => {
    const entries = copy();
    at(entries, 4).body = "withheld";
    expect(await verifyLedger(entries, { origin })).toMatchObject({ holds: true, withheld: 1, storyUpTo: 3 });
  });
});

describe("damage", () => {
  it.each<[string, (entries: StoredEntry[]) => StoredEntry[] | void, string[]]>([
    [
      "one character of a body changed",
      (entries) =>
        void (bodyOf(at(entries, 7)).text = bodyOf(at(entries, 7))
          .text.replace("conditions", "conditionz")
          .replace('"rev":1', '"rev":2')),
      ["7: The body is not the one the envelope commits to."],
    ],
    [
      "the salt changed",
      (entries) => void (bodyOf(at(entries, 3)).saltHex = flip(bodyOf(at(entries, 3)).saltHex, 10)),
      ["3: The body is not the one the envelope commits to."],
    ],
    ["the salt cut short", (entries) => void (bodyOf(at(entries, 3)).saltHex = "00"), ["3: The salt is not 32 bytes."]],
    [
      "a body replaced and its commitment with it",
      (entries) => {
        const entry = at(entries, 8);
        const text = canonicalJson(statement(approver, { conditions: ["with reservations"] }));
        entry.envelope = entry.envelope.replace(/"body":"[0-9a-f]+"/, `"body":"${bodyCommitment(bodyOf(entry).saltHex, text)}"`);
        bodyOf(entry).text = text;
      },
      ["8: The envelope does not hash to the stored hash."],
    ],
    [
      "an entry rewritten and hashed anew",
      (entries) => {
        const entry = at(entries, 4);
        entry.envelope = entry.envelope.replace("key-4-test", "key-4-fake");
        entry.hash = leafHash(entry.envelope);
      },
      ["5: The link to entry 4 is broken."],
    ],
    [
      "the stored hash changed",
      (entries) => void (at(entries, 2).hash = flip(at(entries, 2).hash, 0)),
      ["2: The envelope does not hash to the stored hash."],
    ],
    [
      "a link rewritten",
      (entries) =>
        void (at(entries, 6).envelope = at(entries, 6).envelope.replace(/"prev":"[0-9a-f]{64}"/, `"prev":"${"0".repeat(64)}"`)),
      [
        "6: The envelope does not hash to the stored hash.",
        "6: The link to entry 5 is broken.",
        "7: The link to entry 6 is broken.",
      ],
    ],
    [
      "a space put into an envelope",
      (entries) => void (at(entries, 5).envelope = at(entries, 5).envelope.replace(",", ", ")),
      [
        "5: The envelope does not hash to the stored hash.",
        "5: The envelope is not written in the form of version 1.",
        "6: The link to entry 5 is broken.",
      ],
    ],
    [
      "one entry dropped",
      (entries) => entries.filter(({ seq }) => seq !== 6),
      ["7: Entry 6 is missing.", "7: The link to entry 5 is broken."],
    ],
    [
      "three entries dropped",
      (entries) => entries.filter(({ seq }) => seq < 3 || seq > 5),
      ["6: Entries 3 to 5 are missing.", "6: The link to entry 2 is broken."],
    ],
    [
      "the first entry dropped",
      (entries) => entries.slice(1),
      ["2: Entry 1 is missing.", "2: The first entry does not start from the origin."],
    ],
    [
      "an entry given twice",
      (entries) => [...entries.slice(0, 6), at(entries, 6), ...entries.slice(6)],
      ["6: Entry 6 stands after entry 6.", "6: The link to entry 6 is broken."],
    ],
    [
      "two entries swapped",
      (entries) => [...entries.slice(0, 3), at(entries, 5), at(entries, 4), ...entries.slice(5)],
      [
        "5: Entry 4 is missing.",
        "5: The link to entry 3 is broken.",
        "4: Entry 4 stands after entry 5.",
        "4: The link to entry 5 is broken.",
        "4: The time runs backwards.",
        "6: Entry 5 is missing.",
        "6: The link to entry 4 is broken.",
      ],
    ],
    [
      "a column of the list changed",
      (entries) => void (at(entries, 8).mirrors!.actor = engineer),
      [`8: The list says actor ${engineer}; the envelope says ${approver}.`],
    ],
    [
      "the number of a row changed",
      (entries) => void (at(entries, 8).seq = 9),
      ["9: Entry 8 is missing.", "9: The envelope calls itself entry 8."],
    ],
    [
      "a body deleted",
      (entries) => void (at(entries, 7).body = "redacted"),
      ["7: The body is gone, and no entry says that it was redacted."],
    ],
    ["everything deleted", () => [], ["There is no entry at all."]],
  ])("%s is found and named", async (_what, damage, expected) => {
    const entries = copy();
    const { holds, told } = await faultsOf(damage(entries) ?? entries);
    expect(holds).toBe(false);
    for (const fault of expected) expect(told).toContain(fault);
  });

  it("flipping any one character of envelope, hash, salt or body is found", async () => {
    for (const seq of [1, 5, 8]) {
      for (const place of ["envelope", "hash", "salt", "body"] as const) {
        const length = { envelope: at(whole, seq).envelope.length, hash: 64, salt: 64, body: bodyOf(at(whole, seq)).text.length }[
          place
        ];
        for (let i = 0; i < length; i++) {
          const entries = copy();
          const entry = at(entries, seq);
          if (place === "envelope") entry.envelope = flip(entry.envelope, i);
          else if (place === "hash") entry.hash = flip(entry.hash, i);
          else if (place === "salt") bodyOf(entry).saltHex = flip(bodyOf(entry).saltHex, i);
          else bodyOf(entry).text = flip(bodyOf(entry).text, i);
          expect(
            (await verifyLedger(entries, { origin })).broken.map((verdict) => verdict.seq),
            `${place} ${i} of entry ${seq}`,
          ).toContain(seq);
        }
      }
    }
  });
});

describe("a tail cut off, or a ledger rewritten and chained anew", () => {
  it("looks whole by itself, and is convicted by a head known from elsewhere", async () => {
    const cut = copy().slice(0, 6);
    expect((await faultsOf(cut)).holds).toBe(true);
    const known = [{ seq: 8, hash: at(whole, 8).hash }];
    expect((await faultsOf(cut, { knownHeads: known })).told).toEqual([
      "The ledger ends at entry 6; entry 8 is known from elsewhere, so its end was cut off.",
    ]);

    const rewritten = chain([...people, { ...signed, body: statement(engineer, { contributors: [engineer] }) }, countersigned]);
    expect((await faultsOf(rewritten)).holds).toBe(true);
    expect((await faultsOf(rewritten, { knownHeads: known })).told).toEqual([
      "Entry 8 is another than the one known from elsewhere.",
    ]);
  });

  it("is refused under another origin", async () => {
    expect((await faultsOf(whole, { origin: "ebbmark.other/ledger" })).told).toEqual([
      "1: The first entry does not start from the origin.",
    ]);
  });
});

describe("rules broken by whoever could write the record", () => {
  it.each<[string, Act[], string]>([
    [
      "a countersignature by the author",
      [
        ...people,
        { ...signed, body: statement(engineer, { contributors: [engineer] }) },
        { ...countersigned, actor: engineer, body: statement(engineer, {}) },
      ],
      "8: It was countersigned by somebody who had a hand in it.",
    ],
    [
      "a countersignature by a contributor",
      [...people, signed, { ...countersigned, actor: colleague, body: statement(colleague, {}) }],
      "8: It was countersigned by somebody who had a hand in it.",
    ],
    [
      "a countersignature by an engineer",
      [...people, signed, { ...countersigned, actor: engineer, body: statement(engineer, {}) }],
      "8: E-1 was engineer at that time; this takes approver.",
    ],
    [
      "a countersignature of other content",
      [
        ...people,
        signed,
        { ...countersigned, body: { ...(statement(approver, {}) as object), content: { sha256: "0".repeat(64) } } },
      ],
      "8: The decision names other content than was signed.",
    ],
    [
      "a second decision",
      [...people, signed, countersigned, countersigned],
      "9: A revision that is countersigned can't be countersigned.",
    ],
    ["a decision on what was never signed", [...people, countersigned], "7: This revision was never signed."],
    ["a signature by somebody never enrolled", [...people.slice(0, 2), signed], "3: The person acting was never enrolled."],
    [
      "a signature by a disabled person",
      [
        ...people,
        { actor: administrator, kind: "person_disabled", subject: `person:${engineer}`, body: { badge: "E-1", reason: "left" } },
        signed,
      ],
      "8: E-1 was disabled at that time.",
    ],
    [
      "a statement moved to another person",
      [...people, { ...signed, body: statement(colleague, { contributors: [engineer] }) }],
      "7: The statement is another person's than the actor's.",
    ],
    [
      "a statement moved to another revision",
      [...people, { ...signed, subject: `screening:${screening}:2` }],
      "7: The statement is about another revision than the subject.",
    ],
    [
      "a person who enrols themself as administrator",
      [...people, enrol(engineer, id(9), "D-9", "administrator")],
      "7: E-1 was engineer at that time; this takes administrator.",
    ],
    [
      "a role confirmed by nobody's proposal",
      [
        ...people,
        {
          actor: administrator,
          kind: "role_confirmed",
          subject: `person:${engineer}`,
          body: { badge: "E-1", proposed: 3, role: "approver", twoPersonRule: "not yet bound: one administrator" },
        },
      ],
      "7: No entry proposed this change of role.",
    ],
    ["a second founding", [...people, people[0]!], "7: A record is founded once, by its first entry."],
    [
      "an unknown kind",
      [...people, { ...signed, kind: "screening_blessed" }],
      '7: There is no entry kind "screening_blessed" in this version.',
    ],
    [
      "a kind about the wrong thing",
      [...people, { ...signed, subject: "ledger" }],
      "7: An entry of kind screening_signed can't be about ledger.",
    ],
  ])("%s is named although the chain is whole", async (_what, acts, expected) => {
    expect((await faultsOf(chain(acts))).told).toContain(expected);
  });

  it("a role confirmed by who proposed it is named once there are two administrators", async () => {
    const two = [...people, enrol(administrator, id(9), "D-9", "administrator")];
    const about = { subject: `person:${engineer}`, actor: administrator };
    const acts: Act[] = [
      ...two,
      { ...about, kind: "role_proposed", body: { badge: "E-1", reason: "x", role: "approver", twoPersonRule: "bound" } },
      { ...about, kind: "role_confirmed", body: { badge: "E-1", proposed: 8, role: "approver", twoPersonRule: "bound" } },
    ];
    expect((await faultsOf(chain(acts))).told).toEqual(["9: The change of role was confirmed by who proposed it."]);
  });
});

describe("envelopes", () => {
  it.each<[string, Partial<Envelope>]>([
    ["a quote in the key", { idem: 'key-"1-test' }],
    ["an actor that is no id", { actor: "E-114" }],
    ["a time without microseconds", { at: "2026-12-01T10:00:00Z" }],
    ["a capital in the hash", { prev: "A".repeat(64) }],
    ["a number of zero", { seq: 0 }],
    ["a subject with a space", { subject: "screening: 1" }],
  ])("are not written with %s", (_what, change) => {
    const good: Envelope = {
      actor: "system",
      at: "2026-12-01T10:00:00.000000Z",
      body: "0".repeat(64),
      idem: "key-1-test",
      kind: "genesis",
      prev: "0".repeat(64),
      seq: 1,
      subject: "ledger",
      v: 1,
    };
    expect(() => serialiseEnvelope(good)).not.toThrow();
    expect(() => serialiseEnvelope({ ...good, ...change })).toThrow();
  });
});
