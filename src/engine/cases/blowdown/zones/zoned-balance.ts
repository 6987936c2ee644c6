/**
 * Balances of vapour and liquid that have a temperature each, at one pressure.
 *
 *   dn_g = −ṅ_out + N_ev − N_cd        dU_g = −Ḣ_out + N_ev h_v − N_cd h_l + Q_wg + Q_gl − p dV_g
 *   dn_l = −ṅ_out − N_ev + N_cd        dU_l = −Ḣ_out − N_ev h_v + N_cd h_l + Q_wl − Q_gl − p dV_l
 *   N_ev = n_l cp (T_l − T_bubble)/(τ Δh),  N_cd = n_g cp (T_dew − T_g)/(τ Δh),  each where positive;  Q_gl = h_gl A (T_l − T_g)
 *
 * Liquid hotter than its bubble point boils, with the composition of its first bubble; vapour colder than its dew point rains, with the composition of
 * its first drop. Both relax within τ, so that a phase is a little past its boundary while it does.
 *
 * Where they meet, vapour is exchanged for vapour in equilibrium with the liquid, at the rate that goes with Q_gl, so that compositions come together too.
 *
 * Before the second phase fills a share of the vessel, and after it has shrunk below one, both are in equilibrium (`balance.ts`); amounts and energies carry
 * over unchanged.
 *
 * Source   two-zone model of a vessel in depressurisation (docs/methods/blowdown.md)
 */
import { EngineError } from "../../../errors";
import type { Equilibrium } from "../../../flash/equilibrium";
import { levelTable, type LevelTable } from "../../../vessel/level-table";
import { Balance, type Instant } from "../balance";
import type { Contents, Effort, PhaseMode } from "../contents";
import type { VesselModel } from "../vessel-model";
import { BoundaryPoint } from "./boundary-point";
import { zoneHeat, type ZoneHeat } from "./zone-heat";
import { ZonePair } from "./zone-pair";

export type ZoneExchange = { coefficientWPerM2K: number; relaxationTimeS: number };

/** Shares of the vessel's volume at which two temperatures begin, and end, to be told apart. */
export const zonesBegin = 2e-3;
export const zonesEnd = 5e-4;

export class ZonedBalance extends Balance {
  private readonly pair: ZonePair;
  private readonly bubble: BoundaryPoint;
  private readonly dew: BoundaryPoint;
  private readonly levels: LevelTable;
  private readonly exchange: ZoneExchange;
  private guess: { vapourK: number; liquidK: number; liquidMolarVolume: number };
  private rates: number[] = [];
  /** Is the bubble point of the liquid at hand known? */
  private boilsNear = false;
  private readonly mixed: Float64Array;
  private readonly cp0: Float64Array;
  private readonly h0: Float64Array;
  private readonly s0: Float64Array;

  constructor(model: VesselModel, exchange: ZoneExchange) {
    super(model);
    const levels = levelTable(model.vessel);
    if (!levels) {
      throw new EngineError(
        "not-applicable",
        "Separate temperatures of vapour and liquid need to know the level, which a plain volume does not tell. Give the vessel's shape.",
        {},
        "vessel.geometry",
      );
    }
    if (model.paths.some((path) => path.from === "whole")) {
      throw new EngineError(
        "not-applicable",
        "With separate temperatures of vapour and liquid there is no mixture to let out as a whole. Take the outlet from the vapour or the liquid.",
        {},
        "release.from",
      );
    }
    this.levels = levels;
    this.exchange = exchange;
    this.pair = new ZonePair(model.fluid, model.vessel.volumeM3);
    this.bubble = new BoundaryPoint(model.fluid, "liquid");
    this.dew = new BoundaryPoint(model.fluid, "vapour");
    const count = model.fluid.componentIds.length;
    this.mixed = new Float64Array(count);
    this.cp0 = new Float64Array(count);
    this.h0 = new Float64Array(count);
    this.s0 = new Float64Array(count);
    this.guess = { vapourK: model.start.temperatureK, liquidK: model.start.temperatureK, liquidMolarVolume: 1e-4 };
  }

  private get zonedSize(): number {
    return 2 * this.count + 8;
  }
  private isZoned = (y: readonly number[]): boolean => y.length === this.zonedSize;

