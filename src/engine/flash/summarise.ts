import type { StateSummary } from "../cases/path-case";
import type { FluidModel } from "../eos/fluid-model";
import type { Equilibrium } from "./equilibrium";

/** An equilibrium as the result documents show a state. */
export function summarise(model: FluidModel, state: Equilibrium): StateSummary {
  const { temperatureK, pressurePa, molarVolumeM3PerMol, vapourMoleFraction, phase } = state;
  return {
    temperatureK,
    pressurePa,
    molarVolumeM3PerMol,
    compressibility: (pressurePa * molarVolumeM3PerMol) / (model.gasConstantJPerMolK * temperatureK),
    vapourMoleFraction,
    phase,
  };
}
