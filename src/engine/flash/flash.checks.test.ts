import { describe, expect, it } from "vitest";
import { checkEquations, checkFluid, readCheck, relativeError, type CheckComponent } from "../../../tests/fixtures/check-file";
import { createFluidModel } from "../eos/create-fluid-model";
import type { Equilibrium, EquilibriumPhase } from "./equilibrium";
import { flashPH, flashPS } from "./flash-ph";
import { flashPT } from "./flash-pt";
import { flashPQ, flashTQ } from "./flash-quality";
import { flashUV } from "./flash-uv";
import { saturationAtPressure, saturationAtTemperature } from "./saturation-pure";

type Components = Record<string, CheckComponent>;
const within = 1e-8;

interface MixturePhase {
  composition: number[];
  Z: number;
  rho: number;
  h: number;
  u: number;
  s: number;
  ln_phi: number[];
}
interface MixtureResult {
  phase: "single" | "two-phase";
  vapour_fraction?: number;
  single?: MixturePhase;
  vapour?: MixturePhase;
  liquid?: MixturePhase;
  h: number;
  u: number;
  s: number;
  rho: number;
}
interface MixtureRow {
  id: string;
  label: string;
  components: string[];
  z: number[];
  T: number;
  P: number;
  kij?: Record<string, number>;
  PR_kij0: MixtureResult;
  SRK_kij0: MixtureResult;
  PR_kij?: MixtureResult;
}
const mixtures = readCheck<{ components: Components; rows: MixtureRow[] }>("mixture-pt.json");

function expectPhase(found: EquilibriumPhase, expected: MixturePhase): void {
  expect(relativeError(found.state.compressibility, expected.Z)).toBeLessThan(within);
  expect(relativeError(found.state.enthalpyJPerMol, expected.h)).toBeLessThan(within);
  expect(relativeError(found.state.internalEnergyJPerMol, expected.u)).toBeLessThan(within);
  expect(relativeError(found.state.entropyJPerMolK, expected.s)).toBeLessThan(within);
  expected.composition.forEach((x, i) => expect(relativeError(found.composition[i]!, x)).toBeLessThan(within));
  expected.ln_phi.forEach((value, i) => expect(Math.abs(found.lnFugacityCoefficients[i]! - value)).toBeLessThan(within));
}

function expectMixture(found: Equilibrium, expected: MixtureResult): void {
  expect(found.phases).toHaveLength(expected.phase === "single" ? 1 : 2);
  expect(relativeError(1 / found.molarVolumeM3PerMol, expected.rho)).toBeLessThan(within);
  expect(relativeError(found.enthalpyJPerMol, expected.h)).toBeLessThan(within);
  expect(relativeError(found.internalEnergyJPerMol, expected.u)).toBeLessThan(within);
  expect(relativeError(found.entropyJPerMolK, expected.s)).toBeLessThan(within);
  if (expected.single) return expectPhase(found.phases[0]!, expected.single);
  expect(relativeError(found.vapourMoleFraction, expected.vapour_fraction!)).toBeLessThan(within);
  expectPhase(found.phases[0]!, expected.vapour!);
  expectPhase(found.phases[1]!, expected.liquid!);
}

describe("flash of mixtures against tests/fixtures/checks/mixture-pt.json (own engine of that file, checked there against thermo 0.6.1 and CoolProp 8.0.0)", () => {
  for (const row of mixtures.rows) {
    for (const column of ["PR_kij0", "SRK_kij0", "PR_kij"] as const) {
      const expected = row[column];
      if (!expected) continue;
      const equation = column === "SRK_kij0" ? checkEquations.SRK : checkEquations.PR;
      const model = createFluidModel(
        checkFluid(mixtures.components, row.components, row.z, equation, column === "PR_kij" ? row.kij : {}),
      );
      it(`${row.id} ${row.label} by ${column}: PT, and back to it by PH, PS and UV`, () => {
        const point = { temperatureK: row.T, pressurePa: row.P };
        const found = flashPT(model, point);
        expectMixture(found, expected);
        const { enthalpyJPerMol, entropyJPerMolK, internalEnergyJPerMol, molarVolumeM3PerMol } = found;
        expectMixture(flashPH(model, { pressurePa: row.P, enthalpyJPerMol }), expected);
        expectMixture(flashPS(model, { pressurePa: row.P, entropyJPerMolK }), expected);
        expectMixture(flashUV(model, { internalEnergyJPerMol, molarVolumeM3PerMol }), expected);
      });
    }
  }
});

interface UvRow {
  id: string;
  model: string;
  components: string[];
  z: number[];
  n: number;
  V: number;
  U: number;
  T: number;
  P: number;
  phase: string;
  vapour_fraction: number | null;
  x?: number[];
  y?: number[];
  S: number;
}
const uv = readCheck<{ components: Components; rows: UvRow[] }>("uv-flash.json");

