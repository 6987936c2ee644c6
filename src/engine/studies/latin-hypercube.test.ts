import { describe, expect, it } from "vitest";
import { methodCheck, numberIn } from "../../../tests/fixtures/method-check";
import { inverseNormal, valueAt } from "./distributions";
import { latinHypercube } from "./latin-hypercube";

describe("a Latin hypercube", () => {
  const check = methodCheck("M10-02");
  const samples = numberIn(check.inputs, "N");

  it.each([1, 2, 4127, 4294967295])(`hits every stratum once, as ${check.source} defines it, seed %d`, (seed) => {
    const points = latinHypercube({ samples, variables: 6, seed });
    for (let k = 0; k < 6; k++) {
      const column = points.map((point) => point[k] ?? -1);
      expect(new Set(column.map((p) => Math.floor(p * samples))).size).toBe(numberIn(check.expected, "strata_hit"));
      const mean = column.reduce((sum, p) => sum + p, 0) / samples;
      expect(Math.abs(mean - 0.5)).toBeLessThanOrEqual(numberIn(check.expected, "max_abs_mean_error"));
      expect(Math.min(...column)).toBeGreaterThan(0);
      expect(Math.max(...column)).toBeLessThan(1);
    }
  });

  it("is the same for the same seed and another for another", () => {
    const of = (seed: number): string => JSON.stringify(latinHypercube({ samples: 20, variables: 3, seed }));
    expect(of(7)).toBe(of(7));
    expect(of(7)).not.toBe(of(8));
  });

  it("pairs the variables without order: rank correlations are small", () => {
    const points = latinHypercube({ samples: 1000, variables: 3, seed: 5 });
    const correlation = (a: number, b: number): number =>
      points.reduce((sum, point) => sum + ((point[a] ?? 0) - 0.5) * ((point[b] ?? 0) - 0.5), 0) / (1000 / 12);
    expect(Math.abs(correlation(0, 1))).toBeLessThan(0.1);
    expect(Math.abs(correlation(1, 2))).toBeLessThan(0.1);
  });
});

describe("distributions", () => {
  // Standard normal quantiles, as any table prints them.
  it.each([
    [0.5, 0],
    [0.95, 1.6448536],
    [0.975, 1.959964],
    [0.001, -3.0902323],
  ])("has the normal quantile of %d", (p, z) => expect(inverseNormal(p)).toBeCloseTo(z, 6));

  it("puts low and high of a lognormal at its 5 and 95 % points", () => {
    const film = { input: "inside-film", distribution: "lognormal", low: 0.5, high: 2 } as const;
    expect(valueAt(film, 1, 0.05)).toBeCloseTo(0.5, 6);
    expect(valueAt(film, 1, 0.95)).toBeCloseTo(2, 6);
    expect(valueAt(film, 1, 0.5)).toBeCloseTo(1, 9);
  });

  it("follows the triangle of its ends and peak", () => {
    const skew = { input: "volume", distribution: "triangular", low: 0, high: 4, peak: 1 } as const;
    expect(valueAt(skew, 1, 0.25)).toBeCloseTo(1, 12); // the area below the peak is (c − a)/(b − a)
    expect(valueAt(skew, 1, 0)).toBe(0);
    expect(valueAt(skew, 1, 1)).toBe(4);
    const oneSided = { input: "wall-thickness", distribution: "triangular", low: 0.875, high: 1 } as const;
    expect(valueAt(oneSided, 1, 0.25)).toBeCloseTo(0.875 + 0.125 / 2, 12);
  });

  it("spreads a uniform input evenly", () => {
    expect(valueAt({ input: "volume", distribution: "uniform", low: 1, high: 3 }, 1, 0.25)).toBe(1.5);
  });
});
