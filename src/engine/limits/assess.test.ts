import { describe, expect, it } from "vitest";
import { assess, type Figure } from "./assess";

const time = (value: number | undefined, limit: number | undefined): Figure => ({
  id: "time-to-target",
  title: "t",
  unit: "s",
  sense: "at-most",
  value,
  limit,
  required: false,
});
const wall = (value: number | undefined, limit: number | undefined): Figure => ({
  id: "minimum-wall-temperature",
  title: "w",
  unit: "K",
  sense: "at-least",
  value,
  limit,
  required: true,
});

const verdictOf = (figure: Figure, band = {}) => assess([figure], band).limits[0]?.verdict;

describe("assess", () => {
  it("counts what is used up of a least value as its limit over the value", () => {
    const ratio: Figure = {
      id: "least-strength-ratio",
      title: "r",
      unit: "1",
      sense: "at-least",
      value: 4,
      limit: 1,
      required: false,
    };
    expect(assess([ratio], {}).limits[0]).toMatchObject({ verdict: "within", inHand: 3, share: 0.25 });
    expect(assess([{ ...ratio, value: 1.05 }], {}).verdict).toBe("near");
    expect(assess([{ ...ratio, value: 0.9 }], {}).verdict).toBe("beyond");
  });

  it.each([
    [800, 900, "within"],
    [809.9, 900, "within"],
    [810.1, 900, "near"],
    [899, 900, "near"],
    [900, 900, "beyond"],
    [901, 900, "beyond"],
    [undefined, 900, "open"],
    [800, undefined, "open"],
  ])("calls %s against at most %s %s", (value, limit, verdict) => expect(verdictOf(time(value, limit))).toBe(verdict));

  it.each([
    [260, 244.15, "within"],
    [254.2, 244.15, "within"],
    [254.1, 244.15, "near"],
    [244.15, 244.15, "beyond"],
    [240, 244.15, "beyond"],
  ])("calls a wall at %s K against %s K %s", (value, limit, verdict) => expect(verdictOf(wall(value, limit))).toBe(verdict));

  it("widens the near band as a policy asks, and never narrows it", () => {
    expect(verdictOf(wall(260, 244.15), { bandK: 20 })).toBe("near");
    expect(verdictOf(wall(252, 244.15), { bandK: 1 })).toBe("near");
    expect(verdictOf(time(700, 900), { bandFraction: 0.3 })).toBe("near");
    expect(verdictOf(time(820, 900), { bandFraction: 0.01 })).toBe("near");
  });

  it("takes the worst of the lines, Open aside", () => {
    expect(assess([time(100, 900), wall(300, 244.15)], {}).verdict).toBe("within");
    expect(assess([time(undefined, undefined), wall(300, 244.15)], {}).verdict).toBe("within");
    expect(assess([time(850, 900), wall(300, 244.15)], {}).verdict).toBe("near");
    expect(assess([time(950, 900), wall(300, 244.15)], {}).verdict).toBe("beyond");
    expect(assess([time(undefined, undefined)], {}).verdict).toBe("open");
  });

  it("is Open while a required limit is missing, unless something is Beyond", () => {
    expect(assess([time(100, 900), wall(300, undefined)], {}).verdict).toBe("open");
    expect(assess([time(950, 900), wall(300, undefined)], {}).verdict).toBe("beyond");
  });

  it("lets the line with the least in hand, relative to its band, govern, and only one", () => {
    const { limits } = assess([time(855, 900), wall(250, 244.15)], {});
    expect(limits.map((limit) => limit.governs)).toEqual([true, false]); // 45 of 90 s against 5.85 of 10 K
    expect(limits[0]).toMatchObject({ inHand: 45, share: 0.95 });
    expect(limits[1]?.share).toBeUndefined();
    expect(assess([time(undefined, undefined), wall(undefined, 1)], {}).limits.some((limit) => limit.governs)).toBe(false);
  });
});