  override absoluteTolerances(relativeTolerance: number, mode: PhaseMode): number[] {
    if (mode !== "zones") return super.absoluteTolerances(relativeTolerance, mode);
    return Array.from({ length: this.zonedSize }, (_, i) => (i < 2 * this.count ? 1e-3 : 1e-2) * relativeTolerance);
  }

  override wallEnergyJ = (y: readonly number[]): number => {
    const at = this.isZoned(y) ? 2 * this.count + 2 : this.count + 1;
    return ((y[at] ?? 0) + (this.isZoned(y) ? (y[at + 1] ?? 0) : 0)) * this.energyScaleJ;
  };

  /** An equilibrium state told apart into zones. */
  zonesFrom(t: number, y: readonly number[]): number[] {
    const { contents } = this.at(t, y, "two-phase");
    const [vapour, liquid] = contents.equilibrium?.phases ?? [];
    if (!vapour || !liquid) throw new EngineError("no-convergence", "There is only one phase to tell apart into zones.");
    const scale = contents.totalMolesMol / this.model.start.totalMolesMol;
    const gasMoles = contents.totalMolesMol * vapour.moleFraction;
    const liquidJ = contents.totalMolesMol * liquid.moleFraction * liquid.state.internalEnergyJPerMol;
    const wallE = y[this.count + 1] ?? 0;
    const { areaM2 } = this.levels.at(contents.liquidVolumeM3);
    const wet = this.hasTwoWalls ? Math.min(areaM2 / this.model.insideAreaM2, 1) : 0;
    this.guess = {
      vapourK: contents.temperatureK,
      liquidK: contents.temperatureK,
      liquidMolarVolume: liquid.state.molarVolumeM3PerMol,
    };
    this.bubble.startFrom(contents.temperatureK, vapour.composition);
    this.dew.startFrom(contents.temperatureK, liquid.composition);
    return [
      ...Array.from(vapour.composition, (x) => (x * gasMoles) / this.model.start.totalMolesMol),
      ...Array.from(liquid.composition, (x) => x * liquid.moleFraction * scale),
      (y[this.count] ?? 0) - liquidJ / this.energyScaleJ,
      liquidJ / this.energyScaleJ,
      (1 - wet) * wallE,
      wet * wallE,
      ...y.slice(-4),
    ];
  }

  /** Zones brought together again. */
  mergedFrom(y: readonly number[]): number[] {
    const { count } = this;
    return [
      ...Array.from({ length: count }, (_, i) => (y[i] ?? 0) + (y[count + i] ?? 0)),
      (y[2 * count] ?? 0) + (y[2 * count + 1] ?? 0),
      (y[2 * count + 2] ?? 0) + (y[2 * count + 3] ?? 0),
      ...y.slice(-4),
    ];
  }

  private get hasTwoWalls(): boolean {
    return this.model.wall !== undefined && this.model.wall.slowestModeS > 0;
  }

  override at(t: number, y: readonly number[], mode: PhaseMode, effort: Effort = "thorough"): Instant {
    if (mode !== "zones") return super.at(t, y, mode, effort);
    return this.remembered(t, y, mode, () => this.zonedInstant(t, y));
  }

  private zonedInstant(t: number, y: readonly number[]): Instant {
    const { model, count, pair, energyScaleJ } = this;
    const { vapour: g, liquid: l } = pair;
    const n0 = model.start.totalMolesMol;
    const amounts = y.slice(0, 2 * count).map((part) => part * n0);
    g.setAmounts(amounts, 0);
    l.setAmounts(amounts, count);
    pair.solve({ vapourJ: (y[2 * count] ?? 0) * energyScaleJ, liquidJ: (y[2 * count + 1] ?? 0) * energyScaleJ }, this.guess);
    this.guess = {
      vapourK: g.state.temperatureK,
      liquidK: l.state.temperatureK,
      liquidMolarVolume: l.state.molarVolumeM3PerMol,
    };
    const contents = this.contentsOfZones();
    const wetted = this.levels.at(l.volumeM3);
    const heat = zoneHeat(
      model,
      contents,
      { vapourK: g.state.temperatureK, liquidK: l.state.temperatureK },
      this.wallTemperaturesK(y, wetted.areaM2),
      wetted.areaM2,
    );
    const leaving = this.leaving(t, contents);
    this.rates = this.zonedRates(y, contents, heat, leaving, wetted);
    const outsideW = heat.fromOutsideVapourW + heat.fromOutsideLiquidW;
    return {
      contents,
      ...leaving,
      heat: {
        fromWallW: model.wall ? heat.vapourW + heat.liquidW : 0,
        fromOutsideW: outsideW,
        innerSurfaceK: model.wall ? heat.vapourSurfaceK : undefined,
        liquidSurfaceK: model.wall ? heat.liquidSurfaceK : undefined,
      },
    };
  }

