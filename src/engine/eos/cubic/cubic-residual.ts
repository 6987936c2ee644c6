import { EngineError } from "../../errors";
import { gasConstant as R } from "../../gas-constant";
import type { ResidualDerivatives, ResidualModel, Root } from "../fluid-model";
import type { CubicEquation } from "./cubic-equations";
import { cubicRoots } from "./cubic-roots";

export interface CubicComponent {
  criticalTemperatureK: number;
  criticalPressurePa: number;
  acentricFactor: number;
}

/**
 * Residual Helmholtz energy of a cubic equation with van der Waals one-fluid mixing, and all its second derivatives.
 *
 *   F = −n ln(1 − B/V) − D/(R T B (δ1 − δ2)) · ln[(V + δ1 B)/(V + δ2 B)]
 *   B = Σ n_i b_i,   D = ΣΣ n_i n_j (1 − k_ij) √(a_i a_j)
 *
 * Source   Michelsen and Mollerup, Thermodynamic Models: Fundamentals and Computational Aspects, 2nd ed. (2007), chapter 3.
 *
 * √a_i = p_i g(T) + q_i h(T) with scalars g and h that all components share (Soave: 1 and −√T), so D and its temperature
 * derivatives need three mixing sums a composition, not one a temperature. √a_i stays positive below `maximumTemperatureK`.
 */
export class CubicResidual implements ResidualModel {
  readonly hasFalseBranches = false;
  readonly maximumTemperatureK: number;
  private readonly count: number;
  private readonly b: Float64Array;
  private readonly p: Float64Array;
  private readonly q: Float64Array;
  /** 1 − k_ij, row-major; undefined when every k_ij is zero. */
  private readonly affinity: Float64Array | undefined;
  private readonly np: Float64Array; // n_i p_i
  private readonly nq: Float64Array;
  private readonly delta1: number;
  private readonly delta2: number;
  private readonly kind: CubicEquation["alpha"]["kind"];

  // the composition that is set
  private readonly n: Float64Array;
  private readonly Sp: Float64Array; // Σ_j (1 − k_ij) n_j p_j
  private readonly Sq: Float64Array;
  private total = 0;
  private B = 0;
  private Dpp = 0;
  private Dpq = 0;
  private Dqq = 0;

  // scalars of the temperature last seen
  private T = 0;
  private g = 1;
  private gT = 0;
  private gTT = 0;
  private h = 0;
  private hT = 0;
  private hTT = 0;

  private readonly roots = new Float64Array(3);
  private readonly D_i: Float64Array;
  private readonly sqrtA: Float64Array;

  constructor(equation: CubicEquation, components: readonly CubicComponent[], kij: Float64Array) {
    const count = components.length;
    this.count = count;
    this.b = new Float64Array(count);
    this.p = new Float64Array(count);
    this.q = new Float64Array(count);
    this.n = new Float64Array(count);
    this.Sp = new Float64Array(count);
    this.Sq = new Float64Array(count);
    this.D_i = new Float64Array(count);
    this.sqrtA = new Float64Array(count);
    this.delta1 = equation.delta1;
    this.delta2 = equation.delta2;
    this.kind = equation.alpha.kind;
    let ceiling = Infinity;
    components.forEach(({ criticalTemperatureK: Tc, criticalPressurePa: pc, acentricFactor: omega }, i) => {
      this.b[i] = (equation.omegaB * R * Tc) / pc;
      const root = R * Tc * Math.sqrt(equation.omegaA / pc);
      const { alpha } = equation;
      if (alpha.kind === "soave") {
        const m = alpha.slope(omega);
        this.p[i] = root * (1 + m);
        this.q[i] = (root * m) / Math.sqrt(Tc);
        if (m > 0) ceiling = Math.min(ceiling, Tc * (1 + 1 / m) ** 2);
      } else {
        this.p[i] = alpha.kind === "inverse-root" ? root * Tc ** 0.25 : root;
      }
    });
    this.maximumTemperatureK = ceiling;
    if (kij.some((k) => k !== 0)) this.affinity = kij.map((k) => 1 - k);
    this.np = new Float64Array(count);
    this.nq = new Float64Array(count);
  }

  setComposition(amounts: ArrayLike<number>): void {
    const { count, b, p, q, n, Sp, Sq, np, nq, affinity } = this;
    let total = 0;
    let B = 0;
    let sp = 0;
    let sq = 0;
    for (let i = 0; i < count; i++) {
      const amount = amounts[i]!;
      n[i] = amount;
      total += amount;
      B += amount * b[i]!;
      sp += np[i] = amount * p[i]!;
      sq += nq[i] = amount * q[i]!;
    }
    this.total = total;
    this.B = B;
    if (!affinity) {
      Sp.fill(sp);
      Sq.fill(sq);
      this.Dpp = sp * sp;
      this.Dpq = sp * sq;
      this.Dqq = sq * sq;
      return;
    }
    let pp = 0;
    let pq = 0;
    let qq = 0;
    for (let i = 0, at = 0; i < count; i++) {
      sp = 0;
      sq = 0;
      for (let j = 0; j < count; j++, at++) {
        const weight = affinity[at]!;
        sp += weight * np[j]!;
        sq += weight * nq[j]!;
      }
      Sp[i] = sp;
      Sq[i] = sq;
      pp += np[i]! * sp;
      pq += np[i]! * sq;
      qq += nq[i]! * sq;
    }
    this.Dpp = pp;
    this.Dpq = pq;
    this.Dqq = qq;
  }

