import { describe, expect, it } from "vitest";
import { plainCase, valueAt } from "../../../../tests/fixtures/blowdowns";
import { cooperFlux, zuberLimitWPerM2 } from "../../heat/boiling";
import type { BlowdownCase } from "../blowdown-case";
import { runBlowdown } from "./run-blowdown";

/** Check M3-09 and M3-13 of tests/fixtures/checks/methods.json: own Python with the reference equation and CoolProp's transport properties. */
const vessel = (wall: "lumped" | "conduction"): BlowdownCase => ({
  ...plainCase(
    { equation: "reference", components: [{ id: "nitrogen", moleFraction: 1 }] },
    { diameterM: 0.00635, dischargeCoefficient: 0.8, pressurePa: 1.5e7, temperatureK: 290, stopPressurePa: 101400 },
  ),
  vessel: {
    geometry: { shape: "cylinder", orientation: "vertical", insideDiameterM: 0.273, tangentLengthM: 1.524, heads: "flat" },
    wall: { steel: "carbon_steel", thicknessM: 0.025, massKg: 312.163, specificHeatJPerKgK: 470 },
  },
  heat: { inside: { model: "correlations" }, wall: { model: wall }, outside: { model: "adiabatic" } },
  run: { stopTimeS: 120, stopPressurePa: 101400, relativeTolerance: 1e-6 },
  limits: { targetPressurePa: 1e6, targetTimeS: 900 },
});

describe("an inside film from correlations", () => {
  it("agrees with the nitrogen test vessel with a lumped wall (M3-09) within 3 % of time and 3 K", () => {
    const { summary, series } = runBlowdown(vessel("lumped"));
    // Half of gauge lies at 75.5 bar, a little before the 75 bar of the check.
    expect(Math.abs((summary.timeToHalfGaugePressureS ?? 0) / 7.678 - 1)).toBeLessThan(0.03);
    expect(Math.abs((summary.timeToTargetPressureS ?? 0) / 47.36 - 1)).toBeLessThan(0.03);
    expect(Math.abs(summary.minimumFluidTemperatureK - 201.57)).toBeLessThan(3);
    expect(Math.abs(summary.minimumFluidTemperatureTimeS - 33.6)).toBeLessThan(3);
    expect(Math.abs(valueAt(series, "gasWallTemperatureK", summary.endTimeS) - 286.21)).toBeLessThan(1);
    expect(summary.energyClosure).toBeLessThan(1e-6);
  });

  it("agrees with the wall of twelve cells (M3-13) in gas and inner surface", () => {
    const { summary } = runBlowdown(vessel("conduction"));
    expect(Math.abs((summary.timeToTargetPressureS ?? 0) / 47.34 - 1)).toBeLessThan(0.03);
    expect(Math.abs(summary.minimumFluidTemperatureK - 200.7)).toBeLessThan(3);
    expect(Math.abs((summary.minimumWallTemperatureK ?? 0) - 285.76)).toBeLessThan(1);
  });

  it("boils on the wetted wall: propane in a warm drum stays near its wall", () => {
    const drum: BlowdownCase = {
      ...plainCase({ equation: "peng-robinson-1976", components: [{ id: "propane", moleFraction: 1 }] }),
      vessel: {
        geometry: {
          shape: "cylinder",
          orientation: "horizontal",
          insideDiameterM: 1.2,
          tangentLengthM: 4,
          heads: "ellipsoidal-2-1",
        },
        wall: { steel: "carbon_steel", thicknessM: 0.014 },
      },
      start: { temperatureK: 293.15, liquidVolumeFraction: 0.4 },
      release: {
        path: "orifice",
        diameterM: 0.015,
        dischargeCoefficient: 0.85,
        from: "vapour",
        backPressurePa: 101325,
        openingTimeS: 0,
        flowModel: "frozen",
      },
      heat: { inside: { model: "correlations" }, wall: { model: "conduction" }, outside: { model: "adiabatic" } },
      run: { stopTimeS: 600, stopPressurePa: 3e5, relativeTolerance: 1e-5 },
    };
    const { series, summary } = runBlowdown(drum);
    expect(summary.energyClosure).toBeLessThan(1e-6);
    const gap = (series.gasWallTemperatureK?.at(-1) ?? 0) - (series.fluidTemperatureK.at(-1) ?? 0);
    expect(gap).toBeGreaterThan(0.3);
    expect(gap).toBeLessThan(20);
  });
});

describe("boiling", () => {
  // M4-03, M4-10: Cooper's equation solved at 20 kW/m² (own Python).
  it.each([
    [0.07213187, 102.03, 2811.73],
    [0.2, 44.1, 6331.47],
  ])("has Cooper's coefficient at p_r %d and M %d", (pr, M, h) => {
    expect(Math.abs(cooperFlux(pr, M)(20000 / h) / 20000 - 1)).toBeLessThan(3e-3);
  });
  it("has Zuber's limit for water at 100 °C: 1.106 MW/m² (M4-05, properties of the textbook example from memory)", () => {
    const q = zuberLimitWPerM2({
      latentHeatJPerKg: 2257e3,
      vapourDensityKgPerM3: 0.5956,
      liquidDensityKgPerM3: 957.9,
      surfaceTensionNPerM: 0.0589,
    });
    expect(Math.abs(q / 1.106e6 - 1)).toBeLessThan(0.01);
  });
});
