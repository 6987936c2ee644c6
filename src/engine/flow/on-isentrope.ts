/**
 * Equilibrium at given entropy and volume, for walks along an isentrope that touch the phase boundary.
 *
 * Tried in the order of cost: two phases near those of the last place; one phase that a stability test accepts; two phases grown from the
 * trace that the test proposes, which is how a first drop or bubble is found; the general flash. Where even that fails and the tangent-plane
 * distance is zero to 1e-7, the fluid counts as the one phase it all but is.
 */
import { createPhaseState, type FluidModel } from "../eos/fluid-model";
import { EngineError } from "../errors";
import { assemble } from "../flash/assemble";
import type { Equilibrium } from "../flash/equilibrium";
import { flashSV } from "../flash/flash-uv";
import { onlyComponent } from "../flash/saturation-pure";
import { solveAtVolume, type VolumeTarget } from "../flash/two-phase-volume";
import { createTwoPhaseVolumes, seedFrom } from "../flash/volume-seed";
import { assembleVolumes, incipientSplit } from "./incipient-split";

const onTheBoundary = -1e-7;

export function onIsentrope(
  fluid: FluidModel,
  at: { entropyJPerMolK: number; molarVolumeM3PerMol: number },
  z: ArrayLike<number>,
  seed: Equilibrium,
): Equilibrium {
  const { entropyJPerMolK, molarVolumeM3PerMol } = at;
  if (onlyComponent(z) >= 0) return flashSV(fluid, at, z, seed);
  const target: VolumeTarget = { hold: "entropy", value: entropyJPerMolK, molarVolume: molarVolumeM3PerMol };
  const volumes = createTwoPhaseVolumes(z.length);
  if (seed.phases.length === 2 && seedFrom(seed, z, molarVolumeM3PerMol, volumes) && solveAtVolume(fluid, z, target, volumes)) {
    return assembleVolumes(fluid, volumes);
  }
  const alone = onePhase(fluid, at, z, seed.temperatureK);
  const one = () =>
    assemble(fluid, alone?.temperatureK ?? 0, alone?.pressurePa ?? 0, [
      { moleFraction: 1, composition: z, molarVolume: molarVolumeM3PerMol },
    ]);
  let distance = Number.NEGATIVE_INFINITY;
  if (alone && alone.pressurePa > 0 && alone.pressureByVolume < 0) {
    const test = fluid.stability(alone.temperatureK, alone.pressurePa, z);
    distance = test.tangentPlaneDistance;
    if (test.stable && isStableRoot(fluid, alone.temperatureK, alone.pressurePa, molarVolumeM3PerMol, z)) return one();
    if (!test.stable) {
      const trace = incipientSplit(fluid, { ...alone, composition: Float64Array.from(z) }, test, target);
      if (trace) return trace;
    }
  }
  try {
    return flashSV(fluid, at, z, seed);
  } catch (error) {
    if (error instanceof EngineError && error.code === "no-convergence" && distance > onTheBoundary) return one();
    throw error;
  }
}

function onePhase(
  fluid: FluidModel,
  { entropyJPerMolK, molarVolumeM3PerMol }: { entropyJPerMolK: number; molarVolumeM3PerMol: number },
  z: ArrayLike<number>,
  guessK: number,
) {
  try {
    return fluid.phaseFromEntropyVolume(entropyJPerMolK, molarVolumeM3PerMol, z, guessK, createPhaseState());
  } catch (error) {
    if (error instanceof EngineError && error.code !== "cancelled") return undefined;
    throw error;
  }
}

const scratch = createPhaseState();

const isStableRoot = (fluid: FluidModel, T: number, p: number, v: number, z: ArrayLike<number>): boolean =>
  Math.abs(fluid.phaseAtPressure(T, p, z, "stable", scratch).molarVolumeM3PerMol / v - 1) < 1e-6;
