import { describe, expect, it } from "vitest";
import { madeRun } from "../../../../tests/fixtures/screening-view";
import { runCurves } from "./curves";

const si = { system: "SI", barometricPressurePa: 101325 } as const;

describe("the curves of a run", () => {
  it("share one axis of time, in minutes, to the end of the run", () => {
    const { pressure, ventRate, temperature } = runCurves(madeRun(), si);
    for (const { x } of [pressure, ventRate, temperature]) expect(x).toMatchObject({ unit: "min", min: 0, max: 25 });
  });

  it("turn to seconds where the whole run is short", () => {
    const run = madeRun();
    run.result.summary.endTimeS = 100;
    expect(runCurves(run, si).pressure.x).toMatchObject({ unit: "s", max: 100 });
  });

  it("mark the target where it was reached, and not where it was not", () => {
    expect(runCurves(madeRun(), si).pressure.marks).toEqual([
      { x: 13.6, y: expect.closeTo(6.9, 10), label: "6.90\u00a0bar(g) after 13.6\u00a0min" },
    ]);
    const missed = madeRun();
    delete missed.result.summary.timeToTargetPressureS;
    expect(runCurves(missed, si).pressure.marks).toEqual([]);
  });

  it("draw the wall and its limit only where a wall is in the balance", () => {
    const walled = runCurves(madeRun(), si).temperature;
    expect(walled.series.map(({ id }) => id)).toEqual(["fluid", "wall"]);
    expect(walled.limits?.[0]).toMatchObject({ axis: "y", label: "minimum design metal temperature −29.0\u00a0°C" });
    const bare = madeRun();
    delete bare.result.series.gasWallTemperatureK;
    expect(runCurves(bare, si).temperature).toMatchObject({ series: [{ id: "fluid" }], limits: [] });
  });

  it("draw what leaves the opening, with the limit where one is set", () => {
    const run = madeRun();
    expect(runCurves(run, si).outlet).toMatchObject({ series: [{ id: "outlet" }], limits: [] });
    run.document.limits = { ...run.document.limits, minimumOutletTemperatureK: 169.15 };
    expect(runCurves(run, si).outlet.limits).toMatchObject([{ axis: "y", label: "not below −104.0\u00a0°C" }]);
  });

  it("tell the wall that gas wets from the one that liquid wets, where they differ", () => {
    const run = madeRun();
    const { series } = run.result;
    series.liquidWallTemperatureK = (series.gasWallTemperatureK ?? []).map((value) => value - 5);
    expect(runCurves(run, si).temperature.series.map(({ id }) => id)).toEqual(["fluid", "gas-wall", "liquid-wall"]);
  });

  it("draw mass and energy always, and the level where there was liquid", () => {
    const run = madeRun();
    expect(runCurves(run, si)).toMatchObject({ mass: { series: [{ id: "mass" }] }, energy: { series: [{ id: "energy" }] } });
    expect(runCurves(run, si).level).toBeUndefined();
    run.result.series.liquidLevelM = run.result.series.timeS.map((_, row) => Math.max(0, 0.5 - row / 10));
    expect(runCurves(run, si).level).toMatchObject({ y: { unit: "m", fromZero: true } });
    expect(runCurves(run, { ...si, system: "US" }).level?.series[0]?.y[0]).toBeCloseTo(1.6404, 4);
  });

  it("follow the units shown", () => {
    expect(runCurves(madeRun(), { ...si, system: "US" }).pressure).toMatchObject({ y: { unit: "psig" } });
  });
});
