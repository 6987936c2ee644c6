import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { toSi, unitSymbols, units, type QuantityId } from "@/engine/units";
import { readQuantity } from "@/engine/read-quantity";
import {
  formatAgainst,
  formatForField,
  formatMolePercent,
  formatNumber,
  formatPercent,
  formatPower,
  formatQuantity,
  formatRange,
  plainText,
} from "./format";
import { formatUtc, formatUtcExact } from "./format-time";
import { shownUnit } from "./shown-units";

const celsius = (value: number) => toSi("temperature", value, "°C");
const barg = (value: number) => toSi("pressure", value, "bar(g)");

describe("a number", () => {
  it.each([
    [1840, { decimals: 0 }, "1840"],
    [12345, { decimals: 0 }, "12\u202f345"],
    [1234567.891, { decimals: 2 }, "1\u202f234\u202f567.89"],
    [-46.14, { decimals: 1 }, "\u221246.1"],
    [-0.04, { decimals: 1 }, "0.0"],
    [0, { figures: 3 }, "0"],
    [9.996, { figures: 3 }, "10.0"],
    [0.00123456, { figures: 3 }, "0.00123"],
  ] as const)("%d at %o reads %s", (value, precision, shown) => {
    expect(formatNumber(value, precision)).toBe(shown);
  });

  it.each([Number.NaN, Infinity, -Infinity, null, undefined])("never reads %s", (value) => {
    expect(formatNumber(value, { decimals: 1 })).toBe("–");
  });

  it("writes a plus on changes only", () => {
    expect(formatNumber(1.1, { decimals: 1 }, { signed: true })).toBe("+1.1");
    expect(formatNumber(-2.2, { decimals: 1 }, { signed: true })).toBe("\u22122.2");
    expect(formatNumber(1.1, { decimals: 1 })).toBe("1.1");
  });
});

describe("a quantity", () => {
  it.each([
    ["pressure", barg(84), "bar(g)", "84.0\u00a0bar(g)"],
    ["pressure", barg(6.9), "bar(g)", "6.90\u00a0bar(g)"],
    ["pressure", toSi("pressure", 1218.3, "psig"), "psig", "1218\u00a0psig"],
    ["temperature", celsius(-29), "°C", "\u221229.0\u00a0°C"],
    ["time", 13.6 * 60, "min", "13.6\u00a0min"],
    ["massRate", 12.7, "kg/s", "12.7\u00a0kg/s"],
    ["massRate", 4.8, "kg/s", "4.80\u00a0kg/s"],
    ["mass", 4016.4, "kg", "4016\u00a0kg"],
    ["area", 1140.2e-6, "mm²", "1140\u00a0mm²"],
    ["energy", -491e6, "MJ", "\u2212491.0\u00a0MJ"],
    ["energy", 2.336e6, "MJ", "2.34\u00a0MJ"],
    ["fraction", 0.84, "–", "0.840"],
    ["fraction", 0.09, "%", "9\u00a0%"],
  ] as const)("%s of %d in %s reads %s", (quantity, si, unit, shown) => {
    expect(formatQuantity(quantity, si, unit).text).toBe(shown);
  });

  it("measures gauge pressure from the barometer of the site", () => {
    expect(formatQuantity("pressure", 8e5, "bar(g)", { barometricPressurePa: 8e4 }).text).toBe("7.20\u00a0bar(g)");
    expect(formatQuantity("pressure", 8e5, "bar(a)", { barometricPressurePa: 8e4 }).text).toBe("8.00\u00a0bar(a)");
  });

  it("is shown in a unit of the table in both systems", () => {
    for (const quantity of Object.keys(units) as QuantityId[]) {
      expect(unitSymbols(quantity)).toContain(shownUnit(quantity, "SI"));
      expect(unitSymbols(quantity)).toContain(shownUnit(quantity, "US"));
    }
  });

  it("joins the ends of a range and names the unit once", () => {
    expect(formatRange("temperature", { low: celsius(8.5), high: celsius(12) }, "°C")).toBe("8.5 to 12.0\u00a0°C");
  });
});

