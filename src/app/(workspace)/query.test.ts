import { describe, expect, it } from "vitest";
import { logFilterSchema, screeningFilterSchema } from "@/contracts/requests";
import { filterFrom, withQuery } from "./query";

describe("a filter out of an address", () => {
  it("keeps what it knows and can use", () => {
    expect(filterFrom(screeningFilterSchema, { text: "IS-21", state: "signed", before: "40" })).toMatchObject({
      text: "IS-21",
      state: "signed",
      before: 40,
    });
  });

  it("leaves empty fields, unknown keys and impossible values out", () => {
    expect(
      filterFrom(logFilterSchema, {
        record: " ",
        from: "yesterday",
        badge: ["E-1", "E-2"],
        verify: "now",
        kind: "screening_signed",
      }),
    ).toEqual({
      kind: "screening_signed",
      limit: 50,
    });
  });
});

it("writes an address with what is said only", () => {
  expect(withQuery("/log", { record: "SC-0001", badge: undefined, kind: "", before: 7 })).toBe("/log?record=SC-0001&before=7");
  expect(withQuery("/log", {})).toBe("/log");
});
