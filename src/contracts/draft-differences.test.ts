import { describe, expect, it } from "vitest";
import { newDraft, type DraftDocument } from "./draft";
import { draftDifferences } from "./draft-differences";

const draft = (change: (draft: DraftDocument) => void = () => undefined): DraftDocument => {
  const made = newDraft("Bottle bank");
  change(made);
  return made;
};

describe("draftDifferences", () => {
  it("finds nothing between equal drafts, whatever the order of their keys", () => {
    const one = draft();
    const other = { ...one, lines: Object.fromEntries(Object.entries(one.lines).reverse()) };
    expect(draftDifferences(one, other)).toEqual([]);
  });

  it("names each line that differs, in the order of the form", () => {
    const after = draft((made) => {
      made.lines["A5.02"] = { typed: "6", unit: "mm", si: 0.006, source: { kind: "sheet", note: "PID 5201" } };
      made.lines["2.09"] = { typed: "200", unit: "bar(g)", si: 20.1e6, source: null };
    });
    expect(draftDifferences(draft(), after)).toEqual([
      { line: "2.09", before: "–", after: "200 bar(g)" },
      { line: "A5.02", before: "–", after: "6 mm, sheet: PID 5201" },
    ]);
  });

  it("sees a changed unit, a changed source and an emptied line", () => {
    const before = draft(
      (made) => (made.lines["2.09"] = { typed: "200", unit: "bar(g)", si: 1, source: { kind: "sheet", note: "a" } }),
    );
    const with_ = (value: DraftDocument["lines"][string]) => draft((made) => (made.lines["2.09"] = value));
    for (const value of [
      { typed: "200", unit: "psig", si: 1, source: { kind: "sheet", note: "a" } },
      { typed: "200", unit: "bar(g)", si: 1, source: { kind: "sheet", note: "b" } },
      { typed: "", unit: "bar(g)", si: null, source: null },
    ] as const) {
      expect(draftDifferences(before, with_(value)).map(({ line }) => line)).toEqual(["2.09"]);
    }
  });

  it("tells a given value that was emptied from one that still stands", () => {
    const emptied = draft((made) => (made.lines["A5.03"] = { typed: "", unit: "–", si: null, source: null }));
    expect(draftDifferences(draft(), emptied)).toMatchObject([{ line: "A5.03", after: "–" }]);
  });

  it("compares the composition as a whole", () => {
    const after = draft((made) => (made.composition.rows = [{ id: "nitrogen", typed: "100", molePercent: 100 }]));
    expect(draftDifferences(draft(), after)).toEqual([{ line: "3.01", before: "–", after: "nitrogen 100" }]);
  });
});
