import type { EquationId } from "../cases/fluid-spec";
import { EngineError } from "../errors";
import type { Substance } from "../substances/substance";
import { testStability } from "../flash/stability";
import { referencePressurePa } from "../gas-constant";
import { createPhaseState, type Departures, type FluidModel, type IdealGasModel, type IdealGasState } from "./fluid-model";
import type { PhaseState, ResidualModel, Root, Stability } from "./fluid-model";
import { createResidualDerivatives } from "./residual-derivatives";
import { solveTemperature } from "./solve-temperature";

export interface FluidModelParts {
  equation: EquationId;
  substances: readonly Substance[];
  molarMassesKgPerMol: Float64Array;
  feed: Float64Array;
  gasConstantJPerMolK: number;
  temperatureRangeK: readonly [number, number];
  notes: readonly string[];
  residual: ResidualModel;
  idealHelmholtz: IdealGasModel;
}

/**
 * Everything that follows from the residual Helmholtz energy F = A_res/(R T) of a mixture and its ideal-gas functions.
 *
 *   p = R T/v − R T F_V              u = Σ z_i h0_i − R T − R T² F_T            s = s_ig(T, R T/v) − R (F + T F_T)
 *   cv = Σ z_i cp0_i − R − R (2 T F_T + T² F_TT)                                cp = cv − T p_T²/p_v
 *   w² = −v² (p_v − T p_T²/cv)/M     ln φ_i = F_i − ln Z
 *
 * Source   Michelsen and Mollerup, Thermodynamic Models, 2nd ed. (2007), chapter 2.
 */
