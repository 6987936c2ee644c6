/**
 * Two phases of given energy (or entropy) and volume when one of them is a first drop or a last bubble, too small for the general flash to find.
 *
 * The seed is the homogeneous state with a trace of the phase that the stability test proposes.
 * Returns  the equilibrium, or undefined where no trace grows into one
 */
import type { FluidModel, Stability } from "../eos/fluid-model";
import { assemble } from "../flash/assemble";
import type { Equilibrium } from "../flash/equilibrium";
import { solveAtVolume, type TwoPhaseVolumes, type VolumeTarget } from "../flash/two-phase-volume";
import { createTwoPhaseVolumes } from "../flash/volume-seed";

type Homogeneous = { temperatureK: number; pressurePa: number; composition: Float64Array };

const traces = [1e-6, 1e-4, 1e-2, 1e-8];

export function incipientSplit(
  fluid: FluidModel,
  { temperatureK, pressurePa, composition: z }: Homogeneous,
  test: Stability,
  target: VolumeTarget,
): Equilibrium | undefined {
  const traceIsVapour = test.trialIsVapour;
  fluid.residual.setComposition(test.trialComposition);
  const traceVolume = fluid.residual.volumeAtPressure(temperatureK, pressurePa, traceIsVapour ? "vapour" : "liquid");
  for (const trace of traces) {
    const state = createTwoPhaseVolumes(z.length);
    const [small, large] = traceIsVapour ? [state.v, state.l] : [state.l, state.v];
    let fits = true;
    for (let i = 0; i < z.length; i++) {
      small[i] = trace * (test.trialComposition[i] ?? 0);
      large[i] = (z[i] ?? 0) - (small[i] ?? 0);
      if ((z[i] ?? 0) > 0 && !((large[i] ?? 0) > 0)) fits = false;
    }
    state.temperatureK = temperatureK;
    state.pressurePa = pressurePa;
    const smallVolume = trace * traceVolume;
    state.vapourVolume = traceIsVapour ? smallVolume : target.molarVolume - smallVolume;
    state.liquidVolume = target.molarVolume - state.vapourVolume;
    if (!fits || !(state.vapourVolume > 0 && state.liquidVolume > 0)) continue;
    if (solveAtVolume(fluid, z, target, state)) return assembleVolumes(fluid, state);
  }
  return undefined;
}

export function assembleVolumes(
  fluid: FluidModel,
  { temperatureK, pressurePa, v, l, vapourVolume, liquidVolume }: TwoPhaseVolumes,
): Equilibrium {
  const sum = (moles: Float64Array): number => moles.reduce((total, amount) => total + amount, 0);
  const [nv, nl] = [sum(v), sum(l)];
  return assemble(fluid, temperatureK, pressurePa, [
    { moleFraction: nv, composition: v.map((amount) => amount / nv), molarVolume: vapourVolume / nv },
    { moleFraction: nl, composition: l.map((amount) => amount / nl), molarVolume: liquidVolume / nl },
  ]);
}
