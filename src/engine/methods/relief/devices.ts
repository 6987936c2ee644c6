import { reliefCaution } from "../../cautions";
import {
  gasBackPressureFactor,
  highestBackPressureFraction,
  liquidBackPressureFactor,
  overpressurePercents,
} from "../../relief/back-pressure-factors";
import { isoGasCapacityKgPerS, isoLiquidCapacityKgPerS, subcriticalShare } from "../../relief/iso-4126";
import { chooseOrifices } from "../../relief/orifices";
import { accumulatedPressureGaugePa, additionalSetGaugePa, reliefOccasions } from "../../relief/pressures";
import { reactionForceN } from "../../relief/reaction-force";
import { gives, givesWord, number, oneOf } from "../field";
import { defineMethod } from "../method";
import { belowInlet } from "./shared-fields";

export const accumulatedPressure = defineMethod({
  id: "relief-accumulated-pressure",
  chapter: "relief",
  title: "Allowed accumulated and set pressures",
  source: "ASME VIII-1 UG-125 and API Std 520-1; the column of set pressures is from memory",
  formula: String.raw`p_{acc}=\max(s\,p_{MAWP},\ p_{MAWP}+\Delta p),\qquad s=1.10,\ 1.16,\ 1.21`,
  inputs: {
    workingPressureGaugePa: number("p_{MAWP}", "Maximum allowable working pressure, gauge", "Pa", { above: 0, max: 1e9 }),
    occasion: oneOf("One device, several devices, or fire", reliefOccasions),
  },
  outputs: {
    accumulatedPressureGaugePa: gives("p_{acc}", "Highest pressure during relief, gauge", "Pa"),
    firstSetGaugePa: gives("p_{set}", "Highest set pressure of the first device, gauge", "Pa"),
    additionalSetGaugePa: gives("p_{set,2}", "Highest set pressure of an additional device, gauge", "Pa"),
  },
  cautions: ["Codes outside ASME differ; the code that applies at the site decides."],
  evaluate: ({ workingPressureGaugePa: mawp, occasion }) => ({
    accumulatedPressureGaugePa: accumulatedPressureGaugePa(mawp, occasion),
    firstSetGaugePa: mawp,
    additionalSetGaugePa: additionalSetGaugePa(mawp, occasion),
  }),
});

export const orificeDesignation = defineMethod({
  id: "relief-orifice-designation",
  chapter: "relief",
  title: "First standard orifice not smaller",
  source: "API Std 526, effective areas of the letters D to T",
  formula: String.raw`A_{letter}\,n\ \ge\ A`,
  inputs: { requiredAreaM2: number("A", "Required effective area", "m²", { above: 0, max: 100 }) },
  outputs: {
    designation: givesWord("Letter of the orifice"),
    areaM2: gives("A_{letter}", "Effective area of one orifice", "m²"),
    devices: gives("n", "Devices of this letter", ""),
    spareFraction: gives("s", "Area in hand over the required one", ""),
  },
  cautions: [reliefCaution, "An effective area goes with an effective coefficient; never mix it with a certified one."],
  evaluate: ({ requiredAreaM2 }) => {
    const { letter, areaM2, devices } = chooseOrifices(requiredAreaM2);
    return { designation: letter, areaM2, devices, spareFraction: (areaM2 * devices) / requiredAreaM2 - 1 };
  },
});

export const backPressureFactor = defineMethod({
  id: "relief-back-pressure-factor",
  chapter: "relief",
  title: "Back-pressure factors of a balanced-bellows device",
  source: "API Std 520-1 curves as digitised in an open fluid library, ±0.02",
  formula: String.raw`K_b,\,K_w = f\!\left(\frac{p_{b}}{p_{set}}\right)`,
  inputs: {
    setPressureGaugePa: number("p_{set}", "Set pressure, gauge", "Pa", { above: 0, max: 1e9 }),
    backPressureGaugePa: number("p_b", "Back pressure, gauge", "Pa", { min: 0, max: 1e9 }),
    overpressurePercent: oneOf("Overpressure in percent", overpressurePercents, "10"),
  },
  outputs: {
    backPressureFraction: gives("p_b/p_{set}", "Back pressure over set pressure", ""),
    gasFactor: gives("K_b", "Factor for gas", ""),
    liquidFactor: gives("K_w", "Factor for liquid", ""),
  },
  bounds: [
    {
      words: "Back pressure at most half the set pressure: the curves end there, and the value shown is that of the end.",
      holds: (_, { backPressureFraction }) => backPressureFraction <= highestBackPressureFraction,
    },
  ],
  cautions: ["The maker's curve of the device replaces these factors."],
  evaluate: ({ setPressureGaugePa, backPressureGaugePa, overpressurePercent }) => {
    const fraction = backPressureGaugePa / setPressureGaugePa;
    return {
      backPressureFraction: fraction,
      gasFactor: gasBackPressureFactor(fraction, overpressurePercent),
      liquidFactor: liquidBackPressureFactor(fraction),
    };
  },
});

