/**
 * Equilibrium at given entropy and volume, for walks along an isentrope that touch the phase boundary.
 *
 * On the boundary itself the second phase is a trace that a general flash may not find. There it is grown from what the stability test
 * proposes; where even that fails and the tangent-plane distance is zero to 1e-7, the fluid counts as the one phase it all but is.
 */
import { createPhaseState, type FluidModel } from "../eos/fluid-model";
import { EngineError } from "../errors";
import { assemble } from "../flash/assemble";
import type { Equilibrium } from "../flash/equilibrium";
import { flashSV } from "../flash/flash-uv";
import { incipientSplit } from "./incipient-split";

const onTheBoundary = -1e-7;

export function onIsentrope(
  fluid: FluidModel,
  at: { entropyJPerMolK: number; molarVolumeM3PerMol: number },
  z: ArrayLike<number>,
  seed: Equilibrium,
): Equilibrium {
  try {
    return flashSV(fluid, at, z, seed);
  } catch (error) {
    if (!(error instanceof EngineError && error.code === "no-convergence")) throw error;
    const { entropyJPerMolK, molarVolumeM3PerMol } = at;
    const alone = fluid.phaseFromEntropyVolume(entropyJPerMolK, molarVolumeM3PerMol, z, seed.temperatureK, createPhaseState());
    if (!(alone.pressurePa > 0)) throw error;
    const test = fluid.stability(alone.temperatureK, alone.pressurePa, z);
    const trace = test.stable
      ? undefined
      : incipientSplit(fluid, { ...alone, composition: Float64Array.from(z) }, test, {
          hold: "entropy",
          value: entropyJPerMolK,
          molarVolume: molarVolumeM3PerMol,
        });
    if (trace) return trace;
    if (test.tangentPlaneDistance < onTheBoundary) throw error;
    return assemble(fluid, alone.temperatureK, alone.pressurePa, [
      { moleFraction: 1, composition: z, molarVolume: molarVolumeM3PerMol },
    ]);
  }
}
