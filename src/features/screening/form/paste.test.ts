import { describe, expect, it } from "vitest";
import { pastedColumn } from "./paste";

describe("pasted text", () => {
  it("is a column only with more than one row", () => {
    expect(pastedColumn("25.4\r\n12\tmm\r\n")).toEqual(["25.4", "12"]);
    expect(pastedColumn("25.4 mm")).toBeUndefined();
  });
});
