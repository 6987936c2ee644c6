import { ventGasQuality } from "../../disposal/vent-gas";
import { composition, gives } from "../field";
import { defineMethod } from "../method";

export const ventGas = defineMethod({
  id: "disposal-vent-gas-quality",
  chapter: "disposal",
  title: "Molar mass and net calorific value of vent gas",
  source:
    "Net calorific values at 25 °C from enthalpies of formation (ATcT and others, see the component library), as ISO 6976 defines them",
  formula: String.raw`M=\sum_i x_i M_i,\qquad H=\frac{\sum_i x_i H_i}{\sum_i x_i M_i}`,
  inputs: { composition: composition("Mole fractions of the vent gas") },
  outputs: {
    molarMassKgPerMol: gives("M", "Mean molar mass", "kg/mol"),
    netCalorificJPerKg: gives("H", "Net calorific value", "J/kg"),
  },
  evaluate: ({ composition: fractions }) => ventGasQuality(fractions),
});
