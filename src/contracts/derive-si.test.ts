import { describe, expect, it } from "vitest";
import { deriveSi, molePercentOf } from "./derive-si";
import { newDraft } from "./draft";

const site = 100000;
const draftWith = (key: string, typed: string, unit: string | null, si: number | null = null) => {
  const draft = newDraft("Bottle bank");
  draft.lines[key] = { typed, unit, si, source: null };
  return deriveSi(draft, site).lines[key]?.si;
};

describe("deriveSi", () => {
  it.each([
    ["2.09", "200", "bar(g)", 20.1e6],
    ["2.09", "2900 psia", "bar(g)", 2900 * 6894.757293168361],
    ["2.10", "15", "°C", 288.15],
    ["A5.02", "1/2", "mm", null],
    ["2.09", "200 bar", "bar(g)", null],
    ["2.01-1", "12", null, null],
  ])("reads line %s typed as %j in %s", (key, typed, unit, si) => {
    const derived = draftWith(key, typed, unit);
    if (si === null) expect(derived).toBeNull();
    else expect(derived).toBeCloseTo(si, 6);
  });

  it("replaces a number the browser sent with the one the text gives", () => {
    expect(draftWith("A5.02", "6", "mm", 999)).toBeCloseTo(0.006, 12);
  });

  it("keeps a value that came with the line, and nothing else, where no text is", () => {
    expect(draftWith("A5.03", "", "–", 0.84)).toBe(0.84);
    expect(draftWith("A5.03", "", "–", 0.5)).toBeNull();
    expect(draftWith("A5.03", "", "–", null)).toBeNull();
    expect(draftWith("A5.02", "", "mm", 0.006)).toBeNull();
  });

  it("changes nothing but numbers, and nothing the second time", () => {
    const draft = newDraft("Bottle bank");
    draft.composition.rows = [{ id: "nitrogen", typed: "99.9", molePercent: null }];
    const once = deriveSi(draft, site);
    expect(once.composition.rows[0]?.molePercent).toBe(99.9);
    expect(deriveSi(once, site)).toEqual(once);
    expect(Object.keys(once.lines)).toEqual(Object.keys(draft.lines));
  });
});

describe("molePercentOf", () => {
  it.each([
    ["4.5", 4.5],
    ["4.5 %", 4.5],
    ["0", 0],
    ["", null],
    ["-1", null],
    ["trace", null],
    ["1,5", null],
  ])("reads %j as %s", (typed, percent) => expect(molePercentOf(typed)).toBe(percent));
});
