import { addNonAnalytic } from "./non-analytic";
import type { NonAnalyticTerm, ReferenceTerm } from "./reference-data";

/**
 * αr(δ, τ) and its derivatives, each multiplied by the powers that make it dimensionless:
 * a = αr, d = δ αr_δ, t = τ αr_τ, dd = δ² αr_δδ, dt = δτ αr_δτ, tt = τ² αr_ττ.
 */
export interface ReducedDerivatives {
  a: number;
  d: number;
  t: number;
  dd: number;
  dt: number;
  tt: number;
}

export const createReducedDerivatives = (): ReducedDerivatives => ({ a: 0, d: 0, t: 0, dd: 0, dt: 0, tt: 0 });

/**
 * Sum of the terms of a multiparameter equation with all second derivatives.
 *
 *   power, exponential   n δ^d τ^t exp(−δ^l)
 *   gaussian             n δ^d τ^t exp[−η(δ − ε)² − β(τ − γ)²]
 *   gao_b                n δ^d τ^t exp[η(δ − ε)² + 1/(β(τ − γ)² + b)]
 *   non_analytic         n Δ^b δ ψ  (non-analytic.ts)
 *
 * Source   Span, Multiparameter Equations of State, Springer (2000), chapter 3; Gao et al. 2020 for gao_b.
 *
 * Equal exponents are raised once: the powers of δ by multiplication, those of τ by one exponential each.
 */
export class ReducedTerms {
  private readonly plain: number;
  private readonly n: Float64Array;
  private readonly d: Float64Array;
  private readonly t: Float64Array;
  private readonly dIndex: Int32Array;
  private readonly tIndex: Int32Array;
  private readonly lIndex: Int32Array;
  private readonly l: Float64Array;
  /** η, ε, β, γ, b of the bell-shaped terms, five a term; b > 0 marks the Gao form. */
  private readonly bell: Float64Array;
  private readonly nonAnalytic: readonly NonAnalyticTerm[];

  private readonly tExponents: Float64Array;
  private readonly dExponents: Float64Array;
  private readonly lExponents: Float64Array;
  private readonly tPowers: Float64Array;
  private readonly dPowers: Float64Array;
  private readonly lPowers: Float64Array;
  private readonly lDecay: Float64Array;
  private tauAt = Number.NaN;

  constructor(terms: readonly ReferenceTerm[]) {
    const simple = terms.filter((term) => term.type === "power" || term.type === "exponential");
    const bells = terms.filter((term) => term.type === "gaussian" || term.type === "gao_b");
    this.nonAnalytic = terms.filter((term) => term.type === "non_analytic");
    const ordered = [...simple, ...bells];
    this.plain = simple.length;
    this.n = Float64Array.from(ordered, (term) => term.n);
    this.d = Float64Array.from(ordered, (term) => term.d);
    this.t = Float64Array.from(ordered, (term) => term.t);
    this.l = Float64Array.from(simple, (term) => (term.type === "exponential" ? term.l : 0));
    this.dExponents = distinct(this.d);
    this.tExponents = distinct(this.t);
    this.lExponents = distinct(this.l);
    this.dIndex = indexIn(this.d, this.dExponents);
    this.tIndex = indexIn(this.t, this.tExponents);
    this.lIndex = indexIn(this.l, this.lExponents);
    this.bell = Float64Array.from(
      bells.flatMap((term) =>
        term.type === "gao_b"
          ? [term.eta, term.epsilon, term.beta, term.gamma, term.b]
          : [term.eta, term.epsilon, term.beta, term.gamma, 0],
      ),
    );
    this.tPowers = new Float64Array(this.tExponents.length);
    this.dPowers = new Float64Array(this.dExponents.length);
    this.lPowers = new Float64Array(this.lExponents.length);
    this.lDecay = new Float64Array(this.lExponents.length);
  }

