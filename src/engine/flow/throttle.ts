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
import type { Equilibrium } from "../flash/equilibrium";
import { flashPH } from "../flash/flash-ph";
import { flashPQ } from "../flash/flash-quality";
import { onlyComponent } from "../flash/saturation-pure";
import { solveAtVolume, type TwoPhaseVolumes } from "../flash/two-phase-volume";
import { createTwoPhaseVolumes, seedFrom } from "../flash/volume-seed";
import { assembleVolumes } from "./incipient-split";

export type Stream = { temperatureK: number; pressurePa: number; enthalpyJPerMol: number };

const scratch = createPhaseState();

export function throttleTemperature(fluid: FluidModel, stream: Stream, z: ArrayLike<number>, pressurePa: number): number {
  return new Throttle(fluid, pressurePa).temperatureK(stream, z);
}

/** Throttling of one stream after another to the same pressure: what was found before is where the next search starts. */
export class Throttle {
  private lastK: number | undefined;
  private seed: Equilibrium | undefined;
  private readonly dome: { temperatureK: number; liquid: number; vapour: number } | undefined;

  constructor(
    private readonly fluid: FluidModel,
    private readonly pressurePa: number,
  ) {
    this.dome = domeOf(fluid, pressurePa);
  }

  temperatureK(stream: Stream, z: ArrayLike<number>): number {
    const { fluid, pressurePa, dome } = this;
    const { enthalpyJPerMol: h } = stream;
    if (pressurePa >= stream.pressurePa) return stream.temperatureK;
    if (dome && h >= dome.liquid && h <= dome.vapour) return dome.temperatureK;
    const near = this.seed && nearTwoPhases(fluid, this.seed, h, pressurePa, z);
    if (near) {
      this.seed = near;
      return near.temperatureK;
    }
    const alone = this.asOnePhase(stream, z);
    if (alone !== undefined) {
      this.seed = undefined;
      this.lastK = alone;
      return alone;
    }
    const found = flashPH(fluid, { pressurePa, enthalpyJPerMol: h }, z, this.seed);
    this.seed = found.phases.length === 2 ? found : undefined;
    return found.temperatureK;
  }

  private asOnePhase({ enthalpyJPerMol, temperatureK }: Stream, z: ArrayLike<number>): number | undefined {
    const { fluid, pressurePa, dome, lastK } = this;
    const root = !dome ? "stable" : enthalpyJPerMol > dome.vapour ? "vapour" : "liquid";
    try {
      const found = fluid.phaseFromEnthalpy(enthalpyJPerMol, pressurePa, z, lastK ?? temperatureK, root, scratch);
      const T = found.temperatureK;
      return dome || fluid.stability(T, pressurePa, z).stable ? T : undefined;
    } catch (error) {
      // Between a boiling liquid and its vapour no single phase has this enthalpy.
      if (error instanceof EngineError && error.code === "no-convergence") return undefined;
      throw error;
    }
  }
}

const mostSteps = 12;

/**
 * Two phases of given enthalpy and pressure from two near by: at each volume the phases of internal energy h − p v are found by Newton, and a secant in
 * ln v brings their pressure to p. Undefined where that fails, or where one of the phases goes.
 */
function nearTwoPhases(
  fluid: FluidModel,
  near: Equilibrium,
  enthalpyJPerMol: number,
  pressurePa: number,
  z: ArrayLike<number>,
): Equilibrium | undefined {
  const state = createTwoPhaseVolumes(z.length);
  let lnV = Math.log(near.molarVolumeM3PerMol);
  let before: { lnV: number; gap: number } | undefined;
  for (let i = 0; i < mostSteps; i++) {
    const molarVolume = Math.exp(lnV);
    const value = enthalpyJPerMol - pressurePa * molarVolume;
    if (i === 0 && !seedFrom(near, z, molarVolume, state)) return undefined;
    if (i > 0) rescale(state, molarVolume);
    if (!(state.vapourVolume > 0) || !solveAtVolume(fluid, z, { hold: "energy", value, molarVolume }, state)) return undefined;
    const gap = Math.log(state.pressurePa / pressurePa);
    if (Math.abs(gap) < 1e-9) return assembleVolumes(fluid, state);
    const slope = before ? (gap - before.gap) / (lnV - before.lnV) : -1;
    before = { lnV, gap };
    if (!(slope < 0)) return undefined;
    lnV -= Math.max(Math.min(gap / slope, 0.5), -0.5);
  }
  return undefined;
}

/** Another volume for the same phases: the vapour takes the difference. */
function rescale(state: TwoPhaseVolumes, molarVolume: number): void {
  state.vapourVolume = molarVolume - state.liquidVolume;
}

/** Saturated enthalpies of a pure fluid at a pressure; undefined for mixtures, and where the fluid has no saturation there. */
function domeOf(fluid: FluidModel, pressurePa: number): { temperatureK: number; liquid: number; vapour: number } | undefined {
  if (onlyComponent(fluid.feed) < 0) return undefined;
  try {
    const [vapour, liquid] = [
      flashPQ(fluid, { pressurePa, vapourMoleFraction: 1 }),
      flashPQ(fluid, { pressurePa, vapourMoleFraction: 0 }),
    ];
    return { temperatureK: vapour.temperatureK, liquid: liquid.enthalpyJPerMol, vapour: vapour.enthalpyJPerMol };
  } catch (error) {
    if (error instanceof EngineError && error.code !== "cancelled") return undefined;
    throw error;
  }
}
