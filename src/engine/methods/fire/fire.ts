import { dryWallCaution } from "../../cautions";
import {
  hydrocarbonFireK,
  insulationFactor,
  nfpaHeatW,
  standardFireK,
  surfaceBalanceWPerM2,
  unwettedReliefKgPerS,
} from "../../heat/fire-laws";
import { poolFireHeatW } from "../../heat/pool-fire";
import { steelById, steelIds } from "../../steels/steel";
import { gives, number, oneOf } from "../field";
import { defineMethod } from "../method";

const wettedAreaM2 = number("A_{ws}", "Wetted inside area within reach of the flames", "m²", { above: 0, max: 1e5 });
const heatW = gives("Q", "Heat taken up", "W");

export const poolFire = defineMethod({
  id: "fire-pool-wetted",
  chapter: "fire",
  title: "Heat into a wetted vessel in an open pool fire",
  source: "API Std 521 / ISO 23251, empirical wetted-area law",
  formula: String.raw`Q=C_1\,F\,A_{ws}^{0.82},\qquad C_1=43\,200\ \text{or}\ 70\,900`,
  inputs: {
    wettedAreaM2,
    drainage: oneOf("Drainage and fire-fighting", ["adequate", "inadequate"]),
    environmentFactor: number("F", "Environment factor", "", { min: 0, max: 1, default: 1 }),
  },
  outputs: { heatW },
  cautions: [
    "Open pool of hydrocarbon-like fuel only: no jet fire, no confined or embanked vessel. Count area up to 7.6 m above the pool.",
  ],
  evaluate: ({ wettedAreaM2: A, drainage, environmentFactor }) => ({ heatW: poolFireHeatW(A, drainage, environmentFactor) }),
});

export const insulation = defineMethod({
  id: "fire-insulation-factor",
  chapter: "fire",
  title: "Environment factor of insulation",
  source: "API Std 521; constant from memory, the standard's table confirmed",
  formula: String.raw`F=\frac{k\,(904-\theta)}{66\,570\,t}`,
  inputs: {
    conductanceWPerM2K: number("k/t", "Conductivity over thickness", "W/(m² K)", { above: 0, max: 100 }),
    processTemperatureK: number("\\theta", "Process temperature at relief", "K", { above: 0, max: 1177 }),
  },
  outputs: { environmentFactor: gives("F", "Environment factor", "") },
  bounds: [{ words: "The factor is at most 1.", holds: (_, { environmentFactor }) => environmentFactor <= 1 }],
  cautions: ["Credit only insulation that stays in place at 904 °C for the stated time and resists hose streams."],
  evaluate: (given) => ({ environmentFactor: insulationFactor(given.conductanceWPerM2K, given.processTemperatureK) }),
});

export const unwetted = defineMethod({
  id: "fire-unwetted-relief",
  chapter: "fire",
  title: "Relief rate of a gas-filled vessel in fire",
  source: "API Std 521, SI form; exponents from memory",
  formula: String.raw`W=0.2772\,(M\,p_1)^{1/2}\,\frac{A'\,(T_w-T_1)^{1.25}}{T_1^{1.1506}}`,
  inputs: {
    molarMassKgPerMol: number("M", "Molar mass", "kg/mol", { above: 0, max: 1 }),
    relievingPressurePa: number("p_1", "Relieving pressure, absolute", "Pa", { above: 0, max: 1e9 }),
    relievingTemperatureK: number("T_1", "Gas temperature at relief", "K", { above: 0, max: 3000 }),
    wallTemperatureK: number("T_w", "Wall temperature; 866 K is usual for carbon steel", "K", {
      above: 0,
      max: 1500,
      default: 866,
    }),
    exposedAreaM2: number("A'", "Exposed area", "m²", { above: 0, max: 1e5 }),
  },
  outputs: { massFlowKgPerS: gives("W", "Relief rate", "kg/s") },
  bounds: [
    {
      words: "The gas at relief is colder than the wall; where it is not, the vessel fails before it relieves.",
      holds: ({ relievingTemperatureK, wallTemperatureK }) => relievingTemperatureK < wallTemperatureK,
    },
  ],
  cautions: [dryWallCaution],
  evaluate: (given) => ({
    massFlowKgPerS: unwettedReliefKgPerS({
      ...given,
      wallTemperatureK: Math.max(given.wallTemperatureK, given.relievingTemperatureK),
    }),
  }),
});

