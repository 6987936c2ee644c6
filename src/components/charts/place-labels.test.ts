import { describe, expect, it } from "vitest";
import {
  leaderTo,
  placeLabels,
  placesAlong,
  placesAround,
  placesAtLevel,
  placesAtPost,
  type Box,
  type Obstacles,
  type Point,
} from "./place-labels";

const area: Box = { left: 0, top: 0, right: 300, bottom: 200 };
const size = { width: 60, height: 16 };
const falling: Point[] = Array.from({ length: 100 }, (_, i) => ({ x: i * 3, y: 190 - 180 * Math.exp(-i / 25) }));
const flat = (y: number): Point[] => Array.from({ length: 100 }, (_, i) => ({ x: i * 3, y }));
const place = (places: Point[], obstacles: Partial<Obstacles>, own?: number) =>
  placeLabels([{ ...size, places, own }], { area, curves: [], levels: [], posts: [], ...obstacles })[0];
const covers = (box: Box | null | undefined, points: Point[]) =>
  points.some(({ x, y }) => box && x > box.left && x < box.right && y > box.top && y < box.bottom);

describe("the name of a curve", () => {
  it("stands beside the curve, not on it", () => {
    expect(covers(place(placesAlong(falling, size), { curves: [falling] }, 0), falling)).toBe(false);
  });

  it("never stands on a limit line", () => {
    const level = falling[45]!.y - 12;
    const box = place(placesAlong(falling, size), { curves: [falling], levels: [level] }, 0)!;
    expect(level > box.top && level < box.bottom).toBe(false);
  });

  it("keeps away from another curve that it could be taken for", () => {
    const box = place(placesAlong(flat(100), size), { curves: [flat(100), flat(84)] }, 0)!;
    expect(box.top).toBeGreaterThan(100);
  });

  it("stays inside the axes", () => {
    const box = place(placesAlong(flat(5), size), { curves: [flat(5)] }, 0)!;
    expect(box.top).toBeGreaterThan(5);
  });
});

it("keeps two labels apart", () => {
  const mark = { x: 150, y: 100 };
  const [first, second] = placeLabels(
    [
      { ...size, places: placesAround(mark, size) },
      { ...size, places: placesAround({ x: 155, y: 100 }, size) },
    ],
    { area, curves: [], levels: [], posts: [] },
  );
  expect(
    first!.right <= second!.left || second!.right <= first!.left || first!.bottom <= second!.top || second!.bottom <= first!.top,
  ).toBe(true);
});

it("sets the words of a level at its right end, above the line", () => {
  const box = place(placesAtLevel(100, area, size), {})!;
  expect(box.right).toBeGreaterThan(290);
  expect(box.bottom).toBeLessThan(100);
});

it("turns the words of a post at the edge to its left", () => {
  const box = place(placesAtPost(290, area, size), {})!;
  expect(box.right).toBeLessThan(290);
});

it("has nowhere to put a label without places", () => {
  expect(placeLabels([{ ...size, places: [] }], { area, curves: [], levels: [], posts: [] })).toEqual([null]);
});

describe("a label that has to stand off", () => {
  it("is joined to its point by a line that ends at its edge", () => {
    expect(leaderTo({ x: 0, y: 0 }, { left: 30, right: 90, top: -50, bottom: -34 })).toEqual({ x: 30, y: -34 });
  });
  it("needs no line close by", () => {
    expect(leaderTo({ x: 0, y: 0 }, { left: -30, right: 30, top: -26, bottom: -9 })).toBeNull();
  });
  it("prefers to stay close: an empty chart puts it right above its point", () => {
    const box = place(placesAround({ x: 150, y: 100 }, size), {})!;
    expect([(box.left + box.right) / 2, box.bottom]).toEqual([150, 91]);
  });
});
