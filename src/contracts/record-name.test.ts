import { describe, expect, it } from "vitest";
import { recordName, recordNumber } from "./record-name";

describe("record names", () => {
  it.each([
    [1, "SC-0001"],
    [412, "SC-0412"],
    [12345, "SC-12345"],
  ])("writes %d as %s and reads it back", (number, name) => {
    expect(recordName(number)).toBe(name);
    expect(recordNumber(name)).toBe(number);
  });

  it.each([
    ["sc-41", 41],
    ["SC 0041", 41],
    [" 41 ", 41],
    ["SC-0", undefined],
    ["relief", undefined],
    ["SC-1-2", undefined],
    ["", undefined],
  ])("reads %j as %s", (text, number) => expect(recordNumber(text)).toBe(number));
});
