/**
 * Methods on their own against published and independently derived figures, tests/fixtures/checks/methods.json chapters 1 to 9.
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
  tolerance: { relative?: number; absolute?: number; absolute_T?: number };
  source: string;
};

const { checks } = readCheck<{ checks: Entry[] }>("methods.json");

type Inputs = Record<string, unknown>;
/** Output, expected key, how many of the expected unit make one SI unit (or how to convert), place in its list. */
type Pick = [output: string, expected: string, perSi?: number | ((si: number) => number), at?: number];
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

const rankine = 1.8;
const psia = 1 / 6894.757293168361;
const fahrenheit = (kelvin: number): number => kelvin * 1.8 - 459.67;
const celsius = (kelvin: number): number => kelvin - 273.15;
const departures: Pick[] = [
  ["compressibility", "Z"],
  ["lnFugacityCoefficient", "ln_phi"],
  ["enthalpyDepartureJPerMol", "H_dep"],
  ["entropyDepartureJPerMolK", "S_dep"],
  ["internalEnergyDepartureJPerMol", "U_dep"],
  ["gibbsDepartureJPerMol", "G_dep"],
  ["helmholtzDepartureJPerMol", "A_dep"],
];
const methane = { criticalTemperatureK: 190.564, criticalPressurePa: 4599200, acentricFactor: 0.01142 };
const lying = { orientation: "horizontal", insideDiameterM: 2, tangentLengthM: 6 };
const wet: Pick[] = [
  ["liquidVolumeM3", "V_liquid"],
  ["wettedAreaM2", "A_wetted"],
];
const boilingWater = {
  latentHeatJPerKg: 2257000,
  liquidDensityKgPerM3: 957.9,
  vapourDensityKgPerM3: 0.5955,
  surfaceTensionNPerM: 0.0589,
};
const flame = {
  flameTemperatureK: 1273.15,
  flameEmissivity: 0.7,
  surfaceAbsorptivity: 0.75,
  surfaceEmissivity: 0.75,
  coefficientWPerM2K: 20,
  gasTemperatureK: 1173.15,
};
const btuPerHour = 1 / 0.29307107;
const squareFoot = 0.3048 ** 2;
const times: Pick[] = [
  ["timeConstantS", "tau"],
  ["adiabaticS", "t_adiabatic"],
  ["isothermalS", "t_isothermal"],
  ["adiabaticEndK", "T_adiabatic"],
];

