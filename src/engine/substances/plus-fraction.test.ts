import { describe, expect, it } from "vitest";
import { relativeError } from "../../../tests/fixtures/check-file";
import type { FluidSpec } from "../cases/fluid-spec";
import { createFluidModel } from "../eos/create-fluid-model";
import { flashPT } from "../flash/flash-pt";
import { pseudoSubstance } from "./pseudo-component";
import { expandPlusFractions, splitPlusFraction } from "./plus-fraction";

const total = (values: number[]) => values.reduce((sum, value) => sum + value, 0);

describe("the cut of a plus fraction", () => {
  it.each([1, 2, 3, 5, 8])("into %d pieces keeps moles, mass and volume, each piece holding the same mass", (pieces) => {
    const cut = splitPlusFraction({ molarMassKgPerMol: 0.19, relativeDensity: 0.82, pieces });
    expect(cut).toHaveLength(pieces);
    expect(total(cut.map(({ share }) => share))).toBeCloseTo(1, 13);
    expect(total(cut.map(({ share, molarMassKgPerMol }) => share * molarMassKgPerMol))).toBeCloseTo(0.19, 13);
    const volume = total(
      cut.map(({ share, molarMassKgPerMol, relativeDensity }) => (share * molarMassKgPerMol) / relativeDensity),
    );
    expect(volume).toBeCloseTo(0.19 / 0.82, 12);
    for (const { share, molarMassKgPerMol } of cut) expect(share * molarMassKgPerMol).toBeCloseTo(0.19 / pieces, 12);
    for (let k = 1; k < pieces; k++) {
      expect(cut[k]!.molarMassKgPerMol).toBeGreaterThan(cut[k - 1]!.molarMassKgPerMol);
      expect(cut[k]!.relativeDensity).toBeGreaterThan(cut[k - 1]!.relativeDensity);
    }
  });

  it("falls with carbon number as in condensates: z_n ∝ exp(−0.25903 n), Katz, J. Pet. Technol. 35 (1983) 1205 (from memory)", () => {
    // One carbon number is 14 g/mol: the exponential of Katz has β = 14/0.25903 = 54.05 g/mol, a fraction of 144 g/mol from 90.
    const beta = 0.014 / 0.25903;
    const mean = 0.09 + beta;
    const half = splitPlusFraction({ molarMassKgPerMol: mean, relativeDensity: 0.78, pieces: 2 });
    // By Katz's own sums over n = 7, 8, …: the share of moles in the lighter half of the mass, with M_n = 14 n − 4
    const moles = Array.from({ length: 80 }, (_, k) => Math.exp(-0.25903 * (k + 7)));
    const masses = moles.map((z, k) => z * (14 * (k + 7) - 4));
    let light = 0;
    let mass = 0;
    for (let k = 0; mass < 0.5 * total(masses); k++) {
      const part = Math.min(1, (0.5 * total(masses) - mass) / masses[k]!);
      light += part * moles[k]!;
      mass += part * masses[k]!;
    }
    expect(relativeError(half[0]!.share, light / total(moles))).toBeLessThan(0.02);
  });

  it("keeps the Watson factor of each piece: 4.5579 M^0.15178 SG^−0.84573 (Whitson 1983)", () => {
    const factor = (M: number, SG: number) => 4.5579 * (1000 * M) ** 0.15178 * SG ** -0.84573;
    const cut = splitPlusFraction({ molarMassKgPerMol: 0.2, relativeDensity: 0.84, pieces: 4 });
    const factors = cut.map(({ molarMassKgPerMol, relativeDensity }) => factor(molarMassKgPerMol, relativeDensity));
    expect(Math.max(...factors) / Math.min(...factors) - 1).toBeLessThan(1e-4);
    expect(factors[0]).toBeGreaterThan(11);
    expect(factors[0]).toBeLessThan(12.5);
  });

  it("is part of a fluid before its equation: names, fractions, interactions, and the liquid it brings", () => {
    const fluid: FluidSpec = {
      equation: "peng-robinson-1978",
      components: [
        { id: "methane", moleFraction: 0.9 },
        { id: "c7-plus", moleFraction: 0.1, plus: { molarMassKgPerMol: 0.19, relativeDensity: 0.82 } },
      ],
      interaction: [{ pair: ["methane", "c7-plus"], kij: 0.03 }],
    };
    const expanded = expandPlusFractions(fluid);
    expect(expanded.components.map(({ id }) => id)).toEqual(["methane", "c7-plus-1", "c7-plus-2", "c7-plus-3"]);
    expect(expanded.interaction).toHaveLength(3);
    expect(expandPlusFractions(expanded)).toBe(expanded);
    const model = createFluidModel(fluid);
    expect(model.mixtureMolarMass(model.feed)).toBeCloseTo(0.9 * 0.0160428 + 0.019, 8);
    const one = createFluidModel({
      ...fluid,
      components: [fluid.components[0]!, { ...fluid.components[1]!, plus: { ...fluid.components[1]!.plus!, pieces: 1 } }],
    });
    const state = { temperatureK: 320, pressurePa: 4e6 };
    const [split, lumped] = [flashPT(model, state), flashPT(one, state)];
    // the light pieces dissolve into the gas, the lump does not: less liquid
    expect(split.vapourMoleFraction).toBeGreaterThan(lumped.vapourMoleFraction);
  });

  it("names what is wrong with one", () => {
    const fluid = (plus: object): FluidSpec => ({
      equation: "peng-robinson-1978",
      components: [{ id: "x", moleFraction: 1, plus: { molarMassKgPerMol: 0.19, relativeDensity: 0.82, ...plus } }],
    });
    const path = (plus: object) => {
      try {
        createFluidModel(fluid(plus));
      } catch (error) {
        return (error as { path?: string }).path;
      }
      return undefined;
    };
    expect(path({ pieces: 0 })).toBe("fluid.components[0].plus.pieces");
    expect(path({ molarMassKgPerMol: 0.08 })).toBe("fluid.components[0].plus.molarMassKgPerMol");
    expect(path({ molarMassKgPerMol: 0.4 })).toBe("fluid.components[0].plus"); // the heaviest piece is past 550 g/mol
  });
});

describe("pseudo-components past 300 g/mol", () => {
  it("go on from those below without a jump of more than 3 %", () => {
    const below = pseudoSubstance("a", 0.2999, 0.86);
    const above = pseudoSubstance("b", 0.3001, 0.86);
    expect(relativeError(above.criticalTemperatureK, below.criticalTemperatureK)).toBeLessThan(0.03);
    expect(above.acentricFactor).toBeGreaterThan(0.7);
  });
});
