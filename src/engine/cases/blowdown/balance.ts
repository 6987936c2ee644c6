/**
 * The balances of a rigid vessel with its ways out, as the right-hand side of dy/dt.
 *
 *   dn_i/dt = −ṅ y_i        dU/dt = −ṅ h + Q_wall (+ Q_out without a wall)        dE_wall/dt = Q_out − Q_wall
 *   ṅ = Σ stroke(t) W / M     Q_wall = h_f S (T_w − T)
 *
 * with y_i, h, M of the stream that leaves (h its stagnation enthalpy) and W from the opening, summed over the paths that are open. Kinetic energy inside is neglected.
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
import { strokeAt, type ReleasePath } from "./release-path";
import type { VesselModel } from "./vessel-model";

/** Everything about one instant that a series, an event or a limit may ask for. */
export type Instant = {
  contents: Contents;
  /** Through each path fully open; undefined where it is shut. */
  flows: (Outflow | undefined)[];
  /** That of the path that passes most; where all are shut, what the first would pass. */
  flow: Outflow;
  /** What leaves with the strokes that the paths have made. */
  ventRateKgPerS: number;
  enthalpyW: number;
  molesPerS: Float64Array;
  /** The part of both that comes out of the vapour. */
  vapourMolesPerS: Float64Array;
  vapourEnthalpyW: number;
  heat: HeatFlows;
};

/** After so many refusals in a row the long searches are worth their time. */
const quickRefusals = 6;

export class Balance {
  readonly size: number;
  readonly massScaleKg: number;
  readonly energyScaleJ: number;
  protected readonly count: number;
  private readonly finder: ContentsFinder;
  private readonly moles: Float64Array;
  /** A segment starts with the long search allowed: its first state has no neighbour to start from. */
  private refusedInARow = quickRefusals;
  private open: readonly boolean[];
  private last: { open: readonly boolean[]; y: readonly number[]; mode: PhaseMode; t: number; instant: Instant } | undefined;

  constructor(readonly model: VesselModel) {
    const { fluid, start, vessel } = model;
    this.count = fluid.componentIds.length;
    this.size = this.count + 6;
    this.massScaleKg = start.totalMolesMol * fluid.mixtureMolarMass(fluid.feed);
    this.energyScaleJ = start.totalMolesMol * fluid.gasConstantJPerMolK * start.temperatureK;
    this.finder = new ContentsFinder(fluid, vessel.volumeM3, start.temperatureK);
    this.moles = new Float64Array(this.count);
    this.open = this.allOpen();
  }

  private allOpen = (): boolean[] => this.model.paths.map(() => true);

  /** Tight for amounts: a component that is all but gone must not swing below nothing. */
  absoluteTolerances(relativeTolerance: number, _mode: PhaseMode): number[] {
    return Array.from({ length: this.size }, (_, i) => (i < this.count ? 1e-4 : 1e-2) * relativeTolerance);
  }

  /** Which paths are open from here on. */
  beginSegment(open: readonly boolean[] = this.allOpen()): void {
    this.refusedInARow = quickRefusals;
    this.open = open;
  }

  /** Rate [kg/s] at the start with every path fully open, whatever the clock says. */
  fullRateKgPerS(mode: PhaseMode): number {
    this.open = this.allOpen();
    return this.at(0, this.startState(), mode).flows.reduce((sum, flow) => sum + (flow?.rateKgPerS ?? 0), 0);
  }

