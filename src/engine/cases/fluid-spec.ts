/** The `fluid` object of a case document, as plain types. */

export const equationIds = [
  "van-der-waals",
  "redlich-kwong",
  "soave-redlich-kwong",
  "peng-robinson-1976",
  "peng-robinson-1978",
  "gerg-2008",
  "reference",
] as const;
export type EquationId = (typeof equationIds)[number];

/** cp0/R = a0 + a1 T + a2 T² + …, T in K, one to eight coefficients. */
export interface HeatCapacityPolynomial {
  polynomial: readonly number[];
  rangeK: readonly [number, number];
}

export interface CustomComponent {
  molarMassKgPerMol: number;
  criticalTemperatureK: number;
  criticalPressurePa: number;
  acentricFactor: number;
  idealGasHeatCapacityOverR: HeatCapacityPolynomial;
}

/** A heavy end known by its molar mass and its relative density (60/60 °F). */
export interface PseudoComponent {
  molarMassKgPerMol: number;
  relativeDensity: number;
}

/** A heavy fraction (C7+) known by its means, cut into pseudo-components before the equation is built. */
export interface PlusFraction extends PseudoComponent {
  /** How many pieces of equal mass; left out: 3. */
  pieces?: number | undefined;
  /** Where the fraction begins; left out: 0.090 kg/mol. */
  lightestMolarMassKgPerMol?: number | undefined;
}

export interface ComponentSpec {
  id: string;
  moleFraction: number;
  plus?: PlusFraction;
  pseudo?: PseudoComponent;
  custom?: CustomComponent;
}

export interface PairInteraction {
  pair: readonly [string, string];
  kij: number;
}

export const volumeTranslations = ["none", "library", "peneloux"] as const;
export type VolumeTranslation = (typeof volumeTranslations)[number];

export interface FluidSpec {
  components: readonly ComponentSpec[];
  equation: EquationId;
  /**
   * Volume shift of a Soave or Peng-Robinson equation. "library": fitted to the saturated liquid at 0.7 Tc of each component; "peneloux": from the
   * Rackett factor estimated by the acentric factor. Left out: "none".
   */
  volumeTranslation?: VolumeTranslation | undefined;
  /** Left out: "library". Pairs that a list does not name have kij = 0. */
  interaction?: "library" | "none" | readonly PairInteraction[];
}
