import { describe, expect, it } from "vitest";
import { relativeError } from "../../../../tests/fixtures/check-file";
import { methodCheck, numberIn } from "../../../../tests/fixtures/method-check";
import type { EquationId, FluidSpec } from "../../cases/fluid-spec";
import { flashPT } from "../../flash/flash-pt";
import { flashTQ } from "../../flash/flash-quality";
import { createFluidModel } from "../create-fluid-model";
import { jouleThomsonKPerPa } from "../fluid-model";
import { penelouxShift } from "./volume-translation";

const equationOf: Record<string, EquationId> = {
  PR76: "peng-robinson-1976",
  SRK: "soave-redlich-kwong",
  RK: "redlich-kwong",
  VDW: "van-der-waals",
};

interface Constants {
  Tc: number;
  pc: number;
  omega: number;
  M?: number;
  cp0?: number[];
}

function fluid(equation: EquationId, components: Record<string, Constants>, z: number[] = [1]): FluidSpec {
  return {
    equation,
    interaction: "none",
    components: Object.entries(components).map(([id, { Tc, pc, omega, M, cp0 }], i) => ({
      id,
      moleFraction: z[i]!,
      custom: {
        molarMassKgPerMol: M ?? 0.016,
        criticalTemperatureK: Tc,
        criticalPressurePa: pc,
        acentricFactor: omega,
        idealGasHeatCapacityOverR: { polynomial: cp0 ?? [4], rangeK: [50, 1000] },
      },
    })),
  };
}

describe("departures of the cubic equations, tests/fixtures/checks/methods.json M1-01 to M1-05", () => {
  for (const id of ["M1-01", "M1-02", "M1-03", "M1-04"]) {
    const { inputs, expected, tolerance, source } = methodCheck(id);
    it(`${id} (${source})`, () => {
      const [T, p] = [numberIn(inputs, "T"), numberIn(inputs, "p")];
      const constants = { Tc: numberIn(inputs, "Tc"), pc: numberIn(inputs, "pc"), omega: numberIn(inputs, "omega") };
      const model = createFluidModel(fluid(equationOf[inputs.eos as string]!, { it: constants }));
      const phase = model.phaseAtPressure(T, p, [1]);
      const departures = model.departures(T, phase.molarVolumeM3PerMol, [1]);
      const lnPhi = model.lnFugacityCoefficients(T, p, [1], "stable", new Float64Array(1))[0]!;
      const close = (value: number, key: string) =>
        expect(relativeError(value, numberIn(expected, key)), key).toBeLessThan(tolerance.relative!);
      close(phase.compressibility, "Z");
      close(lnPhi, "ln_phi");
      close(departures.enthalpyJPerMol, "H_dep");
      close(departures.entropyJPerMolK, "S_dep");
      close(departures.internalEnergyJPerMol, "U_dep");
      close(departures.gibbsEnergyJPerMol, "G_dep");
      close(departures.helmholtzEnergyJPerMol, "A_dep");
    });
  }

  it(`M1-05 mixture (${methodCheck("M1-05").source})`, () => {
    const { inputs, expected, tolerance } = methodCheck("M1-05");
    const model = ternary(inputs, Object.values(inputs.z as Record<string, number>));
    const [T, p] = [numberIn(inputs, "T"), numberIn(inputs, "p")];
    const phase = model.phaseAtPressure(T, p, model.feed, "vapour");
    const departures = model.departures(T, phase.molarVolumeM3PerMol, model.feed);
    const lnPhi = model.lnFugacityCoefficients(T, p, model.feed, "vapour", new Float64Array(3));
    expect(relativeError(phase.compressibility, numberIn(expected, "Z"))).toBeLessThan(tolerance.relative!);
    expect(relativeError(departures.enthalpyJPerMol, numberIn(expected, "H_dep"))).toBeLessThan(tolerance.relative!);
    expect(relativeError(departures.entropyJPerMolK, numberIn(expected, "S_dep"))).toBeLessThan(tolerance.relative!);
    (expected.ln_phi as number[]).forEach((value, i) =>
      expect(relativeError(lnPhi[i]!, value)).toBeLessThan(tolerance.relative!),
    );
  });

  it(`M1-13 derived properties (${methodCheck("M1-13").source})`, () => {
    const { inputs, expected, tolerance } = methodCheck("M1-13");
    const coefficients = (inputs.cp0_over_R_coefficients as number[]).map((c, k) => c / 1000 ** k); // printed for T/1000 K
    const methane = {
      Tc: numberIn(inputs, "Tc"),
      pc: numberIn(inputs, "pc"),
      omega: numberIn(inputs, "omega"),
      M: 0.0160428,
      cp0: coefficients,
    };
    const model = createFluidModel(fluid("peng-robinson-1976", { methane }));
    const phase = model.phaseAtPressure(numberIn(inputs, "T"), numberIn(inputs, "p"), [1]);
    const close = (value: number, key: string) =>
      expect(relativeError(value, numberIn(expected, key)), key).toBeLessThan(tolerance.relative!);
    close(phase.heatCapacityVJPerMolK, "cv");
    close(phase.heatCapacityPJPerMolK, "cp");
    close(phase.soundSpeedMPerS, "w");
    close(jouleThomsonKPerPa(phase), "mu_JT");
  });

  it(`M1-07 volume shift (${methodCheck("M1-07").source})`, () => {
    const { inputs, expected, tolerance } = methodCheck("M1-07");
    const constants = { Tc: numberIn(inputs, "Tc"), pc: numberIn(inputs, "pc"), omega: numberIn(inputs, "omega") };
    const model = createFluidModel(fluid("soave-redlich-kwong", { propane: constants }));
    const v = model.phaseAtPressure(numberIn(inputs, "T"), numberIn(inputs, "p"), [1], "liquid").molarVolumeM3PerMol;
    const c = penelouxShift("SRK", {
      criticalTemperatureK: constants.Tc,
      criticalPressurePa: constants.pc,
      rackettZ: numberIn(inputs, "Z_RA"),
    });
    expect(relativeError(v, numberIn(expected, "v_SRK"))).toBeLessThan(tolerance.relative!);
    expect(relativeError(c, numberIn(expected, "c"))).toBeLessThan(tolerance.relative!);
    expect(relativeError(v - c, numberIn(expected, "v_shifted"))).toBeLessThan(tolerance.relative!);
  });
});