  private wallTemperaturesK(y: readonly number[], wettedM2: number): { vapour: number; liquid: number } | undefined {
    const { wall, insideAreaM2 } = this.model;
    if (!wall) return undefined;
    const at = 2 * this.count + 2;
    const [dry, wet] = [(y[at] ?? 0) * this.energyScaleJ, (y[at + 1] ?? 0) * this.energyScaleJ];
    if (!this.hasTwoWalls) {
      const one = wall.temperatureAtK(dry + wet);
      return { vapour: one, liquid: one };
    }
    const share = Math.min(Math.max(wettedM2 / insideAreaM2, 1e-6), 1 - 1e-6);
    return { vapour: wall.temperatureAtK(dry / (1 - share)), liquid: wall.temperatureAtK(wet / share) };
  }

  /** The two zones in the form in which streams and films look at phases in equilibrium. */
  private contentsOfZones(): Contents {
    const { vapour: g, liquid: l } = this.pair;
    const total = g.molesMol + l.molesMol;
    const composition = Float64Array.from(
      g.composition,
      (x, i) => (x * g.molesMol + (l.composition[i] ?? 0) * l.molesMol) / total,
    );
    const phase = (zone: typeof g, kind: "vapour" | "liquid") => ({
      kind,
      moleFraction: zone.molesMol / total,
      composition: zone.composition,
      state: zone.state,
      lnFugacityCoefficients: new Float64Array(zone.composition.length),
    });
    const phases = [phase(g, "vapour"), phase(l, "liquid")];
    const sum = (pick: (state: typeof g.state) => number): number =>
      phases.reduce((all, { moleFraction, state }) => all + moleFraction * pick(state), 0);
    const equilibrium: Equilibrium = {
      temperatureK: g.state.temperatureK,
      pressurePa: this.pair.pressurePa,
      molarVolumeM3PerMol: sum((state) => state.molarVolumeM3PerMol),
      internalEnergyJPerMol: sum((state) => state.internalEnergyJPerMol),
      enthalpyJPerMol: sum((state) => state.enthalpyJPerMol),
      entropyJPerMolK: sum((state) => state.entropyJPerMolK),
      vapourMoleFraction: g.molesMol / total,
      phase: "two-phase",
      phases,
    };
    return {
      temperatureK: Math.min(g.state.temperatureK, l.state.temperatureK),
      pressurePa: this.pair.pressurePa,
      composition,
      totalMolesMol: total,
      phases: 2,
      vapourMoleFraction: equilibrium.vapourMoleFraction,
      liquidVolumeM3: l.volumeM3,
      lightest: g.state,
      lightestComposition: g.composition,
      isLiquidFull: false,
      equilibrium,
    };
  }

