import { describe, expect, it } from "vitest";
import { readCheck, relativeError } from "../../../../tests/fixtures/check-file";
import type { FluidSpec } from "../../cases/fluid-spec";
import { flashPS } from "../../flash/flash-ph";
import { flashTQ } from "../../flash/flash-quality";
import { flashUV } from "../../flash/flash-uv";
import { saturationAtPressure, saturationAtTemperature } from "../../flash/saturation-pure";
import { runPath } from "../../path/run-path";
import { createFluidModel } from "../create-fluid-model";
import { referenceFluids } from "./reference-data";

/** Names of the check files on the left. Fluids without an equation in the table (n-hexane, benzene, toluene) are absent. */
const idOf: Record<string, string> = {
  CH4: "methane",
  C2H6: "ethane",
  C3H8: "propane",
  iC4: "isobutane",
  nC4: "n_butane",
  nC5: "n_pentane",
  C2H4: "ethylene",
  C3H6: "propylene",
  CO2: "carbon_dioxide",
  N2: "nitrogen",
  O2: "oxygen",
  Ar: "argon",
  H2: "hydrogen",
  H2S: "hydrogen_sulfide",
  NH3: "ammonia",
  H2O: "water",
};
const pure = (id: string): FluidSpec => ({ equation: "reference", components: [{ id, moleFraction: 1 }] });
const within = 1e-9;

interface State {
  rho: number;
  u: number;
  h: number;
  s: number;
}
interface PathRow {
  id: string;
  fluid: string;
  T1: number;
  P1: number;
  T2: number;
  P2: number;
  helmholtz: { dU: number; dH: number; dS: number; ideal_dH: number; ideal_dS_T_and_P: number; state1: State; state2: State };
}

describe("change of state by reference equations against tests/fixtures/checks/paths.json (CoolProp 8.0.0)", () => {
  for (const row of readCheck<{ rows: PathRow[] }>("paths.json").rows.filter(({ fluid }) => idOf[fluid])) {
    it(`${row.id} ${row.fluid}`, () => {
      const result = runPath({
        format: "ebbmark-case/1",
        kind: "path",
        fluid: pure(idOf[row.fluid]!),
        from: { temperatureK: row.T1, pressurePa: row.P1 },
        to: { temperatureK: row.T2, pressurePa: row.P2 },
      });
      const { helmholtz } = row;
      expect(relativeError(result.internalEnergyJPerMol.total, helmholtz.dU)).toBeLessThan(within);
      expect(relativeError(result.enthalpyJPerMol.total, helmholtz.dH)).toBeLessThan(within);
      expect(relativeError(result.entropyJPerMolK.total, helmholtz.dS)).toBeLessThan(within);
      expect(relativeError(result.enthalpyJPerMol.idealGas, helmholtz.ideal_dH)).toBeLessThan(within);
      expect(relativeError(result.entropyJPerMolK.idealGas, helmholtz.ideal_dS_T_and_P)).toBeLessThan(within);
      expect(relativeError(1 / result.from.molarVolumeM3PerMol, helmholtz.state1.rho)).toBeLessThan(within);
      expect(relativeError(1 / result.to.molarVolumeM3PerMol, helmholtz.state2.rho)).toBeLessThan(within);
    });
  }
});

interface SaturationRow {
  fluid: string;
  T: number;
  helmholtz: Record<"P" | "rhoL" | "rhoV" | "hL" | "hV" | "sL" | "sV" | "uL" | "uV", number>;
}

describe("saturation by reference equations against tests/fixtures/checks/saturation.json (CoolProp 8.0.0)", () => {
  const rows = readCheck<{ rows: SaturationRow[] }>("saturation.json").rows;
  for (const { fluid, T, helmholtz } of rows.filter((row) => idOf[row.fluid] && row.helmholtz)) {
    it(`${fluid} at ${T} K`, () => {
      const model = createFluidModel(pure(idOf[fluid]!));
      const found = saturationAtTemperature(model, T, [1]);
      expect(relativeError(found.pressurePa, helmholtz.P)).toBeLessThan(within);
      expect(relativeError(1 / found.liquidVolume, helmholtz.rhoL)).toBeLessThan(within);
      expect(relativeError(1 / found.vapourVolume, helmholtz.rhoV)).toBeLessThan(within);
      expect(relativeError(saturationAtPressure(model, helmholtz.P, [1]).temperatureK, T)).toBeLessThan(within);
      const [vapour, liquid] = flashTQ(model, { temperatureK: T, vapourMoleFraction: 0.5 }).phases;
      expect(relativeError(vapour!.state.enthalpyJPerMol, helmholtz.hV)).toBeLessThan(1e-7);
      expect(relativeError(liquid!.state.enthalpyJPerMol, helmholtz.hL)).toBeLessThan(1e-7);
      expect(relativeError(liquid!.state.entropyJPerMolK, helmholtz.sL)).toBeLessThan(1e-7);
      const lnPhi = [vapour!, liquid!].map(({ lnFugacityCoefficients }) => lnFugacityCoefficients[0]!);
      expect(Math.abs(lnPhi[0]! - lnPhi[1]!)).toBeLessThan(1e-9);
    });
  }
});

interface UvRow {
  id: string;
  model: string;
  fluid: string;
  n: number;
  V: number;
  U: number;
  T: number;
  P: number;
  vapour_fraction: number | null;
  s: number;
}

