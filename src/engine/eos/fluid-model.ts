import type { EquationId } from "../cases/fluid-spec";
import type { Substance } from "../substances/substance";

/**
 * What every equation of state offers to the rest of the engine. Molar, SI: Pa, K, m³/mol, J/mol, J/(mol K).
 *
 * `z` is always an array of mole fractions in the order of `componentIds`, summing to 1. Zero fractions are allowed.
 * Zero of energy: every pure ideal gas has H = 0 at 298.15 K, and S = 0 at 298.15 K and 100000 Pa; mixtures add ideal
 * mixing entropy. So U = -R · 298.15 K for an ideal gas at 298.15 K.
 *
 * Every method that returns a `PhaseState` fills `out` when it is given and then allocates nothing: keep one `PhaseState`
 * per role in a hot loop (`createPhaseState()`). The returned object is `out` itself: copy what has to survive.
 *
 * One-phase methods answer for ONE homogeneous phase whether or not it is stable; they never look for a second one.
 * `stability` says whether a phase splits, and `src/engine/flash/` finds the equilibrium:
 *   flash-pt.ts (flashPT)   flash-ph.ts (flashPH, flashPS)   flash-uv.ts (flashUV, flashSV)   flash-quality.ts (flashTQ, flashPQ)
 *   verify-phases.ts (test of an accepted step)   saturation-pure.ts   all answer with an `Equilibrium` (flash/equilibrium.ts)
 *
 * A model holds scratch arrays: it is cheap to share inside one thread and must not be shared across threads.
 * Every answer is a pure function of the arguments; guesses are seeds only and change the answer by round-off at most.
 */
export interface FluidModel {
  readonly equation: EquationId;
  readonly componentIds: readonly string[];
  readonly molarMassesKgPerMol: Float64Array;
  /** The composition that the case document states, normalised. */
  readonly feed: Float64Array;
  /** R of this equation (GERG-2008 and some reference equations keep their own). */
  readonly gasConstantJPerMolK: number;
  /** Where the equation and its heat capacities may be evaluated; a temperature outside throws "outside-validity". */
  readonly temperatureRangeK: readonly [number, number];
  /** Critical constants of each component as this equation uses them. */
  readonly criticalTemperaturesK: Float64Array;
  readonly criticalPressuresPa: Float64Array;
  readonly acentricFactors: Float64Array;
  /** The components with their constants, triple points and the range of their heat-capacity data. */
  readonly substances: readonly Substance[];
  /** What the reader must know about the constants in use (estimated pseudo-component, missing interaction, …). */
  readonly notes: readonly string[];

  mixtureMolarMass(z: ArrayLike<number>): number;

  /** Homogeneous phase at given temperature and molar volume. The fastest evaluation. */
  phaseAtVolume(temperatureK: number, molarVolumeM3PerMol: number, z: ArrayLike<number>, out?: PhaseState): PhaseState;

  /** Homogeneous phase at given temperature and pressure. "stable": of several roots the one of lowest Gibbs energy. */
  phaseAtPressure(temperatureK: number, pressurePa: number, z: ArrayLike<number>, root?: Root, out?: PhaseState): PhaseState;

  /** The temperature at which ONE phase of volume v holds the internal energy u (unique, since cv > 0). */
  phaseFromEnergy(
    internalEnergyJPerMol: number,
    molarVolumeM3PerMol: number,
    z: ArrayLike<number>,
    guessTemperatureK: number,
    out?: PhaseState,
  ): PhaseState;

  /** Homogeneous phase at given molar entropy and molar volume (isentrope walked in volume). */
  phaseFromEntropyVolume(
    entropyJPerMolK: number,
    molarVolumeM3PerMol: number,
    z: ArrayLike<number>,
    guessTemperatureK: number,
    out?: PhaseState,
  ): PhaseState;

  /** Homogeneous phase at given molar entropy and pressure. */
  phaseFromEntropyPressure(
    entropyJPerMolK: number,
    pressurePa: number,
    z: ArrayLike<number>,
    guessTemperatureK: number,
    root?: Root,
    out?: PhaseState,
  ): PhaseState;

  /** Homogeneous phase at given molar enthalpy and pressure. */
  phaseFromEnthalpy(
    enthalpyJPerMol: number,
    pressurePa: number,
    z: ArrayLike<number>,
    guessTemperatureK: number,
    root?: Root,
    out?: PhaseState,
  ): PhaseState;

  /** ln φ_i of one phase at (T, p); returns `out` (length n), filled. A component at zero fraction has its limit value. */
  lnFugacityCoefficients(
    temperatureK: number,
    pressurePa: number,
    z: ArrayLike<number>,
    root: Root,
    out: Float64Array,
  ): Float64Array;

  /** Real minus ideal gas at the same temperature and pressure, of the phase with molar volume v. */
  departures(temperatureK: number, molarVolumeM3PerMol: number, z: ArrayLike<number>): Departures;

  /** Ideal-gas mixture at (T, p) on the zero of energy above. */
  idealGas(temperatureK: number, pressurePa: number, z: ArrayLike<number>): IdealGasState;

  /** Tangent-plane test of the homogeneous phase of lowest Gibbs energy at (T, p). Throws when the test itself fails. */
  stability(temperatureK: number, pressurePa: number, z: ArrayLike<number>): Stability;

