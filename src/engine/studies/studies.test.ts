import { describe, expect, it } from "vitest";
import { plainCase } from "../../../tests/fixtures/blowdowns";
import { idealGas } from "../../../tests/fixtures/fluids";
import { runBlowdown } from "../cases/blowdown/run-blowdown";
import type { BlowdownCase } from "../cases/blowdown-case";
import type { PercentileResult, PercentileStudy, SpreadResult, StudyCase, TornadoResult } from "../cases/study-case";
import { inputIds, inputRules, inputsOf, unvaried } from "./inputs";
import { percentile } from "./percentiles";
import { planOf } from "./plan";
import { assembleStudy, runPart, runStudy } from "./run-study";

const gas: BlowdownCase = {
  ...plainCase(idealGas(1.4, 0.028), { pressurePa: 5e6, stopPressurePa: 9e5 }),
  limits: { targetPressurePa: 1e6, targetTimeS: 1e4, ventCapacityKgPerS: 10 },
};
const head = { format: "ebbmark-case/1", kind: "study", of: gas } as const;
const tornado = (over: object = {}) => runStudy({ ...head, study: "tornado", ...over }) as TornadoResult;
const sampled = (over: Partial<PercentileStudy> = {}): PercentileStudy => ({
  ...head,
  study: "percentiles",
  samples: 20,
  seed: 3,
  ...over,
});

describe("a tornado", () => {
  it("moves the time of an adiabatic ideal gas by volume and by the inverse of the area, which is exact", () => {
    const { bars, base } = tornado();
    const t0 = base.figures.timeToTargetPressureS ?? 0;
    const bar = (input: string) => bars.find((one) => one.input === input);
    expect((bar("volume")?.atLow?.timeToTargetPressureS ?? 0) / t0).toBeCloseTo(0.95, 4);
    expect((bar("volume")?.atHigh?.timeToTargetPressureS ?? 0) / t0).toBeCloseTo(1.05, 4);
    expect((bar("bore")?.atHigh?.timeToTargetPressureS ?? 0) / t0).toBeCloseTo(1 / 1.01 ** 2, 4);
    expect((bar("discharge-coefficient")?.atLow?.peakVentRateKgPerS ?? 0) / (base.figures.peakVentRateKgPerS ?? 1)).toBeCloseTo(
      0.92,
      6,
    );
  });

  it("sorts its bars and names what the case does not have", () => {
    const { bars, sortedBy, notVaried } = tornado();
    const widths = bars.map(({ width }) => width[sortedBy] ?? 0);
    expect(sortedBy).toBe("timeToTargetPressureS");
    expect(widths).toEqual([...widths].sort((a, b) => b - a));
    expect(notVaried).toEqual(expect.arrayContaining(["inside-film", "composition", "ambient-temperature"]));
  });

  it.each([
    [[{ input: "inside-film", low: 0.5, high: 2 }], "inputs[0].input"],
    [[{ input: "volume", low: 1.1, high: 0.9 }], "inputs[0].low"],
    [[{ input: "volume", low: -1, high: 0.9 }], "inputs[0].low"],
    [
      [
        { input: "volume", low: 0.9, high: 1.1 },
        { input: "volume", low: 0.9, high: 1.1 },
      ],
      "inputs[1].input",
    ],
    [[], "inputs"],
  ])("refuses inputs that cannot be varied", (inputs, path) => {
    expect(() => tornado({ inputs })).toThrow(expect.objectContaining({ path }) as Error);
  });
});

