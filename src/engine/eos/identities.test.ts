import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { randomFluid, randomPressurePa, randomTemperatureK } from "../../../tests/fixtures/random-fluid";
import { libraryIds } from "../substances/library";
import { createFluidModel } from "./create-fluid-model";
import { createPhaseState, type FluidModel, type ResidualDerivatives } from "./fluid-model";
import { createResidualDerivatives } from "./residual-derivatives";
import { equations } from "./registry";

const runs = { numRuns: 150, seed: 20 };

/** |a − b| over the larger of the two and a floor: the size below which both are round-off of larger terms. */
function mismatch(a: number, b: number, floor: number): number {
  return Math.abs(a - b) / Math.max(Math.abs(a), Math.abs(b), floor);
}

function evaluate(model: FluidModel, T: number, V: number, n: ArrayLike<number>): ResidualDerivatives {
  const out = createResidualDerivatives(n.length);
  model.residual.setComposition(n);
  model.residual.evaluate(T, V, 2, out);
  return out;
}

/** Central difference of one number of the residual along one argument. */
function slope(read: (x: number) => number, at: number, step: number): number {
  return (read(at - 2 * step) - 8 * read(at - step) + 8 * read(at + step) - read(at + 2 * step)) / (12 * step);
}

describe("derivatives of the residual Helmholtz energy", () => {
  it("equal finite differences for every equation, in one phase and inside the dome", () => {
    fc.assert(
      fc.property(randomFluid(6), randomTemperatureK, fc.double({ min: 1.3, max: 60, noNaN: true }), (fluid, T, packing) => {
        const model = createFluidModel(fluid);
        const n = model.feed;
        model.residual.setComposition(n);
        const V = packing * model.residual.minimumVolume();
        const F = evaluate(model, T, V, n);
        const scale = Math.max(1, Math.abs(F.F));
        const dT = 1e-4 * T;
        const dV = 1e-4 * (V - model.residual.minimumVolume());
        const byT = (read: (f: ResidualDerivatives) => number) => slope((t) => read(evaluate(model, t, V, n)), T, dT);
        const byV = (read: (f: ResidualDerivatives) => number) => slope((v) => read(evaluate(model, T, v, n)), V, dV);
        expect(
          mismatch(
            F.FT,
            byT((f) => f.F),
            scale / T,
          ),
        ).toBeLessThan(1e-6);
        expect(
          mismatch(
            F.FTT,
            byT((f) => f.FT),
            scale / T ** 2,
          ),
        ).toBeLessThan(1e-6);
        expect(
          mismatch(
            F.FV,
            byV((f) => f.F),
            scale / V,
          ),
        ).toBeLessThan(1e-6);
        expect(
          mismatch(
            F.FVV,
            byV((f) => f.FV),
            scale / V ** 2,
          ),
        ).toBeLessThan(1e-6);
        expect(
          mismatch(
            F.FTV,
            byV((f) => f.FT),
            scale / (T * V),
          ),
        ).toBeLessThan(1e-6);
        for (let j = 0; j < n.length; j++) {
          const dn = 1e-5;
          const byN = (read: (f: ResidualDerivatives) => number) =>
            slope(
              (x) => {
                const moved = n.slice();
                moved[j] = x;
                return read(evaluate(model, T, V, moved));
              },
              n[j]!,
              dn,
            );
          expect(
            mismatch(
              F.Fn[j]!,
              byN((f) => f.F),
              scale,
            ),
          ).toBeLessThan(1e-6);
          expect(
            mismatch(
              F.FnT[j]!,
              byN((f) => f.FT),
              scale / T,
            ),
          ).toBeLessThan(1e-6);
          expect(
            mismatch(
              F.FnV[j]!,
              byN((f) => f.FV),
              scale / V,
            ),
          ).toBeLessThan(1e-6);
          for (let i = 0; i < n.length; i++) {
            expect(
              mismatch(
                F.Fnn[i * n.length + j]!,
                byN((f) => f.Fn[i]!),
                scale,
              ),
            ).toBeLessThan(1e-5);
          }
        }
      }),
      { ...runs, numRuns: 60 },
    );
  });

  it("are homogeneous of degree one (Euler: V F_V + Σ n_i F_i = F) and obey Gibbs-Duhem", () => {
    fc.assert(
      fc.property(randomFluid(10), randomTemperatureK, fc.double({ min: 1.2, max: 200, noNaN: true }), (fluid, T, packing) => {
        const model = createFluidModel(fluid);
        const n = model.feed;
        model.residual.setComposition(n);
        const V = packing * model.residual.minimumVolume();
        const F = evaluate(model, T, V, n);
        let euler = V * F.FV;
        for (let i = 0; i < n.length; i++) euler += n[i]! * F.Fn[i]!;
        expect(mismatch(euler, F.F, 1e-3)).toBeLessThan(1e-10);
        for (let j = 0; j < n.length; j++) {
          let duhem = V * F.FnV[j]!;
          for (let i = 0; i < n.length; i++) duhem += n[i]! * F.Fnn[i * n.length + j]!;
          expect(Math.abs(duhem) / Math.max(1, Math.abs(F.Fn[j]!))).toBeLessThan(1e-9);
        }
      }),
      runs,
    );
  });
});

