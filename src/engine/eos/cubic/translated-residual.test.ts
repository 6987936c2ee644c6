import { describe, expect, it } from "vitest";
import { relativeError } from "../../../../tests/fixtures/check-file";
import type { EquationId, FluidSpec, VolumeTranslation } from "../../cases/fluid-spec";
import { flashPT } from "../../flash/flash-pt";
import { flashUV } from "../../flash/flash-uv";
import { saturationAtTemperature } from "../../flash/saturation-pure";
import { createFluidModel } from "../create-fluid-model";
import type { FluidModel, ResidualDerivatives } from "../fluid-model";
import { createResidualDerivatives } from "../residual-derivatives";

const modelOf = (
  composition: Record<string, number>,
  volumeTranslation: VolumeTranslation,
  equation: EquationId = "peng-robinson-1976",
): FluidModel => {
  const components = Object.entries(composition).map(([id, moleFraction]) => ({ id, moleFraction }));
  const spec: FluidSpec = { equation, components, volumeTranslation };
  return createFluidModel(spec);
};
const gas = { methane: 0.6, propane: 0.25, n_decane: 0.15 };

function at(model: FluidModel, T: number, V: number, n: ArrayLike<number>): ResidualDerivatives {
  const out = createResidualDerivatives(n.length);
  model.residual.setComposition(n);
  model.residual.evaluate(T, V, 2, out);
  return out;
}

describe("a translated equation", () => {
  it.each(["soave-redlich-kwong", "peng-robinson-1978"] as const)(
    "%s has derivatives that equal finite differences",
    (equation) => {
      const model = modelOf(gas, "library", equation);
      const n = [0.6, 0.25, 0.15];
      for (const V of [1.2e-4, 4e-4, 5e-3]) {
        const T = 330;
        const F = at(model, T, V, n);
        const close = (value: number, of: (step: number) => number, step: number) =>
          expect(Math.abs(value - (of(step) - of(-step)) / (2 * step))).toBeLessThan(3e-6 * Math.max(Math.abs(value), 1));
        const moved = (j: number, step: number) => n.map((x, i) => (i === j ? x + step : x));
        close(F.FV * V, (s) => V * at(model, T, V + s, n).F, 1e-5 * V);
        close(F.FVV * V * V, (s) => V * V * at(model, T, V + s, n).FV, 1e-5 * V);
        close(F.FTV * V * T, (s) => V * T * at(model, T + s, V, n).FV, 1e-3);
        for (let j = 0; j < 3; j++) {
          close(F.Fn[j]!, (s) => at(model, T, V, moved(j, s)).F, 1e-6);
          close(F.FnV[j]! * V, (s) => V * at(model, T, V, moved(j, s)).FV, 1e-6);
          close(F.FnT[j]! * T, (s) => T * at(model, T, V, moved(j, s)).FT, 1e-6);
          for (let i = 0; i < 3; i++) close(F.Fnn[i * 3 + j]!, (s) => at(model, T, V, moved(j, s)).Fn[i]!, 1e-6);
        }
      }
    },
  );

  it("keeps phases, u and s at given temperature and pressure, and shifts v by −c and h by −c p", () => {
    const [plain, shifted] = [modelOf(gas, "none"), modelOf(gas, "peneloux")];
    const state = { temperatureK: 310, pressurePa: 5e6 };
    const [a, b] = [flashPT(plain, state), flashPT(shifted, state)];
    expect(b.vapourMoleFraction).toBeCloseTo(a.vapourMoleFraction, 11);
    a.phases.forEach((phase, k) => {
      const other = b.phases[k]!;
      phase.composition.forEach((x, i) => expect(other.composition[i]).toBeCloseTo(x, 11));
      const c = phase.state.molarVolumeM3PerMol - other.state.molarVolumeM3PerMol;
      expect(Math.abs(c)).toBeGreaterThan(1e-7);
      expect(other.state.internalEnergyJPerMol).toBeCloseTo(phase.state.internalEnergyJPerMol, 6);
      expect(other.state.entropyJPerMolK).toBeCloseTo(phase.state.entropyJPerMolK, 8);
      expect(other.state.heatCapacityPJPerMolK).toBeCloseTo(phase.state.heatCapacityPJPerMolK, 6);
      expect(other.state.enthalpyJPerMol - phase.state.enthalpyJPerMol).toBeCloseTo(-c * state.pressurePa, 6);
    });
    const again = flashUV(shifted, b);
    expect(again.temperatureK).toBeCloseTo(310, 9);
    expect(relativeError(again.pressurePa, 5e6)).toBeLessThan(1e-9);
  });

  it("brings the liquid to its measured density at 0.7 of the critical temperature, and nowhere far from it", () => {
    for (const id of ["methane", "propane", "n_decane", "carbon_dioxide", "water", "hydrogen_sulfide"]) {
      const pure = modelOf({ [id]: 1 }, "none", "soave-redlich-kwong");
      const shifted = modelOf({ [id]: 1 }, "library", "soave-redlich-kwong");
      const T = 0.7 * pure.criticalTemperaturesK[0]!;
      const [before, after] = [saturationAtTemperature(pure, T, [1]), saturationAtTemperature(shifted, T, [1])];
      expect(relativeError(after.pressurePa, before.pressurePa)).toBeLessThan(1e-10);
      // propane at 258.92 K: 12.39 mol/L (Lemmon et al. 2009, from memory) and alike: the fit is to the reference equation
      if (id === "propane") expect(relativeError(1 / after.liquidVolume, 12390)).toBeLessThan(0.003);
      expect(relativeError(after.liquidVolume, before.liquidVolume)).toBeLessThan(0.35);
    }
  });

  it("is refused where none was published, by the name of the key", () => {
    for (const equation of ["van-der-waals", "redlich-kwong", "gerg-2008", "reference"] as const) {
      expect(() => modelOf({ propane: 1 }, "library", equation)).toThrow(
        expect.objectContaining({ code: "not-applicable", path: "fluid.volumeTranslation" }),
      );
    }
    expect(() => modelOf({ propane: 1 }, "none", "gerg-2008")).not.toThrow();
  });
});
