import { gasConstant, referenceTemperatureK } from "../gas-constant";
import type { HeatCapacity } from "../substances/heat-capacity";
import type { IdealGasModel } from "./fluid-model";

/** Width of one piece of the table [K]. */
const pieceK = 1;
const hottestPiece = 4000;
const coefficients = 12;

/**
 * Pure-component ideal-gas functions of all components of a fluid at one temperature, zero at 298.15 K.
 *
 *   Planck-Einstein   h0/R = c0 T + Σ n θ/(eˣ − 1),  s0/R = c0 ln T + Σ n [ x/(eˣ − 1) − ln(1 − e⁻ˣ) ],  x = θ/T
 *   polynomial        h0/R = Σ a_k T^(k+1)/(k+1),    s0/R = a0 ln T + Σ_{k≥1} a_k T^k/k
 *
 * The exponentials of ten components would cost more than the equation of state. Each kelvin that is visited is therefore
 * replaced once by the quintics that meet h, cp and dcp/dT (and s with its slopes) at both ends; cp is the derivative of the
 * quintic of h, so that u and cv stay consistent to round-off. ideal-gas.test.ts holds the difference below 1e-11.
 */
export function createIdealGasModel(heatCapacities: readonly HeatCapacity[], R = gasConstant): IdealGasModel {
  const count = heatCapacities.length;
  const exact = heatCapacities.map((heatCapacity) => exactFunctions(heatCapacity, R));
  const pieces: (Float64Array | undefined)[] = [];

  function evaluate(T: number, heatCapacity: Float64Array, enthalpy: Float64Array, entropy: Float64Array): void {
    const index = Math.floor(T / pieceK);
    if (!(index >= 1 && index < hottestPiece)) {
      exact.forEach((functions, i) => {
        const value = functions(T);
        heatCapacity[i] = value.cp;
        enthalpy[i] = value.h;
        entropy[i] = value.s;
      });
      return;
    }
    const piece = pieces[index] ?? (pieces[index] = buildPiece(exact, index));
    const t = T / pieceK - index;
    for (let i = 0, at = 0; i < count; i++, at += coefficients) {
      const [h2, h3, h4, h5] = [piece[at + 2]!, piece[at + 3]!, piece[at + 4]!, piece[at + 5]!];
      enthalpy[i] = piece[at]! + t * (piece[at + 1]! + t * (h2 + t * (h3 + t * (h4 + t * h5))));
      heatCapacity[i] = (piece[at + 1]! + t * (2 * h2 + t * (3 * h3 + t * (4 * h4 + t * 5 * h5)))) / pieceK;
      entropy[i] =
        piece[at + 6]! +
        t * (piece[at + 7]! + t * (piece[at + 8]! + t * (piece[at + 9]! + t * (piece[at + 10]! + t * piece[at + 11]!))));
    }
  }
  return { evaluate };
}

interface ExactValue {
  cp: number;
  h: number;
  s: number;
  /** dcp/dT */
  slope: number;
}

/** cp0, h0, s0 [J/mol, J/(mol K)] and dcp0/dT of one component by its published form. */
export function exactFunctions(heatCapacity: HeatCapacity, R: number): (T: number) => ExactValue {
  const raw = heatCapacity.form === "polynomial" ? polynomial(heatCapacity.coefficients) : planckEinstein(heatCapacity);
  const zero = raw(referenceTemperatureK);
  return (T) => {
    const { cp, h, s, slope } = raw(T);
    return { cp: R * cp, h: R * (h - zero.h), s: R * (s - zero.s), slope: R * slope };
  };
}

function polynomial(coefficients: readonly number[]): (T: number) => ExactValue {
  return (T) => {
    let cp = coefficients[0]!;
    let h = cp * T;
    let s = cp * Math.log(T);
    let slope = 0;
    let power = 1; // T^(k-1)
    for (let k = 1; k < coefficients.length; k++) {
      const a = coefficients[k]!;
      slope += a * k * power;
      power *= T;
      cp += a * power;
      h += (a * power * T) / (k + 1);
      s += (a * power) / k;
    }
    return { cp, h, s, slope };
  };
}

function planckEinstein({ c0, terms, powers = [] }: HeatCapacity & { form: "planck-einstein" }): (T: number) => ExactValue {
  return (T) => {
    let cp = c0;
    let h = c0 * T;
    let s = c0 * Math.log(T);
    let slope = 0;
    for (const { n, thetaK } of terms) {
      const x = thetaK / T;
      const decay = Math.exp(-x); // e⁻ˣ rather than eˣ: a cold state must not overflow
      const occupied = decay / -Math.expm1(-x);
      const share = n * x * x * occupied * (1 + occupied);
      cp += share;
      h += n * thetaK * occupied;
      s += n * (x * occupied - Math.log1p(-decay));
      slope += (share * (x * (1 + 2 * occupied) - 2)) / T;
    }
    for (const { k, q } of powers) {
      const term = k * T ** q;
      cp += term;
      h += (term * T) / (q + 1);
      s += term / q;
      slope += (q * term) / T;
    }
    return { cp, h, s, slope };
  };
}

/** Quintic Hermite coefficients of h and s on one piece, for every component. */
function buildPiece(exact: readonly ((T: number) => ExactValue)[], index: number): Float64Array {
  const piece = new Float64Array(exact.length * coefficients);
  const [T0, T1] = [index * pieceK, (index + 1) * pieceK];
  exact.forEach((functions, i) => {
    const [a, b] = [functions(T0), functions(T1)];
    hermite(piece, i * coefficients, [a.h, a.cp, a.slope], [b.h, b.cp, b.slope]);
    const curvature = ({ cp, slope }: ExactValue, T: number) => slope / T - cp / (T * T);
    hermite(piece, i * coefficients + 6, [a.s, a.cp / T0, curvature(a, T0)], [b.s, b.cp / T1, curvature(b, T1)]);
  });
  return piece;
}

type Jet = readonly [value: number, slope: number, curvature: number];

function hermite(out: Float64Array, at: number, [f0, d0, c0]: Jet, [f1, d1, c1]: Jet): void {
  const [s0, s1] = [d0 * pieceK, d1 * pieceK];
  const [k0, k1] = [c0 * pieceK * pieceK, c1 * pieceK * pieceK];
  const rise = f1 - f0;
  out[at] = f0;
  out[at + 1] = s0;
  out[at + 2] = 0.5 * k0;
  out[at + 3] = 10 * rise - 6 * s0 - 4 * s1 - 1.5 * k0 + 0.5 * k1;
  out[at + 4] = -15 * rise + 8 * s0 + 7 * s1 + 1.5 * k0 - k1;
  out[at + 5] = 6 * rise - 3 * (s0 + s1) - 0.5 * (k0 - k1);
}
