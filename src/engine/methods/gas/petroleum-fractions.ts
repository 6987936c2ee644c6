import {
  edmisterAcentricFactor,
  keslerLee,
  pascalPerPsi,
  rankinePerKelvin,
  riaziDaubert1980,
  riaziDaubertFromMolarMass,
} from "../../substances/pseudo-component";
import { gives, number } from "../field";
import { defineMethod } from "../method";

const relativeDensity = number("SG", "Relative density at 15.6 °C", "", { min: 0.5, max: 1.2 });
const boilingPointK = number("T_b", "Normal boiling point", "K", { min: 200, max: 1100 });
const criticalTemperatureK = gives("T_c", "Critical temperature", "K");
const criticalPressurePa = gives("p_c", "Critical pressure", "Pa");
const molarMassKgPerMol = gives("M", "Molar mass", "kg/mol");
const acentricFactor = gives("\\omega", "Acentric factor", "");
export const fractionCaution = "A fraction is represented by correlation; how far the composition matters has not been removed.";

export const riaziDaubert1987 = defineMethod({
  id: "gas-fraction-riazi-daubert-1987",
  chapter: "gas",
  title: "Critical constants of a petroleum fraction from molar mass and relative density",
  source: "Riazi and Daubert 1987, (M, SG) form; acentric factor by Edmister 1958",
  formula: String.raw`\theta=a\,M^b\,SG^c\exp(d\,M+e\,SG+f\,M\,SG),\qquad \omega=\frac{3}{7}\frac{\log_{10}(p_c/14.7)}{T_c/T_b-1}-1`,
  inputs: { molarMassKgPerMol: number("M", "Molar mass", "kg/mol", { min: 0.05, max: 0.6 }), relativeDensity },
  outputs: { criticalTemperatureK, criticalPressurePa, boilingPointK: gives("T_b", "Normal boiling point", "K"), acentricFactor },
  bounds: [
    {
      words: "Molar mass from 0.070 to 0.300 kg/mol.",
      holds: ({ molarMassKgPerMol: M }) => M >= 0.07 && M <= 0.3,
    },
  ],
  cautions: [fractionCaution],
  evaluate: ({ molarMassKgPerMol: M, relativeDensity: SG }) => {
    const { Tc, pc, Tb } = riaziDaubertFromMolarMass(M * 1000, SG);
    return {
      criticalTemperatureK: Tc / rankinePerKelvin,
      criticalPressurePa: pc * pascalPerPsi,
      boilingPointK: Tb / rankinePerKelvin,
      acentricFactor: edmisterAcentricFactor({ Tb, Tc, pc }),
    };
  },
});

export const riaziDaubertFromBoilingPoint = defineMethod({
  id: "gas-fraction-riazi-daubert-1980",
  chapter: "gas",
  title: "Critical constants of a petroleum fraction from boiling point and relative density",
  source: "Riazi and Daubert 1980",
  formula: String.raw`T_c=24.2787\,T_b^{0.58848}SG^{0.3596},\quad p_c=3.12281\cdot10^9\,T_b^{-2.3125}SG^{2.3201},\quad M=4.5673\cdot10^{-5}\,T_b^{2.1962}SG^{-1.0164}`,
  inputs: { boilingPointK, relativeDensity },
  outputs: { criticalTemperatureK, criticalPressurePa, molarMassKgPerMol },
  bounds: [
    {
      words: "Boiling point from 300 to 617 K.",
      holds: ({ boilingPointK: Tb }) => Tb >= 300 && Tb <= 617,
    },
  ],
  cautions: [fractionCaution],
  evaluate: ({ boilingPointK: Tb, relativeDensity: SG }) => {
    const { Tc, pc, M } = riaziDaubert1980(Tb * rankinePerKelvin, SG);
    return { criticalTemperatureK: Tc / rankinePerKelvin, criticalPressurePa: pc * pascalPerPsi, molarMassKgPerMol: M / 1000 };
  },
});

export const keslerLeeFraction = defineMethod({
  id: "gas-fraction-kesler-lee",
  chapter: "gas",
  title: "Critical constants and acentric factor of a petroleum fraction",
  source: "Kesler and Lee 1976; below T_b/T_c = 0.8 Lee and Kesler 1975",
  formula: String.raw`T_c=341.7+811.1\,SG+(0.4244+0.1174\,SG)T_b+(0.4669-3.26238\,SG)\frac{10^5}{T_b},\ \ldots`,
  inputs: { boilingPointK, relativeDensity },
  outputs: { criticalTemperatureK, criticalPressurePa, molarMassKgPerMol, acentricFactor },
  bounds: [{ words: "Boiling point up to about 900 K.", holds: ({ boilingPointK: Tb }) => Tb <= 900 }],
  cautions: [fractionCaution],
  evaluate: ({ boilingPointK: Tb, relativeDensity: SG }) => {
    const { Tc, pc, M, omega } = keslerLee(Tb * rankinePerKelvin, SG);
    return {
      criticalTemperatureK: Tc / rankinePerKelvin,
      criticalPressurePa: pc * pascalPerPsi,
      molarMassKgPerMol: M / 1000,
      acentricFactor: omega,
    };
  },
});
