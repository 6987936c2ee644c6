import { chungTransport } from "../../transport/chung";
import { lucasViscosity } from "../../transport/lucas-viscosity";
import { brockBirdSurfaceTension } from "../../transport/surface-tension";
import { gives, number } from "../field";
import { defineMethod } from "../method";

const temperatureK = number("T", "Temperature", "K", { above: 0, max: 3000 });
const criticalTemperatureK = number("T_c", "Critical temperature", "K", { above: 0, max: 3000 });
const criticalPressurePa = number("p_c", "Critical pressure", "Pa", { above: 0, max: 1e9 });
const molarMassKgPerMol = number("M", "Molar mass", "kg/mol", { above: 0, max: 1 });

export const lucas = defineMethod({
  id: "transport-viscosity-lucas",
  chapter: "heat",
  title: "Viscosity of a non-polar gas at pressure",
  source: "Lucas 1980/84 as in Poling, Prausnitz and O'Connell",
  formula: String.raw`\mu=\frac{Z_2\,F_P\,F_Q}{\xi},\qquad \xi=0.176\left(\frac{T_c}{M^3p_c^4}\right)^{1/6}`,
  inputs: {
    temperatureK,
    pressurePa: number("p", "Pressure, absolute", "Pa", { above: 0, max: 1e9 }),
    criticalTemperatureK,
    criticalPressurePa,
    molarMassKgPerMol,
  },
  outputs: {
    lowPressureViscosityPaS: gives("\\mu_0", "Viscosity at low pressure", "Pa s"),
    viscosityPaS: gives("\\mu", "Viscosity", "Pa s"),
  },
  bounds: [
    {
      words: "Reduced temperature from 1 to 40, reduced pressure up to 100.",
      holds: ({ temperatureK: T, criticalTemperatureK: Tc, pressurePa, criticalPressurePa: pc }) =>
        T >= Tc && T <= 40 * Tc && pressurePa <= 100 * pc,
    },
  ],
  evaluate: ({ temperatureK: T, pressurePa, ...fluid }) => {
    const { lowPressure, atPressure } = lucasViscosity(fluid, T, pressurePa);
    return { lowPressureViscosityPaS: lowPressure, viscosityPaS: atPressure };
  },
});

export const chung = defineMethod({
  id: "transport-chung",
  chapter: "heat",
  title: "Viscosity and conductivity of a fluid at any density",
  source: "Chung, Ajlan, Lee and Starling 1988",
  formula: String.raw`\lambda=\frac{31.2\,\mu_0\Psi}{M}\left(\frac{1}{H_2}+B_6 y\right)+q\,B_7 y^2 T_r^{1/2}H_2,\qquad y=\frac{\rho V_c}{6}`,
  inputs: {
    temperatureK,
    molarVolumeM3PerMol: number("V", "Molar volume", "m³/mol", { above: 0, max: 1e3 }),
    idealHeatCapacityVJPerMolK: number("c_v^0", "Ideal-gas heat capacity at constant volume", "J/(mol K)", {
      above: 0,
      max: 1e4,
    }),
    criticalTemperatureK,
    criticalVolumeM3PerMol: number("V_c", "Critical volume", "m³/mol", { above: 0, max: 1 }),
    molarMassKgPerMol,
    acentricFactor: number("\\omega", "Acentric factor", "", { min: -1, max: 3 }),
    dipoleDebye: number("\\mu_D", "Dipole moment", "D", { min: 0, max: 10, default: 0 }),
    lowPressureViscosityPaS: number("\\mu_0", "Viscosity at low pressure, where it is known", "Pa s", {
      above: 0,
      max: 1,
      optional: true,
    }),
  },
  outputs: {
    viscosityPaS: gives("\\mu", "Viscosity", "Pa s"),
    conductivityWPerMK: gives("\\lambda", "Thermal conductivity", "W/(m K)"),
  },
  cautions: ["Known to 5 to 10 % for non-polar fluids; worse for polar and dense states."],
  evaluate: ({ temperatureK: T, molarVolumeM3PerMol, idealHeatCapacityVJPerMolK, lowPressureViscosityPaS, ...fluid }) => {
    const { viscosityPaS, conductivityWPerMK } = chungTransport(
      fluid,
      { temperatureK: T, molarVolumeM3PerMol, idealHeatCapacityVJPerMolK },
      lowPressureViscosityPaS,
    );
    return { viscosityPaS, conductivityWPerMK };
  },
});

export const surfaceTension = defineMethod({
  id: "transport-surface-tension",
  chapter: "heat",
  title: "Surface tension of a non-polar liquid",
  source: "Brock and Bird 1955 with Miller's factor",
  formula: String.raw`\sigma=p_c^{2/3}T_c^{1/3}(0.132\,\alpha_c-0.279)(1-T_r)^{11/9}`,
  inputs: {
    temperatureK,
    criticalTemperatureK,
    criticalPressurePa,
    normalBoilingPointK: number("T_b", "Normal boiling point", "K", { above: 0, max: 2000 }),
  },
  outputs: { surfaceTensionNPerM: gives("\\sigma", "Surface tension", "N/m") },
  bounds: [
    { words: "Below the critical temperature.", holds: ({ temperatureK: T, criticalTemperatureK: Tc }) => T < Tc },
    {
      words: "Boiling point below the critical temperature.",
      holds: ({ normalBoilingPointK: Tb, criticalTemperatureK: Tc }) => Tb < Tc,
    },
  ],
  evaluate: ({ temperatureK: T, ...fluid }) => ({ surfaceTensionNPerM: brockBirdSurfaceTension(fluid, T) }),
});
