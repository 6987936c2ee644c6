import { describe, expect, it } from "vitest";
import { measureVessel, type VesselShape } from "@/engine/vessel/geometry";
import { headShapes } from "@/engine/vessel/head";
import { cutAtLevel, profileOf, type Point } from "./vessel-profile";

const cylinder = (heads: (typeof headShapes)[number], orientation: "vertical" | "horizontal", L = 4): VesselShape => ({
  shape: "cylinder",
  orientation,
  insideDiameterM: 2,
  tangentLengthM: L,
  heads,
});

/** Volume of the body that an outline makes when it turns about an axis: Pappus, piece by piece of the half outline. */
function turned(outline: readonly Point[], along: (p: Point) => number, radius: (p: Point) => number): number {
  const points = [...outline, outline[0] as Point];
  const volume = points.slice(1).reduce((sum, point, i) => {
    const before = points[i] as Point;
    const [r0, r1] = [Math.max(radius(before), 0), Math.max(radius(point), 0)];
    return sum + (Math.PI / 3) * (r0 * r0 + r0 * r1 + r1 * r1) * (along(point) - along(before));
  }, 0);
  return Math.abs(volume);
}

describe("the outline of a vessel", () => {
  it.each(headShapes)("encloses the volume that the geometry gives, lying, heads %s", (heads) => {
    const vessel = cylinder(heads, "horizontal");
    const profile = profileOf(vessel);
    expect(profile).toBeDefined();
    const volume = turned(
      profile?.outline ?? [],
      (p) => p.x,
      (p) => p.y - 1,
    );
    expect(volume / measureVessel(vessel).volumeM3).toBeCloseTo(1, 2);
  });

  it.each(headShapes)("encloses the volume that the geometry gives, standing, heads %s", (heads) => {
    const vessel = cylinder(heads, "vertical");
    const profile = profileOf(vessel);
    const volume = turned(
      profile?.outline ?? [],
      (p) => p.y,
      (p) => p.x - 1,
    );
    expect(volume / measureVessel(vessel).volumeM3).toBeCloseTo(1, 2);
    expect(profile?.heightM).toBeCloseTo(measureVessel(vessel).heightM ?? 0, 10);
  });

  it("is a circle for a sphere", () => {
    const profile = profileOf({ shape: "sphere", insideDiameterM: 3 });
    for (const { x, y } of profile?.outline ?? []) expect(Math.hypot(x - 1.5, y - 1.5)).toBeCloseTo(1.5, 10);
  });

  it("is broken where the shell is too long to be seen, and says how long it is", () => {
    const profile = profileOf(cylinder("flat", "vertical", 60));
    expect(profile).toMatchObject({ broken: true, trueHeightM: 60 });
    expect(profile?.heightM).toBeLessThan(30);
    expect(profileOf(cylinder("flat", "horizontal", 4))?.broken).toBe(false);
  });

  it("is nothing for a plain volume", () => expect(profileOf({ shape: "volume", volumeM3: 3 })).toBeUndefined());
});

describe("an outline cut at a level", () => {
  const outline = profileOf(cylinder("ellipsoidal-2-1", "horizontal"))?.outline ?? [];

  it("ends both runs of wall on the level", () => {
    for (const level of [0.1, 0.6, 1, 1.4, 1.95]) {
      const { below, above } = cutAtLevel(outline, level);
      for (const end of [below[0], below.at(-1), above[0], above.at(-1)]) expect(end?.y).toBeCloseTo(level, 10);
      expect(Math.max(...below.map(({ y }) => y))).toBeCloseTo(level, 10);
      expect(Math.min(...above.map(({ y }) => y))).toBeCloseTo(level, 10);
    }
  });

  it("has no liquid side when dry and no gas side when full", () => {
    expect(cutAtLevel(outline, 0).below).toEqual([]);
    expect(cutAtLevel(outline, 2).above).toEqual([]);
  });

  it("keeps the length of wall, whatever the level", () => {
    const length = (run: readonly Point[]) =>
      run.slice(1).reduce((sum, p, i) => sum + Math.hypot(p.x - (run[i]?.x ?? 0), p.y - (run[i]?.y ?? 0)), 0);
    const whole = length(cutAtLevel(outline, 0).above);
    for (const level of [0.2, 1, 1.7]) {
      const { below, above } = cutAtLevel(outline, level);
      expect(length(below) + length(above)).toBeCloseTo(whole, 8);
    }
  });
});