function ternary(inputs: Record<string, unknown>, z: number[]) {
  const [Tc, pc, omega] = ["Tc", "pc", "omega"].map((key) => inputs[key] as Record<string, number>) as [
    Record<string, number>,
    Record<string, number>,
    Record<string, number>,
  ];
  const constants = Object.fromEntries(
    ["methane", "ethane", "propane"].map((id) => [id, { Tc: Tc[id]!, pc: pc[id]!, omega: omega[id]! }]),
  );
  return createFluidModel(fluid("peng-robinson-1976", constants, z));
}

describe("phase equilibrium of methane, ethane and propane, methods.json M1-11 and M1-12", () => {
  it(`M1-11 (${methodCheck("M1-11").source})`, () => {
    const { inputs, expected, tolerance } = methodCheck("M1-11");
    const model = ternary(inputs, inputs.z as number[]);
    const found = flashPT(model, { temperatureK: numberIn(inputs, "T"), pressurePa: numberIn(inputs, "p") });
    const [vapour, liquid] = found.phases;
    expect(relativeError(found.vapourMoleFraction, numberIn(expected, "vapour_fraction"))).toBeLessThan(tolerance.relative!);
    expect(relativeError(vapour!.state.compressibility, numberIn(expected, "Z_v"))).toBeLessThan(tolerance.relative!);
    expect(relativeError(liquid!.state.compressibility, numberIn(expected, "Z_l"))).toBeLessThan(tolerance.relative!);
    (expected.x as number[]).forEach((x, i) =>
      expect(relativeError(liquid!.composition[i]!, x)).toBeLessThan(tolerance.relative!),
    );
    (expected.y as number[]).forEach((y, i) =>
      expect(relativeError(vapour!.composition[i]!, y)).toBeLessThan(tolerance.relative!),
    );
  });

  it(`M1-12 (${methodCheck("M1-12").source})`, () => {
    const { inputs, expected, tolerance } = methodCheck("M1-12");
    const model = ternary(inputs, inputs.z as number[]);
    const temperatureK = numberIn(inputs, "T");
    const bubble = flashTQ(model, { temperatureK, vapourMoleFraction: 0 });
    const dew = flashTQ(model, { temperatureK, vapourMoleFraction: 1 });
    expect(relativeError(bubble.pressurePa, numberIn(expected, "p_bubble"))).toBeLessThan(tolerance.relative!);
    expect(relativeError(dew.pressurePa, numberIn(expected, "p_dew"))).toBeLessThan(tolerance.relative!);
  });
});
