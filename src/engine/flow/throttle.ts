/**
 * Temperature of a stream after a throttle: constant enthalpy down to the pressure behind, in equilibrium, kinetic energy recovered.
 *
 *   h(T2, p2) = h(T1, p1)
 *
 * Source   first law for steady adiabatic flow without work (any text)
 * Holds    far enough downstream for the kinetic energy to be small; a fast tail pipe is colder than this by c²/2cp
 * stream   state before the throttle; z its composition
 * Returns  T2 [K]
 * Throws   EngineError "no-convergence" | "outside-validity"
 */
import { createPhaseState, type FluidModel } from "../eos/fluid-model";
import { EngineError } from "../errors";
import { flashPH } from "../flash/flash-ph";

export type Stream = { temperatureK: number; pressurePa: number; enthalpyJPerMol: number };

const scratch = createPhaseState();

export function throttleTemperature(fluid: FluidModel, stream: Stream, z: ArrayLike<number>, pressurePa: number): number {
  if (pressurePa >= stream.pressurePa) return stream.temperatureK;
  return (
    asOnePhase(fluid, stream, z, pressurePa) ??
    flashPH(fluid, { pressurePa, enthalpyJPerMol: stream.enthalpyJPerMol }, z).temperatureK
  );
}

function asOnePhase(
  fluid: FluidModel,
  { enthalpyJPerMol, temperatureK: guessK }: Stream,
  z: ArrayLike<number>,
  pressurePa: number,
): number | undefined {
  try {
    const { temperatureK } = fluid.phaseFromEnthalpy(enthalpyJPerMol, pressurePa, z, guessK, "stable", scratch);
    return fluid.stability(temperatureK, pressurePa, z).stable ? temperatureK : undefined;
  } catch (error) {
    // Between a boiling liquid and its vapour no single phase has this enthalpy.
    if (error instanceof EngineError && error.code === "no-convergence") return undefined;
    throw error;
  }
}
