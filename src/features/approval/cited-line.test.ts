import { expect, it } from "vitest";
import { madeContent } from "../../../tests/fixtures/screening-view";
import { citedLine, labelOfLine } from "./cited-line";

const one = madeContent();
const two = { cases: [...madeContent().cases, { ...madeContent().cases[0]!, letter: "B" }] };

it.each([
  ["4.03", "4.03"],
  [" a7.02 ", "A7.02"],
  ["7.02", "A7.02"],
  ["2.04", "2.04-1"],
  ["2.04-2", "2.04-2"],
  ["9.99", undefined],
  ["B7.02", undefined],
  ["wall", undefined],
  ["", undefined],
])("by %j in a record of one case a person means %s", (text, key) => expect(citedLine(text, one)).toBe(key));

it("asks for the case where there are several", () => {
  expect(citedLine("7.02", two)).toBeUndefined();
  expect(citedLine("B7.02", two)).toBe("B7.02");
  expect(citedLine("4.03", two)).toBe("4.03");
});

it("calls a line what the record calls it, else what the form does", () => {
  expect(labelOfLine("4.03", one)).toBe("Wall thickness");
  expect(labelOfLine("A7.02", one)).toBe("Steel above its rated temperature");
});
