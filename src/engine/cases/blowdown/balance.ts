/**
 * The balances of a rigid vessel with one outlet, as the right-hand side of dy/dt.
 *
 *   dn_i/dt = −ṅ y_i        dU/dt = −ṅ h + Q_wall (+ Q_out without a wall)        dE_wall/dt = Q_out − Q_wall
 *   ṅ = stroke(t) W / M       Q_wall = h_f S (T_w − T)
 *
 * with y_i, h, M of the stream that leaves (h its stagnation enthalpy) and W from the opening. Kinetic energy inside is neglected.
 * Carried along: mass vented, enthalpy vented, heat from the wall, heat from outside.
 *
 * Scales   amounts by n0, every energy by n0 R T0
 */
import { EngineError } from "../../errors";
import { ContentsFinder, type Contents, type Effort, type PhaseMode } from "./contents";
import { DenseRun, type KeptStep } from "./dense-run";
import { heatFlows, type HeatFlows } from "./heat-flows";
import { leavingStreams } from "./leaving-stream";
import { outflow, type Outflow } from "./outflow";
import type { VesselModel } from "./vessel-model";

/** Everything about one instant that a series, an event or a limit may ask for. */
export type Instant = {
  contents: Contents;
  /** Through the opening, fully open. */
  flow: Outflow;
  /** Part of the stroke that the valve has made. */
  stroke: number;
  ventRateKgPerS: number;
  heat: HeatFlows;
};

/** After so many refusals in a row the long searches are worth their time. */
const quickRefusals = 6;

export class Balance {
  readonly size: number;
  readonly massScaleKg: number;
  readonly energyScaleJ: number;
  private readonly count: number;
  private readonly finder: ContentsFinder;
  private readonly moles: Float64Array;
  /** A segment starts with the long search allowed: its first state has no neighbour to start from. */
  private refusedInARow = quickRefusals;
  private last: { y: readonly number[]; mode: PhaseMode; t: number; instant: Instant } | undefined;

  constructor(readonly model: VesselModel) {
    const { fluid, start, vessel } = model;
    this.count = fluid.componentIds.length;
    this.size = this.count + 6;
    this.massScaleKg = start.totalMolesMol * fluid.mixtureMolarMass(fluid.feed);
    this.energyScaleJ = start.totalMolesMol * fluid.gasConstantJPerMolK * start.temperatureK;
    this.finder = new ContentsFinder(fluid, vessel.volumeM3, start.temperatureK);
    this.moles = new Float64Array(this.count);
  }

  /** Tight for amounts: a component that is all but gone must not swing below nothing. */
  absoluteTolerances(relativeTolerance: number): number[] {
    return Array.from({ length: this.size }, (_, i) => (i < this.count ? 1e-4 : 1e-2) * relativeTolerance);
  }

  beginSegment(): void {
    this.refusedInARow = quickRefusals;
  }

  /** Everything at a time of a kept step, searched for from the temperature that the run had there. */
  within(segment: { mode: PhaseMode }, step: KeptStep, t: number): { y: number[]; instant: Instant } {
    const y = DenseRun.inside(step, t);
    this.finder.startFrom(DenseRun.guessK(step, t));
    return { y, instant: this.at(t, y, segment.mode) };
  }

  startState(): number[] {
    const { molesMol, totalMolesMol, internalEnergyJ } = this.model.start;
    return [...Array.from(molesMol, (n) => n / totalMolesMol), internalEnergyJ / this.energyScaleJ, 0, 0, 0, 0, 0];
  }

  molesOf(y: readonly number[]): Float64Array {
    for (let i = 0; i < this.count; i++) this.moles[i] = (y[i] ?? 0) * this.model.start.totalMolesMol;
    return this.moles;
  }

  internalEnergyJ = (y: readonly number[]): number => (y[this.count] ?? 0) * this.energyScaleJ;
  wallEnergyJ = (y: readonly number[]): number => (y[this.count + 1] ?? 0) * this.energyScaleJ;
  ventedMassKg = (y: readonly number[]): number => (y[this.count + 2] ?? 0) * this.massScaleKg;
  ventedEnergyJ = (y: readonly number[]): number => (y[this.count + 3] ?? 0) * this.energyScaleJ;
  heatFromWallJ = (y: readonly number[]): number => (y[this.count + 4] ?? 0) * this.energyScaleJ;
  heatFromOutsideJ = (y: readonly number[]): number => (y[this.count + 5] ?? 0) * this.energyScaleJ;

  /** State of everything at (t, y). Kept for the same arguments, because events and output ask for the same point in turn. */
  at(t: number, y: readonly number[], mode: PhaseMode, effort: Effort = "thorough"): Instant {
    const { last } = this;
    if (last && last.y === y && last.mode === mode && last.t === t) return last.instant;
    const { fluid, vessel, wall, opening, openingTimeS, from } = this.model;
    const contents = this.finder.find(mode, this.molesOf(y), this.internalEnergyJ(y), effort);
    const flow = outflow(fluid, opening, leavingStreams(fluid, contents, from, vessel.volumeM3));
    const stroke = openingTimeS > 0 ? Math.min(t / openingTimeS, 1) : 1;
    const wallMeanK = wall?.temperatureAtK(this.wallEnergyJ(y));
    const heat = heatFlows(this.model, contents, wallMeanK);
    const instant: Instant = { contents, flow, stroke, ventRateKgPerS: stroke * flow.rateKgPerS, heat };
    this.last = { y, mode, t, instant };
    return instant;
  }

  /** dy/dt, or undefined for a trial state that no fluid can be in. */
  derivative(t: number, y: number[], mode: PhaseMode): number[] | undefined {
    let instant: Instant;
    try {
      instant = this.at(t, y, mode, this.refusedInARow < quickRefusals ? "quick" : "thorough");
    } catch (error) {
      if (!(error instanceof EngineError) || error.code === "cancelled") throw error;
      this.refusedInARow++;
      return undefined;
    }
    this.refusedInARow = 0;
    const { contents, flow, stroke, ventRateKgPerS, heat } = instant;
    if (!(contents.pressurePa > 0)) return undefined;
    const { wall, start } = this.model;
    const enthalpyW = stroke * flow.enthalpyW;
    const intoFluidW = wall ? heat.fromWallW : heat.fromOutsideW;

    const rates = new Array<number>(this.size);
    for (let i = 0; i < this.count; i++) rates[i] = (-stroke * (flow.molesPerS[i] ?? 0)) / start.totalMolesMol;
    rates[this.count] = (intoFluidW - enthalpyW) / this.energyScaleJ;
    rates[this.count + 1] = wall ? (heat.fromOutsideW - heat.fromWallW) / this.energyScaleJ : 0;
    rates[this.count + 2] = ventRateKgPerS / this.massScaleKg;
    rates[this.count + 3] = enthalpyW / this.energyScaleJ;
    rates[this.count + 4] = heat.fromWallW / this.energyScaleJ;
    rates[this.count + 5] = heat.fromOutsideW / this.energyScaleJ;
    return rates;
  }
}
