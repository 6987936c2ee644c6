import { describe, expect, it } from "vitest";
import { askedKeysOf, draftDocumentSchema, newDraft } from "./draft";
import { addCase, nextLetter, removeCase } from "./draft-cases";

const source = { kind: "sheet", note: "DS-1" } as const;
const begun = () => {
  const draft = newDraft("Two cases");
  draft.lines["A5.02"] = { typed: "20", unit: "mm", si: 0.02, source };
  return draft;
};

describe("a case added to a draft", () => {
  it("takes the lines of the one it is like, with their sources", () => {
    const { draft, letter } = addCase(begun(), "fire-blowdown", "A") ?? { draft: begun(), letter: "" };
    expect(letter).toBe("B");
    expect(draft.lines["B5.02"]).toEqual(draft.lines["A5.02"]);
    expect(draft.lines["B6.02"]?.typed).toBe("pool-fire");
    expect(draft.cases).toEqual([
      { letter: "A", kind: "cold-blowdown" },
      { letter: "B", kind: "fire-blowdown" },
    ]);
    expect(draftDocumentSchema.safeParse(draft).success).toBe(true);
  });

  it("starts with a surface fire where a plain volume does not tell what is wetted", () => {
    const draft = begun();
    draft.lines["2.02-1"] = { typed: "volume", unit: null, si: null, source: null };
    expect(addCase(draft, "fire-blowdown", "A")?.draft.lines["B6.02"]?.typed).toBe("surface-fire");
  });

  it("asks for its own lines and those of all cases, not for another case's", () => {
    const draft = addCase(begun(), "cold-blowdown", "A")?.draft ?? begun();
    const keys = askedKeysOf(draft, "B").map(({ key }) => key);
    expect(keys).toContain("B5.02");
    expect(keys).toContain("4.03");
    expect(keys.some((key) => key.startsWith("A"))).toBe(false);
  });

  it("never gets the letter of one that was removed", () => {
    const two = addCase(begun(), "cold-blowdown", "A")?.draft ?? begun();
    const one = removeCase(two, "B");
    expect(one.cases.map(({ letter }) => letter)).toEqual(["A"]);
    expect(nextLetter(one)).toBe("C");
    expect(removeCase(one, "A")).toBe(one);
  });
});
