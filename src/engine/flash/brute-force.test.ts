import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { randomFluid, randomPressurePa, randomTemperatureK } from "../../../tests/fixtures/random-fluid";
import { createFluidModel } from "../eos/create-fluid-model";
import { EngineError } from "../errors";
import { flashPT } from "./flash-pt";
import { testStability } from "./stability";

describe("phase verdicts over random fluids", () => {
  it("agree with a stability search from every corner, for the feed and for the phases found", () => {
    let split = 0;
    let three = 0;
    let missing = 0;
    fc.assert(
      fc.property(randomFluid(10), randomTemperatureK, randomPressurePa, (fluid, temperatureK, pressurePa) => {
        const model = createFluidModel(fluid);
        const brute = (z: ArrayLike<number>) => testStability(model, temperatureK, pressurePa, z, { searches: 99 });
        const found = flashPT(model, { temperatureK, pressurePa });
        expect(found.phases.length === 1).toBe(brute(model.feed).tangentPlaneDistance > -1e-9);
        if (found.phases.length > 1) {
          split++;
          if (found.phases.length === 3) three++;
          const further = found.phases.some(({ composition }) => brute(composition).tangentPlaneDistance < -1e-7);
          expect(found.missingPhase ?? false).toBe(further);
          if (further) missing++;
        }
      }),
      { numRuns: 1500, seed: 7 },
    );
    expect(split).toBeGreaterThan(200); // the sample must hold real splits
    expect(three).toBeGreaterThan(3);
    expect(missing).toBeLessThanOrEqual(1); // four phases, and three that the descent did not reach
  });

  it("come with equal fugacities, phases that add up to the feed, and no NaN, over 5000 flashes", () => {
    const outcomes = { one: 0, two: 0, three: 0, refused: 0 };
    fc.assert(
      fc.property(randomFluid(12), randomTemperatureK, randomPressurePa, (fluid, temperatureK, pressurePa) => {
        const model = createFluidModel(fluid);
        let found;
        try {
          found = flashPT(model, { temperatureK, pressurePa });
        } catch (error) {
          if (!(error instanceof EngineError)) throw error;
          outcomes.refused++; // a typed refusal is an outcome, counted below; anything else fails the test
          return;
        }
        for (const value of [found.enthalpyJPerMol, found.entropyJPerMolK, found.molarVolumeM3PerMol, found.vapourMoleFraction]) {
          expect(Number.isFinite(value)).toBe(true);
        }
        if (found.phases.length === 1) {
          outcomes.one++;
          return;
        }
        if (found.phases.length === 2) outcomes.two++;
        else outcomes.three++;
        for (let i = 0; i < model.feed.length; i++) {
          const total = found.phases.reduce((sum, phase) => sum + phase.moleFraction * phase.composition[i]!, 0);
          expect(Math.abs(total - model.feed[i]!)).toBeLessThan(1e-12);
          if (model.feed[i] === 0) continue;
          const lnF = found.phases.map((phase) => Math.log(phase.composition[i]!) + phase.lnFugacityCoefficients[i]!);
          expect(Math.max(...lnF) - Math.min(...lnF)).toBeLessThan(1e-9);
        }
      }),
      { numRuns: 5000, seed: 11 },
    );
    expect(outcomes.refused).toBeLessThanOrEqual(2);
    expect(outcomes.two).toBeGreaterThan(1000);
    expect(outcomes.three).toBeGreaterThan(10);
  });
});

describe("the other flashes over random fluids", () => {
  it("find the PT state again from its energy, enthalpy and entropy", async () => {
    const { flashPH, flashPS } = await import("./flash-ph");
    const { flashUV } = await import("./flash-uv");
    fc.assert(
      fc.property(randomFluid(6), randomTemperatureK, randomPressurePa, (fluid, temperatureK, pressurePa) => {
        const model = createFluidModel(fluid);
        const start = flashPT(model, { temperatureK, pressurePa });
        if (start.missingPhase) return; // a state with a phase left out is not one that energy and volume fix
        const { enthalpyJPerMol, entropyJPerMolK, internalEnergyJPerMol, molarVolumeM3PerMol } = start;
        for (const found of [
          flashPH(model, { pressurePa, enthalpyJPerMol }),
          flashPS(model, { pressurePa, entropyJPerMolK }),
          flashUV(model, { internalEnergyJPerMol, molarVolumeM3PerMol }),
        ]) {
          expect(Math.abs(found.temperatureK / temperatureK - 1)).toBeLessThan(1e-7);
          expect(found.phases.length).toBe(start.phases.length);
        }
        const energy = flashUV(model, { internalEnergyJPerMol, molarVolumeM3PerMol }, model.feed, start);
        const scale = 8.3 * temperatureK + Math.abs(internalEnergyJPerMol);
        expect(Math.abs(energy.internalEnergyJPerMol - internalEnergyJPerMol) / scale).toBeLessThan(1e-10);
        expect(Math.abs(energy.molarVolumeM3PerMol / molarVolumeM3PerMol - 1)).toBeLessThan(1e-10);
      }),
      { numRuns: 250, seed: 5 },
    );
  });
});
