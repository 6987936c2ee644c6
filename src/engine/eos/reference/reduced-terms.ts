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

/** A bell in δ alone, as the departure functions of GERG-2008 have it: n δ^d τ^t exp[−η(δ − ε)² − β(δ − γ)]. */
export interface KunzTerm {
  type: "kunz";
  n: number;
  d: number;
  t: number;
  eta: number;
  epsilon: number;
  beta: number;
  gamma: number;
}

type SimpleTerm = Extract<ReferenceTerm, { type: "power" | "exponential" }>;
type BellTerm = Extract<ReferenceTerm, { type: "gaussian" | "gao_b" }> | KunzTerm;

/** Sums a group: a, d, t, dd, dt, tt. */
export const sumsPerGroup = 6;
const bellNumbers = 6;
const [gaussian, gao, kunz] = [0, 1, 2];

/**
 * Sums of the terms of multiparameter equations, in groups (one fluid, or each component and each pair of a mixture), with all
 * second derivatives.
 *
 *   power, exponential   n δ^d τ^t exp(−δ^l)
 *   gaussian             n δ^d τ^t exp[−η(δ − ε)² − β(τ − γ)²]
 *   gao_b                n δ^d τ^t exp[η(δ − ε)² + 1/(β(τ − γ)² + b)]
 *   kunz                 n δ^d τ^t exp[−η(δ − ε)² − β(δ − γ)]
 *   non_analytic         n Δ^b δ ψ  (non-analytic.ts), first group only
 *
 * Source   Span, Multiparameter Equations of State, Springer (2000), chapter 3; Gao et al. 2020 for gao_b; Kunz and Wagner 2012.
 *
 * Equal exponents are raised once for all groups, with one exponential each.
 */
export class ReducedTerms {
  /** `sumsPerGroup` numbers a group, in the order of `ReducedDerivatives`. */
  readonly sums: Float64Array;
  private readonly groups: number;
  private readonly simpleEnd: Int32Array;
  private readonly bellEnd: Int32Array;
  private readonly simple: Packed;
  private readonly bells: Packed;
  private readonly l: Float64Array;
  private readonly bellShape: Float64Array;
  private readonly nonAnalytic: readonly NonAnalyticTerm[];
  private readonly byTau: Powers;
  private readonly byDelta: Powers;
  private readonly lIndex: Int32Array;
  private readonly lExponents: Float64Array;
  private readonly lPowers: Float64Array;
  private readonly lDecay: Float64Array;
  private readonly extra = createReducedDerivatives();
  private delta = Number.NaN;
  private tau = Number.NaN;

  constructor(groups: readonly (readonly (ReferenceTerm | KunzTerm)[])[]) {
    const isSimple = (term: ReferenceTerm | KunzTerm): term is SimpleTerm => term.type === "power" || term.type === "exponential";
    const isBell = (term: ReferenceTerm | KunzTerm): term is BellTerm =>
      term.type === "gaussian" || term.type === "gao_b" || term.type === "kunz";
    const simple = groups.flatMap((group) => group.filter(isSimple));
    const bells = groups.flatMap((group) => group.filter(isBell));
    this.groups = groups.length;
    this.sums = new Float64Array(groups.length * sumsPerGroup);
    this.simpleEnd = runningCount(groups.map((group) => group.filter(isSimple).length));
    this.bellEnd = runningCount(groups.map((group) => group.filter(isBell).length));
    this.nonAnalytic = groups.flat().filter((term) => term.type === "non_analytic");
    this.byTau = new Powers([...simple, ...bells].map(({ t }) => t));
    this.byDelta = new Powers([...simple, ...bells].map(({ d }) => d));
    this.simple = pack(simple, this.byTau, this.byDelta);
    this.bells = pack(bells, this.byTau, this.byDelta);
    this.l = Float64Array.from(simple, (term) => (term.type === "exponential" ? term.l : 0));
    this.lExponents = Float64Array.from(new Set(this.l));
    this.lIndex = Int32Array.from(this.l, (l) => this.lExponents.indexOf(l));
    this.lPowers = new Float64Array(this.lExponents.length);
    this.lDecay = new Float64Array(this.lExponents.length);
    this.bellShape = Float64Array.from(
      bells.flatMap((term) => {
        const { eta, epsilon, beta, gamma } = term;
        if (term.type === "gao_b") return [eta, epsilon, beta, gamma, term.b, gao];
        return [eta, epsilon, beta, gamma, 0, term.type === "kunz" ? kunz : gaussian];
      }) as number[],
    );
  }

