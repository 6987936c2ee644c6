// Reference integrations of the same model by other software: states from our own Python equation of state and CoolProp 8.0.0, integrated by
// LSODA at 1e-10 and checked by DOP853 (tests/fixtures/checks/README.md, blowdown.json; the accuracy of each row is stated in it).
import { describe, expect, it } from "vitest";
import methods from "../../../../tests/fixtures/checks/methods.json";
import { caseOfRow, plainCase, publishedRows, valueAt } from "../../../../tests/fixtures/blowdowns";
import { idealGas } from "../../../../tests/fixtures/fluids";
import type { FluidSpec } from "../fluid-spec";
import { runBlowdown } from "./run-blowdown";

const relative = (value: number, expected: number) => Math.abs(value / expected - 1);

const pengRobinson = publishedRows.filter((row) => row.definition.eos === "PR");

describe("blowdowns by Peng-Robinson", () => {
  it.each(pengRobinson.map((row) => [row.definition.id, row.definition.title, row] as const))("%s %s", (_id, _title, row) => {
    const { series, summary } = runBlowdown(caseOfRow(row));
    for (const point of row.series) {
      if (point.t > summary.endTimeS) continue;
      expect(relative(valueAt(series, "pressurePa", point.t), point.P)).toBeLessThan(2e-3);
      expect(relative(valueAt(series, "massKg", point.t), point.mass)).toBeLessThan(2e-3);
      expect(Math.abs(valueAt(series, "fluidTemperatureK", point.t) - point.T)).toBeLessThan(0.1);
      expect(relative(valueAt(series, "ventRateKgPerS", point.t), point.vent_rate)).toBeLessThan(2e-3);
      if (point.T_wall !== null)
        expect(Math.abs(valueAt(series, "gasWallTemperatureK", point.t) - point.T_wall)).toBeLessThan(0.02);
    }
    const { events, minima } = row;
    expect(relative(summary.endTimeS, events.t_end_event ?? 0)).toBeLessThan(1e-4);
    if (events.t_50pct_gauge !== null)
      expect(relative(summary.timeToHalfGaugePressureS ?? 0, events.t_50pct_gauge)).toBeLessThan(2e-5);
    if (events.t_6p9barg !== null)
      expect(relative(summary.timeToSixPointNineBarGaugeS ?? 0, events.t_6p9barg)).toBeLessThan(2e-5);
    expect(relative(summary.initialMassKg, row.initial.mass)).toBeLessThan(1e-9);
    expect(Math.abs(summary.minimumFluidTemperatureK - minima.T_fluid_min)).toBeLessThan(2e-3);
    if (minima.T_wall_min != null)
      expect(Math.abs((summary.minimumWallTemperatureK ?? 0) - minima.T_wall_min)).toBeLessThan(2e-3);
    expect(relative(summary.peakVentRateKgPerS, minima.peak_vent_rate)).toBeLessThan(1e-6);
    const last = row.series.at(-1);
    expect(relative(summary.ventedMassKg, last?.mass_out ?? 0)).toBeLessThan(1e-4);
    expect(relative(summary.energyVentedJ, last?.energy_out ?? 0)).toBeLessThan(1e-3);
    expect(summary.massClosure).toBeLessThan(1e-9);
    expect(summary.energyClosure).toBeLessThan(1e-6);
  });
});

/** CoolProp's names of the fixture, by our ids. */
const libraryIds: Record<string, string> = {
  Nitrogen: "nitrogen",
  Methane: "methane",
  CarbonDioxide: "carbon_dioxide",
  "n-Propane": "propane",
  Ethylene: "ethylene",
  Hydrogen: "hydrogen",
};