  private zonedRates(
    y: readonly number[],
    contents: Contents,
    heat: ZoneHeat,
    leaving: ReturnType<Balance["leaving"]>,
    wetted: { areaM2: number; areaRate: number; surfaceM2: number },
  ): number[] {
    const { model, count, pair, energyScaleJ, exchange } = this;
    const { vapour: g, liquid: l } = pair;
    const { pressurePa: p } = contents;
    const boils = this.transfer(
      this.bubble,
      p,
      l.composition,
      l.molesMol * l.state.heatCapacityPJPerMolK,
      l.state.temperatureK,
      1,
    );
    const rains = this.transfer(this.dew, p, g.composition, g.molesMol * g.state.heatCapacityPJPerMolK, g.state.temperatureK, -1);
    this.boilsNear = this.bubble.isCurrent;
    const across = exchange.coefficientWPerM2K * wetted.surfaceM2 * (l.state.temperatureK - g.state.temperatureK);
    const mixes = this.mixing(wetted.surfaceM2);
    const exchangeW =
      mixes.energyW + boils * this.bubble.forming.enthalpyJPerMol - rains * this.dew.forming.enthalpyJPerMol + across;
    const gasRates = new Float64Array(count);
    const liquidRates = new Float64Array(count);
    for (let i = 0; i < count; i++) {
      const moved = boils * this.bubble.composition[i]! - rains * this.dew.composition[i]! + mixes.rates[i]!;
      gasRates[i] = moved - leaving.vapourMolesPerS[i]!;
      liquidRates[i] = -moved - (leaving.molesPerS[i]! - leaving.vapourMolesPerS[i]!);
    }
    const gasW = heat.vapourW + exchangeW - leaving.vapourEnthalpyW;
    const liquidW = heat.liquidW - exchangeW - (leaving.enthalpyW - leaving.vapourEnthalpyW);
    g.weigh(gasRates);
    l.weigh(liquidRates);
    const volumeRate = pair.liquidVolumeRate(gasW, liquidW);

    // Steel changes sides with the level and takes its energy along.
    const { wall, insideAreaM2, start } = model;
    const at = 2 * count + 2;
    let moved = 0;
    if (this.hasTwoWalls) {
      const areaRate = wetted.areaRate * volumeRate;
      const share = Math.min(Math.max(wetted.areaM2 / insideAreaM2, 1e-6), 1 - 1e-6);
      const perShare = areaRate > 0 ? (y[at] ?? 0) / (1 - share) : (y[at + 1] ?? 0) / share;
      moved = (perShare * areaRate) / insideAreaM2;
    }
    const rates = new Array<number>(this.zonedSize);
    for (let i = 0; i < count; i++) {
      rates[i] = gasRates[i]! / start.totalMolesMol;
      rates[count + i] = liquidRates[i]! / start.totalMolesMol;
    }
    rates[2 * count] = (gasW + p * volumeRate) / energyScaleJ;
    rates[2 * count + 1] = (liquidW - p * volumeRate) / energyScaleJ;
    rates[at] = wall ? (heat.fromOutsideVapourW - heat.vapourW) / energyScaleJ - moved : 0;
    rates[at + 1] = wall ? (heat.fromOutsideLiquidW - heat.liquidW) / energyScaleJ + moved : 0;
    rates[at + 2] = leaving.ventRateKgPerS / this.massScaleKg;
    rates[at + 3] = leaving.enthalpyW / energyScaleJ;
    rates[at + 4] = wall ? (heat.vapourW + heat.liquidW) / energyScaleJ : 0;
    rates[at + 5] = (heat.fromOutsideVapourW + heat.fromOutsideLiquidW) / energyScaleJ;
    return rates;
  }

  /**
   * Exchange at the surface that leaves the amounts of both zones as they are: vapour of the liquid's own equilibrium against vapour that is there,
   * at the rate that goes with the heat (Lewis number one): h_gl A/c_p moles each way. Carried with ideal-gas enthalpies, in which the
   * residual part common to all components cancels.
   */
  private mixing(surfaceM2: number): { rates: Float64Array; energyW: number } {
    const { mixed, exchange, bubble, pair, model } = this;
    mixed.fill(0);
    if (!this.boilsNear) return { rates: mixed, energyW: 0 };
    const { vapour: g, liquid: l } = pair;
    const each = (exchange.coefficientWPerM2K * surfaceM2) / g.state.heatCapacityPJPerMolK;
    model.fluid.idealHelmholtz.evaluate(l.state.temperatureK, this.cp0, this.h0, this.s0);
    let energyW = 0;
    for (let i = 0; i < mixed.length; i++) {
      mixed[i] = each * (bubble.composition[i]! - g.composition[i]!);
      energyW += mixed[i]! * this.h0[i]!;
    }
    return { rates: mixed, energyW };
  }

  /** Moles that pass to the other phase [mol/s]: above the bubble temperature (side 1), below the dew temperature (side −1). */
  private transfer(point: BoundaryPoint, p: number, z: Float64Array, heatCapacity: number, T: number, side: 1 | -1): number {
    if (!point.find(p, z)) return 0;
    const past = side * (T - point.temperatureK);
    if (past <= 0) return 0;
    return (heatCapacity * past) / (this.exchange.relaxationTimeS * Math.abs(point.latentJPerMol));
  }

  override derivative(t: number, y: number[], mode: PhaseMode): number[] | undefined {
    if (mode !== "zones") return super.derivative(t, y, mode);
    try {
      this.at(t, y, mode);
      return this.rates;
    } catch (error) {
      if (!(error instanceof EngineError) || error.code === "cancelled") throw error;
      return undefined;
    }
  }
}
