import { EngineError } from "../../errors";
import { denseRoot, scannedRoots, thinRoot, type PressurePoint } from "../density-roots";
import type { ResidualDerivatives, ResidualModel, Root, SaturationVolumes } from "../fluid-model";
import { ReducedTerms, sumsPerGroup } from "../reference/reduced-terms";
import { gergComponents, gergConstants, gergPair, gergResidualTerms } from "./gerg-data";
import { saturationBySpinodals } from "../saturation-by-spinodals";
import { ReducingFunction } from "./reducing-function";

const densestReduced = 4.2;
/** Above this reduced temperature no mixture of the 21 components has two density roots at one pressure. */
const singleRootTemperature = 1.6;
/** Reduced temperature above which a pure component's saturation is found between its spinodals. */
const nearCritical = 0.97;

/**
 * F = Σ n_i α_i(δ, τ) + ΣΣ_{i<j} n_i n_j F_ij α_ij(δ, τ)/n of GERG-2008, with δ = v_r(n)/(V n) and τ = T_r(n)/(n² T) as functions
 * of the mole numbers, and all second derivatives by the chain rule.
 *
 * Source   Kunz and Wagner, J. Chem. Eng. Data 57 (2012) 3032-3091; ISO 20765-2.
 */
export class GergResidual implements ResidualModel {
  readonly hasFalseBranches = true;
  private readonly count: number;
  private readonly terms: ReducedTerms;
  private readonly volume: ReducingFunction;
  private readonly temperature: ReducingFunction;
  /** Pairs that have a departure function: component indices and weight, in the order of the term groups. */
  private readonly pairI: Int32Array;
  private readonly pairJ: Int32Array;
  private readonly pairF: Float64Array;

  private readonly x: Float64Array;
  private n = 1;
  private reducingOrder = -1;
  private T = 0;
  private readonly point: PressurePoint = { pressure: 0, slope: 0 };
  private readonly mix = new Float64Array(sumsPerGroup);
  // ∂G/∂n_i of the mixture sum and of its δ and τ derivatives, at constant δ and τ
  private readonly G: Float64Array;
  private readonly Gd: Float64Array;
  private readonly Gt: Float64Array;

  constructor(ids: readonly string[]) {
    const count = ids.length;
    this.count = count;
    this.x = new Float64Array(count);
    this.G = new Float64Array(count);
    this.Gd = new Float64Array(count);
    this.Gt = new Float64Array(count);
    const rows = ids.map((id) => gergComponents.get(id)!);
    const cross = { V: new Float64Array(count * count), T: new Float64Array(count * count) };
    const squared = { V: new Float64Array(count * count), T: new Float64Array(count * count) };
    const departures: { i: number; j: number; F: number; terms: ReturnType<typeof gergPair>["departure"] }[] = [];
    for (let i = 0; i < count; i++) {
      for (let j = i + 1; j < count; j++) {
        const [a, b] = [rows[i]!, rows[j]!];
        const { betaV, gammaV, betaT, gammaT, F, departure } = gergPair(a.id, b.id);
        const meanVolume = (a.rhoc_mol_per_m3 ** (-1 / 3) + b.rhoc_mol_per_m3 ** (-1 / 3)) ** 3 / 8;
        cross.V[i * count + j] = 2 * betaV * gammaV * meanVolume;
        cross.T[i * count + j] = 2 * betaT * gammaT * Math.sqrt(a.Tc_K * b.Tc_K);
        squared.V[i * count + j] = betaV * betaV;
        squared.T[i * count + j] = betaT * betaT;
        if (departure.length > 0) departures.push({ i, j, F, terms: departure });
      }
    }
    this.volume = new ReducingFunction(
      Float64Array.from(rows, (row) => 1 / row.rhoc_mol_per_m3),
      cross.V,
      squared.V,
    );
    this.temperature = new ReducingFunction(
      Float64Array.from(rows, (row) => row.Tc_K),
      cross.T,
      squared.T,
    );
    this.terms = new ReducedTerms([...ids.map(gergResidualTerms), ...departures.map(({ terms }) => terms)]);
    this.pairI = Int32Array.from(departures, ({ i }) => i);
    this.pairJ = Int32Array.from(departures, ({ j }) => j);
    this.pairF = Float64Array.from(departures, ({ F }) => F);
  }

  setComposition(n: ArrayLike<number>): void {
    let total = 0;
    for (let i = 0; i < this.count; i++) total += n[i]!;
    for (let i = 0; i < this.count; i++) this.x[i] = n[i]! / total;
    this.n = total;
    this.reducingOrder = -1;
    this.reduceTo(0);
  }

  private reduceTo(order: 0 | 1 | 2): void {
    if (order <= this.reducingOrder) return;
    this.volume.evaluate(this.x, order);
    this.temperature.evaluate(this.x, order);
    this.reducingOrder = order;
  }

  minimumVolume(): number {
    return (this.n * this.volume.value) / densestReduced;
  }