describe("percentiles", () => {
  it("are those of the input where the figure is proportional to it", () => {
    const study = sampled({ samples: 50, inputs: [{ input: "volume", distribution: "uniform", low: 0.9, high: 1.1 }] });
    const { percentiles, base, samples } = runStudy(study) as PercentileResult;
    const time = percentiles.find(({ id }) => id === "timeToTargetPressureS");
    const t0 = base.figures.timeToTargetPressureS ?? 1;
    expect(samples).toMatchObject({ asked: 50, computed: 50, failed: [] });
    // Each of the 50 strata is hit once: a percentile is off by no more than one stratum of 0.004.
    expect(Math.abs((time?.p10 ?? 0) / t0 - 0.92)).toBeLessThan(0.004);
    expect(Math.abs((time?.p50 ?? 0) / t0 - 1)).toBeLessThan(0.004);
    expect(Math.abs((time?.p90 ?? 0) / t0 - 1.08)).toBeLessThan(0.004);
  });

  it("are the same again, and the same in parts in any order", () => {
    const study = sampled();
    const whole = JSON.stringify(runStudy(study));
    const runs = planOf(study).runs;
    const parts = [...runPart(study, 11, runs), ...runPart(study, 0, 11)];
    expect(JSON.stringify(runStudy(study))).toBe(whole);
    expect(JSON.parse(JSON.stringify(assembleStudy(study, parts)))).toEqual(JSON.parse(whole));
  });

  it("name and count the samples that cannot be computed", () => {
    // From 0.05 to 2 bar: the lower half starts below the pressure outside, and nothing leaves.
    const study = sampled({
      of: { ...gas, run: { ...gas.run, stopPressurePa: 102000 } },
      samples: 10,
      inputs: [{ input: "start-pressure", distribution: "uniform", low: 0.001, high: 0.0395 }],
    });
    const { samples, warnings, verdicts } = runStudy(study) as PercentileResult;
    expect(samples.computed + samples.failed.length).toBe(10);
    expect(samples.failed.length).toBeGreaterThanOrEqual(5);
    expect(samples.computed).toBeGreaterThanOrEqual(3);
    for (const failure of samples.failed) {
      expect(failure.message.length).toBeGreaterThan(10);
      expect(failure.inputs["start-pressure"]).toBeDefined();
    }
    expect(warnings.map(({ code }) => code)).toContain("failed-samples");
    expect(Object.values(verdicts).reduce((sum, count) => sum + count, 0)).toBe(samples.computed);
  });

  it("count a time that is not reached as later than every other", () => {
    const study = sampled({
      of: { ...gas, run: { ...gas.run, stopTimeS: 255 } },
      inputs: [{ input: "volume", distribution: "uniform", low: 0.5, high: 1.5 }],
    });
    const { percentiles, base } = runStudy({
      ...study,
      of: { ...study.of, run: { ...study.of.run, stopTimeS: 1.0001 * (runBlowdown(gas).summary.timeToTargetPressureS ?? 0) } },
    }) as PercentileResult;
    const time = percentiles.find(({ id }) => id === "timeToTargetPressureS");
    expect(base.figures.timeToTargetPressureS).toBeDefined();
    expect(time?.notReached).toBe(10);
    expect(time?.p90).toBeUndefined();
    expect(time?.p10).toBeDefined();
  });

  it("make a study of what was done when they were stopped", () => {
    const study = sampled();
    const { samples, warnings } = assembleStudy(study, runPart(study, 0, 9)) as PercentileResult;
    expect(samples).toMatchObject({ asked: 20, computed: 8 });
    expect(warnings.map(({ code }) => code)).toContain("cut-short");
  });

  it("stop when they are told to", () => {
    let runs = 0;
    expect(() => runStudy(sampled(), { onProgress: () => runs++, isCancelled: () => runs >= 2 })).toThrow(
      expect.objectContaining({ code: "cancelled" }) as Error,
    );
    expect(runs).toBe(2);
  });

  it("lie on straight lines between sorted values", () => {
    expect(percentile([1, 2, 3, 4, 5], 0.1)).toBeCloseTo(1.4, 12);
    expect(percentile([1, 2, 3, 4, 5], 0.5)).toBe(3);
    expect(percentile([7], 0.9)).toBe(7);
  });
});

describe("the spread over equations", () => {
  const methane: BlowdownCase = {
    ...plainCase(
      { equation: "peng-robinson-1976", components: [{ id: "methane", moleFraction: 1 }] },
      { pressurePa: 8e6, stopPressurePa: 1e6 },
    ),
    limits: { targetPressurePa: 2e6, targetTimeS: 5000 },
  };
  const result = runStudy({ ...head, of: methane, study: "spread" }) as SpreadResult;
  const entry = (equation: string) => result.entries.find((one) => one.equation === equation);

  it("takes in what is fit, shows what is not, and always counts the equation in use", () => {
    expect(entry("peng-robinson-1976")).toMatchObject({ used: true, inSpread: true });
    expect(entry("reference")).toMatchObject({ inSpread: true });
    expect(entry("van-der-waals")?.inSpread).toBe(false);
    expect(entry("van-der-waals")?.figures?.minimumFluidTemperatureK).toBeGreaterThan(0);
  });

  it("has ranges that hold the figure of each equation counted, and curves to draw", () => {
    for (const { id, low, high, used, spread } of result.ranges) {
      expect(used).toBeGreaterThanOrEqual(low);
      expect(used).toBeLessThanOrEqual(high);
      expect(spread).toBeCloseTo(high - low, 12);
      for (const { inSpread, figures } of result.entries) if (inSpread) expect(figures?.[id]).toBeGreaterThanOrEqual(low);
    }
    expect(entry("reference")?.curve?.timeS.length).toBeGreaterThan(20);
  });

  it("agrees with a run of its own under another equation", () => {
    const own = runBlowdown({ ...methane, fluid: { ...methane.fluid, equation: "reference" } }, { coarse: true }).summary;
    expect(entry("reference")?.figures?.minimumFluidTemperatureK).toBe(own.minimumFluidTemperatureK);
  });

  it("says why an equation was refused", () => {
    const mixture = {
      ...methane,
      fluid: {
        equation: "peng-robinson-1976",
        components: [
          { id: "methane", moleFraction: 0.9 },
          { id: "ethane", moleFraction: 0.1 },
        ],
      },
    } as BlowdownCase;
    const { entries } = runStudy({
      ...head,
      of: mixture,
      study: "spread",
      equations: ["reference", "peng-robinson-1978"],
    }) as SpreadResult;
    expect(entries[0]).toMatchObject({ equation: "reference", inSpread: false });
    expect(entries[0]?.refused?.length).toBeGreaterThan(10);
  });
});

