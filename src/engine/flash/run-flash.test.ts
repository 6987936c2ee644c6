import { describe, expect, it } from "vitest";
import type { FlashCase, FlashSpecification } from "../cases/flash-case";
import type { EquationId, FluidSpec } from "../cases/fluid-spec";
import { findLibraryRow } from "../substances/library";
import { runFlash } from "./run-flash";

const gas: FluidSpec["components"] = [
  { id: "methane", moleFraction: 0.85 },
  { id: "ethane", moleFraction: 0.1 },
  { id: "propane", moleFraction: 0.05 },
];
const propane: FluidSpec["components"] = [{ id: "propane", moleFraction: 1 }];

function run(components: FluidSpec["components"], equation: EquationId, specification: FlashSpecification) {
  const document: FlashCase = { format: "ebbmark-case/1", kind: "flash", fluid: { equation, components }, ...specification };
  return runFlash(document);
}

/** Every number of a result is one: JSON would turn NaN and Infinity into null. */
function expectFinite(value: unknown): void {
  if (typeof value === "number") expect(Number.isFinite(value)).toBe(true);
  else if (value && typeof value === "object") Object.values(value).forEach(expectFinite);
}

describe("kind flash", () => {
  const equations: [EquationId, FluidSpec["components"]][] = [
    ["peng-robinson-1976", gas],
    ["soave-redlich-kwong", gas],
    ["gerg-2008", gas],
    ["peng-robinson-1978", propane],
    ["reference", propane],
  ];

  it.each(equations)("by %s gives one state whatever pair of quantities it is asked by", (equation, components) => {
    for (const [temperatureK, pressurePa] of [
      [300, 4e5],
      [320, 9e6],
      [210, 3e6],
    ] as const) {
      const { state } = run(components, equation, { specification: "PT", temperatureK, pressurePa });
      const { enthalpyJPerMol, entropyJPerMolK, internalEnergyJPerMol, molarVolumeM3PerMol } = state;
      for (const result of [
        run(components, equation, { specification: "PH", pressurePa, enthalpyJPerMol }),
        run(components, equation, { specification: "PS", pressurePa, entropyJPerMolK }),
        run(components, equation, { specification: "UV", internalEnergyJPerMol, molarVolumeM3PerMol }),
      ]) {
        expectFinite(result);
        expect(Math.abs(result.state.temperatureK / temperatureK - 1)).toBeLessThan(1e-8);
        expect(Math.abs(result.state.pressurePa / pressurePa - 1)).toBeLessThan(1e-6);
        expect(result.phases.length).toBe(state.phase === "two-phase" ? 2 : 1);
      }
    }
  });

  it.each(equations)("by %s finds saturated states by temperature and by pressure alike", (equation, components) => {
    for (const vapourMoleFraction of [0, 0.4, 1]) {
      const byPressure = run(components, equation, { specification: "PQ", pressurePa: 8e5, vapourMoleFraction });
      const { temperatureK } = byPressure.state;
      const byTemperature = run(components, equation, { specification: "TQ", temperatureK, vapourMoleFraction });
      expectFinite(byPressure);
      expect(byPressure.state.vapourMoleFraction).toBeCloseTo(vapourMoleFraction, 10);
      expect(Math.abs(byTemperature.state.pressurePa / 8e5 - 1)).toBeLessThan(1e-8);
      expect(byPressure.state.soundSpeedMPerS).toBeUndefined();
    }
  });

  it("states each phase with its composition and fugacity coefficients by component id", () => {
    const { phases, state } = run(gas, "peng-robinson-1976", { specification: "PT", temperatureK: 210, pressurePa: 2e6 });
    expect(phases.map(({ kind }) => kind)).toEqual(["vapour", "liquid"]);
    for (const { composition, fugacityCoefficients } of phases) {
      expect(Object.keys(composition)).toEqual(["methane", "ethane", "propane"]);
      expect(Object.values(composition).reduce((a, b) => a + b)).toBeCloseTo(1, 12);
      expect(Object.keys(fugacityCoefficients)).toEqual(["methane", "ethane", "propane"]);
    }
    const density = phases.reduce(
      (volume, phase) => volume + phase.moleFraction / (phase.densityKgPerM3 / molarMass(phase.composition)),
      0,
    );
    expect(density / state.molarVolumeM3PerMol).toBeCloseTo(1, 10);
  });

  it("says that free water is left out", () => {
    const wet: FluidSpec["components"] = [
      { id: "methane", moleFraction: 0.5 },
      { id: "n_heptane", moleFraction: 0.3 },
      { id: "water", moleFraction: 0.2 },
    ];
    const { warnings } = run(wet, "peng-robinson-1976", { specification: "PT", temperatureK: 300, pressurePa: 3e6 });
    expect(warnings.map(({ code }) => code)).toContain("free-water");
  });

  it("refuses with a code and the field", () => {
    const refused =
      (specification: FlashSpecification, components = propane) =>
      () =>
        run(components, "peng-robinson-1976", specification);
    expect(refused({ specification: "PT", temperatureK: -3, pressurePa: 1e5 })).toThrow(
      expect.objectContaining({ code: "invalid-case", path: "temperatureK" }),
    );
    expect(refused({ specification: "PT", temperatureK: 300, pressurePa: 0 })).toThrow(
      expect.objectContaining({ code: "invalid-case", path: "pressurePa" }),
    );
    expect(refused({ specification: "TQ", temperatureK: 400, vapourMoleFraction: 0.5 })).toThrow(
      expect.objectContaining({ code: "not-applicable" }),
    );
    expect(refused({ specification: "PQ", pressurePa: 1e5, vapourMoleFraction: 1.2 })).toThrow(
      expect.objectContaining({ code: "invalid-case", path: "vapourMoleFraction" }),
    );
    expect(refused({ specification: "UV", internalEnergyJPerMol: 0, molarVolumeM3PerMol: 1e-6 })).toThrow(
      expect.objectContaining({ code: "outside-validity" }),
    );
    expect(refused({ specification: "PH", pressurePa: 1e5, enthalpyJPerMol: 1e9 }, gas)).toThrow(
      expect.objectContaining({ name: "EngineError" }),
    );
  });
});

function molarMass(composition: Record<string, number>): number {
  return Object.entries(composition).reduce((mass, [id, x]) => mass + x * findLibraryRow(id)!.molarMass_kg_per_mol, 0);
}