  /** Fills `sums` for every group; asked again for the same point, it has them already. */
  evaluate(delta: number, tau: number): void {
    if (delta === this.delta && tau === this.tau) return;
    this.delta = delta;
    this.tau = tau;
    this.byDelta.raise(delta);
    this.byTau.raise(tau);
    const lnDelta = Math.log(delta);
    const { lExponents, lPowers, lDecay } = this;
    for (let k = 0; k < lExponents.length; k++) {
      const exponent = lExponents[k]!;
      lPowers[k] = exponent === 0 ? 0 : exponent === 1 ? delta : exponent === 2 ? delta * delta : Math.exp(exponent * lnDelta);
      lDecay[k] = exponent === 0 ? 1 : Math.exp(-lPowers[k]!);
    }
    for (let group = 0; group < this.groups; group++) {
      this.sumSimple(group);
      if (this.bellEnd[group + 1]! > this.bellEnd[group]!) this.sumBells(group, delta, tau);
    }
    if (this.nonAnalytic.length > 0) this.sumNonAnalytic(delta, tau);
  }

  private sumSimple(group: number): void {
    const { simple, l, lIndex, lPowers, lDecay, sums, simpleEnd } = this;
    const { n, d, t, dIndex, tIndex } = simple;
    const deltaPowers = this.byDelta.values;
    const tauPowers = this.byTau.values;
    let a = 0;
    let ad = 0;
    let at = 0;
    let add = 0;
    let adt = 0;
    let att = 0;
    for (let k = simpleEnd[group]!, end = simpleEnd[group + 1]!; k < end; k++) {
      const which = lIndex[k]!;
      const exponent = l[k]!;
      const pull = exponent * lPowers[which]!; // l δ^l, 0 for a plain power
      const base = n[k]! * deltaPowers[dIndex[k]!]! * tauPowers[tIndex[k]!]! * lDecay[which]!;
      const D = d[k]! - pull;
      const E = t[k]!;
      a += base;
      ad += base * D;
      at += base * E;
      add += base * (D * (D - 1) - exponent * pull);
      adt += base * D * E;
      att += base * E * (E - 1);
    }
    const at6 = group * sumsPerGroup;
    sums[at6] = a;
    sums[at6 + 1] = ad;
    sums[at6 + 2] = at;
    sums[at6 + 3] = add;
    sums[at6 + 4] = adt;
    sums[at6 + 5] = att;
  }