const rows: Row[] = [
  [
    "M1-01",
    "gas-cubic-departures",
    { equation: "peng-robinson-1976", temperatureK: 300, pressurePa: 1e7, ...methane },
    departures,
  ],
  [
    "M1-02",
    "gas-cubic-departures",
    {
      equation: "soave-redlich-kwong",
      temperatureK: 290,
      pressurePa: 1.5e7,
      criticalTemperatureK: 126.192,
      criticalPressurePa: 3395800,
      acentricFactor: 0.0372,
    },
    departures,
  ],
  [
    "M1-03",
    "gas-cubic-departures",
    {
      equation: "redlich-kwong",
      temperatureK: 320,
      pressurePa: 6e6,
      criticalTemperatureK: 304.1282,
      criticalPressurePa: 7377300,
      acentricFactor: 0.22394,
    },
    departures,
  ],
  ["M1-04", "gas-cubic-departures", { equation: "van-der-waals", temperatureK: 300, pressurePa: 1e7, ...methane }, departures],
  [
    "M1-08",
    "gas-fraction-riazi-daubert-1987",
    { molarMassKgPerMol: 0.15, relativeDensity: 0.78 },
    [
      ["criticalTemperatureK", "Tc", rankine],
      ["criticalPressurePa", "pc", psia],
      ["boilingPointK", "Tb", rankine],
      ["acentricFactor", "omega_Edmister"],
    ],
  ],
  [
    "M1-09",
    "gas-fraction-kesler-lee",
    { boilingPointK: 658 / rankine, relativeDensity: 0.727 },
    [
      ["criticalTemperatureK", "KL_Tc", rankine],
      ["criticalPressurePa", "KL_pc", psia],
      ["molarMassKgPerMol", "KL_M", 1e3],
      ["acentricFactor", "KL_omega"],
    ],
  ],
  [
    "M1-09",
    "gas-fraction-riazi-daubert-1980",
    { boilingPointK: 658 / rankine, relativeDensity: 0.727 },
    [
      ["criticalTemperatureK", "RD_Tc", rankine],
      ["criticalPressurePa", "RD_pc", psia],
      ["molarMassKgPerMol", "RD_M", 1e3],
    ],
  ],
  [
    "M1-10",
    "gas-fraction-kesler-lee",
    { boilingPointK: 805.086 / rankine, relativeDensity: 0.7342 },
    [
      ["criticalTemperatureK", "KL_Tc", rankine],
      ["criticalPressurePa", "KL_pc", psia],
      ["molarMassKgPerMol", "KL_M", 1e3],
      ["acentricFactor", "KL_omega"],
    ],
  ],
  ["M2-01", "vessel-cylinder", { ...lying, heads: "ellipsoidal-2-1", levelM: 0.5 }, wet],
  ["M2-02", "vessel-cylinder", { ...lying, heads: "torispherical-kloepper", levelM: 1.2 }, wet],
  ["M2-03", "vessel-cylinder", { ...lying, heads: "torispherical-flanged-dished", levelM: 0.5 }, wet],
  ["M2-05", "vessel-cylinder", { ...lying, orientation: "vertical", heads: "torispherical-kloepper", levelM: 0.5 }, wet],
  ["M2-06", "vessel-sphere", { insideDiameterM: 12, levelM: 4 }, wet],
  [
    "M3-05",
    "discharge-ideal-gas-blowdown-time",
    {
      volumeM3: 10,
      orificeDiameterM: 0.02,
      dischargeCoefficient: 0.84,
      heatCapacityRatio: 1.4,
      molarMassKgPerMol: 0.0280134,
      temperatureK: 300,
      startPressurePa: 1e7,
      endPressurePa: 5e6,
    },
    times,
  ],
  [
    "M3-10",
    "discharge-ideal-gas-blowdown-time",
    {
      volumeM3: 20,
      orificeDiameterM: 0.03,
      dischargeCoefficient: 0.975,
      heatCapacityRatio: 1.3,
      molarMassKgPerMol: 0.01604,
      temperatureK: 290,
      startPressurePa: 7e6,
      endPressurePa: 7e5,
    },
    times,
  ],
  [
    "M4-01",
    "heat-natural-vertical-plate",
    { rayleigh: 1.813e9, prandtl: 0.69, conductivityWPerMK: 0.0338, lengthM: 0.71 },
    [
      ["nusselt", "Nu"],
      ["coefficientWPerM2K", "h_with_k_0.0338_and_L_0.71"],
    ],
  ],
  ["M4-02", "heat-natural-horizontal-cylinder", { rayleigh: 5.073e6, prandtl: 0.697 }, [["nusselt", "Nu"]]],
  [
    "M4-03",
    "heat-boiling-cooper",
    { reducedPressure: 0.07213187, molarMassKgPerMol: 0.10203, fluxWPerM2: 2e4 },
    [["coefficientWPerM2K", "h"]],
  ],
  [
    "M4-10",
    "heat-boiling-cooper",
    { reducedPressure: 0.2, molarMassKgPerMol: 0.0441, fluxWPerM2: 2e4 },
    [["coefficientWPerM2K", "h"]],
  ],
  [
    "M4-04",
    "heat-boiling-rohsenow",
    {
      ...boilingWater,
      liquidViscosityPaS: 0.000279,
      liquidHeatCapacityJPerKgK: 4217,
      superheatK: 18,
      surfaceFactor: 0.0128,
      liquidPrandtl: 1.76,
      exponent: 1,
    },
    [["fluxWPerM2", "q"]],
  ],
  ["M4-05", "heat-boiling-critical-flux", boilingWater, [["fluxWPerM2", "q", 1, 0]]],
  ["M4-05", "heat-boiling-critical-flux", { ...boilingWater, constant: 0.149 }, [["fluxWPerM2", "q", 1, 1]]],
  [
    "M4-06",
    "transport-viscosity-lucas",
    {
      temperatureK: 300,
      pressurePa: 1e7,
      criticalTemperatureK: 190.564,
      criticalPressurePa: 4599200,
      molarMassKgPerMol: 0.0160428,
    },
    [
      ["lowPressureViscosityPaS", "mu_0"],
      ["viscosityPaS", "mu_p"],
    ],
  ],
  [
    "M4-07",
    "transport-chung",
    {
      temperatureK: 473,
      molarMassKgPerMol: 0.042081,
      criticalTemperatureK: 364.9,
      criticalVolumeM3PerMol: 184.6e-6,
      molarVolumeM3PerMol: 172.1e-6,
      acentricFactor: 0.142,
      dipoleDebye: 0.4,
      idealHeatCapacityVJPerMolK: 82.67,
      lowPressureViscosityPaS: 1.34e-5,
    },
    [["conductivityWPerMK", "lambda"]],
  ],
  [
    "M4-08",
    "heat-overall-coefficient",
    { insideWPerM2K: 50, outsideWPerM2K: 10, thicknessesM: [0.02, 0.05], conductivitiesWPerMK: [45, 0.04] },
    [["coefficientWPerM2K", "U"]],
  ],
  [
    "M4-09",
    "heat-slab-step",
    { thicknessM: 0.025, diffusivityM2PerS: 1.2e-5, startK: 290, innerFaceK: 200, timeS: 30 },
    [["outerFaceK", "T_outer"]],
  ],
  ["M4-11", "heat-cross-flow-cylinder", { reynolds: 6071, prandtl: 0.7 }, [["nusselt", "Nu"]]],
  ...[194.686, 200].map((temperatureK, at): Row => [
    "M5-01",
    "cold-carbon-dioxide-sublimation",
    { temperatureK },
    [["pressurePa", "p", 1, at]],
  ]),
  ["M5-02", "cold-water-saturation", { temperatureK: 300 }, [["pressurePa", "p_water"]]],
  ["M5-02", "cold-ice-sublimation", { temperatureK: 260 }, [["pressurePa", "p_ice"]]],
  [
    "M5-03",
    "cold-hydrate-temperature",
    { pressurePa: 1000 / psia, gasGravity: 0.6 },
    [
      ["motieeK", "T_Motiee", fahrenheit],
      ["towlerMokhatabK", "T_Towler_Mokhatab", fahrenheit],
    ],
  ],
  ["M5-04", "cold-hydrate-inhibitor", { massFraction: 0.25, molarMassKgPerMol: 0.03204 }, [["depressionK", "dT"]]],
  ...(["A", "B", "C", "D"] as const).map((curve, at): Row => [
    "M5-05",
    "cold-impact-exemption",
    { curve, thicknessM: inch },
    [["temperatureK", "MDMT", fahrenheit, at]],
  ]),
  ["M6-01", "fire-pool-wetted", { wettedAreaM2: 50, drainage: "adequate" }, [["heatW", "Q_adequate_drainage"]]],
  ["M6-01", "fire-pool-wetted", { wettedAreaM2: 50, drainage: "inadequate" }, [["heatW", "Q_inadequate_drainage"]]],
  [
    "M6-02",
    "fire-insulation-factor",
    { conductanceWPerM2K: 22.71, processTemperatureK: 15.6 + 273.15 },
    [["environmentFactor", "F"]],
  ],
  [
    "M6-03",
    "fire-unwetted-relief",
    { molarMassKgPerMol: 0.017, relievingPressurePa: 1.1e6, relievingTemperatureK: 430, exposedAreaM2: 30 },
    [["massFlowKgPerS", "W", 3600]],
  ],
  ...[293.15, 873.15].map((surfaceTemperatureK, at): Row => [
    "M6-04",
    "fire-surface-balance",
    { ...flame, surfaceTemperatureK },
    [["fluxWPerM2", "q", 1, at]],
  ]),
  [
    "M6-06",
    "fire-hot-strength",
    { steel: "carbon_steel", temperatureK: 293.15, pressureGaugePa: 4e6, insideDiameterM: 1.475, thicknessM: 0.025 },
    [["stressPa", "hoop", 1e-6]],
  ],
  ["M6-07", "fire-standard-curves", { timeS: 900 }, [["hydrocarbonK", "HC_15min", celsius]]],
  ["M6-07", "fire-standard-curves", { timeS: 1800 }, [["standardK", "ISO834_30min", celsius]]],
  ...[150, 600].map((feet, at): Row => [
    "M6-08",
    "fire-nfpa-30",
    { wettedAreaM2: feet * squareFoot },
    [["heatW", "Q", btuPerHour, at]],
  ]),
  ...[2000, 3500].map((feet, at): Row => [
    "M6-09",
    "fire-nfpa-30",
    { wettedAreaM2: feet * squareFoot },
    [["heatW", "Q", btuPerHour, at]],
  ]),
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
      const si = outputs[output] as number;
      const found = typeof perSi === "number" ? si * perSi : perSi(si);
      const { relative = 0, absolute = 0, absolute_T: kelvin = 0 } = entry.tolerance;
      // A figure is known to half of its last printed digit (M2-06 asks for more than it prints).
      const printed = 0.5 * 10 ** -(String(expected).split(".")[1]?.length ?? 0);
      const band = Math.max(relative * Math.abs(expected), absolute, kelvin, id === "M2-06" ? printed : 0);
      expect(Math.abs(found - expected), `${output}: ${found}, expected ${expected}; ${entry.source}`).toBeLessThanOrEqual(band);
    }
  });

  it("M3-07 by discharge-valve-gas: the valve found without fittings passes its flow", () => {
    const entry = checks.find(({ id }) => id === "M3-07")!;
    const kv = numberOf(entry, "Kv_without_fittings");
    const { outputs } = runMethod({
      format: "ebbmark-case/1",
      kind: "method",
      method: "discharge-valve-gas",
      inputs: {
        cv: kv * 1.156,
        xt: 0.6,
        upstreamPressurePa: 680e3,
        downstreamPressurePa: 310e3,
        densityKgPerM3: (680e3 * 0.04401) / (0.988 * 8.314462618 * 433),
        gamma: 1.3,
      },
    });
    // 3800 m³/h at 0 °C and 101.325 kPa.
    const asked = ((3800 / 3600) * 101325 * 0.04401) / (8.314462618 * 273.15);
    expect(Math.abs((outputs.massFlowKgPerS as number) / asked - 1)).toBeLessThan(3e-3);
    expect(outputs.flow).toBe("subcritical");
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
