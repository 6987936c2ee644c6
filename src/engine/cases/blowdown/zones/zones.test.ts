import { describe, expect, it } from "vitest";
import { plainCase } from "../../../../../tests/fixtures/blowdowns";
import { createFluidModel } from "../../../eos/create-fluid-model";
import { flashTQ } from "../../../flash/flash-quality";
import type { BlowdownCase } from "../../blowdown-case";
import type { FluidSpec } from "../../fluid-spec";
import { runBlowdown } from "../run-blowdown";
import { BoundaryPoint } from "./boundary-point";

const propane: FluidSpec = { equation: "peng-robinson-1976", components: [{ id: "propane", moleFraction: 1 }] };
const mixture: FluidSpec = {
  equation: "peng-robinson-1976",
  components: [
    { id: "ethane", moleFraction: 0.1 },
    { id: "propane", moleFraction: 0.6 },
    { id: "n_butane", moleFraction: 0.3 },
  ],
};

const drum = (fluid: FluidSpec, over: Partial<BlowdownCase> = {}): BlowdownCase => ({
  ...plainCase(fluid, { stopPressurePa: 3e5, diameterM: 0.02, relativeTolerance: 1e-5 }),
  vessel: {
    geometry: { shape: "cylinder", orientation: "horizontal", insideDiameterM: 1.2, tangentLengthM: 4, heads: "ellipsoidal-2-1" },
    wall: { steel: "carbon_steel", thicknessM: 0.014, minimumDesignMetalTemperatureK: 244.15 },
  },
  start: { temperatureK: 293.15, liquidVolumeFraction: 0.5 },
  heat: { inside: { model: "constant", coefficientWPerM2K: 60 }, wall: { model: "conduction" }, outside: { model: "adiabatic" } },
  zones: "separate",
  ...over,
});

const relative = (value: number, expected: number) => Math.abs(value / expected - 1);

describe("separate temperatures of vapour and liquid", () => {
  it.each([
    ["propane", propane],
    ["a mixture", mixture],
  ] as const)("close mass and energy, with the liquid and its wall colder than the vapour and its wall: %s", (_name, fluid) => {
    const { summary, series } = runBlowdown(drum(fluid));
    expect(summary.massClosure).toBeLessThan(1e-9);
    expect(summary.energyClosure).toBeLessThan(1e-6);
    expect(summary.massClosureRecounted).toBeLessThan(1e-4);
    expect(summary.energyClosureRecounted).toBeLessThan(1e-4);
    expect(summary.endedBy).toBe("pressure");
    const [gas, liquid] = [series.vapourTemperatureK?.at(-1) ?? 0, series.liquidTemperatureK?.at(-1) ?? 0];
    expect(gas).toBeGreaterThan(liquid + 1);
    expect(series.gasWallTemperatureK?.at(-1) ?? 0).toBeGreaterThan((series.liquidWallTemperatureK?.at(-1) ?? 0) + 1);
    expect(series.liquidLevelM?.at(-1) ?? 0).toBeLessThan(series.liquidLevelM?.[0] ?? 0);
  });

  it("come together in the equilibrium result when heat passes between them freely and boiling is quick", () => {
    const adiabatic = { inside: { model: "none" }, wall: { model: "none" }, outside: { model: "adiabatic" } } as const;
    const run = { stopTimeS: 1e5, stopPressurePa: 6.8e5, relativeTolerance: 1e-5 };
    for (const fluid of [propane, mixture]) {
      const together = runBlowdown(drum(fluid, { heat: adiabatic, run, zones: "equilibrium" }));
      const apart = runBlowdown(
        drum(fluid, { heat: adiabatic, run, zoneExchange: { coefficientWPerM2K: 2e4, relaxationTimeS: 0.2 } }),
      );
      expect(relative(apart.summary.endTimeS, together.summary.endTimeS)).toBeLessThan(2e-3);
      expect(Math.abs(apart.summary.finalTemperatureK - together.summary.finalTemperatureK)).toBeLessThan(0.1);
      expect(relative(apart.summary.finalMassKg, together.summary.finalMassKg)).toBeLessThan(1e-3);
    }
  });

  it("rain: vapour that is expanded with little heat keeps to its dew point", () => {
    const { series } = runBlowdown(
      drum(propane, {
        zoneExchange: { coefficientWPerM2K: 0, relaxationTimeS: 0.5 },
        heat: { inside: { model: "none" }, wall: { model: "none" }, outside: { model: "adiabatic" } },
        release: { ...plainCase(propane).release, from: "liquid", flowModel: "equilibrium" } as BlowdownCase["release"],
        run: { stopTimeS: 120, stopPressurePa: 1.1e5, relativeTolerance: 1e-5 },
      }),
    );
    // Saturated propane vapour is a wet fluid: its isentrope runs into the dome, so rain warms it back to the liquid's temperature nearly.
    const last = series.timeS.length - 1;
    expect(Math.abs((series.vapourTemperatureK?.[last] ?? 0) - (series.liquidTemperatureK?.[last] ?? 0))).toBeLessThan(0.5);
  });

  it("of a liquid outlet drain the vessel until one phase is left", () => {
    const release = { ...plainCase(propane).release, from: "liquid", flowModel: "equilibrium" } as BlowdownCase["release"];
    const { summary, series } = runBlowdown(drum(propane, { release }));
    expect(summary.massClosure).toBeLessThan(1e-9);
    expect(series.vapourMoleFraction.at(-1)).toBeGreaterThan(0.95);
  });

  it("are refused for a plain volume and for an outlet of the whole", () => {
    expect(() =>
      runBlowdown(
        drum(propane, {
          vessel: { geometry: { shape: "volume", volumeM3: 5, innerAreaM2: 15 } },
          heat: { inside: { model: "none" }, wall: { model: "none" }, outside: { model: "adiabatic" } },
        }),
      ),
    ).toThrow(/level/);
    expect(() =>
      runBlowdown(drum(propane, { release: { ...plainCase(propane).release, from: "whole" } as BlowdownCase["release"] })),
    ).toThrow(/as a whole/);
  });
});

describe("BoundaryPoint", () => {
  it("finds the bubble and dew temperatures that the flash finds", () => {
    const fluid = createFluidModel(mixture);
    for (const [of, vapourMoleFraction] of [
      ["liquid", 0],
      ["vapour", 1],
    ] as const) {
      const flash = flashTQ(fluid, { temperatureK: 280, vapourMoleFraction });
      const other = flash.phases[vapourMoleFraction === 0 ? 0 : 1];
      const point = new BoundaryPoint(fluid, of);
      point.startFrom(283, other?.composition ?? fluid.feed);
      expect(point.find(flash.pressurePa, fluid.feed)).toBe(true);
      expect(Math.abs(point.temperatureK - 280)).toBeLessThan(1e-6);
    }
  });
});