  /** Sums over components and pairs: αr and its reduced derivatives of the mixture at constant composition. */
  private mixSums(delta: number, tau: number): Float64Array {
    const { terms, mix, x, count, pairI, pairJ, pairF } = this;
    terms.evaluate(delta, tau);
    const { sums } = terms;
    mix.fill(0);
    for (let i = 0; i < count; i++) {
      const weight = x[i]!;
      if (weight === 0) continue;
      for (let k = 0; k < sumsPerGroup; k++) mix[k] = mix[k]! + weight * sums[i * sumsPerGroup + k]!;
    }
    for (let pair = 0; pair < pairI.length; pair++) {
      const weight = x[pairI[pair]!]! * x[pairJ[pair]!]! * pairF[pair]!;
      if (weight === 0) continue;
      for (let k = 0; k < sumsPerGroup; k++) mix[k] = mix[k]! + weight * sums[(count + pair) * sumsPerGroup + k]!;
    }
    return mix;
  }

  evaluate(T: number, V: number, order: 0 | 1 | 2, out: ResidualDerivatives): void {
    const { n } = this;
    const v = V / n;
    this.reduceTo(order);
    const [a, d, t, dd, dt, tt] = this.mixSums(this.volume.value / v, this.temperature.value / T) as unknown as Six;
    out.F = n * a;
    out.FV = -d / v;
    out.FVV = (dd + 2 * d) / (v * v * n);
    out.FT = (-n * t) / T;
    out.FTT = (n * (tt + 2 * t)) / (T * T);
    out.FTV = dt / (T * v);
    if (order > 0) this.compositionDerivatives(T, v, order, out);
  }

  /** For one mole in all; F_nV, F_nn fall as 1/n. δ_i, τ_i below are ∂ ln δ/∂n_i and ∂ ln τ/∂n_i. */
  private compositionDerivatives(T: number, v: number, order: 0 | 1 | 2, out: ResidualDerivatives): void {
    const { count, x, n, mix, G, Gd, Gt, pairI, pairJ, pairF, volume, temperature } = this;
    const { sums } = this.terms;
    const [, d, t, dd, dt, tt] = mix as unknown as Six;
    let departure = 0;
    let departureD = 0;
    let departureT = 0;
    for (let i = 0; i < count; i++) {
      G[i] = sums[i * sumsPerGroup]!;
      Gd[i] = sums[i * sumsPerGroup + 1]!;
      Gt[i] = sums[i * sumsPerGroup + 2]!;
    }
    for (let pair = 0; pair < pairI.length; pair++) {
      const [i, j, F] = [pairI[pair]!, pairJ[pair]!, pairF[pair]!];
      const at = (count + pair) * sumsPerGroup;
      const [a0, d0, t0] = [F * sums[at]!, F * sums[at + 1]!, F * sums[at + 2]!];
      G[i] = G[i]! + x[j]! * a0;
      G[j] = G[j]! + x[i]! * a0;
      Gd[i] = Gd[i]! + x[j]! * d0;
      Gd[j] = Gd[j]! + x[i]! * d0;
      Gt[i] = Gt[i]! + x[j]! * t0;
      Gt[j] = Gt[j]! + x[i]! * t0;
      departure += x[i]! * x[j]! * a0;
      departureD += x[i]! * x[j]! * d0;
      departureT += x[i]! * x[j]! * t0;
    }
    // ∂(Q/n)/∂n_i = Q_i − Q for one mole
    for (let i = 0; i < count; i++) {
      G[i] = G[i]! - departure;
      Gd[i] = Gd[i]! - departureD;
      Gt[i] = Gt[i]! - departureT;
    }
    const lnV = (i: number) => volume.first[i]! / volume.value - 1; // ∂ ln δ/∂n_i, δ = v_r(n)/(n V) with v_r = Y of degree two
    const lnT = (i: number) => temperature.first[i]! / temperature.value - 2; // ∂ ln τ/∂n_i
    for (let i = 0; i < count; i++) out.Fn[i] = G[i]! + d * lnV(i) + t * lnT(i);
    if (order === 1) return;

    for (let i = 0; i < count; i++) {
      const di = lnV(i);
      const ti = lnT(i);
      out.FnT[i] = -(Gt[i]! + dt * di + (tt + t) * ti) / T;
      out.FnV[i] = -(Gd[i]! + (dd + d) * di + dt * ti) / (v * n);
      for (let j = 0; j <= i; j++) {
        const dj = lnV(j);
        const tj = lnT(j);
        // ∂²δ/∂n_i∂n_j over δ, and the same of τ
        const Vij = volume.second[i * count + j]! / volume.value;
        const Tij = temperature.second[i * count + j]! / temperature.value;
        const deltaIJ = Vij - (di + 1) - (dj + 1) + 2;
        const tauIJ = Tij - 2 * (ti + 2) - 2 * (tj + 2) + 6;
        const value =
          Gd[i]! * dj +
          Gd[j]! * di +
          Gt[i]! * tj +
          Gt[j]! * ti +
          dd * di * dj +
          tt * ti * tj +
          dt * (di * tj + dj * ti) +
          d * deltaIJ +
          t * tauIJ;
        out.Fnn[i * count + j] = value / n;
      }
    }
    this.addDepartureCurvature(out, departure);
    for (let i = 0; i < count; i++) {
      for (let j = 0; j < i; j++) out.Fnn[j * count + i] = out.Fnn[i * count + j]!;
    }
  }

