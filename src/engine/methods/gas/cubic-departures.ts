import type { EquationId } from "../../cases/fluid-spec";
import { createFluidModel } from "../../eos/create-fluid-model";
import { gives, number, oneOf } from "../field";
import { defineMethod } from "../method";

const cubics = [
  "van-der-waals",
  "redlich-kwong",
  "soave-redlich-kwong",
  "peng-robinson-1976",
  "peng-robinson-1978",
] as const satisfies readonly EquationId[];

export const cubicDepartures = defineMethod({
  id: "gas-cubic-departures",
  chapter: "gas",
  title: "Departures of a pure fluid by a cubic equation of state",
  source:
    "The equation chosen, with its constants at full precision; departures as in Poling, Prausnitz and O'Connell, chapter 6",
  formula: String.raw`p=\frac{RT}{v-b}-\frac{a(T)}{(v+\delta_1 b)(v+\delta_2 b)},\qquad u-u^{ig}=\int_\infty^v\left[T\left(\frac{\partial p}{\partial T}\right)_v-p\right]dv`,
  inputs: {
    equation: oneOf("Equation of state", cubics),
    temperatureK: number("T", "Temperature", "K", { above: 0, max: 3000 }),
    pressurePa: number("p", "Pressure, absolute", "Pa", { above: 0, max: 1e9 }),
    criticalTemperatureK: number("T_c", "Critical temperature", "K", { above: 0, max: 3000 }),
    criticalPressurePa: number("p_c", "Critical pressure", "Pa", { above: 0, max: 1e9 }),
    acentricFactor: number("\\omega", "Acentric factor", "", { min: -1, max: 3 }),
  },
  outputs: {
    compressibility: gives("Z", "Compressibility factor of the stable root", ""),
    lnFugacityCoefficient: gives("\\ln\\varphi", "Logarithm of the fugacity coefficient", ""),
    enthalpyDepartureJPerMol: gives("h-h^{ig}", "Enthalpy less the ideal gas's", "J/mol"),
    entropyDepartureJPerMolK: gives("s-s^{ig}", "Entropy less the ideal gas's at the same pressure", "J/(mol K)"),
    internalEnergyDepartureJPerMol: gives("u-u^{ig}", "Internal energy less the ideal gas's", "J/mol"),
    gibbsDepartureJPerMol: gives("g-g^{ig}", "Gibbs energy less the ideal gas's", "J/mol"),
    helmholtzDepartureJPerMol: gives("a-a^{ig}", "Helmholtz energy less the ideal gas's", "J/mol"),
  },
  evaluate: ({ equation, temperatureK: T, pressurePa: p, criticalTemperatureK, criticalPressurePa, acentricFactor }) => {
    const model = createFluidModel({
      components: [
        {
          id: "fluid",
          moleFraction: 1,
          custom: {
            molarMassKgPerMol: 0.03,
            criticalTemperatureK,
            criticalPressurePa,
            acentricFactor,
            // No heat capacity enters a departure.
            idealGasHeatCapacityOverR: { polynomial: [3.5], rangeK: [1, 5000] },
          },
        },
      ],
      equation,
      interaction: "none",
    });
    const real = model.phaseAtPressure(T, p, model.feed, "stable");
    const ideal = model.idealGas(T, p, model.feed);
    const h = real.enthalpyJPerMol - ideal.enthalpyJPerMol;
    const s = real.entropyJPerMolK - ideal.entropyJPerMolK;
    const u = real.internalEnergyJPerMol - ideal.internalEnergyJPerMol;
    const R = model.gasConstantJPerMolK;
    return {
      compressibility: (p * real.molarVolumeM3PerMol) / (R * T),
      lnFugacityCoefficient: (h - T * s) / (R * T),
      enthalpyDepartureJPerMol: h,
      entropyDepartureJPerMolK: s,
      internalEnergyDepartureJPerMol: u,
      gibbsDepartureJPerMol: h - T * s,
      helmholtzDepartureJPerMol: u - T * s,
    };
  },
});
