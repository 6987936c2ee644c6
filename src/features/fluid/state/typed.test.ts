import { describe, expect, it } from "vitest";
import { inUnit, readState, readTyped, shownTyped, typedState, unitApart } from "./typed";

const baro = 100_000;

describe("a typed quantity", () => {
  it("is read with its unit, gauge pressures from the barometer of the site", () => {
    expect(readTyped("pressure", { text: "9", unit: "bar(g)" }, baro)).toEqual({ si: 1e6 });
    expect(readTyped("temperature", { text: "300 K", unit: "°C" }, baro)).toEqual({ si: 300 });
    expect(readTyped("pressure", { text: " ", unit: "bar(a)" }, baro)).toEqual({ empty: true });
  });

  it.each([
    ["pressure", "-3", "bar(g)", /no pressure above vacuum/],
    ["pressure", "2e5", "bar(a)", /above 10/],
    ["temperature", "-274", "°C", /absolute zero/],
    ["temperature", "9000", "K", /above 5000 K/],
    ["pressure", "12,5", "bar(a)", /comma/],
    ["pressure", "5 bar", "bar(a)", /gauge or absolute/],
  ] as const)("refuses %s %s %s in words", (quantity, text, unit, words) => {
    expect(readTyped(quantity, { text, unit }, baro)).toEqual({ problem: expect.stringMatching(words) as string });
  });

  it("keeps its text where the unit belongs to the system in use, and is converted where it doesn't", () => {
    const typed = { text: "070.0", unit: "bar(g)" };
    expect(shownTyped("pressure", typed, "SI", baro)).toBe(typed);
    expect(shownTyped("pressure", typed, "US", 101_325)).toEqual({ text: "1029.96", unit: "psia" });
  });

  it("goes to another unit with its value, or as it stands when it can't be read", () => {
    expect(inUnit("temperature", { text: "25", unit: "°C" }, "K", baro)).toEqual({ text: "298.15", unit: "K" });
    expect(inUnit("temperature", { text: "cold", unit: "°C" }, "K", baro)).toEqual({ text: "cold", unit: "K" });
  });

  it("gives the unit behind its figure to the unit box", () => {
    expect(unitApart("pressure", { text: "319 psig", unit: "bar(a)" }, baro)).toEqual({ text: "319", unit: "psig" });
    expect(unitApart("pressure", { text: "319", unit: "bar(a)" }, baro)).toEqual({ text: "319", unit: "bar(a)" });
  });

  it("gives a state only with both", () => {
    const state = typedState({ temperatureK: 300, pressurePa: 7e6 }, "SI");
    expect(readState(state, baro)).toEqual({ temperatureK: 300, pressurePa: 7e6 });
    expect(readState({ ...state, pressure: { text: "", unit: "bar(a)" } }, baro)).toBeUndefined();
  });
});