describe("UV flash against tests/fixtures/checks/uv-flash.json, cubic rows (own engine of that file)", () => {
  for (const row of uv.rows.filter(({ model }) => model === "PR" || model === "SRK")) {
    it(`${row.id}`, () => {
      const model = createFluidModel(checkFluid(uv.components, row.components, row.z, checkEquations[row.model as "PR"]));
      const target = { internalEnergyJPerMol: row.U / row.n, molarVolumeM3PerMol: row.V / row.n };
      const found = flashUV(model, target);
      expect(relativeError(found.temperatureK, row.T)).toBeLessThan(within);
      expect(relativeError(found.pressurePa, row.P)).toBeLessThan(within);
      expect(relativeError(found.entropyJPerMolK, row.S / row.n)).toBeLessThan(within);
      expect(found.phases.length === 2).toBe(row.phase === "two-phase");
      if (row.phase === "two-phase") {
        expect(relativeError(found.vapourMoleFraction, row.vapour_fraction!)).toBeLessThan(within);
        row.x!.forEach((x, i) => expect(relativeError(found.phases[1]!.composition[i]!, x)).toBeLessThan(within));
        row.y!.forEach((y, i) => expect(relativeError(found.phases[0]!.composition[i]!, y)).toBeLessThan(within));
      }
      expect(relativeError(found.internalEnergyJPerMol, target.internalEnergyJPerMol)).toBeLessThan(1e-10);
      expect(relativeError(found.molarVolumeM3PerMol, target.molarVolumeM3PerMol)).toBeLessThan(1e-10);
    });
  }
});

interface SaturationRow {
  fluid: string;
  T: number;
  PR?: Record<"P" | "rhoL" | "rhoV" | "hL" | "hV" | "sL" | "sV" | "dHvap", number>;
  SRK?: SaturationRow["PR"];
}
interface BubbleDewRow {
  eos: "PR" | "SRK";
  components: string[];
  z: number[];
  kind: "bubble" | "dew";
  spec: { T?: number; P?: number };
  result: { T: number; P: number; incipient: number[]; v_feed: number; v_incipient: number };
}
const saturation = readCheck<{ components: Components; rows: SaturationRow[]; bubble_dew: BubbleDewRow[] }>("saturation.json");

describe("pure saturation against tests/fixtures/checks/saturation.json, cubic columns", () => {
  for (const row of saturation.rows) {
    for (const column of ["PR", "SRK"] as const) {
      const expected = row[column];
      if (!expected) continue;
      it(`${row.fluid} at ${row.T} K by ${column}`, () => {
        const model = createFluidModel(checkFluid(saturation.components, [row.fluid], [1], checkEquations[column]));
        const found = saturationAtTemperature(model, row.T, [1]);
        expect(relativeError(found.pressurePa, expected.P)).toBeLessThan(within);
        expect(relativeError(1 / found.liquidVolume, expected.rhoL)).toBeLessThan(within);
        expect(relativeError(1 / found.vapourVolume, expected.rhoV)).toBeLessThan(within);
        expect(relativeError(saturationAtPressure(model, expected.P, [1]).temperatureK, row.T)).toBeLessThan(within);
        const [vapour, liquid] = flashTQ(model, { temperatureK: row.T, vapourMoleFraction: 0.5 }).phases;
        expect(relativeError(vapour!.state.enthalpyJPerMol - liquid!.state.enthalpyJPerMol, expected.dHvap)).toBeLessThan(within);
        expect(relativeError(liquid!.state.entropyJPerMolK, expected.sL)).toBeLessThan(within);
      });
    }
  }
});

describe("bubble and dew points of mixtures against tests/fixtures/checks/saturation.json", () => {
  for (const row of saturation.bubble_dew) {
    it(`${row.kind} of ${row.components.join("/")} by ${row.eos}`, () => {
      const model = createFluidModel(checkFluid(saturation.components, row.components, row.z, checkEquations[row.eos]));
      const vapourMoleFraction = row.kind === "dew" ? 1 : 0;
      const found =
        row.spec.T !== undefined
          ? flashTQ(model, { temperatureK: row.spec.T, vapourMoleFraction })
          : flashPQ(model, { pressurePa: row.spec.P!, vapourMoleFraction });
      expect(relativeError(found.temperatureK, row.result.T)).toBeLessThan(within);
      expect(relativeError(found.pressurePa, row.result.P)).toBeLessThan(within);
      const [incipient, feed] = row.kind === "dew" ? [found.phases[1]!, found.phases[0]!] : [found.phases[0]!, found.phases[1]!];
      row.result.incipient.forEach((x, i) => expect(relativeError(incipient.composition[i]!, x)).toBeLessThan(within));
      expect(relativeError(feed.state.molarVolumeM3PerMol, row.result.v_feed)).toBeLessThan(within);
      expect(relativeError(incipient.state.molarVolumeM3PerMol, row.result.v_incipient)).toBeLessThan(within);
    });
  }
});
