import { reliefCaution } from "../../cautions";
import { blockedInRisePaPerK, expansionFlowM3PerS } from "../../relief/thermal-expansion";
import { gives, number } from "../field";
import { defineMethod } from "../method";

const expansion = number("\\alpha_v", "Cubic expansion coefficient of the liquid", "1/K", { above: 0, max: 0.1 });

export const thermalExpansion = defineMethod({
  id: "relief-thermal-expansion",
  chapter: "relief",
  title: "Flow of blocked-in liquid that is heated",
  source: "API Std 521 form, re-derived",
  formula: String.raw`q=\frac{\alpha_v\,Q}{\rho\,c}`,
  inputs: {
    expansionPerK: expansion,
    heatW: number("Q", "Heat into the liquid", "W", { above: 0, max: 1e10 }),
    densityKgPerM3: number("\\rho", "Density of the liquid", "kg/m³", { above: 0, max: 3e4 }),
    specificHeatJPerKgK: number("c", "Specific heat of the liquid", "J/(kg K)", { above: 0, max: 1e5 }),
  },
  outputs: {
    volumeFlowM3PerS: gives("q", "Volume flow to relieve", "m³/s"),
    massFlowKgPerS: gives("W", "Mass flow to relieve", "kg/s"),
  },
  cautions: [reliefCaution],
  evaluate: ({ expansionPerK, heatW, densityKgPerM3, specificHeatJPerKgK }) => {
    const volumeFlowM3PerS = expansionFlowM3PerS(expansionPerK, heatW, densityKgPerM3, specificHeatJPerKgK);
    return { volumeFlowM3PerS, massFlowKgPerS: volumeFlowM3PerS * densityKgPerM3 };
  },
});

export const blockedInRise = defineMethod({
  id: "relief-blocked-in-rise",
  chapter: "relief",
  title: "Pressure rise of blocked-in liquid",
  source: "API Std 521 form without leakage, re-derived; thin-walled elastic pipe with closed ends",
  formula: String.raw`\frac{dp}{dT}=\frac{\alpha_v-3\,\alpha_l}{\chi+\frac{d}{2\,E\,s}(2.5-2\nu)}`,
  inputs: {
    liquidExpansionPerK: expansion,
    pipeExpansionPerK: number("\\alpha_l", "Linear expansion coefficient of the pipe", "1/K", {
      min: 0,
      max: 1e-3,
      default: 1.2e-5,
    }),
    compressibilityPerPa: number("\\chi", "Isothermal compressibility of the liquid", "1/Pa", { above: 0, max: 1e-4 }),
    diameterM: number("d", "Diameter of the pipe", "m", { above: 0, max: 10 }),
    thicknessM: number("s", "Wall thickness", "m", { above: 0, max: 1 }),
    elasticModulusPa: number("E", "Elastic modulus of the pipe", "Pa", { above: 0, max: 1e12, default: 2.07e11 }),
    poissonRatio: number("\\nu", "Poisson's ratio", "", { min: 0, max: 0.5, default: 0.3 }),
  },
  outputs: { pressureRisePaPerK: gives("dp/dT", "Pressure rise per kelvin", "Pa/K") },
  cautions: ["Even 15 K can burst fittings."],
  evaluate: (given) => ({ pressureRisePaPerK: blockedInRisePaPerK(given) }),
});
