import { reliefCaution } from "../../cautions";
import { liquidAreaM2, liquidReynolds, viscosityEditions, viscosityFactor } from "../../relief/liquid-sizing";
import { gives, number, oneOf } from "../field";
import { defineMethod } from "../method";
import { belowInlet, sizingFactors } from "./shared-fields";

const massFlowKgPerS = number("W", "Mass flow", "kg/s", { above: 0, max: 1e5 });
const densityKgPerM3 = number("\\rho", "Density of the liquid", "kg/m³", { above: 0, max: 3e4 });

export const liquid = defineMethod({
  id: "relief-liquid",
  chapter: "relief",
  title: "Relief area, liquid, certified device",
  source: "API Std 520-1, sizing for liquid, devices that require capacity certification; water at 15.6 °C taken as 999 kg/m³",
  formula: String.raw`A = \frac{11.78\,Q}{K_d\,K_w\,K_c\,K_v}\sqrt{\frac{G}{p_1-p_2}},\qquad Q=\frac{W}{\rho},\quad G=\frac{\rho}{999}`,
  inputs: {
    massFlowKgPerS,
    densityKgPerM3,
    relievingPressurePa: number("p_1", "Relieving pressure, on the same base as the back pressure", "Pa", { above: 0, max: 1e9 }),
    backPressurePa: number("p_2", "Back pressure, on the same base", "Pa", { min: 0, max: 1e9, default: 0 }),
    ...sizingFactors(0.65),
    backPressureFactor: number("K_w", "Back-pressure factor of a balanced device", "", { above: 0, max: 1, default: 1 }),
    viscosityFactor: number("K_v", "Viscosity factor", "", { above: 0, max: 1, default: 1 }),
  },
  outputs: { requiredAreaM2: gives("A", "Required effective area", "m²") },
  cautions: [reliefCaution],
  evaluate: (given) => ({ requiredAreaM2: liquidAreaM2(belowInlet(given)) }),
});

export const liquidViscosity = defineMethod({
  id: "relief-liquid-viscosity",
  chapter: "relief",
  title: "Viscosity factor of liquid relief",
  source: "API Std 520-1, 7th to 9th edition; 10th edition as implemented in an open fluid library",
  formula: String.raw`Re=\frac{18\,800\,Q\,G}{\mu\sqrt{A}},\qquad K_v=\left(0.9935+\frac{2.878}{Re^{0.5}}+\frac{342.75}{Re^{1.5}}\right)^{-1}\ \text{or}\ \left(1+\frac{170}{Re}\right)^{-0.5}`,
  inputs: {
    massFlowKgPerS,
    densityKgPerM3,
    viscosityPaS: number("\\mu", "Dynamic viscosity", "Pa s", { above: 0, max: 1e4 }),
    orificeAreaM2: number("A", "Area of the next larger standard orifice", "m²", { above: 0, max: 10 }),
    edition: oneOf("Edition of the standard", viscosityEditions, "api-520-10th"),
  },
  outputs: { reynolds: gives("Re", "Reynolds number", ""), viscosityFactor: gives("K_v", "Viscosity factor", "") },
  evaluate: ({ massFlowKgPerS: flow, densityKgPerM3: density, viscosityPaS, orificeAreaM2, edition }) => {
    const reynolds = liquidReynolds(flow, density, viscosityPaS, orificeAreaM2);
    return { reynolds, viscosityFactor: viscosityFactor(reynolds, edition) };
  },
});