  /** The residual Helmholtz energy and its derivatives, for the flashes. Not for callers outside `engine/flash`. */
  readonly residual: ResidualModel;
  readonly idealHelmholtz: IdealGasModel;
}

export type Root = "stable" | "vapour" | "liquid";

export interface PhaseState {
  temperatureK: number;
  pressurePa: number;
  molarVolumeM3PerMol: number;
  compressibility: number;
  densityKgPerM3: number;
  internalEnergyJPerMol: number;
  enthalpyJPerMol: number;
  entropyJPerMolK: number;
  heatCapacityVJPerMolK: number;
  heatCapacityPJPerMolK: number;
  soundSpeedMPerS: number;
  /** (∂p/∂T)_v [Pa/K] */
  pressureByTemperature: number;
  /** (∂p/∂v)_T [Pa mol/m³]; negative where the phase is mechanically stable */
  pressureByVolume: number;
}

export function createPhaseState(): PhaseState {
  return {
    temperatureK: 0,
    pressurePa: 0,
    molarVolumeM3PerMol: 0,
    compressibility: 0,
    densityKgPerM3: 0,
    internalEnergyJPerMol: 0,
    enthalpyJPerMol: 0,
    entropyJPerMolK: 0,
    heatCapacityVJPerMolK: 0,
    heatCapacityPJPerMolK: 0,
    soundSpeedMPerS: 0,
    pressureByTemperature: 0,
    pressureByVolume: 0,
  };
}

/** Joule-Thomson coefficient (∂T/∂p)_h [K/Pa] of a phase. */
export function jouleThomsonKPerPa(phase: PhaseState): number {
  const { temperatureK: T, molarVolumeM3PerMol: v, pressureByTemperature: pT, pressureByVolume: pv } = phase;
  return ((-T * pT) / pv - v) / phase.heatCapacityPJPerMolK;
}

/** cp/cv of a phase. */
export function heatCapacityRatio(phase: PhaseState): number {
  return phase.heatCapacityPJPerMolK / phase.heatCapacityVJPerMolK;
}

export interface Departures {
  enthalpyJPerMol: number;
  internalEnergyJPerMol: number;
  entropyJPerMolK: number;
  gibbsEnergyJPerMol: number;
  helmholtzEnergyJPerMol: number;
}

export interface IdealGasState {
  heatCapacityPJPerMolK: number;
  enthalpyJPerMol: number;
  internalEnergyJPerMol: number;
  entropyJPerMolK: number;
}

export interface Stability {
  stable: boolean;
  /** Lowest modified tangent-plane distance found [-]; negative: the phase splits. */
  tangentPlaneDistance: number;
  /** The trial phase of that distance, normalised; a first guess of the new phase. */
  trialComposition: Float64Array;
  /** Is the trial phase less dense than the feed? */
  trialIsVapour: boolean;
}

/**
 * F(T, V, n) = A_res/(R T) and derivatives at total volume V and mole numbers n. Order 0 fills F, F_V, F_VV and the T
 * derivatives; order 1 adds F_n; order 2 adds F_nT, F_nV, F_nn (row-major).
 */
export interface ResidualDerivatives {
  F: number;
  FT: number;
  FV: number;
  FTT: number;
  FTV: number;
  FVV: number;
  readonly Fn: Float64Array;
  readonly FnT: Float64Array;
  readonly FnV: Float64Array;
  readonly Fnn: Float64Array;
}

export interface ResidualModel {
  /** Does the equation have mechanically stable branches between its outer density roots that mean nothing? */
  readonly hasFalseBranches: boolean;
  /**
   * Fixes the mole numbers of the evaluations that follow. Evaluations at other temperatures and volumes of the same
   * composition then cost no mixing sums. The flashes call it before each phase; nothing else may rely on it.
   */
  setComposition(n: ArrayLike<number>): void;
  evaluate(T: number, V: number, order: 0 | 1 | 2, out: ResidualDerivatives): void;
  /**
   * Molar volume of the wanted root at (T, p) for the composition that is set, which must sum to 1. Where only one
   * root exists it is returned whatever was asked for. Throws "no-convergence".
   */
  volumeAtPressure(T: number, p: number, root: Root): number;
  /** Volumes at or below this are impossible (the co-volume of a cubic; the density bound of a reference equation). */
  minimumVolume(): number;
  /**
   * Are these two volumes, found to be in equilibrium at T, beyond doubt those of saturated vapour and liquid of a pure fluid, and not of false
   * branches? `false` only means that it has to be looked into.
   */
  isSaturation?(T: number, vapourVolume: number, liquidVolume: number): boolean;
  /** Saturated volumes of one mole of a pure fluid, where the equation has a faster way to them than the general one. */
  saturation?(T: number): SaturationVolumes | undefined;
}

export interface SaturationVolumes {
  pressurePa: number;
  vapourVolume: number;
  liquidVolume: number;
}

/** Pure-component ideal-gas functions of temperature: cp0_i, h0_i (zero at 298.15 K), s0_i at 100000 Pa (zero at 298.15 K). */
export interface IdealGasModel {
  /** Fills the three arrays for one temperature. */
  evaluate(T: number, heatCapacity: Float64Array, enthalpy: Float64Array, entropy: Float64Array): void;
}
