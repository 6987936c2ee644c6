import { describe, expect, it } from "vitest";
import { coarse, fine, integralOf, unresolved, valueAt } from "./chebyshev";

const on = (f: (s: number) => number, places: Float64Array) => Float64Array.from(places, f);

describe("functions on Chebyshev points", () => {
  it("give a polynomial of the degree of the points back, and its integral", () => {
    const eighth = (s: number) => 1 - 3 * s + 7 * s ** 5 - 2 * s ** 8;
    const values = on(eighth, coarse.places);
    for (const s of [0, 0.013, 0.37, 0.5, 0.91, 1]) expect(valueAt(values, s)).toBeCloseTo(eighth(s), 12);
    expect(integralOf(values)).toBeCloseTo(1 - 3 / 2 + 7 / 6 - 2 / 9, 13);
    expect(integralOf(on((s) => 17 * s ** 16, fine.places))).toBeCloseTo(1, 12);
  });

  it("tell what they leave unresolved", () => {
    const steep = (s: number) => Math.exp(-6 * s);
    const values = on(steep, coarse.places);
    const worst = Math.max(...Array.from({ length: 101 }, (_, k) => Math.abs(valueAt(values, k / 100) - steep(k / 100))));
    expect(unresolved(values)).toBeGreaterThan(worst);
    expect(unresolved(values)).toBeLessThan(100 * worst);
    expect(unresolved(on((s) => Math.abs(s - 0.4), fine.places))).toBeGreaterThan(1e-3);
    expect(unresolved(on((s) => s ** 3, coarse.places))).toBeLessThan(1e-15);
  });
});
