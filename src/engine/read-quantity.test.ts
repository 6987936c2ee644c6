import { describe, expect, it } from "vitest";
import { readQuantity } from "./read-quantity";
import { unitSymbols, units, type QuantityId } from "./units";

const read = (typed: string, quantity: QuantityId, unit: string, barometricPressurePa?: number) =>
  readQuantity(typed, { quantity, unit, ...(barometricPressurePa ? { barometricPressurePa } : {}) });

describe("readQuantity", () => {
  it.each([
    ["1.24 in", "length", "mm", 0.031496, "in"],
    ["12", "length", "mm", 0.012, "mm"],
    ["319 psig", "pressure", "bar(g)", 319 * 6894.757293168 + 101325, "psig"],
    ["1450psig", "pressure", "bar(g)", 1450 * 6894.757293168 + 101325, "psig"],
    ["25 barg", "pressure", "psig", 2601325, "bar(g)"],
    ["25 bar(a)", "pressure", "psig", 2.5e6, "bar(a)"],
    ["-20 F", "temperature", "°C", (-20 + 459.67) / 1.8, "°F"],
    ["\u221229", "temperature", "°C", 244.15, "°C"],
    ["− 29 °C", "temperature", "K", 244.15, "°C"],
    ["1\u2009450", "pressure", "psig", 1450 * 6894.757293168 + 101325, "psig"],
    ["1\u202f450.5 kPa", "pressure", "psig", 1450500, "kPa"],
    ["1.5e7 Pa", "pressure", "psig", 1.5e7, "Pa"],
    [".84", "fraction", "–", 0.84, "–"],
    ["50 %", "fraction", "–", 0.5, "%"],
    ["5 Btu/hr/ft2/F", "filmCoefficient", "W/(m²·K)", 28.391317, "Btu/(h·ft²·°F)"],
    ["60 W/m2K", "filmCoefficient", "W/(m²·K)", 60, "W/(m²·K)"],
    ["2 m^3", "volume", "L", 2, "m³"],
    ["3 ft3", "volume", "L", 3 * 0.3048 ** 3, "ft³"],
    ["+4 MW", "power", "kW", 4e6, "MW"],
  ] as [string, QuantityId, string, number, string][])("reads %j as %s", (typed, quantity, unit, si, symbol) => {
    const result = read(typed, quantity, unit);
    expect(result).toMatchObject({ ok: true, unit: symbol });
    expect(result.ok && Math.abs(result.si / si - 1)).toBeLessThan(1e-7);
  });

  it("measures gauge from the barometer it is given", () => {
    expect(read("0 barg", "pressure", "psig", 90000)).toMatchObject({ ok: true, si: 90000 });
  });

  it.each([
    ["", "length", /Nothing is entered/],
    ["  ", "length", /Nothing is entered/],
    ["abc", "length", /no number in front/],
    ["1,5", "length", /comma.*decimal point/],
    ["1,500.0", "length", /comma/],
    ["1.2.3", "length", /not one number/],
    ["12 34", "length", /not one number/],
    ["1e400", "length", /too large/],
    ["12 furlong", "length", /no unit of length here.*mm/],
    ["25 bar", "pressure", /gauge or absolute.*bar\(g\) or bar\(a\)/],
    ["400 psi", "pressure", /gauge or absolute.*psig or psia/],
    ["NaN", "length", /no number in front/],
    ["--5", "temperature", /no number in front/],
  ] as [string, QuantityId, RegExp][])("refuses %j of %s with a sentence", (typed, quantity, sentence) => {
    const result = read(typed, quantity, Object.keys(units[quantity].shown)[0] ?? "");
    expect(result.ok ? "" : result.problem).toMatch(sentence);
  });

  it("takes a decimal comma only where the choice was shown", () => {
    expect(readQuantity("1,5", { quantity: "length", unit: "m", decimalComma: true })).toMatchObject({ ok: true, si: 1.5 });
    expect(readQuantity("1,5,5", { quantity: "length", unit: "m", decimalComma: true }).ok).toBe(false);
  });

  it("finds every unit of the table by its own symbol and never by another quantity's", () => {
    for (const quantity of Object.keys(units) as QuantityId[]) {
      for (const symbol of unitSymbols(quantity))
        expect(read(`7 ${symbol}`, quantity, symbol)).toMatchObject({ ok: true, unit: symbol });
    }
    expect(read("7 kg", "length", "m").ok).toBe(false);
  });
});
