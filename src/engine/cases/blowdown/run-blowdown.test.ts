import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { plainCase, valueAt } from "../../../../tests/fixtures/blowdowns";
import { EngineError } from "../../errors";
import { runConfirmed } from "../../run-case";
import type { BlowdownCase } from "../blowdown-case";
import type { FluidSpec } from "../fluid-spec";
import { Balance } from "./balance";
import { integrateRun } from "./integrate-run";
import { rebuiltState } from "./molar-state";
import { runBlowdown } from "./run-blowdown";
import { makeVesselModel } from "./vessel-model";

const pengRobinson = (...components: [string, number][]): FluidSpec => ({
  equation: "peng-robinson-1976",
  components: components.map(([id, moleFraction]) => ({ id, moleFraction })),
});
const nitrogen = pengRobinson(["nitrogen", 1]);
const leanGas = pengRobinson(["methane", 0.9], ["ethane", 0.06], ["nitrogen", 0.03], ["carbon_dioxide", 0.01]);

const walled = (fluid: FluidSpec, over: Parameters<typeof plainCase>[1] = {}): BlowdownCase => {
  const base = plainCase(fluid, over);
  return {
    ...base,
    vessel: { ...base.vessel, wall: { steel: "carbon_steel", thicknessM: 0.02, minimumDesignMetalTemperatureK: 244.15 } },
    heat: { inside: { model: "constant", coefficientWPerM2K: 60 }, wall: { model: "lumped" }, outside: { model: "adiabatic" } },
  };
};

const refusalOf = (work: () => unknown): EngineError => {
  try {
    work();
  } catch (error) {
    if (error instanceof EngineError) return error;
    throw error;
  }
  throw new Error("nothing was refused");
};

const gas = fc.record({
  fluid: fc.constantFrom(
    nitrogen,
    leanGas,
    pengRobinson(["methane", 1]),
    pengRobinson(["hydrogen", 1]),
    pengRobinson(["argon", 0.5], ["oxygen", 0.5]),
  ),
  pressurePa: fc.double({ min: 1e6, max: 2e7, noNaN: true }),
  temperatureK: fc.double({ min: 290, max: 400, noNaN: true }),
  volumeM3: fc.double({ min: 0.01, max: 50, noNaN: true }),
  bore: fc.double({ min: 0.005, max: 0.05, noNaN: true }),
});

