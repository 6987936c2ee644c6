// Random valid cases; thousands of them run in tests/bench/blowdown-fuzz.ts.
import { describe, expect, it } from "vitest";
import { randomBlowdown } from "../../../../tests/fixtures/random-blowdown";
import { EngineError } from "../../errors";
import { runBlowdown } from "./run-blowdown";

const cases = 60;

describe("sixty random blowdowns", () => {
  it("end with finite numbers that close, or with a typed error that helps, and at most one in sixty with the latter", () => {
    const refused: number[] = [];
    for (let seed = 0; seed < cases; seed++) {
      try {
        const { summary, series } = runBlowdown(randomBlowdown(seed));
        const numbers = [...Object.values(summary), ...Object.values(series).flat()].filter((value) => typeof value === "number");
        expect(numbers.every(Number.isFinite), `seed ${seed}`).toBe(true);
        expect(summary.massClosure, `seed ${seed}`).toBeLessThan(1e-9);
        expect(summary.energyClosure, `seed ${seed}`).toBeLessThan(1e-6);
      } catch (error) {
        if (!(error instanceof EngineError)) throw error;
        expect(error.message.length, `seed ${seed}`).toBeGreaterThan(20);
        refused.push(seed);
      }
    }
    expect(refused.length).toBeLessThanOrEqual(1);
  }, 180_000);
});
