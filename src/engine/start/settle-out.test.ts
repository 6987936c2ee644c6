import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { methodCheck, numberIn } from "../../../tests/fixtures/method-check";
import { randomFluid } from "../../../tests/fixtures/random-fluid";
import type { BlowdownCase, SectionPart } from "../cases/blowdown-case";
import type { FluidSpec } from "../cases/fluid-spec";
import { createFluidModel } from "../eos/create-fluid-model";
import { EngineError } from "../errors";
import { joinVessels } from "./join-vessels";
import { fillParts, settle } from "./settle-out";
import { settleOutReport } from "./settle-out-report";

const methane = (equation: FluidSpec["equation"]): FluidSpec => ({ equation, components: [{ id: "methane", moleFraction: 1 }] });
const bulb = (volumeM3: number, start: SectionPart["start"], more: Partial<SectionPart> = {}): SectionPart => ({
  geometry: { shape: "volume", volumeM3, innerAreaM2: 4 * volumeM3 },
  start,
  ...more,
});
const report = (fluid: FluidSpec, parts: SectionPart[], settleOut: "adiabatic" | "with-steel") => {
  const model = createFluidModel(fluid);
  return settleOutReport(model, settle(model, fillParts(model, parts), settleOut), { settleOut });
};

const twoBulbs = [bulb(5, { pressurePa: 8e6, temperatureK: 310 }), bulb(10, { pressurePa: 2e6, temperatureK: 280 })];

describe("settling out", () => {
  const check = methodCheck("M2-07");
  const [mass, pressure, T] = ["m", "p", "T"].map((key) => numberIn(check.expected, key)) as [number, number, number];

  it(`agrees with ${check.source}`, () => {
    const { after } = report(methane("reference"), twoBulbs, "adiabatic");
    expect(Math.abs(after.massKg / mass - 1)).toBeLessThan(1e-4);
    expect(Math.abs(after.pressurePa / pressure - 1)).toBeLessThan(1e-4);
    expect(Math.abs(after.temperatureK - T)).toBeLessThan(0.03);
  });

  it("stays in the wider band of a cubic equation", () => {
    const { after } = report(methane("peng-robinson-1976"), twoBulbs, "adiabatic");
    expect(Math.abs(after.pressurePa / pressure - 1)).toBeLessThan(0.01);
    expect(Math.abs(after.temperatureK - T)).toBeLessThan(1);
  });

  it("adds pressures by volume for an ideal gas at one temperature", () => {
    const dilute = [bulb(2, { pressurePa: 2000, temperatureK: 300 }), bulb(3, { pressurePa: 1000, temperatureK: 300 })];
    const { after } = report(methane("reference"), dilute, "adiabatic");
    expect(after.pressurePa).toBeCloseTo((2 * 2000 + 3 * 1000) / 5, 1);
    expect(after.temperatureK).toBeCloseTo(300, 2);
  });

  const mixed: FluidSpec = {
    equation: "peng-robinson-1976",
    components: [
      { id: "methane", moleFraction: 0.8 },
      { id: "propane", moleFraction: 0.2 },
      { id: "nitrogen", moleFraction: 0 },
    ],
  };
  const wall = { steel: "carbon_steel", thicknessM: 0.02 };
  const unlike: SectionPart[] = [
    bulb(4, { pressurePa: 6e6, temperatureK: 320 }, { wall }),
    bulb(2, { temperatureK: 290, liquidVolumeFraction: 0.3 }, { wall, components: [{ id: "propane", moleFraction: 1 }] }),
    bulb(
      1,
      { pressurePa: 1e6, temperatureK: 260 },
      { wall, wallTemperatureK: 280, components: [{ id: "nitrogen", moleFraction: 1 }] },
    ),
  ];

  it.each(["adiabatic", "with-steel"] as const)("keeps amounts and energy, %s, with unlike contents and liquid", (rule) => {
    const found = report(mixed, unlike, rule);
    expect(found.energyClosure).toBeLessThan(1e-10);
    expect(found.massClosure).toBeLessThan(1e-12);
    expect(Object.values(found.composition).reduce((sum, x) => sum + x, 0)).toBeCloseTo(1, 12);
    expect(found.vessels.reduce((sum, vessel) => sum + vessel.movesKg, 0) / found.after.massKg).toBeCloseTo(0, 12);
    expect(found.alternative?.rule).toBe(rule === "adiabatic" ? "with-steel" : "adiabatic");
  });

  it("ends between the coldest and the warmest where steel takes part, whatever the order of the vessels", () => {
    const found = report(mixed, unlike, "with-steel");
    expect(found.after.temperatureK).toBeGreaterThan(260);
    expect(found.after.temperatureK).toBeLessThan(320);
    const other = report(mixed, [...unlike].reverse(), "with-steel");
    expect(other.after.pressurePa / found.after.pressurePa - 1).toBeCloseTo(0, 9);
  });

  it("refuses a composition over a component that the fluid does not have", () => {
    const stranger = bulb(1, { pressurePa: 1e6, temperatureK: 300 }, { components: [{ id: "ethane", moleFraction: 1 }] });
    expect(() => report(mixed, [stranger], "adiabatic")).toThrow(/Add it to fluid.components/);
  });

  it("refuses to warm by steel that no vessel has", () => {
    expect(() => report(methane("peng-robinson-1976"), twoBulbs, "with-steel")).toThrow(EngineError);
  });
});