  private sumBells(group: number, delta: number, tau: number): void {
    const { bells, bellShape, sums, bellEnd } = this;
    const { n, d, t, dIndex, tIndex } = bells;
    const at6 = group * sumsPerGroup;
    for (let k = bellEnd[group]!; k < bellEnd[group + 1]!; k++) {
      const shape = k * bellNumbers;
      const eta = bellShape[shape]!;
      const offset = delta - bellShape[shape + 1]!;
      const beta = bellShape[shape + 2]!;
      const gamma = bellShape[shape + 3]!;
      const kind = bellShape[shape + 5]!;
      let decay: number;
      let D = d[k]! - 2 * eta * delta * offset;
      let curvature = -d[k]! - 2 * eta * delta * delta; // δ² f_δδ/f − D²
      let E = t[k]!;
      let EE: number;
      if (kind === kunz) {
        decay = Math.exp(-eta * offset * offset - beta * (delta - gamma));
        D -= beta * delta;
        EE = E * (E - 1);
      } else if (kind === gao) {
        const lag = tau - gamma;
        const u = 1 / (beta * lag * lag + bellShape[shape + 4]!);
        const uT = -2 * beta * lag * u * u;
        const uTT = -2 * beta * u * u + 8 * beta * beta * lag * lag * u * u * u;
        decay = Math.exp(eta * offset * offset + u);
        D = d[k]! + 2 * eta * delta * offset;
        curvature = -d[k]! + 2 * eta * delta * delta;
        E += tau * uT;
        EE = E * E - t[k]! + tau * tau * uTT;
      } else {
        const lag = tau - gamma;
        decay = Math.exp(-eta * offset * offset - beta * lag * lag);
        E -= 2 * beta * tau * lag;
        EE = E * E - t[k]! - 2 * beta * tau * tau;
      }
      const base = n[k]! * this.byDelta.values[dIndex[k]!]! * this.byTau.values[tIndex[k]!]! * decay;
      sums[at6] = sums[at6]! + base;
      sums[at6 + 1] = sums[at6 + 1]! + base * D;
      sums[at6 + 2] = sums[at6 + 2]! + base * E;
      sums[at6 + 3] = sums[at6 + 3]! + base * (D * D + curvature);
      sums[at6 + 4] = sums[at6 + 4]! + base * D * E;
      sums[at6 + 5] = sums[at6 + 5]! + base * EE;
    }
  }

  private sumNonAnalytic(delta: number, tau: number): void {
    const { extra, sums } = this;
    extra.a = extra.d = extra.t = extra.dd = extra.dt = extra.tt = 0;
    for (const term of this.nonAnalytic) addNonAnalytic(term, delta, tau, extra);
    sums[0] = sums[0]! + extra.a;
    sums[1] = sums[1]! + extra.d;
    sums[2] = sums[2]! + extra.t;
    sums[3] = sums[3]! + extra.dd;
    sums[4] = sums[4]! + extra.dt;
    sums[5] = sums[5]! + extra.tt;
  }
}

/** Each distinct exponent raised once for one base. */
class Powers {
  readonly exponents: Float64Array;
  readonly values: Float64Array;
  private base = Number.NaN;

  constructor(exponents: readonly number[]) {
    this.exponents = Float64Array.from(new Set(exponents));
    this.values = new Float64Array(this.exponents.length);
  }

  indexOf(exponent: number): number {
    return this.exponents.indexOf(exponent);
  }

  raise(base: number): void {
    if (base === this.base) return;
    this.base = base;
    const ln = Math.log(base);
    const { exponents, values } = this;
    for (let k = 0; k < exponents.length; k++) {
      const exponent = exponents[k]!;
      values[k] = exponent === 1 ? base : exponent === 2 ? base * base : Math.exp(exponent * ln);
    }
  }
}

interface Packed {
  n: Float64Array;
  d: Float64Array;
  t: Float64Array;
  dIndex: Int32Array;
  tIndex: Int32Array;
}

function pack(terms: readonly { n: number; d: number; t: number }[], byTau: Powers, byDelta: Powers): Packed {
  return {
    n: Float64Array.from(terms, ({ n }) => n),
    d: Float64Array.from(terms, ({ d }) => d),
    t: Float64Array.from(terms, ({ t }) => t),
    dIndex: Int32Array.from(terms, ({ d }) => byDelta.indexOf(d)),
    tIndex: Int32Array.from(terms, ({ t }) => byTau.indexOf(t)),
  };
}

function runningCount(counts: readonly number[]): Int32Array {
  const ends = new Int32Array(counts.length + 1);
  counts.forEach((count, group) => (ends[group + 1] = ends[group]! + count));
  return ends;
}
