/**
 * The throat of an equilibrium nozzle from a first guess near by, for any fluid.
 *
 * Root of h0 − h − M c²/2 in x = ln(v/v0) along the isentrope, c the equilibrium speed of sound. Where one phase meets its boundary the sound speed
 * drops; a root that jumps over zero there lies at the boundary itself, which is found by carrying the share of the second phase to nothing.
 *
 * Returns  the state at the throat, or undefined where the steps don't settle: the caller then walks from stagnation
 */
import type { FluidModel } from "../eos/fluid-model";
import { EngineError } from "../errors";
import type { Equilibrium } from "../flash/equilibrium";
import { equilibriumSoundTerm } from "./equilibrium-sound";
import { soundTerm } from "./isentrope-newton";
import { onIsentrope } from "./on-isentrope";

export type MixedThroat = { x: number; state: Equilibrium };

const settled = 1e-8;
const mostSteps = 24;

export function mixedThroat(
  fluid: FluidModel,
  stagnation: Equilibrium,
  z: ArrayLike<number>,
  guess: MixedThroat,
): MixedThroat | undefined {
  const { molarVolumeM3PerMol: v0, enthalpyJPerMol: h0, entropyJPerMolK } = stagnation;
  let seed = guess.state;
  const at = (x: number): Equilibrium =>
    (seed = onIsentrope(fluid, { entropyJPerMolK, molarVolumeM3PerMol: v0 * Math.exp(x) }, z, seed));
  let low: MixedThroat | undefined;
  let high: MixedThroat | undefined;
  let before: { x: number; excess: number; phases: number } | undefined;
  let closings = 0;
  let x = guess.x;
  try {
    for (let i = 0; i < mostSteps; i++) {
      const state = at(x);
      const phases = state.phases.length;
      const sound = phases === 2 ? equilibriumSoundTerm(fluid, state) : soundTerm(state.phases[0]!.state);
      if (sound === undefined || !(state.pressurePa > 0)) return undefined;
      const excess = h0 - state.enthalpyJPerMol - sound / 2;
      const secant = before && before.phases === phases ? (excess - before.excess) / (x - before.x) : Number.NaN;
      const slope = secant > 0 ? secant : sound;
      before = { x, excess, phases };
      if (excess < 0) low = { x, state };
      else high = { x, state };
      const step = -excess / slope;
      if (Math.abs(step) < settled) return { x, state };
      const overBoundary = low && high && low.state.phases.length !== high.state.phases.length && high.state.phases.length === 2;
      // The root is mostly inside the two-phase part, where steps on that branch alone find it; only then is the boundary itself looked for.
      if (low && high && overBoundary && ++closings > 5) {
        const kink = boundary(at, low.x, high);
        if (!kink) return undefined;
        const beyond = equilibriumSoundTerm(fluid, kink.state);
        if (beyond !== undefined && h0 - kink.state.enthalpyJPerMol - beyond / 2 >= 0) return kink;
        low = kink;
        closings = -mostSteps;
      }
      let next = x + Math.max(Math.min(step, 0.5), -0.5 * x);
      if (overBoundary && low && high && next <= low.x) next = low.x + 0.1 * (high.x - low.x);
      else if ((low && next <= low.x) || (high && next >= high.x)) next = ((low?.x ?? 0) + (high?.x ?? 2 * x)) / 2;
      if (low && high && high.x - low.x < 1e-12) return low;
      x = next;
    }
  } catch (error) {
    if (error instanceof EngineError && error.code !== "cancelled") return undefined;
    throw error;
  }
  return undefined;
}

/** The least x with two phases: the share of the phase that grows there falls to nothing nearly in a straight line. */
function boundary(at: (x: number) => Equilibrium, single: number, two: MixedThroat): MixedThroat | undefined {
  const share = ({ phases }: Equilibrium): number => Math.min(phases[0]!.moleFraction, phases[1]!.moleFraction);
  let low = single;
  let high = two;
  let last: { x: number; share: number } | undefined;
  let overshot = true;
  for (let i = 0; i < 60; i++) {
    const now = share(high.state);
    const slope = last ? (last.share - now) / (last.x - high.x) : Number.NaN;
    if (high.x - low < 1e-11 || now / slope < 1e-11) return high;
    const aimed = high.x - (now / slope) * (1 - 1e-6);
    const x = !overshot && aimed > low && aimed < high.x ? aimed : (low + high.x) / 2;
    const state = at(x);
    overshot = state.phases.length !== 2;
    if (!overshot) {
      last = { x: high.x, share: now };
      high = { x, state };
    } else low = x;
  }
  return undefined;
}
