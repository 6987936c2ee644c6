import { gasConstant, referenceTemperatureK } from "../gas-constant";
import type { HeatCapacity } from "../substances/heat-capacity";
import type { IdealGasModel } from "./fluid-model";

/**
 * Pure-component ideal-gas functions of all components of a fluid at one temperature, zero at 298.15 K.
 *
 *   Planck-Einstein   h0/R = c0 T + Σ n θ/(eˣ − 1),  s0/R = c0 ln T + Σ n [ x/(eˣ − 1) − ln(1 − e⁻ˣ) ],  x = θ/T
 *   polynomial        h0/R = Σ a_k T^(k+1)/(k+1),    s0/R = a0 ln T + Σ_{k≥1} a_k T^k/k
 *
 * The terms of all components lie in flat arrays: this runs in every evaluation of every flash.
 */
export function createIdealGasModel(heatCapacities: readonly HeatCapacity[], R = gasConstant): IdealGasModel {
  const count = heatCapacities.length;
  const termStart = new Int32Array(count + 1);
  const weights: number[] = [];
  const thetas: number[] = [];
  const constants = new Float64Array(count); // c0 or a0: the ln T coefficient
  const polynomials: (Float64Array | undefined)[] = [];
  const powers: (readonly { k: number; q: number }[] | undefined)[] = [];
  heatCapacities.forEach((heatCapacity, i) => {
    if (heatCapacity.form === "planck-einstein") {
      constants[i] = heatCapacity.c0;
      powers[i] = heatCapacity.powers?.length ? heatCapacity.powers : undefined;
      for (const { n, thetaK } of heatCapacity.terms) {
        weights.push(n);
        thetas.push(thetaK);
      }
      polynomials.push(undefined);
    } else {
      constants[i] = heatCapacity.coefficients[0]!;
      polynomials.push(Float64Array.from(heatCapacity.coefficients));
    }
    termStart[i + 1] = weights.length;
  });
  const n = Float64Array.from(weights);
  const theta = Float64Array.from(thetas);
  const enthalpyZero = new Float64Array(count);
  const entropyZero = new Float64Array(count);

  function evaluate(T: number, heatCapacity: Float64Array, enthalpy: Float64Array, entropy: Float64Array): void {
    const lnT = Math.log(T);
    for (let i = 0; i < count; i++) {
      let cp = constants[i]!;
      let h = cp * T;
      let s = cp * lnT;
      const polynomial = polynomials[i];
      if (polynomial) {
        let power = 1;
        for (let k = 1; k < polynomial.length; k++) {
          const a = polynomial[k]!;
          power *= T;
          cp += a * power;
          h += (a * power * T) / (k + 1);
          s += (a * power) / k;
        }
      } else {
        for (let k = termStart[i]!; k < termStart[i + 1]!; k++) {
          const x = theta[k]! / T;
          const decay = Math.exp(-x); // e⁻ˣ rather than eˣ: a cold state must not overflow
          const occupied = decay / (1 - decay);
          cp += n[k]! * x * x * occupied * (1 + occupied);
          h += n[k]! * theta[k]! * occupied;
          s += n[k]! * (x * occupied - Math.log1p(-decay));
        }
        for (const { k, q } of powers[i] ?? []) {
          const term = k * T ** q;
          cp += term;
          h += (term * T) / (q + 1);
          s += term / q;
        }
      }
      heatCapacity[i] = R * cp;
      enthalpy[i] = R * h - enthalpyZero[i]!;
      entropy[i] = R * s - entropyZero[i]!;
    }
  }

  const scratch = new Float64Array(count);
  const h = new Float64Array(count);
  const s = new Float64Array(count);
  evaluate(referenceTemperatureK, scratch, h, s);
  enthalpyZero.set(h);
  entropyZero.set(s);
  return { evaluate };
}