const iso = {
  flowAreaM2: number("A", "Flow area of the device", "m²", { above: 0, max: 10 }),
  deratedCoefficient: number("K_{dr}", "Certified derated coefficient of discharge", "", { above: 0, max: 1 }),
  relievingPressurePa: number("p_0", "Relieving pressure, absolute", "Pa", { above: 0, max: 1e9 }),
  backPressurePa: number("p_b", "Back pressure, absolute", "Pa", { min: 0, max: 1e9, default: 101325 }),
} as const;

export const isoGas = defineMethod({
  id: "relief-iso-gas-capacity",
  chapter: "relief",
  title: "Capacity of a safety device, gas",
  source: "ISO 4126-1; constants re-derived from the units",
  formula: String.raw`Q_m=p_0\,C\,A\,K_{dr}\,K_b\sqrt{\frac{M}{Z\,T_0}},\qquad C=3.948\sqrt{k\left(\frac{2}{k+1}\right)^{\frac{k+1}{k-1}}}`,
  inputs: {
    ...iso,
    temperatureK: number("T_0", "Relieving temperature", "K", { above: 0, max: 3000 }),
    compressibility: number("Z", "Compressibility factor", "", { above: 0, max: 5, default: 1 }),
    molarMassKgPerMol: number("M", "Molar mass", "kg/mol", { above: 0, max: 1 }),
    heatCapacityRatio: number("k", "Isentropic exponent at the inlet", "", { above: 1, max: 3 }),
  },
  outputs: {
    massFlowKgPerS: gives("Q_m", "Capacity", "kg/s"),
    subcriticalFactor: gives("K_b", "Share of the choked flow", ""),
  },
  cautions: [reliefCaution],
  evaluate: (given) => ({
    massFlowKgPerS: isoGasCapacityKgPerS(belowInlet(given)),
    subcriticalFactor: subcriticalShare(given.heatCapacityRatio, given.backPressurePa / given.relievingPressurePa),
  }),
});

export const isoLiquid = defineMethod({
  id: "relief-iso-liquid-capacity",
  chapter: "relief",
  title: "Capacity of a safety device, liquid",
  source: "ISO 4126-1; constants re-derived from the units",
  formula: String.raw`Q_m=1.61\,K_{dr}\,K_v\,A\sqrt{\frac{p_0-p_b}{v}}`,
  inputs: {
    ...iso,
    densityKgPerM3: number("1/v", "Density of the liquid", "kg/m³", { above: 0, max: 3e4 }),
    viscosityFactor: number("K_v", "Viscosity factor", "", { above: 0, max: 1, default: 1 }),
  },
  outputs: { massFlowKgPerS: gives("Q_m", "Capacity", "kg/s") },
  cautions: [reliefCaution],
  evaluate: (given) => ({ massFlowKgPerS: isoLiquidCapacityKgPerS(belowInlet(given)) }),
});

export const reactionForce = defineMethod({
  id: "relief-reaction-force",
  chapter: "relief",
  title: "Reaction force of an open discharge",
  source: "API Std 520-2, form from memory; the momentum constant is re-derived",
  formula: String.raw`F=129\,W\sqrt{\frac{k\,T}{(k+1)\,M}}+0.1\,A\,p_2`,
  inputs: {
    massFlowKgPerS: number("W", "Mass flow", "kg/s", { above: 0, max: 1e5 }),
    heatCapacityRatio: number("k", "Heat capacity ratio", "", { above: 1, max: 2 }),
    temperatureK: number("T", "Inlet temperature", "K", { above: 0, max: 3000 }),
    molarMassKgPerMol: number("M", "Molar mass", "kg/mol", { above: 0, max: 1 }),
    outletAreaM2: number("A", "Area of the outlet", "m²", { above: 0, max: 100 }),
    outletPressureGaugePa: number("p_2", "Static pressure at the outlet, gauge", "Pa", { min: 0, max: 1e8, default: 0 }),
  },
  outputs: { forceN: gives("F", "Reaction force", "N") },
  cautions: ["For screening only: bends, supports and transients are not in it."],
  evaluate: (given) => ({ forceN: reactionForceN(given) }),
});
