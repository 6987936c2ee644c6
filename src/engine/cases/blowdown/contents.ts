/**
 * The contents of the vessel at given amounts, energy and volume: temperature, pressure, phases, and the stream that can leave.
 *
 * The number of phases is pinned by the caller: inside one segment of a run it must not flip, because the integrator needs a smooth
 * right-hand side. `homogeneous` follows one phase even where it would split; `equilibrium` finds what is really there.
 * Objects are reused: copy what has to survive the next call.
 */
import { createPhaseState, type FluidModel, type PhaseState } from "../../eos/fluid-model";
import { EngineError } from "../../errors";
import { classifyPhase } from "../../flash/classify-phase";
import type { Equilibrium } from "../../flash/equilibrium";
import { flashUV } from "../../flash/flash-uv";
import { onlyComponent } from "../../flash/saturation-pure";
import { mayHoldWater } from "../../flash/third-phase";
import { solveAtVolume } from "../../flash/two-phase-volume";
import { createTwoPhaseVolumes, seedFrom } from "../../flash/volume-seed";
import { assembleVolumes, incipientSplit } from "../../flow/incipient-split";
import { isStableAlone } from "./phase-check";

/** "zones": vapour and liquid with a temperature each (`zones/zoned-balance.ts`). */
export type PhaseMode = "one-phase" | "two-phase" | "zones";

/** "quick" gives up where only a long search could help: right for a trial state that the integrator may as well shorten its step for. */
export type Effort = "quick" | "thorough";

export type Contents = {
  temperatureK: number;
  pressurePa: number;
  /** Overall mole fractions and amount. */
  composition: Float64Array;
  totalMolesMol: number;
  /** One phase, or more: liquid water beside a hydrocarbon liquid counts as liquid. */
  phases: 1 | 2;
  vapourMoleFraction: number;
  liquidVolumeM3: number;
  /** The one phase there is, or the lightest. */
  lightest: PhaseState;
  lightestComposition: Float64Array;
  /** One phase, and that a liquid. */
  isLiquidFull: boolean;
  /** Present where two phases were found. */
  equilibrium: Equilibrium | undefined;
};

/** A tangent-plane distance this close to zero lies on the phase boundary: what splits off there is too little to weigh. */
const onTheBoundary = -1e-7;

export class ContentsFinder {
  private readonly z: Float64Array;
  private readonly state = createPhaseState();
  private readonly volumes;
  private guessK: number;
  private seed: Equilibrium | undefined;

  constructor(
    private readonly fluid: FluidModel,
    private readonly volumeM3: number,
    startTemperatureK: number,
  ) {
    this.z = new Float64Array(fluid.componentIds.length);
    this.volumes = createTwoPhaseVolumes(fluid.componentIds.length);
    this.guessK = startTemperatureK;
  }

  /** Where the next search for a temperature starts. Inside a dome an equation may have more than one answer; the nearest is meant. */
  startFrom(temperatureK: number): void {
    this.guessK = temperatureK;
  }

  /** n_i [mol] and U [J] of the contents; throws EngineError where no state exists. */
  find(mode: PhaseMode, moles: ArrayLike<number>, internalEnergyJ: number, effort: Effort): Contents {
    const z = this.z;
    let total = 0;
    for (let i = 0; i < z.length; i++) total += Math.max(moles[i] ?? 0, 0);
    for (let i = 0; i < z.length; i++) z[i] = Math.max(moles[i] ?? 0, 0) / total;
    const u = internalEnergyJ / total;
    const v = this.volumeM3 / total;
    return mode === "one-phase" ? this.homogeneous(total, u, v) : this.equilibrium(total, u, v, effort);
  }

  private homogeneous(total: number, u: number, v: number): Contents {
    const state = this.fluid.phaseFromEnergy(u, v, this.z, this.guessK, this.state);
    this.guessK = state.temperatureK;
    const { temperatureK, pressurePa, molarVolumeM3PerMol } = state;
    const isLiquidFull = classifyPhase(this.fluid, temperatureK, pressurePa, molarVolumeM3PerMol, this.z) === "liquid";
    return {
      temperatureK,
      pressurePa,
      composition: this.z,
      totalMolesMol: total,
      phases: 1,
      vapourMoleFraction: isLiquidFull ? 0 : 1,
      liquidVolumeM3: isLiquidFull ? this.volumeM3 : 0,
      lightest: state,
      lightestComposition: this.z,
      isLiquidFull,
      equilibrium: undefined,
    };
  }