describe("blowdowns by the reference equations", () => {
  const rows = publishedRows.filter((row) => row.definition.eos === "Helmholtz");
  it.each(rows.map((row) => [row.definition.id, row.definition.title, row] as const))("%s %s", (_id, _title, row) => {
    const id = libraryIds[row.definition.fluid ?? ""] ?? fail();
    const { series, summary } = runBlowdown(caseOfRow(row, { equation: "reference", components: [{ id, moleFraction: 1 }] }));
    for (const point of row.series) {
      if (point.t > summary.endTimeS) continue;
      expect(relative(valueAt(series, "pressurePa", point.t), point.P)).toBeLessThan(2e-3);
      expect(relative(valueAt(series, "massKg", point.t), point.mass)).toBeLessThan(2e-3);
      expect(Math.abs(valueAt(series, "fluidTemperatureK", point.t) - point.T)).toBeLessThan(0.3);
      if (point.T_wall !== null)
        expect(Math.abs(valueAt(series, "gasWallTemperatureK", point.t) - point.T_wall)).toBeLessThan(0.05);
    }
    const { events, minima } = row;
    expect(relative(summary.initialMassKg, row.initial.mass)).toBeLessThan(1e-9);
    expect(relative(summary.peakVentRateKgPerS, minima.peak_vent_rate)).toBeLessThan(1e-6);
    expect(Math.abs(summary.minimumFluidTemperatureK - minima.T_fluid_min)).toBeLessThan(5e-3);
    // The bubble line of S1-B10 is met 4 ms later here: dense output across the vent's kinks.
    if (events.t_50pct_gauge !== null)
      expect(relative(summary.timeToHalfGaugePressureS ?? 0, events.t_50pct_gauge)).toBeLessThan(1e-4);
    if (events.t_6p9barg !== null)
      expect(relative(summary.timeToSixPointNineBarGaugeS ?? 0, events.t_6p9barg)).toBeLessThan(5e-5);
    if (events.t_end_event !== null) expect(relative(summary.endTimeS, events.t_end_event)).toBeLessThan(2e-5);
    else expect(summary.endedBy).toBe("solid-phase");
    expect(relative(summary.endTimeS, row.series.at(-1)?.t ?? 0)).toBeLessThan(1e-4);
    expect(summary.massClosure).toBeLessThan(1e-9);
    expect(summary.energyClosure).toBeLessThan(1e-6);
  });
});

describe("phase changes of S1-B12", () => {
  it("come at the times of the reference, each given twice in the series", () => {
    const row = publishedRows.find((one) => one.definition.id === "S1-B12");
    const { series } = runBlowdown(caseOfRow(row ?? fail()));
    const doubled = series.timeS.filter((t, i) => t === series.timeS[i - 1]);
    for (const change of row?.phase_changes ?? []) expect(doubled.some((t) => relative(t, change.t) < 1e-4)).toBe(true);
  });
});

describe("closed forms of an ideal gas that stays choked", () => {
  // p/p0 = [1 + (κ−1)/2 t/τ]^(−2κ/(κ−1)), τ = m0/W0; checks M3-05 and M3-10 of tests/fixtures/checks/methods.json.
  it.each([
    [
      "M3-05",
      1.4,
      0.0280134,
      { volumeM3: 10, diameterM: 0.02, dischargeCoefficient: 0.84, pressurePa: 1e7, temperatureK: 300, stopPressurePa: 5e6 },
    ],
    [
      "M3-10",
      1.3,
      0.01604,
      { volumeM3: 20, diameterM: 0.03, dischargeCoefficient: 0.975, pressurePa: 7e6, temperatureK: 290, stopPressurePa: 7e5 },
    ],
  ] as const)("%s", (id, k, molarMass, over) => {
    const check = methods.checks.find((row) => row.id === id);
    const expected = check?.expected as {
      t_adiabatic: { value: number };
      T_adiabatic: { value: number };
      tau: { value: number };
    };
    const { summary } = runBlowdown(plainCase(idealGas(k, molarMass), over));
    expect(relative(summary.endTimeS, expected.t_adiabatic.value)).toBeLessThan(2e-6);
    expect(relative(summary.finalTemperatureK, expected.T_adiabatic.value)).toBeLessThan(1e-6);
    expect(relative(summary.initialMassKg / summary.peakVentRateKgPerS, expected.tau.value)).toBeLessThan(2e-6);
  });

  it("M3-05, isothermal: p/p0 = exp(−t/τ) when a huge wall with a strong film keeps the gas warm", () => {
    const base = plainCase(idealGas(1.4, 0.0280134), {
      volumeM3: 10,
      diameterM: 0.02,
      dischargeCoefficient: 0.84,
      pressurePa: 1e7,
      stopPressurePa: 5e6,
    });
    const { summary } = runBlowdown({
      ...base,
      vessel: { ...base.vessel, wall: { steel: "carbon_steel", thicknessM: 0.1, massKg: 1e8, specificHeatJPerKgK: 500 } },
      heat: {
        inside: { model: "constant", coefficientWPerM2K: 1e5 },
        wall: { model: "lumped" },
        outside: { model: "adiabatic" },
      },
    });
    // 390 kW through 2.8 MW/K leave the gas 0.14 K below the wall: 2.3e-4 in time (rate ~ T^-1/2).
    expect(relative(summary.endTimeS, 128.5527)).toBeLessThan(4e-4);
  });
});