describe("settling out at random", () => {
  const state = fc.record({
    pressurePa: fc.double({ min: 1e5, max: 2e7, noNaN: true }),
    temperatureK: fc.double({ min: 250, max: 420, noNaN: true }),
  });
  const volume = fc.double({ min: 0.1, max: 50, noNaN: true });

  it("keeps energy to 1e-10 and ends between the two pressures or says why not", () => {
    let settled = 0;
    fc.assert(
      fc.property(randomFluid(6), state, state, volume, volume, (fluid, one, other, V1, V2) => {
        try {
          const found = report(fluid, [bulb(V1, one), bulb(V2, other)], "adiabatic");
          settled++;
          expect(found.energyClosure).toBeLessThan(1e-10);
          expect(found.massClosure).toBeLessThan(1e-12);
          expect(found.after.temperatureK).toBeGreaterThan(100);
        } catch (error) {
          if (!(error instanceof EngineError)) throw error;
          expect(error.message.length).toBeGreaterThan(10);
        }
      }),
      { numRuns: 60, seed: 11 },
    );
    expect(settled).toBeGreaterThan(54);
  });
});

describe("several vessels as one", () => {
  const drum: SectionPart = {
    geometry: { shape: "cylinder", orientation: "vertical", insideDiameterM: 1, tangentLengthM: 3, heads: "hemispherical" },
    wall: { steel: "carbon_steel", thicknessM: 0.03, designPressurePa: 9e6, minimumDesignMetalTemperatureK: 244.15 },
    start: { pressurePa: 5e6, temperatureK: 300 },
  };
  const run: SectionPart = {
    geometry: { shape: "pipe", insideDiameterM: 0.2, lengthM: 20 },
    wall: { steel: "carbon_steel_lt", thicknessM: 0.01, designPressurePa: 8e6, minimumDesignMetalTemperatureK: 227.15 },
    start: { pressurePa: 5e6, temperatureK: 300 },
  };

  it("adds steel and takes the warmer rating and the lower design pressure", () => {
    const { wall } = joinVessels([drum, run]);
    const pipeKg = 7850 * Math.PI * (0.11 ** 2 - 0.1 ** 2) * 20;
    const drumKg = 7850 * (Math.PI * (0.53 ** 2 - 0.5 ** 2) * 3 + (4 / 3) * Math.PI * (0.53 ** 3 - 0.5 ** 3));
    expect(wall?.massKg).toBeCloseTo(pipeKg + drumKg, 6);
    expect(wall).toMatchObject({ steel: "carbon_steel", designPressurePa: 8e6, minimumDesignMetalTemperatureK: 244.15 });
    expect(wall?.thicknessM).toBeCloseTo((0.03 * drumKg + 0.01 * pipeKg) / (drumKg + pipeKg), 12);
  });

  it("asks for every wall or none, and names the one that lacks it", () => {
    const bare: BlowdownCase["vessels"] = [drum, { ...run, wall: undefined }];
    expect(() => joinVessels(bare)).toThrow(expect.objectContaining({ path: "vessels[1].wall" }) as Error);
  });

  it("leaves the rating open where one wall has none", () => {
    const unrated = { ...run, wall: { steel: "carbon_steel_lt", thicknessM: 0.01 } };
    expect(joinVessels([drum, unrated]).wall?.minimumDesignMetalTemperatureK).toBeUndefined();
  });
});