export function deriveFluidModel(parts: FluidModelParts): FluidModel {
  const { residual, idealHelmholtz, gasConstantJPerMolK: R, molarMassesKgPerMol, temperatureRangeK } = parts;
  const count = parts.substances.length;
  const F = createResidualDerivatives(count);
  const cp0 = new Float64Array(count);
  const h0 = new Float64Array(count);
  const s0 = new Float64Array(count);
  let idealAt = Number.NaN;

  /** The composition in use and what it alone decides. */
  let z: ArrayLike<number> = parts.feed;
  let molarMass = 0;
  let mixingEntropy = 0;

  function setComposition(composition: ArrayLike<number>): void {
    z = composition;
    molarMass = 0;
    mixingEntropy = 0;
    for (let i = 0; i < count; i++) {
      const fraction = z[i]!;
      molarMass += fraction * molarMassesKgPerMol[i]!;
      if (fraction > 0) mixingEntropy -= R * fraction * Math.log(fraction);
    }
    residual.setComposition(z);
  }

  function setTemperature(T: number): void {
    if (T === idealAt) return;
    if (!(T >= temperatureRangeK[0] && T <= temperatureRangeK[1])) {
      throw new EngineError(
        "outside-validity",
        `temperature ${T} K is outside ${temperatureRangeK[0]} to ${temperatureRangeK[1]} K, where this equation can be evaluated`,
        { temperatureK: T, minimumK: temperatureRangeK[0], maximumK: temperatureRangeK[1] },
      );
    }
    idealHelmholtz.evaluate(T, cp0, h0, s0);
    idealAt = T;
  }

  /** The composition must be set. */
  function fill(T: number, v: number, out: PhaseState): PhaseState {
    setTemperature(T);
    if (!(v > residual.minimumVolume())) {
      throw new EngineError("outside-validity", "the molar volume is below the smallest that the equation allows", {
        molarVolumeM3PerMol: v,
        minimumM3PerMol: residual.minimumVolume(),
      });
    }
    residual.evaluate(T, v, 0, F);
    let cp = 0;
    let h = 0;
    let s = 0;
    for (let i = 0; i < count; i++) {
      const fraction = z[i]!;
      cp += fraction * cp0[i]!;
      h += fraction * h0[i]!;
      s += fraction * s0[i]!;
    }
    const RT = R * T;
    const p = RT / v - RT * F.FV;
    const pT = R / v - R * F.FV - RT * F.FTV;
    const pv = -RT / (v * v) - RT * F.FVV;
    const cv = cp - R - R * (2 * T * F.FT + T * T * F.FTT);
    const u = h - RT - RT * T * F.FT;
    out.temperatureK = T;
    out.pressurePa = p;
    out.molarVolumeM3PerMol = v;
    out.compressibility = (p * v) / RT;
    out.densityKgPerM3 = molarMass / v;
    out.internalEnergyJPerMol = u;
    out.enthalpyJPerMol = u + p * v;
    out.entropyJPerMolK = s + mixingEntropy - R * Math.log(RT / (v * referencePressurePa)) - R * (F.F + T * F.FT);
    out.heatCapacityVJPerMolK = cv;
    out.heatCapacityPJPerMolK = pv === 0 ? Number.MAX_VALUE : cv - (T * pT * pT) / pv;
    // Inside the mechanical spinodal no sound travels: 0 rather than the root of a negative number.
    out.soundSpeedMPerS = Math.sqrt(Math.max(0, (v * v * ((T * pT * pT) / cv - pv)) / molarMass));
    out.pressureByTemperature = pT;
    out.pressureByVolume = pv;
    return out;
  }

  function requirePressure(p: number): void {
    if (!(p > 0 && p < Infinity)) {
      throw new EngineError("outside-validity", "pressure must be above 0 Pa", { pressurePa: p });
    }
  }

  const model: FluidModel = {
    equation: parts.equation,
    componentIds: parts.substances.map((substance) => substance.id),
    substances: parts.substances,
    molarMassesKgPerMol,
    feed: parts.feed,
    gasConstantJPerMolK: R,
    temperatureRangeK,
    criticalTemperaturesK: Float64Array.from(parts.substances, (substance) => substance.criticalTemperatureK),
    criticalPressuresPa: Float64Array.from(parts.substances, (substance) => substance.criticalPressurePa),
    acentricFactors: Float64Array.from(parts.substances, (substance) => substance.acentricFactor),
    notes: parts.notes,
    residual,
    idealHelmholtz,

    mixtureMolarMass(composition: ArrayLike<number>): number {
      let mass = 0;
      for (let i = 0; i < count; i++) mass += composition[i]! * molarMassesKgPerMol[i]!;
      return mass;
    },

    phaseAtVolume(T: number, v: number, composition: ArrayLike<number>, out = createPhaseState()): PhaseState {
      setComposition(composition);
      return fill(T, v, out);
    },

    phaseAtPressure(
      T: number,
      p: number,
      composition: ArrayLike<number>,
      root: Root = "stable",
      out = createPhaseState(),
    ): PhaseState {
      requirePressure(p);
      setComposition(composition);
      setTemperature(T);
      fill(T, residual.volumeAtPressure(T, p, root), out);
      // The root is exact to round-off; the pressure reported is the one asked for, not its echo through the equation.
      out.enthalpyJPerMol += (p - out.pressurePa) * out.molarVolumeM3PerMol;
      out.pressurePa = p;
      return out;
    },

    phaseFromEnergy(u: number, v: number, composition: ArrayLike<number>, guess: number, out = createPhaseState()): PhaseState {
      setComposition(composition);
      solveTemperature(
        { target: u, scale: R, guess, range: temperatureRangeK, quantity: "internal energy" },
        (T) => fill(T, v, out).internalEnergyJPerMol,
        () => out.heatCapacityVJPerMolK,
      );
      return out;
    },

    phaseFromEntropyVolume(
      s: number,
      v: number,
      composition: ArrayLike<number>,
      guess: number,
      out = createPhaseState(),
    ): PhaseState {
      setComposition(composition);
      solveTemperature(
        { target: s, scale: 0, guess, range: temperatureRangeK, quantity: "entropy" },
        (T) => fill(T, v, out).entropyJPerMolK,
        () => out.heatCapacityVJPerMolK / out.temperatureK,
      );
      return out;
    },

    phaseFromEntropyPressure(
      s: number,
      p: number,
      composition: ArrayLike<number>,
      guess: number,
      root: Root = "stable",
      out = createPhaseState(),
    ): PhaseState {
      requirePressure(p);
      setComposition(composition);
      solveTemperature(
        { target: s, scale: 0, guess, range: temperatureRangeK, quantity: "entropy" },
        (T) => fill(T, residual.volumeAtPressure(T, p, root), out).entropyJPerMolK,
        () => out.heatCapacityPJPerMolK / out.temperatureK,
      );
      return out;
    },

    phaseFromEnthalpy(
      h: number,
      p: number,
      composition: ArrayLike<number>,
      guess: number,
      root: Root = "stable",
      out = createPhaseState(),
    ): PhaseState {
      requirePressure(p);
      setComposition(composition);
      solveTemperature(
        { target: h, scale: R, guess, range: temperatureRangeK, quantity: "enthalpy" },
        (T) => fill(T, residual.volumeAtPressure(T, p, root), out).enthalpyJPerMol,
        () => out.heatCapacityPJPerMolK,
      );
      return out;
    },

    lnFugacityCoefficients(T: number, p: number, composition: ArrayLike<number>, root: Root, out: Float64Array): Float64Array {
      residual.setComposition(composition);
      const v = residual.volumeAtPressure(T, p, root);
      residual.evaluate(T, v, 1, F);
      const lnZ = Math.log((p * v) / (R * T));
      for (let i = 0; i < count; i++) out[i] = F.Fn[i]! - lnZ;
      return out;
    },

    departures(T: number, v: number, composition: ArrayLike<number>): Departures {
      residual.setComposition(composition);
      residual.evaluate(T, v, 0, F);
      const RT = R * T;
      const Z = 1 - v * F.FV;
      if (!(Z > 0)) {
        throw new EngineError("outside-validity", "this state is in tension (negative pressure): no departure exists", {
          temperatureK: T,
          molarVolumeM3PerMol: v,
        });
      }
      const energy = -RT * T * F.FT;
      const entropy = -R * (F.F + T * F.FT) + R * Math.log(Z);
      const enthalpy = energy + RT * (Z - 1);
      return {
        enthalpyJPerMol: enthalpy,
        internalEnergyJPerMol: energy,
        entropyJPerMolK: entropy,
        gibbsEnergyJPerMol: enthalpy - T * entropy,
        helmholtzEnergyJPerMol: energy - T * entropy,
      };
    },

    idealGas(T: number, p: number, composition: ArrayLike<number>): IdealGasState {
      requirePressure(p);
      setComposition(composition);
      setTemperature(T);
      let cp = 0;
      let h = 0;
      let s = 0;
      for (let i = 0; i < count; i++) {
        cp += z[i]! * cp0[i]!;
        h += z[i]! * h0[i]!;
        s += z[i]! * s0[i]!;
      }
      return {
        heatCapacityPJPerMolK: cp,
        enthalpyJPerMol: h,
        internalEnergyJPerMol: h - R * T,
        entropyJPerMolK: s + mixingEntropy - R * Math.log(p / referencePressurePa),
      };
    },

    stability(T: number, p: number, composition: ArrayLike<number>): Stability {
      requirePressure(p);
      setTemperature(T);
      return testStability(model, T, p, composition);
    },
  };
  return model;
}
