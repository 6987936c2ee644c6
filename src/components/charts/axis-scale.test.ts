import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { axisTitle, roundTicks, timeScale, valueScale } from "./axis-scale";
import type { Curves } from "./curve";

const falling: Curves = {
  x: { name: "time", unit: "min" },
  y: { name: "pressure", unit: "bar(g)", fromZero: true },
  series: [{ id: "p", label: "pressure", tone: "pressure", x: [0, 10, 25], y: [84, 20, 1] }],
  limits: [{ axis: "x", at: 15, label: "15 min allowed" }],
};

describe("ticks", () => {
  it.each([
    [0, 25, 5, [0, 5, 10, 15, 20, 25]],
    [0, 90, 3, [0, 30, 60, 90]],
    [-60, 20, 5, [-60, -40, -20, 0, 20]],
    [0, 0.3, 3, [0, 0.1, 0.2, 0.3]],
    [0, 900, 5, [0, 200, 400, 600, 800]],
  ])("from %d to %d, at most %d, stand at %j", (min, max, most, ticks) => {
    expect(roundTicks(min, max, most)).toEqual(ticks);
  });

  it("are never more than asked for, and never outside", () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e4, max: 1e4, noNaN: true }),
        fc.double({ min: 1e-3, max: 1e5, noNaN: true }),
        fc.integer({ min: 2, max: 8 }),
        (min, span, most) => {
          const ticks = roundTicks(min, min + span, most);
          expect(ticks.length).toBeLessThanOrEqual(most + 1);
          for (const tick of ticks) {
            expect(tick).toBeGreaterThanOrEqual(min - 1e-6 * span);
            expect(tick).toBeLessThanOrEqual(min + span * (1 + 1e-6));
          }
        },
      ),
    );
  });
});

describe("scales", () => {
  it("start pressure at zero and hold the start of the curve", () => {
    expect(valueScale(falling, 3)).toEqual({ min: 0, max: 90, ticks: [0, 30, 60, 90] });
  });

  it("end time with the run", () => expect(timeScale(falling)).toMatchObject({ min: 0, max: 25 }));

  it("hold a limit that no curve reaches", () => {
    const scale = valueScale({
      ...falling,
      y: { name: "temperature", unit: "°C" },
      limits: [{ axis: "y", at: -104, label: "limit" }],
    });
    expect(scale.min).toBeLessThanOrEqual(-104);
  });

  it("draw empty axes when there is nothing to show", () => {
    expect(valueScale({ ...falling, series: [], limits: [] }).max).toBeGreaterThan(0);
    expect(timeScale({ ...falling, series: [], limits: [] })).toMatchObject({ min: 0, max: 1 });
  });

  it("skip points that are not numbers", () => {
    const gap: Curves = { ...falling, series: [{ id: "p", label: "", tone: "pressure", x: [0, 1, 2], y: [10, Number.NaN, 5] }] };
    expect(valueScale(gap)).toMatchObject({ min: 0, max: 10 });
  });
});

it("names an axis with its unit, a pure number without", () => {
  expect(axisTitle({ name: "pressure", unit: "bar(g)" })).toBe("pressure, bar(g)");
  expect(axisTitle({ name: "compressibility", unit: "–" })).toBe("compressibility");
});

describe("a log scale", () => {
  const scale = (y: number[]) =>
    valueScale({
      x: { name: "t", unit: "s" },
      y: { name: "stress", unit: "MPa", log: true },
      series: [{ id: "a", label: "a", tone: "wall", x: y.map((_, i) => i), y }],
    });

  it("spans whole steps of ten", () => {
    expect(scale([1.2, 410])).toEqual({ min: 1, max: 1000, ticks: [1, 10, 100, 1000] });
    expect(scale([0.02, 0.9]).ticks).toEqual([0.01, 0.1, 1]);
  });

  it("is drawn for values that are not above zero too", () => expect(scale([0, -3]).max).toBeGreaterThan(scale([0, -3]).min));
});
