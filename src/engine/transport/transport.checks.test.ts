import { describe, expect, it } from "vitest";
import { relativeError } from "../../../tests/fixtures/check-file";
import { methodCheck, numberIn } from "../../../tests/fixtures/method-check";
import { createFluidModel } from "../eos/create-fluid-model";
import { chungTransport } from "./chung";
import { lucasViscosity } from "./lucas-viscosity";
import { brockBirdSurfaceTension } from "./surface-tension";
import { transportProperties } from "./transport-properties";

describe("transport properties, tests/fixtures/checks/methods.json", () => {
  it(`M4-06 viscosity of methane (${methodCheck("M4-06").source})`, () => {
    const { inputs, expected, tolerance } = methodCheck("M4-06");
    const { lowPressure, atPressure } = lucasViscosity(
      {
        criticalTemperatureK: numberIn(inputs, "Tc"),
        criticalPressurePa: numberIn(inputs, "pc"),
        molarMassKgPerMol: numberIn(inputs, "M") / 1000,
      },
      numberIn(inputs, "T"),
      numberIn(inputs, "p"),
    );
    expect(relativeError(lowPressure, numberIn(expected, "mu_0"))).toBeLessThan(tolerance.relative!);
    expect(relativeError(atPressure, numberIn(expected, "mu_p"))).toBeLessThan(tolerance.relative!);
    expect(relativeError(atPressure, numberIn(expected, "reference_mu_p"))).toBeLessThan(0.01);
  });

  it(`M4-07 conductivity of propylene (${methodCheck("M4-07").source})`, () => {
    const { inputs, expected, tolerance } = methodCheck("M4-07");
    const { conductivityWPerMK } = chungTransport(
      {
        criticalTemperatureK: numberIn(inputs, "Tc"),
        criticalVolumeM3PerMol: numberIn(inputs, "Vc") / 1e6,
        molarMassKgPerMol: numberIn(inputs, "M") / 1000,
        acentricFactor: numberIn(inputs, "omega"),
        dipoleDebye: numberIn(inputs, "dipole"),
      },
      {
        temperatureK: numberIn(inputs, "T"),
        molarVolumeM3PerMol: numberIn(inputs, "V") / 1e6,
        idealHeatCapacityVJPerMolK: numberIn(inputs, "cv0"),
      },
      numberIn(inputs, "mu0"),
    );
    expect(relativeError(conductivityWPerMK, numberIn(expected, "lambda"))).toBeLessThan(tolerance.relative!);
  });
});

describe("transport properties of phases", () => {
  const phaseOf = (id: string, T: number, p: number) => {
    const model = createFluidModel({ equation: "reference", components: [{ id, moleFraction: 1 }] });
    return transportProperties(model, model.phaseAtPressure(T, p, [1]), [1]);
  };

  // Measured values as printed in handbooks, from memory, each good to about 2 %.
  it.each([
    ["nitrogen", 300, 1e5, 17.9e-6, 0.0259, 0.06],
    ["methane", 300, 1e5, 11.1e-6, 0.0344, 0.1],
    ["propane", 300, 1e6, 97e-6, 0.094, 0.1],
    ["carbon_dioxide", 300, 1e5, 15.0e-6, 0.0168, 0.1],
  ])("%s at %d K and %d Pa", (id, T, p, viscosity, conductivity, within) => {
    const found = phaseOf(id, T, p);
    expect(relativeError(found.viscosityPaS, viscosity)).toBeLessThan(within);
    expect(relativeError(found.conductivityWPerMK, conductivity)).toBeLessThan(within);
    expect(found.prandtl).toBeGreaterThan(0.5);
  });

  it("gives finite, positive values for mixtures with custom and pseudo components", () => {
    const model = createFluidModel({
      equation: "peng-robinson-1976",
      components: [
        { id: "methane", moleFraction: 0.7 },
        { id: "hydrogen", moleFraction: 0.1 },
        { id: "heavy", moleFraction: 0.2, pseudo: { molarMassKgPerMol: 0.15, relativeDensity: 0.78 } },
      ],
    });
    for (const [T, p] of [
      [250, 1e5],
      [300, 1e7],
      [450, 3e7],
    ] as const) {
      const found = transportProperties(model, model.phaseAtPressure(T, p, model.feed), model.feed);
      expect(found.viscosityPaS).toBeGreaterThan(1e-6);
      expect(found.conductivityWPerMK).toBeGreaterThan(1e-3);
      expect(Number.isFinite(found.prandtl)).toBe(true);
    }
  });

  it("surface tension of propane at 231 K is about 15.5 mN/m (handbook value, from memory) and vanishes at the critical point", () => {
    const propane = { criticalTemperatureK: 369.89, criticalPressurePa: 4.2512e6, normalBoilingPointK: 231.036 };
    expect(relativeError(brockBirdSurfaceTension(propane, 231.036), 0.0155)).toBeLessThan(0.05);
    expect(brockBirdSurfaceTension(propane, 369.89)).toBe(0);
  });
});
