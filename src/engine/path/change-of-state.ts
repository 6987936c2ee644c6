import type { ThreeSteps } from "../cases/path-case";
import type { FluidModel } from "../eos/fluid-model";
import type { Equilibrium } from "../flash/equilibrium";

export interface ChangeOfState {
  internalEnergyJPerMol: ThreeSteps;
  enthalpyJPerMol: ThreeSteps;
  entropyJPerMolK: ThreeSteps;
}

/**
 * The change of a real fluid between two equilibrium states by way of the ideal gas: out at `from`, across, back at `to`.
 *
 *   ΔX = [X_ig(T1, p1) − X(T1, p1)] + [X_ig(T2, p2) − X_ig(T1, p1)] + [X(T2, p2) − X_ig(T2, p2)]
 *
 * The ideal gas has the overall composition and is one phase; a departure is taken at the same temperature and pressure.
 *
 * Source   Poling, Prausnitz and O'Connell, The Properties of Gases and Liquids, 5th ed. (2001), chapter 6.
 */
export function changeOfState(
  model: FluidModel,
  from: Equilibrium,
  to: Equilibrium,
  z: ArrayLike<number> = model.feed,
): ChangeOfState {
  const start = realAndIdeal(model, from, z);
  const end = realAndIdeal(model, to, z);
  const steps = (key: "u" | "h" | "s"): ThreeSteps => {
    const departureOut = -start.departure[key];
    const idealGas = end.ideal[key] - start.ideal[key];
    const departureBack = end.departure[key];
    return { departureOut, idealGas, departureBack, total: departureOut + idealGas + departureBack };
  };
  return { internalEnergyJPerMol: steps("u"), enthalpyJPerMol: steps("h"), entropyJPerMolK: steps("s") };
}

function realAndIdeal(model: FluidModel, state: Equilibrium, z: ArrayLike<number>) {
  const gas = model.idealGas(state.temperatureK, state.pressurePa, z);
  const ideal = { u: gas.internalEnergyJPerMol, h: gas.enthalpyJPerMol, s: gas.entropyJPerMolK };
  const only = state.phases.length === 1 ? state.phases[0]! : undefined;
  if (only) {
    // From the residual itself: a thin gas would lose its departure in the difference of two large numbers.
    const departure = model.departures(state.temperatureK, only.state.molarVolumeM3PerMol, only.composition);
    return {
      ideal,
      departure: { u: departure.internalEnergyJPerMol, h: departure.enthalpyJPerMol, s: departure.entropyJPerMolK },
    };
  }
  return {
    ideal,
    departure: {
      u: state.internalEnergyJPerMol - ideal.u,
      h: state.enthalpyJPerMol - ideal.h,
      s: state.entropyJPerMolK - ideal.s,
    },
  };
}
