/**
 * The contents as one molar state, built again from the temperature, the pressure and the phases that are there.
 *
 * Closure rests on this: the volume of each phase is solved for again at (T, p), and energy and mass of the first and last state come from the
 * equation of state by way of the ideal gas and the departure, not from what the integrator added up.
 */
import { createPhaseState, type FluidModel } from "../../eos/fluid-model";
import type { MolarState } from "../../account/three-steps";
import type { Contents } from "./contents";

export type RebuiltState = MolarState & { molarVolumeM3PerMol: number };

export function rebuiltState(fluid: FluidModel, contents: Contents): RebuiltState {
  const { temperatureK, pressurePa, equilibrium } = contents;
  const composition = Float64Array.from(contents.composition);
  const parts = equilibrium
    ? equilibrium.phases.map(({ moleFraction, composition: z, state }) => ({
        share: moleFraction,
        z,
        T: state.temperatureK,
        v: volumeAgain(fluid, state.temperatureK, pressurePa, z, state.molarVolumeM3PerMol),
      }))
    : [
        {
          share: 1,
          z: composition,
          T: temperatureK,
          v: volumeAgain(fluid, temperatureK, pressurePa, composition, contents.lightest.molarVolumeM3PerMol),
        },
      ];
  const sum: RebuiltState = {
    temperatureK,
    pressurePa,
    composition,
    internalEnergyJPerMol: 0,
    enthalpyJPerMol: 0,
    entropyJPerMolK: 0,
    molarVolumeM3PerMol: 0,
  };
  for (const { share, z, T, v } of parts) {
    const ideal = fluid.idealGas(T, pressurePa, z);
    const departure = fluid.departures(T, v, z);
    sum.internalEnergyJPerMol += share * (ideal.internalEnergyJPerMol + departure.internalEnergyJPerMol);
    sum.enthalpyJPerMol += share * (ideal.enthalpyJPerMol + departure.enthalpyJPerMol);
    sum.entropyJPerMolK += share * (ideal.entropyJPerMolK + departure.entropyJPerMolK);
    sum.molarVolumeM3PerMol += share * v;
  }
  return sum;
}

const scratch = createPhaseState();

/** The root at (T, p) that is the phase's own; near the critical point, where roots run together, the nearer of the two. */
function volumeAgain(fluid: FluidModel, T: number, p: number, z: Float64Array, v: number): number {
  const light = fluid.phaseAtPressure(T, p, z, "vapour", scratch).molarVolumeM3PerMol;
  const dense = fluid.phaseAtPressure(T, p, z, "liquid", scratch).molarVolumeM3PerMol;
  return Math.abs(light / v - 1) < Math.abs(dense / v - 1) ? light : dense;
}