  minimumVolume(): number {
    return this.B;
  }

  private setTemperature(T: number): void {
    if (T === this.T) return;
    this.T = T;
    if (this.kind === "soave") {
      const root = Math.sqrt(T);
      this.h = -root;
      this.hT = -0.5 / root;
      this.hTT = 0.25 / (T * root);
    } else if (this.kind === "inverse-root") {
      this.g = T ** -0.25;
      this.gT = (-0.25 * this.g) / T;
      this.gTT = (-1.25 * this.gT) / T;
    }
  }

  evaluate(T: number, V: number, order: 0 | 1 | 2, out: ResidualDerivatives): void {
    this.setTemperature(T);
    const { total: n, B, delta1, delta2, g, gT, gTT, h, hT, hTT, Dpp, Dpq, Dqq } = this;
    const D = Dpp * g * g + 2 * Dpq * g * h + Dqq * h * h;
    const DT = 2 * (Dpp * g * gT + Dpq * (g * hT + gT * h) + Dqq * h * hT);
    const DTT = 2 * (Dpp * (gT * gT + g * gTT) + Dpq * (g * hTT + 2 * gT * hT + gTT * h) + Dqq * (hT * hT + h * hTT));

    const free = V - B;
    const spread = delta1 - delta2;
    const first = V + delta1 * B;
    const second = V + delta2 * B;
    const ln = Math.log1p(-B / V); // g of the source
    const lnV = B / (V * free);
    const lnVV = 1 / (V * V) - 1 / (free * free);
    const f = spread === 0 ? 1 / (R * V) : Math.log1p((spread * B) / second) / (R * B * spread);
    const fV = -1 / (R * first * second);
    const fVV = (first + second) / (R * first * first * second * second);

    const invT = 1 / T;
    const FD = -f * invT;
    const FDT = f * invT * invT;
    out.F = -n * ln + D * FD;
    out.FT = D * FDT + DT * FD;
    out.FV = -n * lnV - D * fV * invT;
    out.FTT = -2 * D * FDT * invT + 2 * FDT * DT + FD * DTT;
    out.FTV = D * fV * invT * invT - fV * invT * DT;
    out.FVV = -n * lnVV - D * fVV * invT;
    if (order === 0) return;

    const { count, b, p, q, Sp, Sq, D_i, sqrtA } = this;
    const lnB = -1 / free;
    const fB = -(f + V * fV) / B;
    const FB = -n * lnB - D * fB * invT;
    for (let i = 0; i < count; i++) {
      const root = p[i]! * g + q[i]! * h;
      sqrtA[i] = root;
      const Di = 2 * root * (Sp[i]! * g + Sq[i]! * h);
      D_i[i] = Di;
      out.Fn[i] = -ln + FB * b[i]! + FD * Di;
    }
    if (order === 1) return;

    const lnBV = 1 / (free * free);
    const fBV = -(2 * fV + V * fVV) / B;
    const fBB = -(2 * fB + V * fBV) / B;
    const FBV = -n * lnBV - D * fBV * invT;
    const FBB = n * lnBV - D * fBB * invT; // ln_BB = −ln_BV
    const FBD = -fB * invT;
    const FBT = D * fB * invT * invT + FBD * DT;
    const FDV = -fV * invT;
    const { FnT, FnV, Fnn } = out;
    for (let i = 0; i < count; i++) {
      const bi = b[i]!;
      const Di = D_i[i]!;
      const DiT = 2 * ((p[i]! * gT + q[i]! * hT) * (Sp[i]! * g + Sq[i]! * h) + sqrtA[i]! * (Sp[i]! * gT + Sq[i]! * hT));
      FnT[i] = FBT * bi + FDT * Di + FD * DiT;
      FnV[i] = -lnV + FBV * bi + FDV * Di;
      const row = i * count;
      const withB = -lnB + FBB * bi + FBD * Di;
      const withD = FBD * bi;
      const pull = 2 * FD * sqrtA[i]!;
      for (let j = 0; j <= i; j++) {
        const value =
          -lnB * bi + withB * b[j]! + withD * D_i[j]! + pull * sqrtA[j]! * (this.affinity ? this.affinity[row + j]! : 1);
        Fnn[row + j] = value;
        Fnn[j * count + i] = value;
      }
    }
  }

  volumeAtPressure(T: number, p: number, root: Root): number {
    this.setTemperature(T);
    const { g, h, B: b, roots, delta1, delta2 } = this;
    const a = this.Dpp * g * g + 2 * this.Dpq * g * h + this.Dqq * h * h;
    const B = (p * b) / (R * T);
    const alpha = a / (b * R * T);
    const count = cubicRoots(B, alpha, delta1, delta2, roots);
    if (count === 0) {
      throw new EngineError("no-convergence", "no molar volume satisfies the equation of state", {
        temperatureK: T,
        pressurePa: p,
      });
    }
    const low = roots[0]!;
    const high = roots[count - 1]!;
    if (count === 1 || root === "liquid") return low * b;
    if (root === "vapour") return high * b;
    return (this.reducedGibbs(low, B, alpha) < this.reducedGibbs(high, B, alpha) ? low : high) * b;
  }

  /** G_dep/(R T) + ln p of a root, up to a constant that both roots share. */
  private reducedGibbs(w: number, B: number, alpha: number): number {
    const spread = this.delta1 - this.delta2;
    const attraction = spread === 0 ? 1 / w : Math.log1p(spread / (w + this.delta2)) / spread;
    return B * w - Math.log(w - 1) - alpha * attraction;
  }
}
