import { describe, expect, it } from "vitest";
import { madeContent, madeRun } from "../../../../tests/fixtures/screening-view";
import type { SizingResult } from "@/engine/cases/sizing-case";
import type { PreparedView } from "@/contracts/views";
import { parseCase } from "@/contracts/case-file";
import { leadingFigureOf, limitOfFigure } from "./limit-of-figure";
import { curveWithEdges, pointAtBore } from "./point-at-bore";
import { sizingOf } from "./sizing-of";
import { spreadBand } from "./spread-band";

describe("figures between two bores", () => {
  const curve = [
    { diameterM: 0.02, timeToTargetS: 900, minimumWallTemperatureK: 250 },
    { diameterM: 0.03, timeToTargetS: 400, minimumWallTemperatureK: 240 },
    { diameterM: 0.04, minimumWallTemperatureK: 235 },
  ];

  it("lie on the straight line, and are left out where a neighbour lacks them", () => {
    const between = pointAtBore(curve, 0.025);
    expect(between.timeToTargetS).toBeCloseTo(650, 9);
    expect(between.minimumWallTemperatureK).toBeCloseTo(245, 9);
    expect(pointAtBore(curve, 0.035)).toEqual({ diameterM: 0.035, minimumWallTemperatureK: expect.closeTo(237.5, 9) as number });
    expect(pointAtBore(curve, 0.02)).toMatchObject({ timeToTargetS: 900 });
    expect(pointAtBore(curve, 0.05)).toEqual({ diameterM: 0.05 });
  });
});

describe("a row of bores", () => {
  it("meets its limit where the edge stands", () => {
    const edge = { diameterM: 0.025, governedBy: "fire-time", value: 700, limit: 700, unit: "s", confirmed: [] } as const;
    const curve = [
      { diameterM: 0.02, timeToTargetS: 900, minimumWallTemperatureK: 250 },
      { diameterM: 0.03, timeToTargetS: 400, minimumWallTemperatureK: 240 },
    ];
    const drawn = curveWithEdges({ curve, smallest: edge } as unknown as SizingResult); // what is read
    expect(drawn.map(({ diameterM, timeToTargetS }) => [diameterM, timeToTargetS])).toEqual([
      [0.02, 900],
      [0.025, 700],
      [0.03, 400],
    ]);
  });
});

describe("the band of several equations", () => {
  const curve = (offset: number, end: number) => ({
    timeS: [0, end / 2, end],
    pressurePa: [3e6, 2e6, 1e6],
    fluidTemperatureK: [300 + offset, 280 + offset, 290 + offset],
  });

  it("holds the lowest and the highest at each time, up to the first end", () => {
    const band = spreadBand([curve(0, 100), curve(4, 100), curve(-2, 100)], "fluidTemperatureK");
    expect(band).toEqual({ timeS: [0, 50, 100], low: [298, 278, 288], high: [304, 284, 294] });
    expect(spreadBand([curve(0, 100), curve(1, 80)], "fluidTemperatureK")?.timeS.at(-1)).toBe(80);
  });

  it("is not there where a run has no such curve", () => {
    expect(spreadBand([curve(0, 100)], "wallTemperatureK")).toBeUndefined();
    expect(spreadBand([], "pressurePa")).toBeUndefined();
  });
});

describe("the figure that a study draws", () => {
  it("is the one whose limit governs, with that limit", () => {
    const run = madeRun();
    expect(leadingFigureOf(run, ["timeToTargetPressureS", "minimumWallTemperatureK"])).toBe("minimumWallTemperatureK");
    expect(limitOfFigure(run, "minimumWallTemperatureK")).toEqual({ at: 244.15, pastWhen: "below", governs: true });
    expect(limitOfFigure(run, "ventedMassKg")).toBeUndefined();
    expect(leadingFigureOf(run, ["ventedMassKg"])).toBe("ventedMassKg");
  });
});

describe("the window asked of a screening", () => {
  const prepared = (...runs: ReturnType<typeof madeRun>[]) => ({ content: madeContent(), runs }) as unknown as PreparedView; // what is read
  const inFire = (letter: string) => {
    const run = madeRun();
    run.document.heat.outside = { model: "surface-fire", basis: "open-pool" };
    return { ...run, letter };
  };

  it("takes the first case in fire and the first without", () => {
    const found = sizingOf(prepared(madeRun(), inFire("B")));
    expect(found?.names).toEqual({ fire: "case B", cold: "case A" });
    expect(parseCase(found?.sizing)).toMatchObject({ ok: true });
  });

  it("does with one of them, and with none where nothing has a bore", () => {
    expect(sizingOf(prepared(madeRun()))?.sizing).not.toHaveProperty("fire");
    const valve = madeRun();
    valve.document.release = {
      path: "valve",
      cv: 10,
      xt: 0.7,
      from: "vapour",
      backPressurePa: 101325,
      openingTimeS: 0,
      flowModel: "frozen",
    };
    expect(sizingOf(prepared(valve))).toBeUndefined();
  });
});
