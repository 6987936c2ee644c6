import { reliefCaution } from "../../cautions";
import {
  criticalPressureRatio,
  flowCoefficient,
  gasCriticalAreaM2,
  gasSubcriticalAreaM2,
  subcriticalCoefficient,
} from "../../relief/gas-sizing";
import { gives, number } from "../field";
import { defineMethod } from "../method";
import { belowInlet, sizingFactors } from "./shared-fields";

const gas = {
  massFlowKgPerS: number("W", "Required mass flow", "kg/s", { above: 0, max: 1e5 }),
  molarMassKgPerMol: number("M", "Molar mass", "kg/mol", { above: 0, max: 1 }),
  temperatureK: number("T", "Relieving temperature", "K", { above: 0, max: 3000 }),
  compressibility: number("Z", "Compressibility factor at the inlet", "", { above: 0, max: 5, default: 1 }),
  heatCapacityRatio: number("k", "Ideal-gas heat capacity ratio at the relieving temperature", "", { above: 1, max: 2 }),
  relievingPressurePa: number("p_1", "Relieving pressure, absolute", "Pa", { above: 0, max: 1e9 }),
} as const;

const idealRange = {
  words:
    "Z from 0.8 to 1.1: outside, the ideal heat capacity ratio no longer stands for the gas. Compare with the real-gas flux.",
  holds: ({ compressibility }: { compressibility: number }) => compressibility >= 0.8 && compressibility <= 1.1,
};

export const gasCritical = defineMethod({
  id: "relief-gas-critical",
  chapter: "relief",
  title: "Relief area, gas or vapour, choked",
  source: "API Std 520-1, sizing for gas or vapour in critical flow",
  formula: String.raw`A = \frac{W}{C\,K_d\,p_1\,K_b\,K_c}\sqrt{\frac{T\,Z}{M}},\qquad C = 0.03948\sqrt{k\left(\frac{2}{k+1}\right)^{\frac{k+1}{k-1}}}`,
  inputs: {
    ...gas,
    ...sizingFactors(0.975),
    backPressureFactor: number("K_b", "Back-pressure factor", "", { above: 0, max: 1, default: 1 }),
    backPressurePa: number("p_2", "Back pressure, absolute", "Pa", { min: 0, max: 1e9, optional: true }),
  },
  outputs: {
    requiredAreaM2: gives("A", "Required effective area", "m²"),
    flowCoefficient: gives("C", "Coefficient of the standard, for kg/h, kPa, mm², K, kg/kmol", "√(kg kmol K)/(mm² h kPa)"),
    criticalPressureRatio: gives("r_c", "Critical pressure ratio", ""),
  },
  bounds: [
    idealRange,
    {
      words: "Back pressure at most r_c p_1: above it the flow does not choke, and the subcritical equation applies.",
      holds: ({ backPressurePa, relievingPressurePa }, { criticalPressureRatio: ratio }) =>
        backPressurePa === undefined || backPressurePa <= ratio * relievingPressurePa,
    },
  ],
  cautions: [reliefCaution],
  evaluate: (given) => ({
    requiredAreaM2: gasCriticalAreaM2(given),
    flowCoefficient: flowCoefficient(given.heatCapacityRatio),
    criticalPressureRatio: criticalPressureRatio(given.heatCapacityRatio),
  }),
});

export const gasSubcritical = defineMethod({
  id: "relief-gas-subcritical",
  chapter: "relief",
  title: "Relief area, gas or vapour, not choked",
  source: "API Std 520-1, sizing for gas or vapour in subcritical flow, conventional and pilot-operated devices",
  formula: String.raw`A = \frac{17.9\,W}{F_2\,K_d\,K_c}\sqrt{\frac{Z\,T}{M\,p_1\,(p_1-p_2)}},\qquad F_2 = \sqrt{\frac{k}{k-1}\,r^{2/k}\,\frac{1-r^{(k-1)/k}}{1-r}},\quad r=\frac{p_2}{p_1}`,
  inputs: {
    ...gas,
    ...sizingFactors(0.975),
    backPressurePa: number("p_2", "Back pressure, absolute", "Pa", { above: 0, max: 1e9 }),
  },
  outputs: {
    requiredAreaM2: gives("A", "Required effective area", "m²"),
    subcriticalCoefficient: gives("F_2", "Coefficient of subcritical flow", ""),
    criticalPressureRatio: gives("r_c", "Critical pressure ratio", ""),
  },
  bounds: [
    idealRange,
    {
      words: "Back pressure above r_c p_1: below it the flow is choked, and the critical equation applies.",
      holds: ({ backPressurePa, relievingPressurePa }, { criticalPressureRatio: ratio }) =>
        backPressurePa > ratio * relievingPressurePa,
    },
  ],
  cautions: [reliefCaution],
  evaluate: (given) => ({
    requiredAreaM2: gasSubcriticalAreaM2(belowInlet(given)),
    subcriticalCoefficient: subcriticalCoefficient(given.heatCapacityRatio, given.backPressurePa / given.relievingPressurePa),
    criticalPressureRatio: criticalPressureRatio(given.heatCapacityRatio),
  }),
});