describe("the nitrogen test vessel by the reference equation", () => {
  it("M3-08: mass, time to 75 bar and to 10 bar; M3-06: temperatures on the isentrope", () => {
    const base = plainCase(
      { equation: "reference", components: [{ id: "nitrogen", moleFraction: 1 }] },
      { diameterM: 0.00635, dischargeCoefficient: 0.8, pressurePa: 1.5e7, temperatureK: 290, stopPressurePa: 1e6 },
    );
    const geometry = {
      shape: "cylinder" as const,
      orientation: "vertical" as const,
      insideDiameterM: 0.273,
      tangentLengthM: 1.524,
      heads: "flat" as const,
    };
    const { summary, series } = runBlowdown({
      ...base,
      vessel: { geometry },
      limits: { targetPressurePa: 7.5e6, targetTimeS: 60 },
    });
    expect(relative(summary.initialMassKg, 15.2722)).toBeLessThan(1e-5);
    expect(relative(summary.timeToTargetPressureS ?? 0, 7.371)).toBeLessThan(3e-4);
    expect(relative(summary.endTimeS, 39.68)).toBeLessThan(3e-4);
    expect(Math.abs(valueAt(series, "fluidTemperatureK", summary.timeToTargetPressureS ?? 0) - 236.22)).toBeLessThan(0.02);
    expect(Math.abs(summary.finalTemperatureK - 129.209)).toBeLessThan(0.005);
  });
});

describe("the nitrogen test vessel by Peng-Robinson with the heat capacity of the dossier", () => {
  const fluid: FluidSpec = {
    equation: "peng-robinson-1976",
    interaction: "none",
    components: [
      {
        id: "n2",
        moleFraction: 1,
        custom: {
          molarMassKgPerMol: 0.0280135,
          criticalTemperatureK: 126.192,
          criticalPressurePa: 3395800,
          acentricFactor: 0.0372,
          idealGasHeatCapacityOverR: {
            polynomial: [3.4486, 0.85671e-3, -4.8311e-6, 11.161e-9, -9.4839e-12, 2.7745e-15],
            rangeK: [110, 900],
          },
        },
      },
    ],
  };
  const base = plainCase(fluid, {
    diameterM: 0.00635,
    dischargeCoefficient: 0.8,
    pressurePa: 1.5e7,
    temperatureK: 290,
    stopPressurePa: 1e6,
  });
  const vessel = {
    geometry: {
      shape: "cylinder" as const,
      orientation: "vertical" as const,
      insideDiameterM: 0.273,
      tangentLengthM: 1.524,
      heads: "flat" as const,
    },
  };

  it("M3-12: mass, time to 75 bar and to 10 bar; M3-11: temperatures on the isentrope", () => {
    const { summary, series } = runBlowdown({ ...base, vessel, limits: { targetPressurePa: 7.5e6, targetTimeS: 60 } });
    expect(relative(summary.initialMassKg, 15.62212)).toBeLessThan(1e-5);
    expect(relative(summary.timeToTargetPressureS ?? 0, 7.5551)).toBeLessThan(3e-4);
    expect(relative(summary.endTimeS, 40.091)).toBeLessThan(3e-4);
    expect(Math.abs(valueAt(series, "fluidTemperatureK", summary.timeToTargetPressureS ?? 0) - 236.752)).toBeLessThan(0.02);
    expect(Math.abs(summary.finalTemperatureK - 128.782)).toBeLessThan(0.005);
  });
});

function fail(): never {
  throw new Error("the fixture is missing");
}