describe("inputs", () => {
  const walled: BlowdownCase = {
    ...gas,
    fluid: {
      equation: "peng-robinson-1976",
      components: [
        { id: "methane", moleFraction: 0.9 },
        { id: "ethane", moleFraction: 0.1 },
      ],
    },
    vessel: {
      geometry: { shape: "cylinder", orientation: "vertical", insideDiameterM: 1, tangentLengthM: 2, heads: "flat" },
      wall: { steel: "carbon_steel", thicknessM: 0.02 },
    },
    heat: {
      inside: { model: "constant", coefficientWPerM2K: 50 },
      wall: { model: "lumped" },
      outside: { model: "ambient", temperatureK: 290, coefficientWPerM2K: 8 },
    },
  };

  it.each(inputIds.filter((input) => inputsOf(walled).includes(input)))(
    "%s leaves the case as it is where it varies nothing",
    (input) => {
      const same = inputRules[input].vary(walled, unvaried(input));
      const numbers = (value: unknown): number[] =>
        typeof value === "number" ? [value] : typeof value === "object" && value ? Object.values(value).flatMap(numbers) : [];
      const [a, b] = [numbers(walled), numbers(same)];
      expect(b).toHaveLength(a.length);
      b.forEach((value, i) => expect(value).toBeCloseTo(a[i] ?? 0, 9));
    },
  );

  it("keeps mole fractions summing to one and the volume as asked", () => {
    const richer = inputRules.composition.vary(walled, 1.1);
    expect(richer?.fluid.components.map(({ moleFraction }) => moleFraction)).toEqual([0.89, expect.closeTo(0.11, 12)]);
    const larger = inputRules.volume.vary(walled, 1.05) as BlowdownCase;
    const of = ({ vessel: { geometry } }: BlowdownCase): number =>
      geometry.shape === "cylinder" ? geometry.insideDiameterM ** 2 * geometry.tangentLengthM : 0;
    expect(of(larger) / of(walled)).toBeCloseTo(1.05, 12);
  });

  it("varies films from correlations and the heat of fires by a factor, which acts as a stated flux would", () => {
    const outside = { model: "surface-fire", basis: "open-pool", heatFluxWPerM2: 2e4 } as const;
    const fire: BlowdownCase = { ...walled, heat: { inside: { model: "correlations" }, wall: { model: "lumped" }, outside } };
    expect(inputsOf(fire)).toEqual(expect.arrayContaining(["inside-film", "outside-heat"]));
    const varied = inputRules["outside-heat"].vary(fire, 1.3);
    const stated = { ...fire, heat: { ...fire.heat, outside: { ...outside, heatFluxWPerM2: 1.3 * 2e4 } } };
    const wallOf = (one: BlowdownCase | undefined) =>
      one && runBlowdown({ ...one, run: { ...gas.run, stopTimeS: 200 } }, { coarse: true }).series.gasWallTemperatureK?.at(-1);
    expect(wallOf(varied)).toBeCloseTo(wallOf(stated) ?? 0, 6);
    const still = { ...fire, heat: { ...fire.heat, outside: { model: "adiabatic" } as const } };
    const fluidOf = (by: number): number =>
      runBlowdown(inputRules["inside-film"].vary(still, by) ?? still, { coarse: true }).summary.minimumFluidTemperatureK;
    expect(fluidOf(2)).toBeGreaterThan(fluidOf(1));
    expect(fluidOf(0.5)).toBeLessThan(fluidOf(1));
  });

  it("has a study of every kind for a case with a wall", () => {
    const small: StudyCase = { ...head, of: walled, study: "percentiles", samples: 3, seed: 1 };
    expect(planOf(small).inputs.map(({ input }) => input)).toEqual(inputsOf(walled));
    expect((runStudy(small) as PercentileResult).samples.computed).toBe(3);
  });
});
