import { describe, expect, it } from "vitest";
import { readCheck, relativeError } from "../../../../tests/fixtures/check-file";
import { methodCheck, numberIn } from "../../../../tests/fixtures/method-check";
import type { FluidSpec } from "../../cases/fluid-spec";
import { flashPT } from "../../flash/flash-pt";
import { runPath } from "../../path/run-path";
import { createFluidModel } from "../create-fluid-model";
import { jouleThomsonKPerPa, type FluidModel, type ResidualDerivatives } from "../fluid-model";
import { createResidualDerivatives } from "../residual-derivatives";
import { gergComponents, gergConstants } from "./gerg-data";

const gerg = (composition: Record<string, number>): FluidSpec => ({
  equation: "gerg-2008",
  components: Object.entries(composition).map(([id, moleFraction]) => ({ id, moleFraction })),
});

interface Row {
  id: string;
  label: string;
  composition: Record<string, number>;
  T1: number;
  P1: number;
  T2: number;
  P2: number;
  Z1: number;
  Z2: number;
  dU: number;
  dH: number;
  dS: number;
  w1: number;
  w2: number;
  cp1: number;
  cp2: number;
}

describe("GERG-2008 against tests/fixtures/checks/gerg-path.json (public NIST reference code of AGA Report 8 part 2)", () => {
  for (const row of readCheck<{ rows: Row[] }>("gerg-path.json").rows) {
    it(`${row.id} ${row.label}`, () => {
      const fluid = gerg(row.composition);
      const result = runPath({
        format: "ebbmark-case/1",
        kind: "path",
        fluid,
        from: { temperatureK: row.T1, pressurePa: row.P1 },
        to: { temperatureK: row.T2, pressurePa: row.P2 },
      });
      expect(relativeError(result.internalEnergyJPerMol.total, row.dU)).toBeLessThan(1e-9);
      expect(relativeError(result.enthalpyJPerMol.total, row.dH)).toBeLessThan(1e-9);
      expect(relativeError(result.entropyJPerMolK.total, row.dS)).toBeLessThan(1e-9);
      expect(relativeError(result.from.compressibility, row.Z1)).toBeLessThan(1e-10);
      expect(relativeError(result.to.compressibility, row.Z2)).toBeLessThan(1e-10);
      const model = createFluidModel(fluid);
      const start = model.phaseAtPressure(row.T1, row.P1, model.feed);
      expect(relativeError(start.soundSpeedMPerS, row.w1)).toBeLessThan(1e-10);
      expect(relativeError(start.heatCapacityPJPerMolK, row.cp1)).toBeLessThan(1e-10);
      const end = model.phaseAtPressure(row.T2, row.P2, model.feed);
      expect(relativeError(end.soundSpeedMPerS, row.w2)).toBeLessThan(1e-10);
      expect(relativeError(end.heatCapacityPJPerMolK, row.cp2)).toBeLessThan(1e-10);
    });
  }
});

const idOf: Record<string, string> = {
  CH4: "methane",
  N2: "nitrogen",
  CO2: "carbon_dioxide",
  C2H6: "ethane",
  C3H8: "propane",
  iC4: "isobutane",
  nC4: "n_butane",
  iC5: "isopentane",
  nC5: "n_pentane",
  nC6: "n_hexane",
  nC7: "n_heptane",
  nC8: "n_octane",
  nC9: "n_nonane",
  nC10: "n_decane",
  H2: "hydrogen",
  O2: "oxygen",
  CO: "carbon_monoxide",
  H2O: "water",
  H2S: "hydrogen_sulfide",
  He: "helium",
  Ar: "argon",
};

describe("GERG-2008 with all 21 components, methods.json M1-06", () => {
  it(`gives the distributed check state (${methodCheck("M1-06").source})`, () => {
    const { inputs, expected } = methodCheck("M1-06");
    const composition = Object.fromEntries(
      Object.entries(inputs.x as Record<string, number>).map(([name, x]) => [idOf[name]!, x]),
    );
    const model = createFluidModel(gerg(composition));
    const phase = model.phaseAtPressure(numberIn(inputs, "T"), numberIn(inputs, "p"), model.feed);
    expect(relativeError(1e-3 / phase.molarVolumeM3PerMol, numberIn(expected, "rho"))).toBeLessThan(1e-8);
    expect(relativeError(phase.compressibility, numberIn(expected, "Z"))).toBeLessThan(1e-8);
    expect(relativeError(phase.heatCapacityVJPerMolK, numberIn(expected, "cv"))).toBeLessThan(1e-8);
    expect(relativeError(phase.heatCapacityPJPerMolK, numberIn(expected, "cp"))).toBeLessThan(1e-8);
    expect(relativeError(phase.soundSpeedMPerS, numberIn(expected, "w"))).toBeLessThan(1e-8);
    expect(relativeError(jouleThomsonKPerPa(phase) * 1e3, numberIn(expected, "JT"))).toBeLessThan(1e-8);
    // Energies: the code's zero comes from printed coefficients and is 3e-5 J/mol off; entropy starts at 101325 Pa there.
    expect(Math.abs(phase.internalEnergyJPerMol - numberIn(expected, "U"))).toBeLessThan(1e-4);
    expect(Math.abs(phase.enthalpyJPerMol - numberIn(expected, "H"))).toBeLessThan(1e-4);
    const entropy = phase.entropyJPerMolK + gergConstants.R * Math.log(1.01325);
    expect(Math.abs(entropy - numberIn(expected, "S"))).toBeLessThan(1e-6);
  });
});

