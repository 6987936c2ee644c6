import { describe, expect, it } from "vitest";
import { newDraft } from "./draft";
import { draftFluid } from "./draft-fluid";

const draft = (...rows: [string, number | null][]) => ({
  ...newDraft("A fluid"),
  composition: {
    rows: rows.map(([id, molePercent]) => ({ id, typed: String(molePercent), molePercent })),
    normalised: false,
    source: null,
  },
});

describe("the fluid of a draft", () => {
  it("is there before anything else is, in shares of its own sum", () => {
    expect(draftFluid(draft(["methane", 89.1], ["ethane", 9.9], ["water", 0]))).toEqual({
      components: [
        { id: "methane", moleFraction: expect.closeTo(0.9, 12) as number },
        { id: "ethane", moleFraction: expect.closeTo(0.1, 12) as number },
      ],
      equation: "peng-robinson-1976",
      interaction: "library",
    });
  });

  it.each([
    ["empty", draft()],
    ["too far from 100", draft(["methane", 90])],
    ["not a number", draft(["methane", 100], ["ethane", null])],
    ["twice the same", draft(["methane", 50], ["methane", 50])],
  ])("is not there while the composition is %s", (_, given) => expect(draftFluid(given)).toBeUndefined());
});