  private equilibrium(total: number, u: number, v: number, effort: Effort): Contents {
    const found = this.fromSeed(u, v) ?? this.split(total, u, v, effort);
    if (!found) return this.homogeneous(total, u, v);
    const [light, dense] = found.phases;
    const liquidVolume = found.phases
      .slice(1)
      .reduce((sum, { moleFraction, state }) => sum + moleFraction * state.molarVolumeM3PerMol, 0);
    if (!light) throw new RangeError("an equilibrium without a phase");
    if (dense) this.seed = found;
    return {
      temperatureK: found.temperatureK,
      pressurePa: found.pressurePa,
      composition: this.z,
      totalMolesMol: total,
      phases: dense ? 2 : 1,
      vapourMoleFraction: found.vapourMoleFraction,
      liquidVolumeM3: dense ? total * liquidVolume : found.phase === "liquid" ? this.volumeM3 : 0,
      lightest: light.state,
      lightestComposition: light.composition,
      isLiquidFull: !dense && found.phase === "liquid",
      equilibrium: dense ? found : undefined,
    };
  }

  /** Two phases from those of the last call, which is where they nearly always are; with water in the fluid a third may come or go. */
  private fromSeed(u: number, v: number): Equilibrium | undefined {
    const { seed, fluid, z, volumes } = this;
    if (seed && onlyComponent(z) < 0 && (seed.phases.length > 2 || mayHoldWater(fluid, z))) {
      try {
        return flashUV(fluid, { internalEnergyJPerMol: u, molarVolumeM3PerMol: v }, z, seed);
      } catch (error) {
        if (!isRefusal(error)) throw error;
        return undefined;
      }
    }
    if (
      !seed ||
      !seedFrom(seed, z, v, volumes) ||
      !solveAtVolume(fluid, z, { hold: "energy", value: u, molarVolume: v }, volumes)
    )
      return undefined;
    return assembleVolumes(fluid, volumes);
  }

  /** The equilibrium, or undefined where the fluid is one phase, or so near its phase boundary that it counts as one. */
  private split(total: number, u: number, v: number, effort: Effort): Equilibrium | undefined {
    // A pure fluid's search is short, and its stability shows only in the dome.
    if (onlyComponent(this.z) >= 0) return this.thorough(total, u, v);
    try {
      const alone = this.homogeneous(total, u, v);
      if (isStableAlone(this.fluid, alone)) return undefined;
      const trace = alone.pressurePa > 0 ? this.traceOf(alone, u, v) : undefined;
      if (trace) return trace;
    } catch (error) {
      if (!isRefusal(error) || effort === "quick") throw error;
    }
    if (effort === "quick") throw new EngineError("no-convergence", "No equilibrium was found near the last one.");
    return this.thorough(total, u, v);
  }

  private traceOf(alone: Contents, u: number, v: number): Equilibrium | undefined {
    const test = this.fluid.stability(alone.temperatureK, alone.pressurePa, this.z);
    return test.stable ? undefined : incipientSplit(this.fluid, alone, test, { hold: "energy", value: u, molarVolume: v });
  }

  private thorough(total: number, u: number, v: number): Equilibrium | undefined {
    try {
      return flashUV(this.fluid, { internalEnergyJPerMol: u, molarVolumeM3PerMol: v }, this.z, this.seed);
    } catch (error) {
      if (!isRefusal(error)) throw error;
      const alone = this.homogeneous(total, u, v);
      const onIt =
        alone.pressurePa > 0 &&
        this.fluid.stability(alone.temperatureK, alone.pressurePa, this.z).tangentPlaneDistance > onTheBoundary;
      if (!onIt) throw error;
      return undefined;
    }
  }
}

const isRefusal = (error: unknown): boolean => error instanceof EngineError && error.code === "no-convergence";