describe("UV flash by reference equations against tests/fixtures/checks/uv-flash.json (CoolProp 8.0.0)", () => {
  for (const row of readCheck<{ rows: UvRow[] }>("uv-flash.json").rows.filter(({ model }) => model === "Helmholtz")) {
    it(`${row.id} ${row.fluid}`, () => {
      const model = createFluidModel(pure(idOf[row.fluid]!));
      const target = { internalEnergyJPerMol: row.U / row.n, molarVolumeM3PerMol: row.V / row.n };
      const found = flashUV(model, target);
      expect(relativeError(found.temperatureK, row.T)).toBeLessThan(within);
      expect(relativeError(found.pressurePa, row.P)).toBeLessThan(within);
      expect(relativeError(found.entropyJPerMolK, row.s)).toBeLessThan(within);
      expect(found.phases).toHaveLength(row.vapour_fraction === null ? 1 : 2);
      if (row.vapour_fraction !== null) expect(relativeError(found.vapourMoleFraction, row.vapour_fraction)).toBeLessThan(1e-8);
      expect(relativeError(found.internalEnergyJPerMol, target.internalEnergyJPerMol)).toBeLessThan(1e-10);
      expect(relativeError(found.molarVolumeM3PerMol, target.molarVolumeM3PerMol)).toBeLessThan(1e-10);
    });
  }
});

interface IsentropicRow {
  id: string;
  model: string;
  fluid: string;
  initial: { s: number };
  final: { T: number; P: number; u: number; vapour_fraction: number | null };
}

describe("isentropic end states by reference equations against tests/fixtures/checks/isentropic.json (CoolProp 8.0.0)", () => {
  const rows = readCheck<{ rows: IsentropicRow[] }>("isentropic.json").rows;
  for (const row of rows.filter(({ model, fluid }) => model === "Helmholtz" && idOf[fluid])) {
    it(`${row.id} ${row.fluid} to ${(row.final.P / 1e5).toFixed(3)} bar`, () => {
      const model = createFluidModel(pure(idOf[row.fluid]!));
      const found = flashPS(model, { pressurePa: row.final.P, entropyJPerMolK: row.initial.s });
      expect(relativeError(found.temperatureK, row.final.T)).toBeLessThan(1e-8);
      expect(relativeError(found.internalEnergyJPerMol, row.final.u)).toBeLessThan(1e-7);
      if (row.final.vapour_fraction !== null) {
        expect(relativeError(found.vapourMoleFraction, row.final.vapour_fraction)).toBeLessThan(1e-7);
      }
    });
  }
});

describe("IAPWS-95", () => {
  it("gives the check values printed for 500 K and 838.025 kg/m³ (IAPWS R6-95, Table 6, from memory)", () => {
    const water = referenceFluids.get("water")!;
    const model = createFluidModel(pure("water"));
    const out = {
      F: 0,
      FT: 0,
      FV: 0,
      FTT: 0,
      FTV: 0,
      FVV: 0,
      Fn: new Float64Array(1),
      FnT: new Float64Array(1),
      FnV: new Float64Array(1),
      Fnn: new Float64Array(1),
    };
    const V = water.molarMass_kg_per_mol / 838.025;
    model.residual.setComposition([1]);
    model.residual.evaluate(500, V, 2, out);
    expect(relativeError(out.F, -0.342693206e1)).toBeLessThan(2e-9);
    expect(relativeError(-out.FV * V, -0.36436665 * (838.025 / 322))).toBeLessThan(2e-8); // δ φr_δ, φr_δ as printed
    expect(relativeError((-out.FT * 500) / (647.096 / 500), -0.581403435e1)).toBeLessThan(2e-8);
  });
});

describe("the reference equations", () => {
  it("refuse a mixture and a fluid without one, at the field", () => {
    const refused = (fluid: FluidSpec) => () => createFluidModel(fluid);
    expect(refused(pure("n_decane"))).toThrow(
      expect.objectContaining({ code: "not-applicable", path: "fluid.components[0].id" }),
    );
    expect(
      refused({
        equation: "reference",
        components: [
          { id: "methane", moleFraction: 0.5 },
          { id: "ethane", moleFraction: 0.5 },
        ],
      }),
    ).toThrow(expect.objectContaining({ code: "not-applicable", path: "fluid.components" }));
  });

  it("have derivatives that equal finite differences, near the critical point too", () => {
    for (const id of referenceFluids.keys()) {
      const model = createFluidModel(pure(id));
      const data = referenceFluids.get(id)!;
      for (const [reducedT, reducedRho] of [
        [0.8, 2.6],
        [0.8, 0.02],
        [1.003, 1.02],
        [1.3, 0.6],
        [1.5, 1.6],
      ] as const) {
        const T = reducedT * data.reducing.T_K;
        const v = 1 / (reducedRho * data.reducing.rho_mol_per_m3);
        const at = (t: number, volume: number) => ({ ...model.phaseAtVolume(t, volume, [1]) });
        const here = at(T, v);
        const slope = (f: (x: number) => number, x: number, h: number) =>
          (f(x - 2 * h) - 8 * f(x - h) + 8 * f(x + h) - f(x + 2 * h)) / (12 * h);
        const cv = slope((t) => at(t, v).internalEnergyJPerMol, T, 2e-5 * T);
        const pT = slope((x) => at(T, x).entropyJPerMolK, v, 2e-5 * v);
        const pv = slope((x) => at(T, x).pressurePa, v, 2e-5 * v);
        expect(relativeError(here.heatCapacityVJPerMolK, cv), `${id} cv`).toBeLessThan(1e-6);
        expect(relativeError(here.pressureByTemperature, pT), `${id} p_T`).toBeLessThan(1e-6);
        expect(
          Math.abs(here.pressureByVolume - pv) / Math.max(Math.abs(pv), (1e-3 * here.pressurePa) / v),
          `${id} p_v`,
        ).toBeLessThan(1e-6);
      }
    }
  });
});
