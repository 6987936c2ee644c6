import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { fromSi, toSi, unitOf, unitSymbols, units, type QuantityId } from "./units";

/** NIST Special Publication 811 (2008), appendix B.8: factor printed there, to the digits printed. */
const published: [QuantityId, string, number][] = [
  ["pressure", "psia", 6.894757e3],
  ["pressure", "atm", 1.01325e5],
  ["length", "in", 2.54e-2],
  ["length", "ft", 3.048e-1],
  ["area", "ft²", 9.290304e-2],
  ["area", "in²", 6.4516e-4],
  ["volume", "ft³", 2.831685e-2],
  ["volume", "bbl", 1.589873e-1],
  ["volume", "L", 1e-3],
  ["mass", "lb", 4.535924e-1],
  ["massRate", "lb/h", 1.259979e-4],
  ["massFlux", "lb/(ft²·s)", 4.882428],
  ["power", "Btu/h", 2.930711e-1],
  ["energy", "Btu", 1.055056e3],
  ["energy", "kWh", 3.6e6],
  ["specificEnergy", "Btu/lb", 2.326e3],
  ["heatFlux", "Btu/(h·ft²)", 3.154591],
  ["filmCoefficient", "Btu/(h·ft²·°F)", 5.678263],
  ["conductivity", "Btu/(h·ft·°F)", 1.730735],
  ["specificHeat", "Btu/(lb·°F)", 4.1868e3],
  ["density", "lb/ft³", 1.601846e1],
  ["speed", "mph", 4.4704e-1],
  ["temperatureDifference", "°F difference", 5.555556e-1],
  ["viscosity", "cP", 1e-3],
  ["surfaceTension", "dyn/cm", 1e-3],
];

describe("the unit table", () => {
  it.each(published)("has the published factor of %s in %s", (quantity, symbol, factor) => {
    expect(Math.abs(unitOf(quantity, symbol).factor / factor - 1)).toBeLessThan(5e-7);
  });

  it("has Kv as 0.865 Cv (IEC 60534-1)", () => {
    expect(fromSi("flowCoefficient", 1, "Kv")).toBeCloseTo(0.865, 3);
  });

  it("has the Joule-Thomson coefficient in °F/psi as its two parts make it", () => {
    const { factor } = unitOf("temperatureDifference", "°F difference");
    expect(unitOf("jouleThomson", "°F/psi").factor / (factor / unitOf("pressureDifference", "psi").factor)).toBeCloseTo(1, 12);
  });

  it.each([
    ["°F", 32, 273.15],
    ["°F", 212, 373.15],
    ["°F", -459.67, 0],
    ["°C", -29, 244.15],
    ["°R", 491.67, 273.15],
    ["K", 300, 300],
  ])("reads %s %d as the temperature it defines", (symbol, value, kelvin) => {
    expect(toSi("temperature", value, symbol)).toBeCloseTo(kelvin, 10);
  });

  it("measures a gauge pressure from the barometer of the site", () => {
    expect(toSi("pressure", 6.9, "bar(g)")).toBe(791325);
    expect(toSi("pressure", 0, "psig", 83000)).toBe(83000);
    expect(fromSi("pressure", 83000, "bar(g)", 83000)).toBe(0);
    expect(toSi("pressure", 1, "bar(a)", 83000)).toBe(1e5);
  });

  it("comes back to the number it started from in every unit", () => {
    const every = (Object.keys(units) as QuantityId[]).flatMap((quantity) =>
      unitSymbols(quantity).map((symbol) => ({ quantity, symbol })),
    );
    fc.assert(
      fc.property(fc.constantFrom(...every), fc.double({ min: -1e6, max: 1e6, noNaN: true }), ({ quantity, symbol }, value) => {
        const back = fromSi(quantity, toSi(quantity, value, symbol, 95000), symbol, 95000);
        expect(Math.abs(back - value)).toBeLessThanOrEqual(
          1e-9 * Math.max(1, Math.abs(value)) + 1e-9 / unitOf(quantity, symbol).factor,
        );
      }),
    );
  });

  it("names the known units when asked for one that isn't there", () => {
    expect(() => toSi("length", 1, "furlong")).toThrow(/no unit of length.*mm/);
    expect(() => toSi("length", 1, "toString")).toThrow(RangeError);
  });
});
