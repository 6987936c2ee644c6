import { describe, expect, it } from "vitest";
import { seriesOfLine, type PhaseLine } from "./phase-line";

const line = (...points: [number, number][]): PhaseLine => ({
  id: "dew",
  label: "dew line",
  tone: "dew",
  points: points.map(([x, y]) => ({ x, y })),
});

describe("a line of a phase diagram", () => {
  it("that turns back is two curves in rising x that meet at the turn; the longer one carries the name", () => {
    const [below, above] = seriesOfLine(line([-20, 1], [0, 10], [30, 50], [10, 90]));
    expect(below).toMatchObject({ x: [-20, 0, 30], y: [1, 10, 50], label: "dew line" });
    expect(below?.quiet).toBeUndefined();
    expect(above).toMatchObject({ x: [10, 30], y: [90, 50], quiet: true });
  });

  it("that falls all the way is one curve, turned round", () => {
    expect(seriesOfLine(line([10, 5], [0, 3], [-10, 1])).map(({ x }) => x)).toEqual([[-10, 0, 10]]);
  });

  it("goes upright without being cut", () => {
    expect(seriesOfLine(line([0, 1], [5, 2], [5, 3], [9, 4])).map(({ y }) => y)).toEqual([[1, 2, 3, 4]]);
  });

  it("leaves out what is no number, and a lone point", () => {
    expect(seriesOfLine(line([0, 1], [1, Number.NaN], [2, 3])).map(({ x }) => x)).toEqual([[0, 2]]);
    expect(seriesOfLine(line([0, 1]))).toEqual([]);
  });
});