  /** G_ij at constant δ and τ: ∂²(Q/n)/∂n_i∂n_j = Q_ij − Q_i − Q_j + 2 Q for one mole. */
  private addDepartureCurvature(out: ResidualDerivatives, Q: number): void {
    const { count, x, n, pairI, pairJ, pairF } = this;
    if (pairI.length === 0) return;
    const { sums } = this.terms;
    const Qi = new Float64Array(count);
    for (let pair = 0; pair < pairI.length; pair++) {
      const [i, j] = [pairI[pair]!, pairJ[pair]!];
      const value = pairF[pair]! * sums[(count + pair) * sumsPerGroup]!;
      Qi[i] = Qi[i]! + x[j]! * value;
      Qi[j] = Qi[j]! + x[i]! * value;
      const at = Math.max(i, j) * count + Math.min(i, j);
      out.Fnn[at] = out.Fnn[at]! + value / n;
    }
    for (let i = 0; i < count; i++) {
      for (let j = 0; j <= i; j++) out.Fnn[i * count + j] = out.Fnn[i * count + j]! + (2 * Q - Qi[i]! - Qi[j]!) / n;
    }
  }

  private readonly pressureAt = (rho: number): void => {
    const { point, T } = this;
    const RT = gergConstants.R * T;
    const mix = this.mixSums(rho * this.volume.value, this.temperature.value / T);
    point.pressure = rho * RT * (1 + mix[1]!);
    point.slope = RT * (1 + 2 * mix[1]! + mix[3]!);
  };

  volumeAtPressure(T: number, p: number, root: Root): number {
    this.T = T;
    const ceiling = densestReduced / this.volume.value;
    const start = p / (gergConstants.R * T);
    const thin = () =>
      thinRoot(this.pressureAt, this.point, p, Math.min(start, 0.5 * ceiling), ceiling, T < this.temperature.value);
    const dense = () => denseRoot(this.pressureAt, this.point, p, 3 / this.volume.value, ceiling);
    let rho: number | undefined;
    if (T > singleRootTemperature * this.temperature.value || root === "vapour") rho = thin() ?? dense();
    else if (root === "liquid") rho = dense() ?? thin();
    else rho = this.lowerGibbs(thin(), dense(), p);
    if (rho === undefined) {
      const roots = scannedRoots(this.pressureAt, this.point, p, ceiling);
      const [first, last] = [roots[0], roots.at(-1)];
      rho = root === "vapour" ? first : root === "liquid" ? last : this.lowerGibbs(first, last, p);
    }
    if (rho === undefined) {
      throw new EngineError("no-convergence", "no density satisfies GERG-2008", { temperatureK: T, pressurePa: p });
    }
    return 1 / rho;
  }

  /** Of a pure component above 0.97 of its critical temperature, where the general search for equal fugacities loses the two roots. */
  saturation(T: number): SaturationVolumes | undefined {
    const tau = this.temperature.value / T;
    if (tau > 1 / nearCritical) return undefined;
    const RT = gergConstants.R * T;
    const isotherm = { pressure: 0, slope: 0, gibbs: 0 };
    const evaluate = (rho: number) => {
      const mix = this.mixSums(rho * this.volume.value, tau);
      isotherm.pressure = rho * RT * (1 + mix[1]!);
      isotherm.slope = RT * (1 + 2 * mix[1]! + mix[3]!);
      isotherm.gibbs = mix[0]! + mix[1]! + Math.log(rho);
    };
    const found = saturationBySpinodals(evaluate, isotherm, 1 / this.volume.value, RT);
    if (found) return found;
    throw new EngineError(
      "not-applicable",
      "this fluid's isotherm has no loop: by its equation it is above its critical temperature",
      {
        temperatureK: T,
      },
    );
  }

  private lowerGibbs(thin: number | undefined, dense: number | undefined, p: number): number | undefined {
    if (thin === undefined || dense === undefined || Math.abs(dense / thin - 1) < 1e-9) return thin ?? dense;
    const gibbs = (rho: number) =>
      this.mixSums(rho * this.volume.value, this.temperature.value / this.T)[0]! +
      p / (rho * gergConstants.R * this.T) +
      Math.log(rho);
    return gibbs(dense) < gibbs(thin) ? dense : thin;
  }
}

type Six = readonly [number, number, number, number, number, number];
