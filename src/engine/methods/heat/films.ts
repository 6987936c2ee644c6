import { cooperFlux, zuberLimitWPerM2 } from "../../heat/boiling";
import { crossFlowNusselt, horizontalCylinderNusselt, turbulentNusselt, verticalPlateNusselt } from "../../heat/nusselt";
import { rohsenowFluxWPerM2 } from "../../heat/rohsenow";
import { gives, number } from "../field";
import { defineMethod } from "../method";

const filmCaution =
  "Films are known to about 25 % in steady flow and 50 % in a vessel that is being emptied; boiling to 30 % and worse.";
const rayleigh = number("Ra", "Rayleigh number", "", { min: 0, max: 1e15 });
const prandtl = number("Pr", "Prandtl number", "", { above: 0, max: 1e5 });
const conductivityWPerMK = number("\\lambda", "Thermal conductivity of the fluid", "W/(m K)", {
  above: 0,
  max: 100,
  optional: true,
});
const lengthM = number("L", "Length that the numbers stand on", "m", { above: 0, max: 1e3, optional: true });
const outputs = {
  nusselt: gives("Nu", "Nusselt number", ""),
  coefficientWPerM2K: gives("h", "Film coefficient; 0 where conductivity or length is not given", "W/(m² K)"),
} as const;
const film = (
  nusselt: number,
  { conductivityWPerMK: k, lengthM: L }: { conductivityWPerMK?: number | undefined; lengthM?: number | undefined },
) => ({
  nusselt,
  coefficientWPerM2K: k !== undefined && L !== undefined ? (nusselt * k) / L : 0,
});
const below = (limit: number) => ({
  words: `Ra below ${limit.toExponential(0)}.`,
  holds: ({ rayleigh: Ra }: { rayleigh: number }) => Ra < limit,
});

export const verticalPlate = defineMethod({
  id: "heat-natural-vertical-plate",
  chapter: "heat",
  title: "Natural convection on a vertical wall",
  source: "Churchill and Chu 1975",
  formula: String.raw`Nu=\left\{0.825+\frac{0.387\,Ra^{1/6}}{[1+(0.492/Pr)^{9/16}]^{8/27}}\right\}^2`,
  inputs: { rayleigh, prandtl, conductivityWPerMK, lengthM },
  outputs,
  bounds: [below(1e12)],
  cautions: [filmCaution],
  evaluate: (given) => film(verticalPlateNusselt(given.rayleigh, given.prandtl), given),
});

export const horizontalCylinder = defineMethod({
  id: "heat-natural-horizontal-cylinder",
  chapter: "heat",
  title: "Natural convection on a horizontal cylinder",
  source: "Churchill and Chu 1975",
  formula: String.raw`Nu=\left\{0.60+\frac{0.387\,Ra^{1/6}}{[1+(0.559/Pr)^{9/16}]^{8/27}}\right\}^2`,
  inputs: { rayleigh, prandtl, conductivityWPerMK, lengthM },
  outputs,
  bounds: [below(1e12)],
  cautions: [filmCaution],
  evaluate: (given) => film(horizontalCylinderNusselt(given.rayleigh, given.prandtl), given),
});

export const turbulentNatural = defineMethod({
  id: "heat-natural-turbulent",
  chapter: "heat",
  title: "Turbulent natural convection",
  source: "McAdams 1954",
  formula: String.raw`Nu=0.13\,Ra^{1/3}`,
  inputs: { rayleigh, conductivityWPerMK, lengthM },
  outputs,
  bounds: [{ words: "Ra from 1e9 to 1e13.", holds: ({ rayleigh: Ra }) => Ra >= 1e9 && Ra <= 1e13 }],
  cautions: [filmCaution],
  evaluate: (given) => film(turbulentNusselt(given.rayleigh), given),
});

export const crossFlow = defineMethod({
  id: "heat-cross-flow-cylinder",
  chapter: "heat",
  title: "Cylinder in cross-flow",
  source: "Churchill and Bernstein 1977",
  formula: String.raw`Nu=0.3+\frac{0.62\,Re^{1/2}Pr^{1/3}}{[1+(0.4/Pr)^{2/3}]^{1/4}}\left[1+\left(\frac{Re}{282\,000}\right)^{5/8}\right]^{4/5}`,
  inputs: { reynolds: number("Re", "Reynolds number", "", { above: 0, max: 1e9 }), prandtl, conductivityWPerMK, lengthM },
  outputs,
  bounds: [{ words: "Re Pr above 0.2.", holds: ({ reynolds, prandtl: Pr }) => reynolds * Pr > 0.2 }],
  cautions: [filmCaution],
  evaluate: (given) => film(crossFlowNusselt(given.reynolds, given.prandtl), given),
});

