import fc from "fast-check";
import { expect, it } from "vitest";
import { bridgeBars } from "./bridge";

it("starts each step where the last one ended, and the sum at zero", () => {
  const bars = bridgeBars(
    [
      { label: "Departure out", value: 128.8 },
      { label: "Ideal-gas change", value: -116.6 },
      { label: "Departure back", value: -35.9 },
    ],
    { label: "Change of enthalpy" },
  );
  expect(bars.map(({ from, kind }) => [Number(from.toFixed(6)), kind])).toEqual([
    [0, "rise"],
    [128.8, "fall"],
    [12.2, "fall"],
    [0, "sum"],
  ]);
  expect(bars.at(-1)?.to).toBeCloseTo(-23.7, 9);
});

it("ends at the sum of any steps", () => {
  fc.assert(
    fc.property(fc.array(fc.double({ min: -1e3, max: 1e3, noNaN: true }), { maxLength: 6 }), (values) => {
      const bars = bridgeBars(
        values.map((value, i) => ({ label: String(i), value })),
        { label: "sum" },
      );
      expect(bars.at(-1)?.value).toBeCloseTo(
        values.reduce((a, b) => a + b, 0),
        6,
      );
    }),
  );
});
