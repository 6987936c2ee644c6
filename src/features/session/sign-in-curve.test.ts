import { describe, expect, it } from "vitest";
import { lastMinute, pressureAt, targetBarGauge, targetMinutes } from "./sign-in-curve";

describe("the curve behind the sign-in form", () => {
  it("starts at 84 bar(g) and passes the mark where the mark stands", () => {
    expect(pressureAt(0)).toBeCloseTo(84, 10);
    expect(pressureAt(targetMinutes)).toBeCloseTo(targetBarGauge, 10);
  });

  it("falls all the way and stays above the choking limit, so that the relation holds", () => {
    // A perfect gas with exponent 1.3 chokes above 1.83 times the atmosphere: (2 / 2.3) ^ (−1.3 / 0.3).
    const chokesAboveBarGauge = 1.01325 * (2 / 2.3) ** (-1.3 / 0.3) - 1.01325;
    for (let minute = 1; minute <= lastMinute; minute++) {
      expect(pressureAt(minute)).toBeLessThan(pressureAt(minute - 1));
      expect(pressureAt(minute)).toBeGreaterThan(chokesAboveBarGauge);
    }
  });
});