export const cooper = defineMethod({
  id: "heat-boiling-cooper",
  chapter: "heat",
  title: "Nucleate pool boiling",
  source: "Cooper 1984, roughness 1 µm",
  formula: String.raw`h=55\,p_r^{0.12}(-\log_{10}p_r)^{-0.55}M^{-0.5}q^{0.67}`,
  inputs: {
    reducedPressure: number("p_r", "Reduced pressure", "", { min: 0.001, max: 0.9 }),
    molarMassKgPerMol: number("M", "Molar mass", "kg/mol", { min: 0.002, max: 0.2 }),
    fluxWPerM2: number("q", "Heat flux", "W/m²", { above: 0, max: 1e7 }),
  },
  outputs: {
    coefficientWPerM2K: gives("h", "Film coefficient", "W/(m² K)"),
    superheatK: gives("\\Delta T", "Superheat of the wall at this flux", "K"),
  },
  cautions: [filmCaution],
  evaluate: ({ reducedPressure, molarMassKgPerMol, fluxWPerM2 }) => {
    // q = (c ΔT)^(1/0.33), so one kelvin gives c.
    const c = cooperFlux(reducedPressure, molarMassKgPerMol * 1000)(1) ** 0.33;
    const superheatK = fluxWPerM2 ** 0.33 / c;
    return { coefficientWPerM2K: fluxWPerM2 / superheatK, superheatK };
  },
});

const boilingPair = {
  latentHeatJPerKg: number("h_{fg}", "Latent heat", "J/kg", { above: 0, max: 1e7 }),
  liquidDensityKgPerM3: number("\\rho_l", "Density of the liquid", "kg/m³", { above: 0, max: 3e4 }),
  vapourDensityKgPerM3: number("\\rho_v", "Density of the vapour", "kg/m³", { above: 0, max: 3e4 }),
  surfaceTensionNPerM: number("\\sigma", "Surface tension", "N/m", { above: 0, max: 1 }),
} as const;

export const rohsenow = defineMethod({
  id: "heat-boiling-rohsenow",
  chapter: "heat",
  title: "Nucleate boiling on a known surface",
  source: "Rohsenow 1952",
  formula: String.raw`q=\mu_l h_{fg}\left[\frac{g(\rho_l-\rho_v)}{\sigma}\right]^{1/2}\left[\frac{c_{p,l}\Delta T}{C_{sf}h_{fg}Pr_l^n}\right]^3`,
  inputs: {
    ...boilingPair,
    liquidViscosityPaS: number("\\mu_l", "Viscosity of the liquid", "Pa s", { above: 0, max: 10 }),
    liquidHeatCapacityJPerKgK: number("c_{p,l}", "Specific heat of the liquid", "J/(kg K)", { above: 0, max: 1e5 }),
    liquidPrandtl: number("Pr_l", "Prandtl number of the liquid", "", { above: 0, max: 1e4 }),
    superheatK: number("\\Delta T", "Superheat of the wall", "K", { above: 0, max: 500 }),
    surfaceFactor: number("C_{sf}", "Factor of surface and liquid", "", { min: 0.001, max: 0.1, default: 0.013 }),
    exponent: number("n", "Exponent: 1 for water, 1.7 for other liquids", "", { min: 1, max: 1.7, default: 1.7 }),
  },
  outputs: { fluxWPerM2: gives("q", "Heat flux", "W/m²") },
  bounds: [
    {
      words: "The liquid is denser than the vapour.",
      holds: ({ liquidDensityKgPerM3: l, vapourDensityKgPerM3: v }) => l > v,
    },
  ],
  cautions: [filmCaution],
  evaluate: (given) => ({ fluxWPerM2: rohsenowFluxWPerM2(given) }),
});

export const criticalFlux = defineMethod({
  id: "heat-boiling-critical-flux",
  chapter: "heat",
  title: "Critical heat flux of pool boiling",
  source: "Zuber 1958 with π/24 = 0.131; 0.149 by Lienhard and Dhir 1973",
  formula: String.raw`q_{max}=C\,h_{fg}\,\rho_v\left[\frac{\sigma g(\rho_l-\rho_v)}{\rho_v^2}\right]^{1/4}`,
  inputs: { ...boilingPair, constant: number("C", "Constant", "", { min: 0.1, max: 0.2, default: 0.131 }) },
  outputs: { fluxWPerM2: gives("q_{max}", "Critical heat flux", "W/m²") },
  cautions: ["A wetted wall past this flux boils as a film and heats up like a dry one."],
  evaluate: ({ constant, ...pair }) => ({ fluxWPerM2: (zuberLimitWPerM2(pair) * constant) / 0.131 }),
});
