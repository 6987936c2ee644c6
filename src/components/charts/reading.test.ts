import { describe, expect, it } from "vitest";
import type { Curves } from "./curve";
import { valueAt } from "./curve-plugin";
import { moveReading, readingAt } from "./reading";

const curves: Curves = {
  x: { name: "time", unit: "min", format: (value) => value.toFixed(1) },
  y: { name: "temperature", unit: "°C", format: (value) => value.toFixed(1) },
  series: [
    { id: "fluid", label: "fluid", tone: "fluid", x: [0, 10, 20], y: [10, -10, -20] },
    { id: "wall", label: "inner wall", tone: "wall", x: [0, 10], y: [10, 5] },
    { id: "before", label: "before", tone: "ghost", x: [0, 20], y: [0, 0] },
  ],
};

describe("reading the curves", () => {
  it("goes straight between points, and has no value beyond the last or in a gap", () => {
    expect(valueAt({ x: [0, 10], y: [10, 5] }, 5)).toBe(7.5);
    expect(valueAt({ x: [0, 10], y: [10, 5] }, 10)).toBe(5);
    expect(valueAt({ x: [0, 10], y: [10, 5] }, 11)).toBeNull();
    expect(valueAt({ x: [2, 10], y: [10, 5] }, 1)).toBeNull();
    expect(valueAt({ x: [0, 10, 20], y: [1, NaN, 3] }, 5)).toBeNull();
  });

  it("says what each curve shows there, without ghosts and without curves that have ended", () => {
    expect(readingAt(curves, 5)).toBe("at 5.0\u00a0min, fluid 0.0\u00a0°C, inner wall 7.5\u00a0°C");
    expect(readingAt(curves, 20)).toBe("at 20.0\u00a0min, fluid -20.0\u00a0°C");
  });
});

describe("keys", () => {
  const span = { min: 0, max: 20 };
  it.each([
    ["ArrowRight", null, false, 0],
    ["ArrowRight", 1, false, 1.2],
    ["ArrowLeft", null, false, 20],
    ["ArrowLeft", 0.1, false, 0],
    ["ArrowRight", 1, true, 3],
    ["Home", 7, false, 0],
    ["End", 7, false, 20],
    ["Escape", 7, false, null],
  ] as const)("%s from %s, fast %s, goes to %s", (key, from, fast, to) => {
    const next = moveReading(key, from, span, fast);
    if (to === null) expect(next).toBeNull();
    else expect(next).toBeCloseTo(to, 10);
  });

  it("leaves every other key to the page", () => {
    expect(moveReading("Tab", 7, span, false)).toBeUndefined();
    expect(moveReading("Escape", null, span, false)).toBeUndefined();
  });
});
