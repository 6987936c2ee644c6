import type { FluidModel, PhaseState } from "../eos/fluid-model";
import { assemble } from "./assemble";
import { attempted } from "./attempted";
import type { Equilibrium } from "./equilibrium";
import { flashPT } from "./flash-pt";
import { splitsFurther } from "./third-phase";
import { createThreePhaseVolumes, solveThreeAtVolume, type ThreePhaseVolumes } from "./three-phase-volume";
import { solveAtVolume, type TwoPhaseVolumes, type VolumeTarget } from "./two-phase-volume";
import { verifyPhases } from "./verify-phases";
import { createTwoPhaseVolumes, seedFrom, seedThreeFrom } from "./volume-seed";

/** Two or three phases by Newton from an equilibrium near by; undefined where that fails or leaves a phase out. */
export function fromNear(
  model: FluidModel,
  z: ArrayLike<number>,
  target: VolumeTarget,
  near: Equilibrium,
  state: TwoPhaseVolumes,
): Equilibrium | undefined {
  if (near.phases.length === 3) return fromThree(model, z, target, near);
  if (!seedFrom(near, z, target.molarVolume, state) || !solveAtVolume(model, z, target, state)) return undefined;
  const found = assembleTwo(model, state);
  return splitsFurther(model, found) ? withThird(model, z, target, found) : found;
}

export function withThird(
  model: FluidModel,
  z: ArrayLike<number>,
  target: VolumeTarget,
  found: Equilibrium,
): Equilibrium | undefined {
  const near = attempted(() => flashPT(model, found, z, found));
  return near && fromThree(model, z, target, near);
}

export function fromThree(
  model: FluidModel,
  z: ArrayLike<number>,
  target: VolumeTarget,
  near: Equilibrium,
): Equilibrium | undefined {
  const state = threeFor(z.length);
  if (!seedThreeFrom(near, z, target.molarVolume, state)) return undefined;
  if (target.hold === "temperature") state.temperatureK = target.value;
  if (!solveThreeAtVolume(model, z, target, state)) return undefined;
  const found = assembleThree(model, state);
  return attempted(() => verifyPhases(model, found)) === "sound" ? found : undefined;
}

/** The root of lowest Gibbs energy at its own pressure, and no split there. */
export function isStable(model: FluidModel, single: PhaseState, z: ArrayLike<number>): boolean {
  const { temperatureK: T, pressurePa: p, molarVolumeM3PerMol: v } = single;
  model.residual.setComposition(z);
  const best = model.residual.volumeAtPressure(T, p, "stable");
  if (Math.abs(best / v - 1) > 1e-6) return false;
  return model.stability(T, p, z).stable;
}

export function assembleOne(model: FluidModel, single: PhaseState, z: ArrayLike<number>): Equilibrium {
  return assemble(model, single.temperatureK, single.pressurePa, [
    { moleFraction: 1, composition: z, molarVolume: single.molarVolumeM3PerMol },
  ]);
}

export function assembleTwo(model: FluidModel, state: TwoPhaseVolumes): Equilibrium {
  const { v, l, vapourVolume, liquidVolume, temperatureK, pressurePa } = state;
  let nv = 0;
  let nl = 0;
  for (let i = 0; i < v.length; i++) {
    nv += v[i]!;
    nl += l[i]!;
  }
  for (let i = 0; i < v.length; i++) {
    v[i] = v[i]! / nv; // the unknowns are spent: they leave as the compositions
    l[i] = l[i]! / nl;
  }
  return assemble(model, temperatureK, pressurePa, [
    { moleFraction: nv, composition: v, molarVolume: vapourVolume / nv },
    { moleFraction: nl, composition: l, molarVolume: liquidVolume / nl },
  ]);
}

function assembleThree(model: FluidModel, { moles, volumes, temperatureK, pressurePa }: ThreePhaseVolumes): Equilibrium {
  const phases = moles.map((amounts, k) => {
    const total = amounts.reduce((sum, amount) => sum + amount, 0);
    return { moleFraction: total, composition: amounts.map((amount) => amount / total), molarVolume: volumes[k]! / total };
  });
  return assemble(model, temperatureK, pressurePa, phases);
}

const threes = new Map<number, ThreePhaseVolumes>();

function threeFor(count: number): ThreePhaseVolumes {
  let state = threes.get(count);
  if (!state) threes.set(count, (state = createThreePhaseVolumes(count)));
  return state;
}

const states = new Map<number, TwoPhaseVolumes>();

export function volumesFor(count: number): TwoPhaseVolumes {
  let state = states.get(count);
  if (!state) states.set(count, (state = createTwoPhaseVolumes(count)));
  return state;
}