describe("the derivatives of GERG-2008 in (T, V, n)", () => {
  const composition = {
    methane: 0.7,
    ethane: 0.12,
    propane: 0.08,
    isobutane: 0.03,
    nitrogen: 0.03,
    carbon_dioxide: 0.02,
    n_octane: 0.02,
    hydrogen: 0,
  };
  const model: FluidModel = createFluidModel(gerg(composition));
  const count = model.feed.length;
  const moles = model.feed.map((x) => 1.7 * x);
  const at = (T: number, V: number, n: ArrayLike<number>): ResidualDerivatives => {
    const out = createResidualDerivatives(count);
    model.residual.setComposition(n);
    model.residual.evaluate(T, V, 2, out);
    return out;
  };
  const slope = (f: (x: number) => number, x: number, h: number) =>
    (f(x - 2 * h) - 8 * f(x - h) + 8 * f(x + h) - f(x + 2 * h)) / (12 * h);

  it.each([
    [280, 1.2e-4],
    [280, 4e-4],
    [350, 3e-3],
  ])("equal finite differences at %d K, %d m³", (T, V) => {
    const F = at(T, V, moles);
    const size = Math.max(...F.Fn.map(Math.abs));
    const close = (value: number, expected: number, scale: number, what: string) =>
      expect(Math.abs(value - expected) / Math.max(Math.abs(value), scale), what).toBeLessThan(1e-6);
    close(
      F.FT,
      slope((t) => at(t, V, moles).F, T, 0.02),
      size / T,
      "F_T",
    );
    close(
      F.FTT,
      slope((t) => at(t, V, moles).FT, T, 0.02),
      size / T ** 2,
      "F_TT",
    );
    close(
      F.FV,
      slope((v) => at(T, v, moles).F, V, 1e-4 * V),
      size / V,
      "F_V",
    );
    close(
      F.FVV,
      slope((v) => at(T, v, moles).FV, V, 1e-4 * V),
      size / V ** 2,
      "F_VV",
    );
    close(
      F.FTV,
      slope((v) => at(T, v, moles).FT, V, 1e-4 * V),
      size / (T * V),
      "F_TV",
    );
    for (let j = 0; j < count; j++) {
      if (moles[j] === 0) continue; // a central difference would need a negative amount
      const along = (read: (f: ResidualDerivatives) => number) =>
        slope(
          (x) => {
            const moved = moles.slice();
            moved[j] = x;
            return read(at(T, V, moved));
          },
          moles[j]!,
          1e-4 * moles[j]!,
        );
      close(
        F.Fn[j]!,
        along((f) => f.F),
        size,
        "F_n",
      );
      close(
        F.FnT[j]!,
        along((f) => f.FT),
        size / T,
        "F_nT",
      );
      close(
        F.FnV[j]!,
        along((f) => f.FV),
        size / V,
        "F_nV",
      );
      for (let i = 0; i < count; i++)
        close(
          F.Fnn[i * count + j]!,
          along((f) => f.Fn[i]!),
          size,
          "F_nn",
        );
    }
  });
});

describe("phase equilibrium by GERG-2008", () => {
  it.each([
    [250, 5e6],
    [220, 2e6],
    [180, 1e6],
  ])("has equal fugacities at %d K and %d Pa", (temperatureK, pressurePa) => {
    const model = createFluidModel(gerg({ methane: 0.7, ethane: 0.14, propane: 0.1, n_butane: 0.03, nitrogen: 0.03 }));
    const { phases } = flashPT(model, { temperatureK, pressurePa });
    expect(phases).toHaveLength(2);
    const [vapour, liquid] = phases;
    for (let i = 0; i < model.feed.length; i++) {
      const lnF = (phase: typeof vapour) => Math.log(phase!.composition[i]!) + phase!.lnFugacityCoefficients[i]!;
      expect(Math.abs(lnF(vapour) - lnF(liquid))).toBeLessThan(1e-9);
    }
  });

  it("takes any of its components alone and refuses others at the field", () => {
    for (const id of gergComponents.keys()) {
      const model = createFluidModel(gerg({ [id]: 1 }));
      const phase = model.phaseAtPressure(450, 2e4, [1]);
      expect(Math.abs(phase.compressibility - 1), id).toBeLessThan(0.03);
    }
    expect(() => createFluidModel(gerg({ methane: 0.5, benzene: 0.5 }))).toThrow(
      expect.objectContaining({ code: "not-applicable", path: "fluid.components[1].id" }),
    );
  });
});
