/** Corresponding-states parameters of a fluid or of a mixture taken as one. */
export interface ChungFluid {
  criticalTemperatureK: number;
  criticalVolumeM3PerMol: number;
  molarMassKgPerMol: number;
  acentricFactor: number;
  dipoleDebye?: number;
  /** Association parameter κ; 0 for fluids without hydrogen bonds. */
  association?: number;
}

export interface ChungState {
  temperatureK: number;
  molarVolumeM3PerMol: number;
  /** Ideal-gas cv [J/(mol K)], for the conductivity. */
  idealHeatCapacityVJPerMolK: number;
}

export interface ChungResult {
  viscosityLowPressurePaS: number;
  viscosityPaS: number;
  conductivityWPerMK: number;
}

const viscosityTable = [
  [6.324, 50.412, -51.68, 1189],
  [1.21e-3, -1.154e-3, -6.257e-3, 0.03728],
  [5.283, 254.209, -168.48, 3898],
  [6.623, 38.096, -8.464, 31.42],
  [19.745, 7.63, -14.354, 31.53],
  [-1.9, -12.537, 4.985, -18.15],
  [24.275, 3.45, -11.291, 69.35],
  [0.7972, 1.117, 0.01235, -4.117],
  [-0.2382, 0.0677, -0.8163, 4.025],
  [0.06863, 0.3479, 0.5926, -0.727],
] as const;

const conductivityTable = [
  [2.4166, 0.74824, -0.91858, 121.72],
  [-0.50924, -1.5094, -49.991, 69.983],
  [6.6107, 5.6207, 64.76, 27.039],
  [14.543, -8.9139, -5.6379, 74.344],
  [0.79274, 0.82019, -0.69369, 6.3173],
  [-5.8634, 12.801, 9.5893, 65.529],
  [91.089, 128.11, -54.217, 523.81],
] as const;

const R = 8.314462618;

/**
 * Viscosity and thermal conductivity at any density.
 *
 *   µ  = { (T*^½/Ω) Fc (1/G2 + E6 y) + E7 y² G2 exp(E8 + E9/T* + E10/T*²) } · 36.344 (M Tc)^½/Vc^⅔     [µP; g/mol, K, cm³/mol]
 *   λ  = 31.2 µ0 Ψ/M' (1/H2 + B6 y) + q B7 y² Tr^½ H2,   y = ρ Vc/6
 *
 * Source   Chung, Ajlan, Lee and Starling, Ind. Eng. Chem. Res. 27 (1988) 671-679. One recent library prints 4.958 for c of E6;
 *          seven other readings give 4.985.
 * Holds    non-polar fluids over the whole density range; viscosity within 5 to 10 %, conductivity within 5 to 10 %, polar
 *          and dense states worse
 * Checks   M4-07 in transport.checks.test.ts
 */
export function chungTransport(fluid: ChungFluid, state: ChungState, knownLowPressurePaS?: number): ChungResult {
  const { criticalTemperatureK: Tc, acentricFactor: omega, association: kappa = 0, dipoleDebye = 0 } = fluid;
  const M = fluid.molarMassKgPerMol * 1000;
  const Vc = fluid.criticalVolumeM3PerMol * 1e6;
  const T = state.temperatureK;
  const Tr = T / Tc;
  const Ts = 1.2593 * Tr;
  const mu4 = ((131.3 * dipoleDebye) / Math.sqrt(Vc * Tc)) ** 4;
  const collision = 1.16145 * Ts ** -0.14874 + 0.52487 * Math.exp(-0.7732 * Ts) + 2.16178 * Math.exp(-2.43787 * Ts);
  const Fc = 1 - 0.2756 * omega + 0.059035 * mu4 + kappa;
  const volume23 = Vc ** (2 / 3);
  const lowPressure = knownLowPressurePaS ?? ((40.785 * Fc * Math.sqrt(M * T)) / (volume23 * collision)) * 1e-7;

  const y = fluid.criticalVolumeM3PerMol / state.molarVolumeM3PerMol / 6;
  const G1 = (1 - 0.5 * y) / (1 - y) ** 3;
  const coefficient = ([a, b, c, d]: readonly [number, number, number, number]) => a + b * omega + c * mu4 + d * kappa;
  const E = viscosityTable.map(coefficient);
  const G2 = contact([E[0]!, E[1]!, E[2]!, E[3]!, E[4]!], y, G1);
  const dense =
    (Math.sqrt(Ts) / collision) * Fc * (1 / G2 + E[5]! * y) +
    E[6]! * y * y * G2 * Math.exp(E[7]! + E[8]! / Ts + E[9]! / (Ts * Ts));
  const viscosity = ((dense * 36.344 * Math.sqrt(M * Tc)) / volume23) * 1e-7;

  const B = conductivityTable.map(coefficient);
  const H2 = contact([B[0]!, B[1]!, B[2]!, B[3]!, B[4]!], y, G1);
  const alpha = state.idealHeatCapacityVJPerMolK / R - 1.5;
  const beta = 0.7862 - 0.7109 * omega + 1.3168 * omega * omega;
  const z = 2 + 10.5 * Tr * Tr;
  const Psi = 1 + (alpha * (0.215 + 0.28288 * alpha - 1.061 * beta + 0.26665 * z)) / (0.6366 + beta * z + 1.061 * alpha * beta);
  const q = (3.586e-3 * Math.sqrt(Tc / fluid.molarMassKgPerMol)) / volume23;
  const conductivity =
    ((31.2 * lowPressure * Psi) / fluid.molarMassKgPerMol) * (1 / H2 + B[5]! * y) + q * B[6]! * y * y * Math.sqrt(Tr) * H2;
  return { viscosityLowPressurePaS: lowPressure, viscosityPaS: viscosity, conductivityWPerMK: conductivity };
}

/** G2 of the viscosity and H2 of the conductivity have one form. */
function contact([c1, c2, c3, c4, c5]: readonly [number, number, number, number, number], y: number, G1: number): number {
  const core = y < 1e-8 ? c4 : -Math.expm1(-c4 * y) / y;
  return (c1 * core + c2 * G1 * Math.exp(c5 * y) + c3 * G1) / (c1 * c4 + c2 + c3);
}
