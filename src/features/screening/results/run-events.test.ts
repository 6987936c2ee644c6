import { describe, expect, it } from "vitest";
import { madeRun } from "../../../../tests/fixtures/screening-view";
import { runEvents } from "./run-events";

function runWith(vapourMoleFraction: number[], timeS: number[]) {
  const { result } = madeRun();
  return {
    series: { ...result.series, timeS, vapourMoleFraction },
    summary: { ...result.summary, endTimeS: timeS.at(-1) ?? 0 },
  };
}

describe("what happened in a run", () => {
  it("names phases that appear and go, at their times", () => {
    expect(runEvents(runWith([1, 1, 0.99, 0.9, 1, 1], [0, 100, 100, 200, 300, 400]))).toEqual([
      { timeS: 100, row: 2, words: "first liquid" },
      { timeS: 300, row: 4, words: "last liquid gone" },
    ]);
    expect(runEvents(runWith([0, 0.01, 0.5], [0, 5, 50]))).toEqual([{ timeS: 5, row: 1, words: "first vapour" }]);
  });

  it("leaves out a flicker that is undone at once", () => {
    expect(runEvents(runWith([1, 0.999, 1, 1], [0, 100, 100.1, 400]))).toEqual([]);
  });

  it("has nothing to tell of a gas that stays gas", () => expect(runEvents(madeRun().result)).toEqual([]));
});
