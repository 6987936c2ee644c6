/**
 * The change between two states of the contents by way of the ideal gas, when the amounts have changed in between.
 *
 *   ΔX = [X_ig(1) − X(1)] + [X_ig(2) − X_ig(1)] + [X(2) − X_ig(2)]        per mole of the fluid that is there
 *
 * X_ig(k) is the ideal gas at temperature, pressure and overall composition of state k. Where liquid has stayed behind, the middle step
 * holds the change of composition too.
 *
 * Source   Poling, Prausnitz and O'Connell, The Properties of Gases and Liquids, 5th ed. (2001), chapter 6.
 */
import type { ThreeSteps } from "../cases/blowdown-result";
import type { FluidModel } from "../eos/fluid-model";

export type MolarState = {
  temperatureK: number;
  pressurePa: number;
  composition: ArrayLike<number>;
  internalEnergyJPerMol: number;
  enthalpyJPerMol: number;
  entropyJPerMolK: number;
};

export type Changes = { internalEnergyJPerMol: ThreeSteps; enthalpyJPerMol: ThreeSteps; entropyJPerMolK: ThreeSteps };

export function threeSteps(fluid: FluidModel, from: MolarState, to: MolarState): Changes {
  const idealFrom = fluid.idealGas(from.temperatureK, from.pressurePa, from.composition);
  const idealTo = fluid.idealGas(to.temperatureK, to.pressurePa, to.composition);
  const steps = (key: "internalEnergyJPerMol" | "enthalpyJPerMol" | "entropyJPerMolK"): ThreeSteps => {
    const departureOut = idealFrom[key] - from[key];
    const idealGas = idealTo[key] - idealFrom[key];
    const departureBack = to[key] - idealTo[key];
    return { departureOut, idealGas, departureBack, total: departureOut + idealGas + departureBack };
  };
  return {
    internalEnergyJPerMol: steps("internalEnergyJPerMol"),
    enthalpyJPerMol: steps("enthalpyJPerMol"),
    entropyJPerMolK: steps("entropyJPerMolK"),
  };
}
