/**
 * Vapour and liquid of different temperature at one pressure in a rigid vessel.
 *
 * Found from amounts and energies of both:  u_g(T_g, V_g) = U_g,  u_l(T_l, V − V_g) = U_l,  p_g = p_l  by Newton in (T_g, V_g, T_l).
 * Each zone is one homogeneous phase, a little past its boundary while it boils or condenses (see `zoned-balance.ts`).
 *
 * How fast the boundary between them moves, from E = heat less enthalpy that leaves (without p dV), with ū_i, p_i derivatives by amount at constant T, V:
 *
 *   C Ṫ + T p_T V̇ = E − Σ ū_i ṅ_i  for each zone, V̇_l = −V̇_g, ṗ_g = ṗ_l
 *
 * Source   the first law for each zone; Michelsen and Mollerup (2007), chapter 2, for the derivatives
 */
import { createPhaseState, type FluidModel, type PhaseState, type ResidualDerivatives } from "../../../eos/fluid-model";
import { createResidualDerivatives } from "../../../eos/residual-derivatives";
import { EngineError } from "../../../errors";

export class Zone {
  readonly composition: Float64Array;
  readonly state: PhaseState = createPhaseState();
  molesMol = 0;
  volumeM3 = 0;
  /** Σ ū_i ṅ_i [W] and Σ p_i ṅ_i [Pa/s] of the last call of `weigh`. */
  energyRate = 0;
  pressureRate = 0;
  private readonly F: ResidualDerivatives;
  private readonly cp: Float64Array;
  private readonly h: Float64Array;
  private readonly s: Float64Array;

  constructor(private readonly fluid: FluidModel) {
    const count = fluid.componentIds.length;
    this.composition = new Float64Array(count);
    this.F = createResidualDerivatives(count);
    this.cp = new Float64Array(count);
    this.h = new Float64Array(count);
    this.s = new Float64Array(count);
  }

  setAmounts(amounts: ArrayLike<number>, from: number): void {
    const { composition } = this;
    let total = 0;
    for (let i = 0; i < composition.length; i++) total += Math.max(amounts[from + i] ?? 0, 0);
    if (!(total > 0)) throw new EngineError("no-convergence", "One of the two zones has no fluid left.");
    for (let i = 0; i < composition.length; i++) composition[i] = Math.max(amounts[from + i] ?? 0, 0) / total;
    this.molesMol = total;
  }

  moveTo(T: number, volumeM3: number): void {
    this.volumeM3 = volumeM3;
    this.fluid.phaseAtVolume(T, volumeM3 / this.molesMol, this.composition, this.state);
  }

  get energyJ(): number {
    return this.molesMol * this.state.internalEnergyJPerMol;
  }

  /** What amounts that come or go at given rates do at constant T and V. */
  weigh(rates: Float64Array): void {
    const { fluid, composition, state, F, cp, h, s } = this;
    const R = fluid.gasConstantJPerMolK;
    const { temperatureK: T, molarVolumeM3PerMol: v } = state;
    fluid.residual.setComposition(composition);
    fluid.residual.evaluate(T, v, 2, F);
    fluid.idealHelmholtz.evaluate(T, cp, h, s);
    this.energyRate = 0;
    this.pressureRate = 0;
    for (let i = 0; i < composition.length; i++) {
      this.energyRate += rates[i]! * (h[i]! - R * T - R * T * T * F.FnT[i]!);
      this.pressureRate += (rates[i]! * R * T * (1 / v - F.FnV[i]!)) / this.molesMol;
    }
  }
}

const mostSteps = 40;

export class ZonePair {
  readonly vapour: Zone;
  readonly liquid: Zone;
  pressurePa = 0;

  constructor(
    fluid: FluidModel,
    private readonly volumeM3: number,
  ) {
    this.vapour = new Zone(fluid);
    this.liquid = new Zone(fluid);
  }