  /** Everything at a time of a kept step, searched for from the temperature that the run had there. */
  within(segment: { mode: PhaseMode; open: readonly boolean[] }, step: KeptStep, t: number): { y: number[]; instant: Instant } {
    const y = DenseRun.inside(step, t);
    this.finder.startFrom(DenseRun.guessK(step, t));
    this.open = segment.open;
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
  ventedMassKg = (y: readonly number[]): number => (y[y.length - 4] ?? 0) * this.massScaleKg;
  ventedEnergyJ = (y: readonly number[]): number => (y[y.length - 3] ?? 0) * this.energyScaleJ;
  heatFromWallJ = (y: readonly number[]): number => (y[y.length - 2] ?? 0) * this.energyScaleJ;
  heatFromOutsideJ = (y: readonly number[]): number => (y[y.length - 1] ?? 0) * this.energyScaleJ;

  /** State of everything at (t, y). Kept for the same arguments, because events and output ask for the same point in turn. */
  at(t: number, y: readonly number[], mode: PhaseMode, effort: Effort = "thorough"): Instant {
    return this.remembered(t, y, mode, () => {
      const { wall } = this.model;
      const contents = this.finder.find(mode, this.molesOf(y), this.internalEnergyJ(y), effort);
      const wallMeanK = wall?.temperatureAtK(this.wallEnergyJ(y));
      const heat = heatFlows(this.model, contents, wallMeanK);
      return { contents, ...this.leaving(t, contents), heat };
    });
  }

  protected remembered(t: number, y: readonly number[], mode: PhaseMode, make: () => Instant): Instant {
    const { last, open } = this;
    if (last && last.y === y && last.mode === mode && last.t === t && last.open === open) return last.instant;
    const instant = make();
    this.last = { open, y, mode, t, instant };
    return instant;
  }

  protected leaving(t: number, contents: Contents): Omit<Instant, "contents" | "heat"> {
    const { fluid, vessel, paths } = this.model;
    const { open } = this;
    const pass = (path: ReleasePath): Outflow =>
      outflow(fluid, path.opening, leavingStreams(fluid, contents, path.from, vessel.volumeM3));
    const flows = paths.map((path, i) => (open[i] ? pass(path) : undefined));
    const molesPerS = new Float64Array(this.count);
    const vapourMolesPerS = new Float64Array(this.count);
    let vapourEnthalpyW = 0;
    let ventRateKgPerS = 0;
    let enthalpyW = 0;
    let main: Outflow | undefined;
    flows.forEach((flow, k) => {
      if (!flow) return;
      const stroke = strokeAt(paths[k]!, t);
      ventRateKgPerS += stroke * flow.rateKgPerS;
      enthalpyW += stroke * flow.enthalpyW;
      vapourEnthalpyW += stroke * flow.vapourEnthalpyW;
      for (let i = 0; i < molesPerS.length; i++) {
        molesPerS[i] = molesPerS[i]! + stroke * flow.molesPerS[i]!;
        vapourMolesPerS[i] = vapourMolesPerS[i]! + stroke * flow.vapourMolesPerS[i]!;
      }
      if (!main || flow.rateKgPerS > main.rateKgPerS) main = flow;
    });
    return { flows, flow: main ?? pass(paths[0]!), ventRateKgPerS, enthalpyW, molesPerS, vapourMolesPerS, vapourEnthalpyW };
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
    const { contents, enthalpyW, molesPerS, ventRateKgPerS, heat } = instant;
    if (!(contents.pressurePa > 0)) return undefined;
    const { wall, start } = this.model;
    const intoFluidW = wall ? heat.fromWallW : heat.fromOutsideW;

    const rates = new Array<number>(this.size);
    for (let i = 0; i < this.count; i++) rates[i] = -molesPerS[i]! / start.totalMolesMol;
    rates[this.count] = (intoFluidW - enthalpyW) / this.energyScaleJ;
    rates[this.count + 1] = wall ? (heat.fromOutsideW - heat.fromWallW) / this.energyScaleJ : 0;
    rates[this.count + 2] = ventRateKgPerS / this.massScaleKg;
    rates[this.count + 3] = enthalpyW / this.energyScaleJ;
    rates[this.count + 4] = heat.fromWallW / this.energyScaleJ;
    rates[this.count + 5] = heat.fromOutsideW / this.energyScaleJ;
    return rates;
  }
}
