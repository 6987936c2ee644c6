import { describe, expect, it } from "vitest";
import { madeScreening, madeSignature } from "../../../tests/fixtures/screening-view";
import { whyNotDecide, whyNotSign } from "./why-not-now";

describe("why a revision can't be signed now", () => {
  it.each([
    ["signed before", { state: "signed" as const }, "Revision 2 is signed already"],
    ["never computed", { state: "draft" as const, prepared: null }, "There is nothing to sign yet"],
    [
      "of older lines",
      { state: "draft" as const, prepared: { ...madeScreening().prepared!, stale: true } },
      "The lines have changed since the last run",
    ],
    ["another's work", { state: "computed" as const }, "You can’t sign this revision"],
  ])("%s", (_, fields, title) => expect(whyNotSign({ ...madeScreening(), ...fields }).title).toBe(title));
});

describe("why a revision can't be decided on now", () => {
  it.each([
    ["own work", { whyNot: "You had a hand in this revision, so another approver decides." }, "Another approver decides"],
    [
      "decided",
      {
        state: "returned" as const,
        signatures: [madeSignature(), { ...madeSignature(), act: "returned" as const, badge: "A-027", seq: 13 }],
      },
      "Revision 2 has been decided",
    ],
    ["not signed", { state: "computed" as const, signatures: [] }, "There is nothing to decide yet"],
    ["withdrawn", { state: "withdrawn" as const }, "Revision 2 is withdrawn"],
    ["another role", {}, "You can’t decide on this record"],
  ])("%s", (_, fields, title) => expect(whyNotDecide({ ...madeScreening(), ...fields }, "someone").title).toBe(title));

  it("own work, for its author", () => expect(whyNotDecide(madeScreening(), "e").title).toBe("You prepared this revision"));
});
