/**
 * The contents of the vessel at given amounts, energy and volume: temperature, pressure, phases, and the stream that can leave.
 *
 * The number of phases is pinned by the caller: inside one segment of a run it must not flip, because the integrator needs a smooth
 * right-hand side. `homogeneous` follows one phase even where it would split; `equilibrium` finds what is really there.
 * Objects are reused: copy what has to survive the next call.
 */
import { createPhaseState, type FluidModel, type PhaseState } from "../../eos/fluid-model";
import { EngineError } from "../../errors";
import type { Equilibrium } from "../../flash/equilibrium";
import { flashUV } from "../../flash/flash-uv";
import { incipientSplit } from "./incipient-split";

export type PhaseMode = "one-phase" | "two-phase";

export type Contents = {
  temperatureK: number;
  pressurePa: number;
  /** Overall mole fractions and amount. */
  composition: Float64Array;
  totalMolesMol: number;
  /** How many phases were found. */
  phases: 1 | 2;
  vapourMoleFraction: number;
  liquidVolumeM3: number;
  /** The stream at the outlet, at rest: the vapour of two phases, or the one phase there is. */
  outlet: PhaseState;
  outletComposition: Float64Array;
  /** Present where two phases were found. */
  equilibrium: Equilibrium | undefined;
};

/** A tangent-plane distance this close to zero lies on the phase boundary: what splits off there is too little to weigh. */
const onTheBoundary = -1e-7;

export class ContentsFinder {
  private readonly z: Float64Array;
  private readonly state = createPhaseState();
  private guessK: number;
  private seed: Equilibrium | undefined;

  constructor(
    private readonly fluid: FluidModel,
    private readonly volumeM3: number,
    startTemperatureK: number,
  ) {
    this.z = new Float64Array(fluid.componentIds.length);
    this.guessK = startTemperatureK;
  }

  /** n_i [mol] and U [J] of the contents; throws EngineError where no state exists. */
  find(mode: PhaseMode, moles: ArrayLike<number>, internalEnergyJ: number): Contents {
    const z = this.z;
    let total = 0;
    for (let i = 0; i < z.length; i++) total += Math.max(moles[i] ?? 0, 0);
    for (let i = 0; i < z.length; i++) z[i] = Math.max(moles[i] ?? 0, 0) / total;
    const u = internalEnergyJ / total;
    const v = this.volumeM3 / total;
    return mode === "one-phase" ? this.homogeneous(total, u, v) : this.equilibrium(total, u, v);
  }

  private homogeneous(total: number, u: number, v: number): Contents {
    const state = this.fluid.phaseFromEnergy(u, v, this.z, this.guessK, this.state);
    this.guessK = state.temperatureK;
    return {
      temperatureK: state.temperatureK,
      pressurePa: state.pressurePa,
      composition: this.z,
      totalMolesMol: total,
      phases: 1,
      vapourMoleFraction: 1,
      liquidVolumeM3: 0,
      outlet: state,
      outletComposition: this.z,
      equilibrium: undefined,
    };
  }

  private equilibrium(total: number, u: number, v: number): Contents {
    const found = this.split(total, u, v);
    if (!found) return this.homogeneous(total, u, v);
    const [light, dense] = found.phases;
    if (!light) throw new RangeError("an equilibrium without a phase");
    if (dense) this.seed = found;
    return {
      temperatureK: found.temperatureK,
      pressurePa: found.pressurePa,
      composition: this.z,
      totalMolesMol: total,
      phases: dense ? 2 : 1,
      vapourMoleFraction: found.vapourMoleFraction,
      liquidVolumeM3: dense ? total * dense.moleFraction * dense.state.molarVolumeM3PerMol : found.phase === "liquid" ? this.volumeM3 : 0,
      outlet: light.state,
      outletComposition: light.composition,
      equilibrium: dense ? found : undefined,
    };
  }

  /** The equilibrium, or undefined where the fluid stands on its phase boundary and counts as one phase. */
  private split(total: number, u: number, v: number): Equilibrium | undefined {
    try {
      return flashUV(this.fluid, { internalEnergyJPerMol: u, molarVolumeM3PerMol: v }, this.z, this.seed);
    } catch (error) {
      if (!(error instanceof EngineError && error.code === "no-convergence")) throw error;
      const alone = this.homogeneous(total, u, v);
      if (!(alone.pressurePa > 0)) throw error;
      const test = this.fluid.stability(alone.temperatureK, alone.pressurePa, this.z);
      if (test.stable) return undefined;
      const trace = incipientSplit(this.fluid, alone, test, { energy: u, molarVolume: v });
      if (!trace && test.tangentPlaneDistance < onTheBoundary) throw error;
      return trace;
    }
  }
}
