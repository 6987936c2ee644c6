/**
 * The contents as one molar state, built again from temperature and pressure alone.
 *
 * Closure rests on this: energy and mass of the last state come from the equation of state at (T, p), not from what the integrator added up.
 */
import type { FluidModel } from "../../eos/fluid-model";
import { createPhaseState } from "../../eos/fluid-model";
import type { MolarState } from "../../account/three-steps";
import type { Contents } from "./contents";

export type RebuiltState = MolarState & { molarVolumeM3PerMol: number };

export function rebuiltState(fluid: FluidModel, contents: Contents): RebuiltState {
  const { temperatureK, pressurePa, equilibrium } = contents;
  const composition = Float64Array.from(contents.composition);
  const parts = equilibrium
    ? equilibrium.phases.map((phase) => ({
        share: phase.moleFraction,
        z: phase.composition,
        root: phase === equilibrium.phases[0] ? ("vapour" as const) : ("liquid" as const),
      }))
    : [{ share: 1, z: composition, root: "stable" as const }];
  const sum: RebuiltState = {
    temperatureK,
    pressurePa,
    composition,
    internalEnergyJPerMol: 0,
    enthalpyJPerMol: 0,
    entropyJPerMolK: 0,
    molarVolumeM3PerMol: 0,
  };
  for (const { share, z, root } of parts) {
    const state = fluid.phaseAtPressure(temperatureK, pressurePa, z, root, createPhaseState());
    const ideal = fluid.idealGas(temperatureK, pressurePa, z);
    const departure = fluid.departures(temperatureK, state.molarVolumeM3PerMol, z);
    sum.internalEnergyJPerMol += share * (ideal.internalEnergyJPerMol + departure.internalEnergyJPerMol);
    sum.enthalpyJPerMol += share * (ideal.enthalpyJPerMol + departure.enthalpyJPerMol);
    sum.entropyJPerMolK += share * (ideal.entropyJPerMolK + departure.entropyJPerMolK);
    sum.molarVolumeM3PerMol += share * state.molarVolumeM3PerMol;
  }
  return sum;
}
