import { describe, expect, it } from "vitest";
import { methodCheck, numberIn } from "../../../tests/fixtures/method-check";
import { fireFluxWPerM2 } from "../heat/surface-fire";
import { steelById } from "../steels/steel";
import { heatUp } from "./heat-up";
import { crossingTime, strengthPa, stressPa } from "./rupture";

const steel = steelById("carbon_steel");
const atmosphere = 101325;
// The open-pool set of this program is that of the check.
const dry = {
  steel,
  thicknessM: 0.025,
  startK: 293.15,
  fireFluxWPerM2: (T: number) => fireFluxWPerM2("open-pool", T),
  insideFluxWPerM2: () => 0,
};
const values = (record: unknown): number[] => (record as { value: number }[]).map(({ value }) => value);

describe("a dry wall in a fire", () => {
  const check = methodCheck("M6-05");
  const [at300, at600, at900] = values(check.expected.T);
  const { timeS, temperatureK } = heatUp(dry, { fromS: 0, untilS: 900, steps: 600 });
  const celsiusAt = (t: number): number => (temperatureK[timeS.findIndex((time) => Math.abs(time - t) < 1e-6)] ?? 0) - 273.15;

  it.each([
    [300, at300],
    [600, at600],
    [900, at900],
  ])(`agrees with ${check.source} at %d s`, (t, expected) => {
    expect(Math.abs(celsiusAt(t) - (expected ?? 0))).toBeLessThanOrEqual(numberIn(check.tolerance, "absolute_T"));
  });

  it("does not depend on the number of steps", () => {
    const fine = heatUp(dry, { fromS: 0, untilS: 900, steps: 2400 }).temperatureK.at(-1) ?? 0;
    expect(Math.abs((temperatureK.at(-1) ?? 0) - fine)).toBeLessThan(0.01);
  });

  it("comes to rest where the fire gives no more heat", () => {
    const last = heatUp(dry, { fromS: 0, untilS: 40000, steps: 4000 }).temperatureK.at(-1) ?? 0;
    expect(Math.abs(fireFluxWPerM2("open-pool", last))).toBeLessThan(1);
  });
});

describe("stress against hot strength", () => {
  const check = methodCheck("M6-06");
  const part = { steel, insideDiameterM: 1.475, thicknessM: 0.025, sphere: false };
  const rule = { strengthFraction: 1, tensileStrengthPa: 485e6 };

  it("has the hoop stress of the check", () => {
    expect(stressPa(part, 4e6 + atmosphere)).toBeCloseTo(numberIn(check.expected, "hoop") * 1e6, 3);
    expect(stressPa({ ...part, sphere: true }, 4e6 + atmosphere)).toBeCloseTo(60e6, 3);
    expect(stressPa(part, 5e4)).toBe(0);
  });

  it(`ruptures when ${check.source} says`, () => {
    const { timeS, temperatureK } = heatUp(dry, { fromS: 0, untilS: 1800, steps: 900 });
    const time = crossingTime(
      timeS,
      temperatureK.map((T) => strengthPa(steel, rule, T)),
      temperatureK.map(() => stressPa(part, 4e6 + atmosphere)),
    );
    expect(Math.abs((time ?? 0) / numberIn(check.expected, "t") - 1)).toBeLessThan(numberIn(check.tolerance, "relative_time"));
  });

  it("finds no crossing where the strength stays above", () => {
    expect(crossingTime([0, 1, 2], [3, 2, 1.5], [1, 1, 1])).toBeUndefined();
    expect(crossingTime([0, 1, 2], [3, 2, 0], [1, 1, 1])).toBeCloseTo(1.5, 12);
    expect(crossingTime([0, 1], [1, 0], [2, 2])).toBe(0);
  });
});