describe("a value beside its limit", () => {
  const read = (shown: string) => Number(plainText(shown));

  it("gains a figure when rounding would put it on the limit", () => {
    const { value, limit } = formatAgainst("temperature", { si: celsius(-28.96), limitSi: celsius(-29) }, "°C");
    expect([value.text, limit.text]).toEqual(["\u221228.96\u00a0°C", "\u221229.00\u00a0°C"]);
  });

  it("keeps the usual figures when the side shows anyway", () => {
    const { value, limit } = formatAgainst("temperature", { si: celsius(-27.2), limitSi: celsius(-29) }, "°C");
    expect([value.number, limit.number]).toEqual(["\u221227.2", "\u221229.0"]);
  });

  it("reads equal when it is equal", () => {
    const { value, limit } = formatAgainst("time", { si: 900, limitSi: 900 }, "min");
    expect(value.number).toBe(limit.number);
  });

  it("is on the same side in every unit, however close", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 120, max: 900, noNaN: true }),
        fc.double({ min: -1, max: 1, noNaN: true }),
        (limitSi, distance) => {
          fc.pre(Math.abs(distance) > 1e-9);
          for (const unit of ["°C", "°F", "K"]) {
            const { value, limit } = formatAgainst("temperature", { si: limitSi + distance, limitSi }, unit);
            expect(Math.sign(read(value.number) - read(limit.number))).toBe(Math.sign(distance));
          }
        },
      ),
    );
  });

  it("leaves a distance that isn't zero visible", () => {
    expect(formatQuantity("temperatureDifference", 0.03, "K", { neverZero: true }).text).toBe("0.03\u00a0K");
    expect(formatPercent(0.003)).toBe("0.3\u00a0%");
    expect(formatPercent(0.09)).toBe("9\u00a0%");
  });
});

describe("a value written into a field", () => {
  it.each([
    ["length", 0.0254, "in", "1.000"],
    ["length", 0.0315, "in", "1.24016"],
    ["temperature", celsius(-29), "°C", "\u221229.0"],
    ["massRate", 12.5, "lb/h", "99208"],
    ["fraction", 0.84, "–", "0.84"],
    ["time", 0, "s", "0"],
  ] as const)("%s of %d in %s reads %s", (quantity, si, unit, shown) => {
    expect(formatForField(quantity, si, unit)).toBe(shown);
  });

  it("is read back to the same value within six figures, in every unit", () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...(Object.keys(units) as QuantityId[])),
        fc.double({ min: 1e-3, max: 1e6, noNaN: true }),
        (quantity, value) => {
          for (const unit of unitSymbols(quantity)) {
            const si = toSi(quantity, value, unit);
            const back = readQuantity(formatForField(quantity, si, unit), { quantity, unit });
            expect(back.ok && Math.abs(back.value - value) <= 5.1e-6 * Math.abs(value)).toBe(true);
          }
        },
      ),
    );
  });
});

describe("other figures", () => {
  it("shows composition to three decimals", () => expect(formatMolePercent(0.8512345)).toBe("85.123"));
  it("splits a power into mantissa and exponent", () =>
    expect(formatPower(2.04e-6)).toEqual({ mantissa: "2.0", exponent: "\u22126" }));
  it("is plain on the clipboard", () => expect(plainText("\u221212\u202f345.6\u00a0kg/s")).toBe("-12345.6 kg/s"));
  it("writes times in UTC", () => {
    expect(formatUtc("2026-12-01T15:58:37.120Z", "2026-12-02T00:00:00Z")).toBe("1 Dec 15:58:37");
    expect(formatUtc("2025-12-01T15:58:37Z", "2026-12-02T00:00:00Z")).toBe("1 Dec 2025 15:58:37");
    expect(formatUtcExact("2026-12-01T15:40:12.481Z")).toBe("2026-12-01 15:40:12.481 UTC");
    expect(formatUtc("never")).toBe("–");
  });
});
