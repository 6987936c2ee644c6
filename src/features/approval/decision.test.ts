import { describe, expect, it } from "vitest";
import { madeContent } from "../../../tests/fixtures/screening-view";
import { conditionsToSend, missingFor, remarksToSend, type DecisionDraft } from "./decision";

const content = madeContent();
const all = new Set(content.cautions.map(({ id }) => id));
const draft = (fields: Partial<DecisionDraft>): DecisionDraft => ({
  choice: null,
  conditions: [],
  remarks: [],
  password: "",
  ...fields,
});
const remark = (line: string, text: string) => ({ key: 0, line, text });

describe("a decision", () => {
  it.each([
    ["no choice", draft({}), "Choose what you decide."],
    [
      "cautions not ticked",
      draft({ choice: "countersign", password: "x" }),
      "Three acknowledgements are missing: C1, C2 and C6.",
    ],
    ["a return without remarks", draft({ choice: "return", password: "x" }), "A return needs at least one remark."],
    [
      "a remark without line",
      draft({ choice: "return", remarks: [remark("", "Why?")] }),
      "A remark needs the number of its line.",
    ],
    [
      "a line that is not there",
      draft({ choice: "return", remarks: [remark("9.99", "Why?")] }),
      "There is no line 9.99 in this record.",
    ],
    [
      "a remark without words",
      draft({ choice: "return", remarks: [remark("4.03", " ")] }),
      "The remark on line 4.03 has no words.",
    ],
    [
      "an empty condition",
      draft({ choice: "countersign", conditions: ["Measure the wall.", " "], password: "x" }),
      "A condition has no words. Write it, or remove it.",
    ],
    ["no password", draft({ choice: "return", remarks: [remark("4.03", "Why?")] }), "Type your password."],
  ])("with %s can't be sent, and it is said why", (_, decision, words) => {
    expect(missingFor(decision, content, decision.conditions.length > 0 ? all : new Set())).toBe(words);
  });

  it("can be sent when all is there", () => {
    expect(missingFor(draft({ choice: "countersign", password: "x" }), content, all)).toBeNull();
    expect(
      missingFor(
        draft({ choice: "return", remarks: [remark("7.02", "Why?"), remark("", "")], password: "x" }),
        content,
        new Set(),
      ),
    ).toBeNull();
  });

  it("sends remarks under the full number and without the empty ones", () => {
    expect(remarksToSend([remark("7.02", " Why? "), remark("", "")], content)).toEqual([{ line: "A7.02", text: "Why?" }]);
  });

  it("sends conditions without the space around them", () => {
    expect(conditionsToSend({ conditions: [" Measure the wall. "] })).toEqual(["Measure the wall."]);
  });
});