describe("runBlowdown", () => {
  it("closes mass to 1e-9 and energy to 1e-6, falls in pressure, and cools when adiabatic, whatever the gas", () => {
    fc.assert(
      fc.property(gas, fc.boolean(), ({ fluid, bore, volumeM3, ...state }, wall) => {
        const over = {
          ...state,
          volumeM3,
          diameterM: bore * volumeM3 ** (1 / 3),
          stopPressurePa: 0.3 * state.pressurePa + 0.7 * 101325,
        };
        const { summary, series } = runBlowdown(wall ? walled(fluid, over) : plainCase(fluid, over));
        expect(summary.massClosure).toBeLessThan(1e-9);
        expect(summary.energyClosure).toBeLessThan(1e-6);
        expect(summary.endedBy).toBe("pressure");
        series.pressurePa.forEach((p, i) => i > 0 && expect(p).toBeLessThanOrEqual(series.pressurePa[i - 1] ?? 0));
        if (!wall)
          series.fluidTemperatureK.forEach(
            (T, i) => i > 0 && expect(T).toBeLessThanOrEqual((series.fluidTemperatureK[i - 1] ?? 0) + 1e-9),
          );
        for (const column of Object.values(series))
          expect(column.every(Number.isFinite) && column.length === series.timeS.length).toBe(true);
      }),
      { numRuns: 25 },
    );
  });

  it("counts outflow and heat again from the states, and finds what the integration lost", () => {
    const energy = (relativeTolerance: number) => {
      const { summary } = runBlowdown(walled(leanGas, { relativeTolerance, pressurePa: 7e6 }));
      expect(summary.massClosureRecounted).toBeLessThan(10 * relativeTolerance);
      return summary.energyClosureRecounted ?? Number.NaN;
    };
    expect(energy(1e-6)).toBeLessThan(1e-6);
    expect(energy(1e-8)).toBeLessThan(1e-8);
    // A count that could not differ from the integrator's own sums would be zero here too.
    expect(energy(1e-3)).toBeGreaterThan(1e-9);
  });

  it("keeps the entropy of an adiabatic gas to 1e-6 of R", () => {
    for (const fluid of [nitrogen, leanGas]) {
      const blowdown = plainCase(fluid, { pressurePa: 1.5e7, temperatureK: 320, stopPressurePa: 5e6, relativeTolerance: 1e-7 });
      const balance = new Balance(makeVesselModel(blowdown));
      const run = integrateRun(balance, blowdown, { relativeTolerance: 1e-7, maxEvaluations: 1e5 });
      const entropies = run.segments.flatMap((segment) =>
        segment.dense.steps.map(
          (step) => rebuiltState(balance.model.fluid, balance.within(segment, step, step.t1).instant.contents).entropyJPerMolK,
        ),
      );
      expect(Math.max(...entropies) - Math.min(...entropies)).toBeLessThan(1e-6 * 8.314);
    }
  });

  it("gives the same answer for the components in any order", () => {
    const parts = leanGas.components;
    const forward = runBlowdown(walled(leanGas, { stopPressurePa: 1e6 }));
    const backward = runBlowdown(walled({ ...leanGas, components: [...parts].reverse() }, { stopPressurePa: 1e6 }));
    expect(Math.abs(backward.summary.endTimeS / forward.summary.endTimeS - 1)).toBeLessThan(1e-7);
    expect(Math.abs(backward.summary.minimumFluidTemperatureK - forward.summary.minimumFluidTemperatureK)).toBeLessThan(1e-4);
  });

  it("moves the governing figures less than claimed at a tenfold tighter tolerance", () => {
    for (const relativeTolerance of [1e-4, 1e-5, 1e-6]) {
      const { confirmation } = runConfirmed(walled(leanGas, { relativeTolerance, pressurePa: 7e6 }), {
        engineVersion: "test",
        caseSha256: "0",
      });
      expect(confirmation.relativeTolerance).toBeCloseTo(relativeTolerance / 10, 12);
      for (const { id, value, change } of confirmation.figures) {
        // Dense output carries an error of its own of some ten times the tolerance; 30 covers all figures measured.
        expect(Math.abs(change / value), id).toBeLessThan(30 * relativeTolerance);
      }
      expect(confirmation.figures.map((figure) => figure.id)).toContain("minimumWallTemperatureK");
    }
  });

  it("gives the same bytes twice", () => {
    expect(JSON.stringify(runBlowdown(walled(leanGas)))).toBe(JSON.stringify(runBlowdown(walled(leanGas))));
  });

  it("fills the series so that neighbours are as near as the format promises", () => {
    const { series, summary } = runBlowdown(walled(leanGas, { pressurePa: 7e6 }));
    for (let i = 1; i < series.timeS.length; i++) {
      const gap = (column: number[]) => Math.abs((column[i] ?? 0) - (column[i - 1] ?? 0));
      expect(gap(series.pressurePa)).toBeLessThanOrEqual(0.0201 * (series.pressurePa[i] ?? 0));
      expect(gap(series.fluidTemperatureK)).toBeLessThanOrEqual(1.001);
      expect(gap(series.gasWallTemperatureK ?? [])).toBeLessThanOrEqual(1.001);
      expect(gap(series.massKg)).toBeLessThanOrEqual(0.01001 * summary.initialMassKg);
      expect(gap(series.timeS)).toBeLessThanOrEqual(0.01001 * summary.endTimeS);
    }
  });

  it("accounts for the whole run, and by three steps that add up", () => {
    const { energyAccount, summary } = runBlowdown(walled(leanGas));
    const { wholeRun, startToColdest, startToEnd } = energyAccount;
    expect(Math.abs(wholeRun.leftOverJ)).toBeLessThan(1e-6 * Math.abs(wholeRun.ventedJ));
    expect(wholeRun.heatFromWallJ).toBe(summary.heatFromWallJ);
    for (const changes of [startToColdest, startToEnd]) {
      for (const steps of [changes.internalEnergyJPerMol, changes.enthalpyJPerMol, changes.entropyJPerMolK]) {
        expect(steps.departureOut + steps.idealGas + steps.departureBack).toBeCloseTo(steps.total, 9);
      }
    }
    expect(startToColdest.atTimeS).toBe(summary.minimumFluidTemperatureTimeS);
  });

  it("opens linearly: no flow at the start, the peak at the end of the stroke", () => {
    const base = plainCase(nitrogen);
    const { series, summary } = runBlowdown({
      ...base,
      release: { ...base.release, openingTimeS: 4 } as BlowdownCase["release"],
    });
    const sudden = runBlowdown(base).summary;
    expect(series.ventRateKgPerS[0]).toBe(0);
    expect(summary.peakVentRateTimeS).toBeCloseTo(4, 6);
    expect(summary.peakVentRateKgPerS).toBeLessThan(sudden.peakVentRateKgPerS);
    // A linear stroke loses about half its time.
    expect(summary.endTimeS - sudden.endTimeS).toBeGreaterThan(1.7);
    expect(summary.endTimeS - sudden.endTimeS).toBeLessThan(2.3);
  });

  it("takes constant heat into the fluid where there is no wall, and into the wall where there is one", () => {
    const base = plainCase(nitrogen);
    const bare = runBlowdown({ ...base, heat: { ...base.heat, outside: { model: "constant-heat", heatW: 2000 } } });
    expect(bare.summary.heatFromOutsideJ).toBeCloseTo(2000 * bare.summary.endTimeS, 2);
    expect(bare.summary.minimumFluidTemperatureK).toBeGreaterThan(runBlowdown(base).summary.minimumFluidTemperatureK);
    const steel = walled(nitrogen);
    const hot = runBlowdown({ ...steel, heat: { ...steel.heat, outside: { model: "constant-heat", heatW: 20000 } } });
    expect(hot.summary.minimumWallTemperatureK ?? 0).toBeGreaterThan(runBlowdown(steel).summary.minimumWallTemperatureK ?? 0);
    expect(hot.summary.energyClosure).toBeLessThan(1e-6);
  });

  it("stops where heat drives a gas past the data instead of running on for ever", () => {
    const base = plainCase(nitrogen);
    const { summary, warnings } = runBlowdown({
      ...base,
      heat: { ...base.heat, outside: { model: "constant-heat", heatW: 50000 } },
    });
    expect(summary.endedBy).toBe("too-hot");
    expect(summary.finalTemperatureK).toBeCloseTo(1000, 3);
    expect(warnings.map((warning) => warning.code)).toContain("too-hot");
  });

  it("lets the wall take heat from still air, more slowly the lower the coefficient", () => {
    const base = walled(nitrogen);
    const coldest = [0, 10, 1000].map(
      (coefficientWPerM2K) =>
        runBlowdown({ ...base, heat: { ...base.heat, outside: { model: "ambient", temperatureK: 300, coefficientWPerM2K } } })
          .summary.minimumWallTemperatureK ?? 0,
    );
    expect(coldest[0]).toBeLessThan(coldest[1] ?? 0);
    expect(coldest[1]).toBeLessThan(coldest[2] ?? 0);
  });

  it("uses the steel's table where no specific heat is given, which matters little near room temperature", () => {
    const base = walled(nitrogen);
    const table = runBlowdown(base).summary.minimumWallTemperatureK ?? 0;
    const constant =
      runBlowdown({
        ...base,
        vessel: { ...base.vessel, wall: { steel: "carbon_steel", thicknessM: 0.02, specificHeatJPerKgK: 440 } },
      }).summary.minimumWallTemperatureK ?? 0;
    expect(Math.abs(table - constant)).toBeLessThan(0.5);
    expect(table).not.toBe(constant);
  });

  it("ends at the back pressure when asked to go to it or below, with a warning only in the latter case", () => {
    const base = plainCase(nitrogen);
    const to = (stopPressurePa: number) => runBlowdown({ ...base, run: { ...base.run, stopPressurePa } });
    expect(to(101325).summary).toMatchObject({ endedBy: "pressure" });
    expect(Math.abs(to(101325).summary.finalPressurePa / 101325 - 1)).toBeLessThan(2e-5);
    expect(to(5e4).summary.endedBy).toBe("back-pressure");
    expect(to(5e4).warnings.map((warning) => warning.code)).toContain("back-pressure-reached");
  });

  it("ends at the stop time when that comes first", () => {
    const base = plainCase(nitrogen);
    const { summary } = runBlowdown({ ...base, run: { ...base.run, stopTimeS: 7 } });
    expect(summary).toMatchObject({ endedBy: "time", endTimeS: 7 });
    expect(summary.timeToSixPointNineBarGaugeS).toBeUndefined();
  });

  it("follows methane that condenses inside the vessel, and says so", () => {
    const { series, summary, cautionIds, cautions } = runBlowdown(
      plainCase(pengRobinson(["methane", 1]), { pressurePa: 1e7, temperatureK: 250, stopPressurePa: 2e5 }),
    );
    expect(Math.min(...series.vapourMoleFraction)).toBeLessThan(1);
    expect(cautionIds).toContain("C3");
    expect(cautions[cautionIds.indexOf("C3")]).toMatch(/below about −\d+\u00a0°C/);
    // Saturated to the end: methane boils at 111.67 K at 1.013 bar (components table), 120.6 K near 2 bar.
    expect(summary.finalTemperatureK).toBeGreaterThan(118);
    expect(summary.finalTemperatureK).toBeLessThan(123);
    expect(valueAt(series, "pressurePa", 0)).toBeCloseTo(1e7, 0);
  });

  it("stops carbon dioxide where it turns solid, and refuses a solid start", () => {
    const dioxide = pengRobinson(["carbon_dioxide", 1]);
    const run = runBlowdown(plainCase(dioxide, { pressurePa: 2e6, temperatureK: 310, stopPressurePa: 1.2e5 }));
    expect(run.summary.endedBy).toBe("solid-phase");
    expect(run.summary.finalTemperatureK).toBeLessThan(216.6);
    expect(run.warnings.map((warning) => warning.code)).toContain("solid-phase");
    expect(
      refusalOf(() => runBlowdown(plainCase(dioxide, { pressurePa: 5e5, temperatureK: 190, stopPressurePa: 1.2e5 }))).code,
    ).toBe("solid-phase");
  });

  it("reports progress that rises to the end, and stops when cancelled", () => {
    const parts: number[] = [];
    runBlowdown(plainCase(nitrogen), { onProgress: (part) => parts.push(part) });
    expect(parts.at(-1)).toBeGreaterThan(0.999);
    parts.forEach((part, i) => i > 0 && expect(part).toBeGreaterThanOrEqual(parts[i - 1] ?? 0));
    let calls = 0;
    expect(refusalOf(() => runBlowdown(plainCase(nitrogen), { isCancelled: () => ++calls > 50 })).code).toBe("cancelled");
    expect(calls).toBe(51);
  });

  it("gives a preview with fewer rows that tells the same story", () => {
    const whole = runBlowdown(walled(leanGas));
    const preview = runBlowdown(walled(leanGas), { coarse: true });
    expect(preview.series.timeS.length).toBeLessThan(0.6 * whole.series.timeS.length);
    expect(Math.abs(preview.summary.endTimeS / whole.summary.endTimeS - 1)).toBeLessThan(2e-3);
    expect(Math.abs(preview.summary.minimumFluidTemperatureK - whole.summary.minimumFluidTemperatureK)).toBeLessThan(0.3);
  });
});
