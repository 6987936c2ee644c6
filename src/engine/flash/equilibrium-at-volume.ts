import { createPhaseState, type FluidModel } from "../eos/fluid-model";
import { bracketedRoot } from "./bracketed-root";
import type { Equilibrium } from "./equilibrium";
import { flashPT } from "./flash-pt";
import { lever, type Sides } from "./lever";
import { splitsFurther } from "./third-phase";
import { solveAtVolume, type VolumeTarget } from "./two-phase-volume";
import { assembleOne, assembleTwo, fromThree, isStable, volumesFor } from "./volume-phases";
import { seedFrom } from "./volume-seed";

/** Equilibrium at given temperature and molar volume. */
export function equilibriumAtVolume(
  model: FluidModel,
  T: number,
  v: number,
  z: ArrayLike<number>,
  seed?: Equilibrium,
): Equilibrium {
  const single = model.phaseAtVolume(T, v, z, createPhaseState());
  if (single.pressurePa > 0 && single.pressureByVolume < 0 && isStable(model, single, z)) return assembleOne(model, single, z);
  const state = volumesFor(z.length);
  const target: VolumeTarget = { hold: "temperature", value: T, molarVolume: v };
  if (seed?.phases.length === 2 && seedFrom(seed, z, v, state)) {
    state.temperatureK = T;
    if (solveAtVolume(model, z, target, state)) {
      const found = assembleTwo(model, state);
      if (!splitsFurther(model, found)) return found;
    }
  }
  if (seed?.phases.length === 3) {
    const found = fromThree(model, z, target, seed);
    if (found) return found;
  }
  let latest: Equilibrium | undefined;
  const sides: Sides = {};
  const excess = (lnP: number): number => {
    latest = flashPT(model, { temperatureK: T, pressurePa: Math.exp(lnP) }, z, latest);
    const difference = Math.log(latest.molarVolumeM3PerMol / v);
    if (difference < 0) sides.below = latest;
    else sides.above = latest;
    return difference;
  };
  const start = single.pressurePa > 1e3 ? single.pressurePa : (0.5 * model.gasConstantJPerMolK * T) / v;
  let a = Math.log(start);
  let fa = excess(a);
  let b = a;
  let fb = fa;
  for (let k = 0, jump = 0.25; k < 40 && fa * fb > 0; k++, jump = Math.min(2 * jump, 3)) {
    a = b;
    fa = fb;
    b += fb > 0 ? jump : -jump;
    fb = excess(b);
  }
  const lnP = bracketedRoot(excess, { a, fa, b, fb }, { within: 1e-13, what: "pressure at given temperature and volume" });
  const left = excess(lnP);
  const found = (Math.abs(left) > 1e-7 && between(model, v, sides)) || latest!;
  if (found.phases.length === 3) return fromThree(model, z, target, found) ?? found;
  if (found.phases.length === 2 && seedFrom(found, z, v, state)) {
    state.temperatureK = T;
    if (solveAtVolume(model, z, target, state)) {
      const polished = assembleTwo(model, state);
      if (!splitsFurther(model, polished)) return polished;
    }
  }
  return found;
}

/** At a jump of the volume: the two sides together. */
function between(model: FluidModel, v: number, { below, above }: Sides): Equilibrium | undefined {
  if (!below || !above) return undefined;
  const [low, high] = [below.molarVolumeM3PerMol, above.molarVolumeM3PerMol];
  return lever(model, below, above, (v - low) / (high - low));
}