describe("a homogeneous phase", () => {
  it("obeys Maxwell: (∂s/∂v)_T = (∂p/∂T)_v, (∂u/∂T)_v = cv, (∂h/∂T)_p = cp, and the isentropic speed of sound", () => {
    fc.assert(
      fc.property(randomFluid(8), randomTemperatureK, randomPressurePa, (fluid, T, p) => {
        const model = createFluidModel(fluid);
        const z = model.feed;
        const phase = model.phaseAtPressure(T, p, z);
        const v = phase.molarVolumeM3PerMol;
        model.residual.setComposition(z);
        const dv = 1e-4 * (v - model.residual.minimumVolume());
        const dT = 1e-4 * T;
        const at = (t: number, volume: number) => model.phaseAtVolume(t, volume, z, createPhaseState());
        expect(
          mismatch(
            slope((x) => at(T, x).entropyJPerMolK, v, dv),
            phase.pressureByTemperature,
            0,
          ),
        ).toBeLessThan(1e-6);
        expect(
          mismatch(
            slope((t) => at(t, v).internalEnergyJPerMol, T, dT),
            phase.heatCapacityVJPerMolK,
            0,
          ),
        ).toBeLessThan(1e-6);
        expect(
          mismatch(
            slope((x) => at(T, x).pressurePa, v, dv),
            phase.pressureByVolume,
            0,
          ),
        ).toBeLessThan(1e-6);
        // dp/dv along the isentrope, from the state itself: p_v − T p_T²/cv
        const isentropic = slope((x) => model.phaseFromEntropyVolume(phase.entropyJPerMolK, x, z, T).pressurePa, v, dv);
        const speed = Math.sqrt((-v * v * isentropic) / model.mixtureMolarMass(z));
        expect(mismatch(speed, phase.soundSpeedMPerS, 0)).toBeLessThan(1e-6);
        // (∂T/∂v)_p from p_T and p_v turns du + p dv into cp dT
        const heat = phase.heatCapacityVJPerMolK - (T * phase.pressureByTemperature ** 2) / phase.pressureByVolume;
        expect(mismatch(heat, phase.heatCapacityPJPerMolK, 0)).toBeLessThan(1e-9);
      }),
      runs,
    );
  });

  it("has G = Σ z_i μ_i: the departure of G over R T is Σ z_i ln φ_i", () => {
    fc.assert(
      fc.property(randomFluid(12), randomTemperatureK, randomPressurePa, (fluid, T, p) => {
        const model = createFluidModel(fluid);
        const z = model.feed;
        const lnPhi = model.lnFugacityCoefficients(T, p, z, "stable", new Float64Array(z.length));
        const phase = model.phaseAtPressure(T, p, z);
        const departures = model.departures(T, phase.molarVolumeM3PerMol, z);
        const sum = z.reduce((total, fraction, i) => total + fraction * lnPhi[i]!, 0);
        expect(Math.abs(sum - departures.gibbsEnergyJPerMol / (model.gasConstantJPerMolK * T))).toBeLessThan(1e-9);
      }),
      runs,
    );
  });

  it("becomes the ideal gas as the pressure falls", () => {
    fc.assert(
      fc.property(randomFluid(8), fc.double({ min: 250, max: 600, noNaN: true }), (fluid, T) => {
        const model = createFluidModel(fluid);
        const phase = model.phaseAtPressure(T, 1, model.feed, "vapour");
        const ideal = model.idealGas(T, 1, model.feed);
        expect(Math.abs(phase.compressibility - 1)).toBeLessThan(1e-5);
        expect(Math.abs(phase.enthalpyJPerMol - ideal.enthalpyJPerMol)).toBeLessThan(0.2);
        expect(Math.abs(phase.entropyJPerMolK - ideal.entropyJPerMolK)).toBeLessThan(1e-3);
      }),
      runs,
    );
  });

  it("is found again from its energy, entropy or enthalpy to round-off", () => {
    fc.assert(
      fc.property(randomFluid(8), randomTemperatureK, randomPressurePa, (fluid, T, p) => {
        const model = createFluidModel(fluid);
        const z = model.feed;
        const { internalEnergyJPerMol: u, entropyJPerMolK: s, molarVolumeM3PerMol: v } = model.phaseAtPressure(T, p, z);
        expect(mismatch(model.phaseFromEnergy(u, v, z, 300).temperatureK, T, 0)).toBeLessThan(1e-11);
        expect(mismatch(model.phaseFromEntropyVolume(s, v, z, 300).temperatureK, T, 0)).toBeLessThan(1e-11);
      }),
      runs,
    );
  });

  it("does not depend on the order of the components, nor on one that is absent", () => {
    fc.assert(
      fc.property(randomFluid(8), randomTemperatureK, randomPressurePa, (fluid, T, p) => {
        const backwards = createFluidModel({ ...fluid, components: [...fluid.components].reverse() });
        const used = new Set(fluid.components.map(({ id }) => id));
        const absent = libraryIds.find((id) => !used.has(id))!;
        const longer = createFluidModel({ ...fluid, components: [...fluid.components, { id: absent, moleFraction: 0 }] });
        const model = createFluidModel(fluid);
        const phase = model.phaseAtPressure(T, p, model.feed);
        for (const other of [backwards, longer]) {
          const same = other.phaseAtPressure(T, p, other.feed);
          expect(mismatch(same.molarVolumeM3PerMol, phase.molarVolumeM3PerMol, 0)).toBeLessThan(1e-10);
          expect(Math.abs(same.enthalpyJPerMol - phase.enthalpyJPerMol)).toBeLessThan(1e-7);
          expect(Math.abs(same.entropyJPerMolK - phase.entropyJPerMolK)).toBeLessThan(1e-9);
        }
      }),
      runs,
    );
  });

  it("takes 25 components", () => {
    const components = libraryIds.slice(0, 25).map((id) => ({ id, moleFraction: 1 / 25 }));
    for (const equation of Object.keys(equations) as (keyof typeof equations)[]) {
      if (equation === "gerg-2008" || equation === "reference") continue;
      const model = createFluidModel({ equation, components });
      const phase = model.phaseAtPressure(400, 5e5, model.feed);
      expect(phase.compressibility).toBeGreaterThan(0);
      expect(Number.isFinite(phase.soundSpeedMPerS)).toBe(true);
    }
  });

  it("refuses impossible states with a reason", () => {
    const model = createFluidModel({ equation: "peng-robinson-1976", components: [{ id: "methane", moleFraction: 1 }] });
    for (const attempt of [
      () => model.phaseAtPressure(300, 0, [1]),
      () => model.phaseAtPressure(300, -1, [1]),
      () => model.phaseAtPressure(300, Number.NaN, [1]),
      () => model.phaseAtPressure(Number.NaN, 1e5, [1]),
      () => model.phaseAtPressure(-5, 1e5, [1]),
      () => model.phaseAtPressure(1e5, 1e5, [1]),
      () => model.phaseAtVolume(300, 1e-6, [1]),
      () => model.phaseFromEnergy(1e9, 1e-3, [1], 300),
    ]) {
      expect(attempt).toThrow(expect.objectContaining({ name: "EngineError" }));
    }
  });
});
