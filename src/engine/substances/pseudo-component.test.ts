import { describe, expect, it } from "vitest";
import { relativeError } from "../../../tests/fixtures/check-file";
import { methodCheck, numberIn } from "../../../tests/fixtures/method-check";
import { createIdealGasModel } from "../eos/ideal-gas";
import { findLibraryRow, librarySubstance } from "./library";
import {
  edmisterAcentricFactor,
  keslerLee,
  pascalPerPsi,
  pseudoSubstance,
  rankinePerKelvin,
  riaziDaubert1980,
  riaziDaubertFromMolarMass,
} from "./pseudo-component";

describe("petroleum fractions, tests/fixtures/checks/methods.json M1-08 to M1-10", () => {
  it(`M1-08 (${methodCheck("M1-08").source})`, () => {
    const { inputs, expected, tolerance } = methodCheck("M1-08");
    const found = riaziDaubertFromMolarMass(numberIn(inputs, "M"), numberIn(inputs, "SG"));
    for (const key of ["Tc", "pc", "Tb"] as const) {
      expect(relativeError(found[key], numberIn(expected, key)), key).toBeLessThan(tolerance.relative!);
    }
    expect(relativeError(edmisterAcentricFactor(found), numberIn(expected, "omega_Edmister"))).toBeLessThan(tolerance.relative!);
  });

  for (const id of ["M1-09", "M1-10"]) {
    it(`${id} (${methodCheck(id).source})`, () => {
      const { inputs, expected, tolerance } = methodCheck(id);
      const [Tb, SG] = [numberIn(inputs, "Tb"), numberIn(inputs, "SG")];
      const kesler = keslerLee(Tb, SG);
      for (const [key, value] of Object.entries({ KL_Tc: kesler.Tc, KL_pc: kesler.pc, KL_M: kesler.M, KL_omega: kesler.omega })) {
        expect(relativeError(value, numberIn(expected, key)), key).toBeLessThan(tolerance.relative!);
      }
      if (id === "M1-10") return;
      const riazi = riaziDaubert1980(Tb, SG);
      for (const [key, value] of Object.entries({ RD_Tc: riazi.Tc, RD_pc: riazi.pc, RD_M: riazi.M })) {
        expect(relativeError(value, numberIn(expected, key)), key).toBeLessThan(tolerance.relative!);
      }
    });
  }
});

describe("a pseudo-component", () => {
  it("made to look like n-decane has nearly its constants", () => {
    const decane = librarySubstance(findLibraryRow("n_decane")!);
    // relative density of n-decane 60/60 °F: 0.7342 (as in M1-10)
    const cut = pseudoSubstance("cut", decane.molarMassKgPerMol, 0.7342);
    // the (M, SG) form was fitted to fractions of mixed type; a pure paraffin lies at the edge of it (2.5 % found in Tc)
    expect(relativeError(cut.criticalTemperatureK, decane.criticalTemperatureK)).toBeLessThan(0.03);
    expect(relativeError(cut.criticalPressurePa, decane.criticalPressurePa)).toBeLessThan(0.08);
    // Edmister divides by Tc/Tb − 1, which magnifies an error of the two estimates (15 % found)
    expect(relativeError(cut.acentricFactor, decane.acentricFactor)).toBeLessThan(0.2);
  });

  it("has the heat capacity of n-decane within 3 % from 300 to 500 K, with its true boiling point fed in", () => {
    const decane = findLibraryRow("n_decane")!;
    const cut = pseudoSubstance("cut", decane.molarMass_kg_per_mol, 0.7342);
    const model = createIdealGasModel([cut.heatCapacity, librarySubstance(decane).heatCapacity]);
    const cp = new Float64Array(2);
    for (const T of [300, 350, 400, 450, 500]) {
      model.evaluate(T, cp, new Float64Array(2), new Float64Array(2));
      // the correlation's own statement is 2.3 %; estimated Tb and ω here add to it
      expect(relativeError(cp[0]!, cp[1]!)).toBeLessThan(0.03);
    }
  });

  it.each([
    [0.05, 0.7],
    [0.6, 0.9],
    [0.15, 0.4],
    [0.15, 1.2],
    [Number.NaN, 0.8],
  ])("refuses molar mass %d kg/mol with relative density %d", (mass, density) => {
    expect(() => pseudoSubstance("x", mass, density)).toThrow(/pseudo-component|petroleum/);
  });

  it("keeps Rankine and psi exact", () => {
    expect(rankinePerKelvin).toBe(1.8);
    expect(pascalPerPsi).toBeCloseTo((0.45359237 * 9.80665) / 0.0254 ** 2, 9);
  });
});
