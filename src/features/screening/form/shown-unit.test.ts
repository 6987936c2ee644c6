import { describe, expect, it } from "vitest";
import type { LineValue } from "@/contracts/draft";
import type { QuantityLine } from "@/contracts/lines/line";
import { lineByNo } from "@/contracts/lines/registry";
import { otherText, shownText, shownUnitOf, unitTyped } from "./shown-unit";

const bore = lineByNo("5.02") as QuantityLine;
const pressure = lineByNo("2.09") as QuantityLine;
const value = (typed: string, unit: string, si: number | null): LineValue => ({ typed, unit, si, source: null });

describe("the unit a line is shown in", () => {
  it("is the one chosen at the line, then the one typed in, then the line's own", () => {
    expect(shownUnitOf(bore, value("1", "in", 0.0254), "SI", "cm")).toBe("cm");
    expect(shownUnitOf(bore, value("1.2", "cm", 0.012), "SI")).toBe("cm");
    expect(shownUnitOf(bore, value("1", "in", 0.0254), "SI")).toBe("mm");
    expect(shownUnitOf(bore, undefined, "US")).toBe("in");
  });
});

describe("the text of a field", () => {
  it("is what was typed while its unit is shown, and the SI value written anew in another", () => {
    expect(shownText(bore, value("11.0", "mm", 0.011), "mm", 101325)).toBe("11.0");
    expect(shownText(bore, value("25.4", "mm", 0.0254), "in", 101325)).toMatch(/^1(\.0+)?$/);
  });

  it("measures gauge pressures from the site's own barometer", () => {
    expect(shownText(pressure, value("", "bar(a)", 95000 + 70e5), "bar(g)", 95000)).toMatch(/^70(\.0+)?$/);
  });

  it("keeps what is no number as it was typed", () => {
    expect(shownText(bore, value("abc", "mm", null), "in", 101325)).toBe("abc");
  });

  it("shows a given value that nobody typed", () => {
    expect(shownText(bore, value("", "mm", 0.012), "mm", 101325)).toMatch(/^12(\.0+)?$/);
    expect(shownText(bore, undefined, "mm", 101325)).toBe("");
  });
});

describe("a unit typed behind the figure", () => {
  it.each([
    ["1.24 in", { typed: "1.24", unit: "in" }],
    ["0.5ft", { typed: "0.5", unit: "ft" }],
    ["12 mm", { typed: "12", unit: "mm" }],
  ])("%s moves into the unit box", (typed, moved) => expect(unitTyped(bore, value(typed, "mm", null), 101325)).toEqual(moved));

  it.each(["12", "1e-2", "−12", "abc", "5 furlongs"])("leaves “%s” alone", (typed) => {
    expect(unitTyped(bore, value(typed, "mm", null), 101325)).toBeUndefined();
  });
});

describe("the other system under the label", () => {
  it("stands where the systems differ and there is a value", () => {
    expect(otherText(bore, value("25.4", "mm", 0.0254), "mm", 101325)).toMatch(/^1\.\d*\u00a0in$/);
    expect(otherText(bore, value("1", "in", 0.0254), "in", 101325)).toBe("25.4\u00a0mm");
    expect(otherText(bore, undefined, "mm", 101325)).toBeUndefined();
    expect(otherText(lineByNo("5.05") as QuantityLine, value("5", "s", 5), "s", 101325)).toBeUndefined();
  });
});
