import { describe, expect, it } from "vitest";
import { relativeError } from "../../../tests/fixtures/check-file";
import type { EquationId } from "../cases/fluid-spec";
import { createFluidModel } from "../eos/create-fluid-model";
import type { FluidModel } from "../eos/fluid-model";
import { gergComponents } from "../eos/gerg/gerg-data";
import { referenceFluids } from "../eos/reference/reference-data";
import { EngineError } from "../errors";
import { libraryIds } from "../substances/library";
import { flashPH } from "./flash-ph";
import { flashPT } from "./flash-pt";
import { flashUV } from "./flash-uv";
import { saturationAtPressure, saturationAtTemperature } from "./saturation-pure";

const pure = (id: string, equation: EquationId) => createFluidModel({ equation, components: [{ id, moleFraction: 1 }] });

/** Saturation there and back, and a half-boiled state found again from its energy and from its enthalpy. */
function expectBoiling(model: FluidModel, T: number): void {
  const saturation = saturationAtTemperature(model, T, [1]);
  const { pressurePa, vapourVolume, liquidVolume } = saturation;
  expect(relativeError(saturationAtPressure(model, pressurePa, [1]).temperatureK, T)).toBeLessThan(1e-9);
  const vapour = { ...model.phaseAtVolume(T, vapourVolume, [1]) };
  const liquid = { ...model.phaseAtVolume(T, liquidVolume, [1]) };
  expect(relativeError(vapour.pressurePa, pressurePa)).toBeLessThan(1e-7);
  const half = (key: "internalEnergyJPerMol" | "enthalpyJPerMol" | "molarVolumeM3PerMol") => 0.5 * (vapour[key] + liquid[key]);
  const byEnergy = flashUV(model, {
    internalEnergyJPerMol: half("internalEnergyJPerMol"),
    molarVolumeM3PerMol: half("molarVolumeM3PerMol"),
  });
  expect(byEnergy.phases).toHaveLength(2);
  expect(relativeError(byEnergy.temperatureK, T)).toBeLessThan(1e-7);
  expect(relativeError(flashPH(model, { pressurePa, enthalpyJPerMol: half("enthalpyJPerMol") }).temperatureK, T)).toBeLessThan(
    1e-7,
  );
}

const reduced = [0.5, 0.7, 0.9, 0.99, 0.995, 0.998, 0.999, 0.9995, 0.9999];

describe("pure fluids up to 0.9999 of their critical temperature", () => {
  const cases: [EquationId, readonly string[]][] = [
    ["reference", [...referenceFluids.keys()]],
    ["gerg-2008", [...gergComponents.keys()]],
    ["peng-robinson-1976", libraryIds],
    ["soave-redlich-kwong", libraryIds],
    ["van-der-waals", libraryIds],
  ];
  it.each(cases)("boil by %s", (equation, ids) => {
    const above: string[] = [];
    for (const id of ids) {
      const model = pure(id, equation);
      for (const share of reduced) {
        const T = share * model.criticalTemperaturesK[0]!;
        if (T < model.temperatureRangeK[0]) continue;
        try {
          expectBoiling(model, T);
        } catch (error) {
          if (!(error instanceof EngineError) || error.code !== "not-applicable") throw error;
          above.push(`${id} ${share}`);
        }
      }
    }
    // The isotherm of GERG-2008 for isobutane has lost its loop at 0.9999 of the Tc that the equation is reduced by.
    expect(above).toEqual(equation === "gerg-2008" ? ["isobutane 0.9999"] : []);
  });

  it("below which helium has no cubic: its flashes by enthalpy are those of a gas", () => {
    const helium = pure("helium", "peng-robinson-1976");
    const { enthalpyJPerMol } = flashPT(helium, { temperatureK: 250, pressurePa: 1.5e5 });
    expect(flashPH(helium, { pressurePa: 1.5e5, enthalpyJPerMol }).temperatureK).toBeCloseTo(250, 9);
  });
});

describe("fluids of unusual make-up", () => {
  let seed = 7;
  const random = () => (seed = (seed * 1664525 + 1013904223) >>> 0) / 2 ** 32;
  const dry = libraryIds.filter((id) => id !== "water");
  const sour = ["methane", "hydrogen_sulfide", "carbon_dioxide", "water", "methanol", "n_butane", "nitrogen", "hydrogen"];
  const kinds: [string, readonly string[], EquationId, number, number][] = [
    ["twenty-five components", dry, "peng-robinson-1976", 25, 25],
    ["sour water and methanol", sour, "soave-redlich-kwong", 8, 60],
    ["hydrogen and helium", ["hydrogen", "helium", "methane", "nitrogen", "propane"], "peng-robinson-1978", 5, 60],
    ["GERG-2008, unlike components", [...gergComponents.keys()].filter((id) => id !== "water"), "gerg-2008", 5, 12],
  ];
  it.each(kinds)("%s: PT, UV and PH agree", (_, ids, equation, count, runs) => {
    for (let run = 0; run < runs; run++) {
      const own = [...ids].sort(() => random() - 0.5).slice(0, count);
      const weights = own.map(() => (random() < 0.15 ? [0, 1e-12][Math.floor(2 * random())]! : -Math.log(random() || 0.5)));
      const sum = weights.reduce((total, weight) => total + weight, 0) || 1;
      if (sum === 1) weights[0] = 1;
      const model = createFluidModel({ equation, components: own.map((id, i) => ({ id, moleFraction: weights[i]! / sum })) });
      const state = { temperatureK: 200 + 250 * random(), pressurePa: 1e5 * 200 ** random() };
      const found = flashPT(model, state);
      expect(Number.isFinite(found.enthalpyJPerMol + found.entropyJPerMolK + found.molarVolumeM3PerMol)).toBe(true);
      if (found.missingPhase) continue;
      expect(relativeError(flashUV(model, found).temperatureK, state.temperatureK)).toBeLessThan(1e-6);
      expect(relativeError(flashPH(model, found).temperatureK, state.temperatureK)).toBeLessThan(1e-6);
    }
  });

  it("refuses a component listed twice, and more than twenty-five", () => {
    const twice = [
      { id: "methane", moleFraction: 0.5 },
      { id: "methane", moleFraction: 0.5 },
    ];
    expect(() => createFluidModel({ equation: "gerg-2008", components: twice })).toThrow(/listed twice/);
    const many = libraryIds.slice(0, 26).map((id) => ({ id, moleFraction: 1 / 26 }));
    expect(() => createFluidModel({ equation: "peng-robinson-1976", components: many })).toThrow(/1 to 25/);
  });
});
