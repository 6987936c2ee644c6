import { describe, expect, it } from "vitest";
import { ebbOf } from "./ebb";

const run = (timeToTargetPressureS?: number) => ({
  series: { timeS: [0, 300, 600, 900], pressurePa: [8e6, 4e6, 2e6, 1e6] } as Parameters<typeof ebbOf>[1]["series"],
  verdict: "within" as const,
  summary: timeToTargetPressureS === undefined ? {} : { timeToTargetPressureS },
});
const start = { pressurePa: 8e6, temperatureK: 300 };
const allowed = { start, limits: { targetPressurePa: 3e6, targetTimeS: 900 } };

describe("ebbOf", () => {
  it("puts the post where the target is reached, over twice the time allowed", () => {
    expect(ebbOf(allowed, run(450)).postX).toBe(0.25);
  });
  it("has no post where the target is never reached, or only after the width", () => {
    expect(ebbOf(allowed, run()).postX).toBeNull();
    expect(ebbOf(allowed, run(2000)).postX).toBeNull();
  });
  it("is as wide as the run where no time is allowed", () => {
    const ebb = ebbOf({ start }, run());
    expect([ebb.x.at(-1), ebb.y.at(0), ebb.y.at(-1)]).toEqual([1, 1, 0.125]);
  });
});