  evaluate(delta: number, tau: number, out: ReducedDerivatives): void {
    this.raise(delta, tau);
    const { plain, n, d, t, l, dIndex, tIndex, lIndex, dPowers, tPowers, lPowers, lDecay, bell } = this;
    let a = 0;
    let ad = 0;
    let at = 0;
    let add = 0;
    let adt = 0;
    let att = 0;
    for (let k = 0; k < plain; k++) {
      const which = lIndex[k]!;
      const exponent = l[k]!;
      const pull = exponent * lPowers[which]!; // l δ^l, 0 for a plain power
      const base = n[k]! * dPowers[dIndex[k]!]! * tPowers[tIndex[k]!]! * lDecay[which]!;
      const D = d[k]! - pull;
      const E = t[k]!;
      a += base;
      ad += base * D;
      at += base * E;
      add += base * (D * (D - 1) - exponent * pull);
      adt += base * D * E;
      att += base * E * (E - 1);
    }
    for (let k = plain, at5 = 0; k < n.length; k++, at5 += 5) {
      const eta = bell[at5]!;
      const offset = delta - bell[at5 + 1]!;
      const beta = bell[at5 + 2]!;
      const lag = tau - bell[at5 + 3]!;
      const b = bell[at5 + 4]!;
      let decay: number;
      let D: number;
      let DD: number;
      let E: number;
      let EE: number;
      if (b > 0) {
        const u = 1 / (beta * lag * lag + b);
        const uT = -2 * beta * lag * u * u;
        const uTT = -2 * beta * u * u + 8 * beta * beta * lag * lag * u * u * u;
        decay = Math.exp(eta * offset * offset + u);
        D = d[k]! + 2 * eta * delta * offset;
        DD = D * D - d[k]! + 2 * eta * delta * delta;
        E = t[k]! + tau * uT;
        EE = E * E - t[k]! + tau * tau * uTT;
      } else {
        decay = Math.exp(-eta * offset * offset - beta * lag * lag);
        D = d[k]! - 2 * eta * delta * offset;
        DD = D * D - d[k]! - 2 * eta * delta * delta;
        E = t[k]! - 2 * beta * tau * lag;
        EE = E * E - t[k]! - 2 * beta * tau * tau;
      }
      const base = n[k]! * dPowers[dIndex[k]!]! * tPowers[tIndex[k]!]! * decay;
      a += base;
      ad += base * D;
      at += base * E;
      add += base * DD;
      adt += base * D * E;
      att += base * EE;
    }
    out.a = a;
    out.d = ad;
    out.t = at;
    out.dd = add;
    out.dt = adt;
    out.tt = att;
    for (const term of this.nonAnalytic) addNonAnalytic(term, delta, tau, out);
  }

  private raise(delta: number, tau: number): void {
    const { dExponents, dPowers, lExponents, lPowers, lDecay, tExponents, tPowers } = this;
    const lnDelta = Math.log(delta);
    for (let k = 0; k < dExponents.length; k++) {
      const exponent = dExponents[k]!;
      dPowers[k] = exponent === 1 ? delta : exponent === 2 ? delta * delta : Math.exp(exponent * lnDelta);
    }
    for (let k = 0; k < lExponents.length; k++) {
      const exponent = lExponents[k]!;
      if (exponent === 0) {
        lPowers[k] = 0;
        lDecay[k] = 1;
      } else {
        lPowers[k] = exponent === 1 ? delta : exponent === 2 ? delta * delta : Math.exp(exponent * lnDelta);
        lDecay[k] = Math.exp(-lPowers[k]!);
      }
    }
    if (tau === this.tauAt) return;
    this.tauAt = tau;
    const lnTau = Math.log(tau);
    for (let k = 0; k < tExponents.length; k++) tPowers[k] = Math.exp(tExponents[k]! * lnTau);
  }
}

function distinct(values: Float64Array): Float64Array {
  return Float64Array.from(new Set(values));
}

function indexIn(values: Float64Array, table: Float64Array): Int32Array {
  return Int32Array.from(values, (value) => table.indexOf(value));
}