  /** From a first guess of the two temperatures and of the liquid's molar volume; throws "no-convergence". */
  solve(
    { vapourJ, liquidJ }: { vapourJ: number; liquidJ: number },
    guess: { vapourK: number; liquidK: number; liquidMolarVolume: number },
  ): void {
    const { vapour: g, liquid: l, volumeM3 } = this;
    let Tg = guess.vapourK;
    let Tl = guess.liquidK;
    let Vl = Math.min(guess.liquidMolarVolume * l.molesMol, 0.999999 * volumeM3);
    for (let i = 0; i < mostSteps; i++) {
      g.moveTo(Tg, volumeM3 - Vl);
      l.moveTo(Tl, Vl);
      const [sg, sl] = [g.state, l.state];
      const Cg = g.molesMol * sg.heatCapacityVJPerMolK;
      const Cl = l.molesMol * sl.heatCapacityVJPerMolK;
      const [eg, el] = [vapourJ - g.energyJ, liquidJ - l.energyJ];
      const gap = sl.pressurePa - sg.pressurePa;
      // Unknown step x in V_l: T steps follow from the energies, then the pressures must meet.
      const ug = sg.temperatureK * sg.pressureByTemperature - sg.pressurePa;
      const ul = sl.temperatureK * sl.pressureByTemperature - sl.pressurePa;
      const slope =
        sl.pressureByVolume / l.molesMol -
        (sl.pressureByTemperature * ul) / Cl +
        sg.pressureByVolume / g.molesMol -
        (sg.pressureByTemperature * ug) / Cg;
      const offset = gap + (sl.pressureByTemperature * el) / Cl - (sg.pressureByTemperature * eg) / Cg;
      const full = -offset / slope;
      if (!Number.isFinite(full)) break;
      const stepTg = (eg + ug * full) / Cg;
      const stepTl = (el - ul * full) / Cl;
      let length = 1;
      if (Math.abs(stepTg) > 0.2 * Tg) length = Math.min(length, (0.2 * Tg) / Math.abs(stepTg));
      if (Math.abs(stepTl) > 0.1 * Tl) length = Math.min(length, (0.1 * Tl) / Math.abs(stepTl));
      if (full > 0) length = Math.min(length, (0.5 * (volumeM3 - Vl)) / full);
      if (full < 0) length = Math.min(length, (0.1 * Vl) / -full);
      Tg += length * stepTg;
      Tl += length * stepTl;
      Vl += length * full;
      if (Math.abs(stepTg) < 1e-12 * Tg && Math.abs(stepTl) < 1e-12 * Tl && Math.abs(full) < 1e-12 * Vl) {
        this.pressurePa = g.state.pressurePa;
        if (this.pressurePa > 0 && sg.pressureByVolume < 0 && sl.pressureByVolume < 0) return;
        break;
      }
    }
    throw new EngineError("no-convergence", "No pressure was found that vapour and liquid of these energies share.");
  }

  /** dV_l/dt [m³/s] for the powers (without p dV) that the zones receive; `weigh` must have been called on both. */
  liquidVolumeRate(vapourW: number, liquidW: number): number {
    const { vapour: g, liquid: l } = this;
    const [sg, sl] = [g.state, l.state];
    const Cg = g.molesMol * sg.heatCapacityVJPerMolK;
    const Cl = l.molesMol * sl.heatCapacityVJPerMolK;
    const ag = vapourW - g.energyRate;
    const al = liquidW - l.energyRate;
    const pull = (s: PhaseState, C: number, n: number): number =>
      (s.temperatureK * s.pressureByTemperature * s.pressureByTemperature) / C - s.pressureByVolume / n;
    const rise = (sg.pressureByTemperature * ag) / Cg + g.pressureRate - (sl.pressureByTemperature * al) / Cl - l.pressureRate;
    return -rise / (pull(sg, Cg, g.molesMol) + pull(sl, Cl, l.molesMol));
  }
}
