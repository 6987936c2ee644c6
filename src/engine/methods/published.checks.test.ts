/**
 * Methods on their own against published and independently derived figures, tests/fixtures/checks/methods.json chapters 6 to 9.
 * The source of each figure stands in the file beside it and is shown in the test's name; inputs are its inputs in SI.
 */
import { describe, expect, it } from "vitest";
import { readCheck } from "../../../tests/fixtures/check-file";
import { runMethod } from "./run-method";

type Quantity = number | { value: number; unit: string };
type Entry = {
  id: string;
  quantity: string;
  expected: Record<string, Quantity | string | (Quantity | string)[]>;
  tolerance: { relative?: number; absolute?: number };
  source: string;
};

const { checks } = readCheck<{ checks: Entry[] }>("methods.json");

type Inputs = Record<string, unknown>;
/** Output, expected key (and place in its list), and how many of the expected unit make one SI unit. */
type Pick = [output: string, expected: string, perSi?: number, at?: number];
type Row = [check: string, method: string, inputs: Inputs, picks: Pick[]];

const hour = 1 / 3600;
const inch = 0.0254;
const pound = 0.45359237;
const gasExample = {
  massFlowKgPerS: 24_260 * hour,
  molarMassKgPerMol: 0.051,
  temperatureK: 348,
  compressibility: 0.9,
  heatCapacityRatio: 1.11,
  relievingPressurePa: 670e3,
};
const vessel = { pressurePa: 10.1e6, surroundingsPa: 101_325, volumeM3: 10 };
const header = { massFlowKgPerS: 50_000 * hour, diameterM: 0.3, temperatureK: 300, molarMassKgPerMol: 0.02, compressibility: 1 };
const omegaExample = {
  omega: 1.482,
  pressurePa: 80.7 * 6894.757293,
  specificVolumeM3PerKg: (0.3116 * (12 * inch) ** 3) / pound,
  backPressurePa: 101_325,
};
const scaled = (z: number) => ({ distanceM: z, tntKg: 1 });

const rows: Row[] = [
  [
    "M7-01",
    "relief-gas-critical",
    gasExample,
    [
      ["requiredAreaM2", "A", 1e6],
      ["flowCoefficient", "C_SI"],
    ],
  ],
  [
    "M7-02",
    "relief-gas-subcritical",
    { ...gasExample, backPressurePa: 532e3 },
    [
      ["requiredAreaM2", "A", 1e6],
      ["subcriticalCoefficient", "F2"],
    ],
  ],
  [
    "M7-03",
    "relief-steam",
    { massFlowKgPerS: 69_615 * hour, relievingPressurePa: 12.236e6 },
    [
      ["requiredAreaM2", "A", 1e6],
      ["napierCorrection", "K_N"],
    ],
  ],
  [
    "M7-04",
    "relief-liquid",
    {
      massFlowKgPerS: (6814 / 6e4) * 0.9 * 999,
      densityKgPerM3: 0.9 * 999,
      relievingPressurePa: 1896e3,
      backPressurePa: 345e3,
      backPressureFactor: 0.97,
    },
    [["requiredAreaM2", "A", 1e6]],
  ],
  [
    "M7-05",
    "relief-omega-two-phase",
    omegaExample,
    [
      ["massFluxKgPerM2S", "G"],
      ["criticalPressureRatio", "eta_c"],
    ],
  ],
  [
    "M7-05",
    "relief-two-phase-area",
    { massFlowKgPerS: 477_430 * pound * hour, massFluxKgPerM2S: 2883.4 },
    [["requiredAreaM2", "A", inch ** -2]],
  ],
  [
    "M7-06",
    "relief-thermal-expansion",
    { expansionPerK: 0.0018, heatW: 1e5, densityKgPerM3: 500, specificHeatJPerKgK: 2500 },
    [["volumeFlowM3PerS", "q"]],
  ],
  [
    "M7-08",
    "relief-blocked-in-rise",
    { liquidExpansionPerK: 0.001, compressibilityPerPa: 1e-9, diameterM: 0.3, thicknessM: 0.0095 },
    [["pressureRisePaPerK", "dp_dT"]],
  ],
  [
    "M7-09",
    "relief-omega-subcooled",
    { omega: 6.836401, pressurePa: 1.05e6, saturationPressurePa: 1e6, densityKgPerM3: 489.4646 },
    [
      ["massFluxKgPerM2S", "G"],
      ["criticalPressureRatio", "eta_c"],
    ],
  ],
  ["M8-01", "energy-brode", { ...vessel, heatCapacityRatio: 1.4 }, [["energyJ", "Brode"]]],
  ["M8-01", "energy-isentropic-ideal", { ...vessel, heatCapacityRatio: 1.4 }, [["energyJ", "isentropic"]]],
  ["M8-01", "energy-isothermal", vessel, [["energyJ", "isothermal"]]],
  ["M8-01", "energy-availability", vessel, [["energyJ", "availability"]]],
  [
    "M8-02",
    "energy-pressure-test",
    { testPressurePa: 10.1e6, volumeM3: 10 },
    [
      ["energyJ", "E"],
      ["tntKg", "TNT"],
      ["distanceByFormulaM", "R_at_20"],
    ],
  ],
  ...[2, 5, 10, 20].flatMap((z, at): Row[] => [
    ["M8-05", "blast-free-air", scaled(z), [["overpressurePa", "Kinney_Graham_free_air", 1e-3, at]]],
    ["M8-05", "blast-surface", scaled(z), [["overpressurePa", "Kingery_Bulmash_simplified_hemispherical", 1e-3, at]]],
  ]),
  ...[20.7, 6.9, 2.07].map((p, at): Row => [
    "M8-06",
    "blast-surface-distance",
    { overpressurePa: p * 1e3, tntKg: 1 },
    [["scaledDistance", "Z", 1, at]],
  ]),
  ["M9-01", "disposal-pipe-mach", { ...header, outletPressurePa: 150e3, heatCapacityRatio: 1.3 }, [["mach", "Ma"]]],
  [
    "M9-02",
    "disposal-pipe-inlet-pressure",
    { ...header, outletPressurePa: 150e3, lengthM: 200, darcyFrictionFactor: 0.014 },
    [
      ["inletPressurePa", "p1", 1e-3],
      ["outletMachIsothermal", "Ma2_isothermal"],
    ],
  ],
  [
    "M9-03",
    "disposal-radiation-distance",
    { heatReleaseW: 630e6, radiatedFraction: 0.3, fluxWPerM2: 6300 },
    [["distanceM", "D"]],
  ],
  ["M9-04", "disposal-flame-length", { heatReleaseW: 630e6 }, [["lengthM", "L"]]],
  [
    "M9-05",
    "disposal-vent-noise",
    {
      massFlowKgPerS: 14.6,
      molarMassKgPerMol: 0.029,
      heatCapacityRatio: 1.4,
      temperatureK: 311,
      pressureRatio: 3.2653061224489797,
      chartDb: 54,
    },
    [
      ["levelAt30mDb", "L30"],
      ["soundSpeedMPerS", "c"],
    ],
  ],
  [
    "M9-08",
    "disposal-vent-noise",
    { massFlowKgPerS: 25, molarMassKgPerMol: 0.0185, heatCapacityRatio: 1.28, temperatureK: 290, chartDb: 56, distanceM: 150 },
    [
      ["levelAt30mDb", "L30"],
      ["levelDb", "L150"],
    ],
  ],
  [
    "M9-06",
    "disposal-vent-gas-quality",
    { composition: { methane: 0.85, ethane: 0.1, propane: 0.03, carbon_dioxide: 0.02 } },
    [
      ["molarMassKgPerMol", "M", 1e3],
      ["netCalorificJPerKg", "LHV", 1e-6],
    ],
  ],
];