export const surfaceBalance = defineMethod({
  id: "fire-surface-balance",
  chapter: "fire",
  title: "Heat flux into a surface in flames",
  source: "API Std 521, analytical method",
  formula: String.raw`q=\sigma\left[\alpha_s\varepsilon_f T_f^4-\varepsilon_s T_s^4\right]+h\,(T_g-T_s)`,
  inputs: {
    flameTemperatureK: number("T_f", "Flame temperature", "K", { above: 0, max: 2500 }),
    gasTemperatureK: number("T_g", "Temperature of the hot gas", "K", { above: 0, max: 2500 }),
    flameEmissivity: number("\\varepsilon_f", "Emissivity of the flame", "", { min: 0, max: 1 }),
    surfaceAbsorptivity: number("\\alpha_s", "Absorptivity of the surface", "", { min: 0, max: 1 }),
    surfaceEmissivity: number("\\varepsilon_s", "Emissivity of the surface", "", { min: 0, max: 1 }),
    coefficientWPerM2K: number("h", "Film coefficient of the hot gas", "W/(m² K)", { min: 0, max: 500 }),
    surfaceTemperatureK: number("T_s", "Temperature of the surface", "K", { above: 0, max: 2500 }),
  },
  outputs: { fluxWPerM2: gives("q", "Heat flux into the surface", "W/m²") },
  evaluate: ({ surfaceTemperatureK, ...flame }) => ({ fluxWPerM2: surfaceBalanceWPerM2(flame, surfaceTemperatureK) }),
});

export const nfpa = defineMethod({
  id: "fire-nfpa-30",
  chapter: "fire",
  title: "Heat into a wetted tank, for comparison",
  source: "NFPA 30 and 29 CFR 1910.106",
  formula: String.raw`Q=20\,000A;\ 199\,300A^{0.566};\ 963\,400A^{0.338};\ 21\,000A^{0.82}\ \text{or}\ 14\,090\,000\ \text{Btu/h},\ A\ \text{in ft}^2`,
  inputs: { wettedAreaM2, design: oneOf("Design pressure", ["above-1-psig", "up-to-1-psig"], "above-1-psig") },
  outputs: { heatW },
  cautions: ["It wets to another height and gives other credits than API Std 521: never mix parts of two standards."],
  evaluate: ({ wettedAreaM2: A, design }) => ({ heatW: nfpaHeatW(A, design === "above-1-psig") }),
});

export const curves = defineMethod({
  id: "fire-standard-curves",
  chapter: "fire",
  title: "Standard fire curves",
  source: "EN 1991-1-2: hydrocarbon curve, standard curve (ISO 834)",
  formula: String.raw`\theta_{HC}=20+1080\left(1-0.325e^{-0.167t}-0.675e^{-2.5t}\right),\qquad \theta=20+345\log_{10}(8t+1)`,
  inputs: { timeS: number("t", "Time", "s", { min: 0, max: 1e6 }) },
  outputs: {
    hydrocarbonK: gives("\\theta_{HC}", "Hydrocarbon curve", "K"),
    standardK: gives("\\theta", "Standard curve", "K"),
  },
  evaluate: ({ timeS }) => ({ hydrocarbonK: hydrocarbonFireK(timeS), standardK: standardFireK(timeS) }),
});

export const hotStrength = defineMethod({
  id: "fire-hot-strength",
  chapter: "fire",
  title: "Strength of hot steel and hoop stress",
  source: "EN 1993-1-2 table 3.1 and annex C; thin-walled hoop stress on the mean diameter",
  formula: String.raw`\sigma=\frac{p\,(D_i+s)}{2s},\qquad S=f\,\sigma_u\,k(T)`,
  inputs: {
    steel: oneOf("Steel", steelIds),
    temperatureK: number("T", "Temperature of the steel", "K", { above: 0, max: 1500 }),
    pressureGaugePa: number("p", "Pressure, gauge", "Pa", { min: 0, max: 1e9 }),
    insideDiameterM: number("D_i", "Inside diameter", "m", { above: 0, max: 100 }),
    thicknessM: number("s", "Wall thickness", "m", { above: 0, max: 2 }),
    strengthFraction: number("f", "Part of the strength counted on", "", { above: 0, max: 1, default: 0.85 }),
    tensileStrengthPa: number("\\sigma_u", "Tensile strength at 20 °C; the steel's table where it is left out", "Pa", {
      above: 0,
      max: 5e9,
      optional: true,
    }),
  },
  outputs: {
    stressPa: gives("\\sigma", "Hoop stress", "Pa"),
    strengthPa: gives("S", "Strength counted on", "Pa"),
    strengthRatio: gives("k", "Hot strength over that at 20 °C", ""),
  },
  bounds: [
    {
      words: "Thin wall: thickness at most a tenth of the diameter.",
      holds: ({ thicknessM, insideDiameterM }) => thicknessM <= 0.1 * insideDiameterM,
    },
  ],
  cautions: ["Static strength: creep after about 15 min, bending and supports are not in it."],
  evaluate: ({ steel, temperatureK, pressureGaugePa, insideDiameterM, thicknessM, strengthFraction, tensileStrengthPa }) => {
    const material = steelById(steel);
    const ratio = material.strengthRatio(temperatureK);
    return {
      stressPa: (pressureGaugePa * (insideDiameterM + thicknessM)) / (2 * thicknessM),
      strengthPa: strengthFraction * (tensileStrengthPa ?? material.tensileStrengthPa) * ratio,
      strengthRatio: ratio,
    };
  },
});
