import { describe, expect, it } from "vitest";
import { verdictWords } from "@/components/verdict/verdict";
import type { CaseRunView } from "@/contracts/views";
import { madeContent, madeRun } from "../../../../tests/fixtures/screening-view";
import { compareCurves } from "./compare-curves";
import { changedLines, compareTitle, movedLimits, sameFluid, type Side } from "./sides";

function side(name: string, change: (run: CaseRunView, content: ReturnType<typeof madeContent>) => void = () => undefined): Side {
  const content = madeContent();
  const run = madeRun();
  change(run, content);
  const recordCase = content.cases[0];
  if (!recordCase) throw new Error("no case");
  return { name, content, recordCase, run };
}

const line = (no: string, typed: string, si: number | null, unit: string | null = null) => ({
  line: no,
  label: `Line ${no}`,
  typed,
  unit,
  si,
  siUnit: unit ? "m" : null,
  source: { kind: "sheet" as const, note: "DS-1" },
});

describe("two cases side by side", () => {
  it("differ in the lines whose value differs, and not in how it was typed", () => {
    const from = side("rev 1", (_run, content) => {
      content.lines = [line("4.03", "25.4", 0.0254, "mm"), line("A5.02", "22.5", 0.0225, "mm"), line("2.02-1", "Sphere", null)];
    });
    const to = side("rev 2", (_run, content) => {
      content.lines = [line("4.03", "1", 0.0254, "in"), line("A5.02", "21.5", 0.0215, "mm"), line("2.07-1", "0.36", 0.36, "m")];
    });
    expect(changedLines(from, to).map(({ no, from: one, to: other }) => [no, one?.typed, other?.typed])).toEqual([
      ["2.02-1", "Sphere", undefined],
      ["2.07-1", undefined, "0.36"],
      ["5.02", "22.5", "21.5"],
    ]);
  });

  it("hold another case's lines against this one's under the bare number", () => {
    const from = side("case A", (_run, content) => {
      content.lines = [line("A5.02", "20", 0.02, "mm"), line("B5.02", "30", 0.03, "mm")];
    });
    const to = side("case B", (_run, content) => {
      content.lines = [line("A5.02", "20", 0.02, "mm"), line("B5.02", "30", 0.03, "mm")];
    });
    to.recordCase = { ...to.recordCase, letter: "B" };
    expect(changedLines(from, to).map(({ no, from: one, to: other }) => [no, one?.typed, other?.typed])).toEqual([
      ["5.02", "20", "30"],
    ]);
  });

  it("move in every limit that either of them has a figure for", () => {
    const from = side("rev 1");
    const to = side("rev 2", (run) => {
      const wall = run.result.limits.find(({ id }) => id === "minimum-wall-temperature");
      if (wall) wall.value = 240;
    });
    const wall = movedLimits(from, to).find(({ id }) => id === "minimum-wall-temperature");
    expect(wall).toMatchObject({ governs: true, to: { value: 240 } });
    expect(wall?.from?.value).not.toBe(240);
  });

  it("have a title that counts and tells the verdicts", () => {
    expect(compareTitle(5, "within", "near", verdictWords)).toBe("Five lines differ; the verdict goes from Within to Near");
    expect(compareTitle(1, "near", "near", verdictWords)).toBe("One line differs; both are Near");
    expect(compareTitle(12, "open", "beyond", verdictWords)).toMatch(/^12 lines differ/);
  });

  it("know whether the fluid is the same", () => {
    expect(sameFluid(side("a"), side("b"))).toBe(true);
    const other = side("b", (_run, content) => {
      content.composition = [{ id: "nitrogen", name: "Nitrogen", typed: "100", moleFraction: 1 }];
    });
    expect(sameFluid(side("a"), other)).toBe(false);
  });
});

describe("their curves", () => {
  const si = { system: "SI", barometricPressurePa: 101325 } as const;

  it("lie over each other on one axis of time, the older grey and first", () => {
    const { pressure, temperature } = compareCurves(side("rev 1"), side("rev 2"), si);
    expect(pressure.series.map(({ id, tone }) => [id, tone])).toEqual([
      ["older-pressure", "ghost"],
      ["pressure", "pressure"],
    ]);
    expect(temperature.series.filter(({ tone }) => tone === "ghost")).toHaveLength(temperature.series.length / 2);
    expect(pressure.marks?.map(({ label }) => label)).toEqual(["rev 1 13.6\u00a0min", "rev 2 13.6\u00a0min"]);
  });

  it("take one unit of time where one run is short and the other long", () => {
    const short = side("rev 1", (run) => {
      run.result.summary.endTimeS = 100;
      run.result.series.timeS = run.result.series.timeS.map((time) => time / 15);
    });
    const { pressure } = compareCurves(short, side("rev 2"), si);
    expect(pressure.x).toMatchObject({ unit: "min", max: 25 });
    expect(Math.max(...(pressure.series[0]?.x ?? []))).toBeCloseTo(100 / 60, 6);
  });
});