describe("published methods, tests/fixtures/checks/methods.json", () => {
  it.each(rows)("%s by %s", (id, method, inputs, picks) => {
    const entry = checks.find((one) => one.id === id);
    if (!entry) throw new Error(`${id} is not in the file`);
    const { outputs } = runMethod({ format: "ebbmark-case/1", kind: "method", method, inputs });
    for (const [output, key, perSi = 1, at] of picks) {
      const expected = numberOf(entry, key, at);
      const found = (outputs[output] as number) * perSi;
      const { relative, absolute } = entry.tolerance;
      const band = Math.max(relative === undefined ? 0 : relative * Math.abs(expected), absolute ?? 0);
      expect(Math.abs(found - expected), `${output}: ${found}, expected ${expected}; ${entry.source}`).toBeLessThanOrEqual(band);
    }
  });

  it("chooses orifice P for M7-01, and holds the areas of M7-07", () => {
    const chosen = runMethod({
      format: "ebbmark-case/1",
      kind: "method",
      method: "relief-orifice-designation",
      inputs: { requiredAreaM2: 3697.52e-6 },
    });
    expect(chosen.outputs).toMatchObject({ designation: "P", devices: 1 });
    const areas = checks.find(({ id }) => id === "M7-07")?.expected.area_in2 as number[];
    for (const area of areas) {
      const { outputs } = runMethod({
        format: "ebbmark-case/1",
        kind: "method",
        method: "relief-orifice-designation",
        inputs: { requiredAreaM2: area * inch ** 2 * (1 - 1e-9) },
      });
      expect(outputs.areaM2).toBeCloseTo(area * inch ** 2, 12);
    }
  });
});

function numberOf({ expected, id }: Entry, key: string, at?: number): number {
  const found = expected[key];
  const one = Array.isArray(found) && at !== undefined ? found[at] : found;
  const value = typeof one === "object" && !Array.isArray(one) ? one.value : one;
  if (typeof value !== "number") throw new Error(`${id} has no number ${key}`);
  return value;
}
