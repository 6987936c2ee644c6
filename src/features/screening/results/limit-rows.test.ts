import { describe, expect, it } from "vitest";
import { madeCase, madeRun } from "../../../../tests/fixtures/screening-view";
import { limitRows } from "./limit-rows";

const si = { system: "SI", barometricPressurePa: 101325 } as const;

describe("the rows of the limit table", () => {
  it("puts the governing limit first, each under the number of its line", () => {
    const rows = limitRows(madeCase(), madeRun(), si);
    expect(rows.map(({ no, governs }) => [no, governs])).toEqual([
      ["A7.02", true],
      ["A7.01", false],
      ["A7.03", false],
      ["A7.04", false],
    ]);
  });

  it("says value, limit, distance and band in the units shown", () => {
    const [wall] = limitRows(madeCase(), madeRun(), si);
    expect(wall).toMatchObject({
      computed: "−27.2\u00a0°C",
      limit: "not below −29.0\u00a0°C",
      inHand: "1.8\u00a0K",
      note: "band 10\u00a0K",
    });
    const [inFahrenheit] = limitRows(madeCase(), madeRun(), { ...si, system: "US" });
    expect(inFahrenheit).toMatchObject({
      computed: "−17.0\u00a0°F",
      limit: "not below −20.2\u00a0°F",
      note: "band 18\u00a0°F difference",
    });
  });

  it("never rounds a value onto its limit", () => {
    const run = madeRun();
    const wall = run.result.limits.find(({ id }) => id === "minimum-wall-temperature");
    if (!wall) throw new Error("no wall");
    wall.value = 244.17;
    wall.inHand = 0.02;
    const [row] = limitRows(madeCase(), run, si);
    expect(row?.computed).not.toBe("−29.0\u00a0°C");
    expect(row?.inHand).toBe("0.02\u00a0K");
  });

  it("names the target in the title and gives what is left of the time", () => {
    const time = limitRows(madeCase(), madeRun(), si)[1];
    expect(time).toMatchObject({
      title: "Time to 6.90\u00a0bar(g)",
      computed: "13.6\u00a0min",
      limit: "at most 15.0\u00a0min",
      note: "9\u00a0%",
    });
  });

  it("says that a target was not reached instead of giving the end of the run as its time", () => {
    const run = madeRun();
    delete run.result.summary.timeToTargetPressureS;
    const time = limitRows(madeCase(), run, si).find(({ no }) => no === "A7.01");
    expect(time).toMatchObject({ computed: "not reached", inHand: null });
  });

  it("leaves limit and distance empty where none was entered", () => {
    const vent = limitRows(madeCase(), madeRun(), si).at(-1);
    expect(vent).toMatchObject({ computed: "12.7\u00a0kg/s", limit: null, inHand: null, verdict: "open" });
  });
});
