import { EngineError } from "../../errors";
import { denseRoot, thinRoot, type PressurePoint } from "../density-roots";
import type { ResidualDerivatives, ResidualModel, Root, SaturationVolumes } from "../fluid-model";
import { ancillary, type ReferenceFluid } from "./reference-data";
import { createReducedDerivatives, ReducedTerms, type ReducedDerivatives } from "./reduced-terms";

/** Highest reduced density that is searched; the densest liquids of the fluids in the table lie near 3.5. */
const densestReduced = 5;
/** The saturation-pressure ancillaries are within 0.1 %: outside this band they decide the phase, inside it the Gibbs energy does. */
const undecided = 0.01;
/** The density ancillaries are within 1 % well below the critical point: two volumes this near them are not of a false branch. */
const ancillaryBand = 0.02;

/** F = n αr(δ, τ) of a pure fluid by its reference equation. */
export class ReferenceResidual implements ResidualModel {
  readonly hasFalseBranches = true;
  private readonly terms: ReducedTerms;
  private readonly reduced = createReducedDerivatives();
  private readonly point: PressurePoint = { pressure: 0, slope: 0 };
  private readonly R: number;
  private readonly rhoR: number;
  private readonly Tr: number;
  private n = 1;
  private T = 0;

  constructor(private readonly fluid: ReferenceFluid) {
    this.terms = new ReducedTerms([fluid.residual]);
    this.R = fluid.R_J_per_molK;
    this.rhoR = fluid.reducing.rho_mol_per_m3;
    this.Tr = fluid.reducing.T_K;
  }

  setComposition(n: ArrayLike<number>): void {
    this.n = n[0]!;
  }

  minimumVolume(): number {
    return this.n / (densestReduced * this.rhoR);
  }

  evaluate(T: number, V: number, order: 0 | 1 | 2, out: ResidualDerivatives): void {
    const { n } = this;
    const { a, d, t, dd, dt, tt } = this.reduce(n / (V * this.rhoR), this.Tr / T);
    out.F = n * a;
    out.FV = (-n * d) / V;
    out.FVV = (n * (dd + 2 * d)) / (V * V);
    out.FT = (-n * t) / T;
    out.FTT = (n * (tt + 2 * t)) / (T * T);
    out.FTV = (n * dt) / (T * V);
    if (order === 0) return;
    out.Fn[0] = a + d;
    if (order === 1) return;
    out.FnT[0] = -(t + dt) / T;
    out.FnV[0] = -(2 * d + dd) / V;
    out.Fnn[0] = (2 * d + dd) / n;
  }

  private reduce(delta: number, tau: number): ReducedDerivatives {
    const { terms, reduced } = this;
    const { sums } = terms;
    terms.evaluate(delta, tau);
    reduced.a = sums[0]!;
    reduced.d = sums[1]!;
    reduced.t = sums[2]!;
    reduced.dd = sums[3]!;
    reduced.dt = sums[4]!;
    reduced.tt = sums[5]!;
    return reduced;
  }

  private readonly pressureAt = (rho: number): void => {
    const { point, R, T } = this;
    const reduced = this.reduce(rho / this.rhoR, this.Tr / T);
    point.pressure = rho * R * T * (1 + reduced.d);
    point.slope = R * T * (1 + 2 * reduced.d + reduced.dd);
  };

  volumeAtPressure(T: number, p: number, root: Root): number {
    this.T = T;
    const { critical, saturationAncillaries } = this.fluid;
    const thin = () => thinRoot(this.pressureAt, this.point, p, p / (this.R * T), densestReduced * this.rhoR, T < critical.T_K);
    const dense = () => {
      const start = T < critical.T_K ? 1.02 * ancillary(saturationAncillaries.rhoLiquid, T) : 2.2 * this.rhoR;
      return denseRoot(this.pressureAt, this.point, p, start, densestReduced * this.rhoR);
    };
    let rho: number | undefined;
    if (T >= critical.T_K) {
      rho = thin() ?? dense();
    } else if (root === "vapour") {
      rho = thin() ?? dense();
    } else if (root === "liquid") {
      rho = dense() ?? thin();
    } else {
      const saturation = ancillary(saturationAncillaries.pSat, T);
      if (p < saturation * (1 - undecided)) rho = thin() ?? dense();
      else if (p > saturation * (1 + undecided)) rho = dense() ?? thin();
      else rho = this.lowerGibbs(thin(), dense(), p);
    }
    if (rho === undefined) {
      throw new EngineError("no-convergence", "no density satisfies the reference equation", { temperatureK: T, pressurePa: p });
    }
    return 1 / rho;
  }

  private lowerGibbs(thin: number | undefined, dense: number | undefined, p: number): number | undefined {
    if (thin === undefined || dense === undefined) return thin ?? dense;
    const gibbs = (rho: number) => {
      return this.reduce(rho / this.rhoR, this.Tr / this.T).a + p / (rho * this.R * this.T) + Math.log(rho);
    };
    return gibbs(dense) < gibbs(thin) ? dense : thin;
  }

  isSaturation(T: number, vapourVolume: number, liquidVolume: number): boolean {
    const { rhoLiquid, rhoVapour } = this.fluid.saturationAncillaries;
    return (
      Math.abs(liquidVolume * ancillary(rhoLiquid, T) - 1) < ancillaryBand &&
      Math.abs(vapourVolume * ancillary(rhoVapour, T) - 1) < ancillaryBand
    );
  }

  /**
   * Saturated volumes by Newton on equal pressure and equal Gibbs energy in (δ_L, δ_V), from the ancillary equations.
   *
   * Source   Akasaka, J. Therm. Sci. Technol. 3 (2008) 442-451.
   * Returns  undefined where it does not converge to two phases (close to the critical point)
   */
  saturation(T: number): SaturationVolumes | undefined {
    const { critical, saturationAncillaries } = this.fluid;
    if (!(T < critical.T_K)) return undefined;
    const { reduced, rhoR, R } = this;
    const tau = this.Tr / T;
    let dense = ancillary(saturationAncillaries.rhoLiquid, T) / rhoR;
    let thin = ancillary(saturationAncillaries.rhoVapour, T) / rhoR;
    let previous = Infinity;
    for (let iteration = 0; iteration < 60; iteration++) {
      this.reduce(dense, tau);
      const J_L = dense * (1 + reduced.d);
      const K_L = reduced.d + reduced.a + Math.log(dense);
      const dJ_L = 1 + 2 * reduced.d + reduced.dd;
      const dK_L = dJ_L / dense;
      this.reduce(thin, tau);
      const J_V = thin * (1 + reduced.d);
      const K_V = reduced.d + reduced.a + Math.log(thin);
      const dJ_V = 1 + 2 * reduced.d + reduced.dd;
      const dK_V = dJ_V / thin;
      const determinant = dJ_V * dK_L - dJ_L * dK_V;
      const stepL = ((K_V - K_L) * dJ_V - (J_V - J_L) * dK_V) / determinant;
      const stepV = ((K_V - K_L) * dJ_L - (J_V - J_L) * dK_L) / determinant;
      const size = Math.max(Math.abs(stepL) / dense, Math.abs(stepV) / thin);
      if (!Number.isFinite(size)) return undefined;
      if (size < 1e-14 || (size < 1e-10 && size >= 0.5 * previous)) {
        if (!(dense > thin * (1 + 1e-7) && dJ_L > 0 && dJ_V > 0)) return undefined;
        return { pressurePa: J_V * rhoR * R * T, vapourVolume: 1 / (thin * rhoR), liquidVolume: 1 / (dense * rhoR) };
      }
      previous = size;
      const shorten = size > 0.3 ? 0.3 / size : 1;
      dense += shorten * stepL;
      thin += shorten * stepV;
    }
    return undefined;
  }
}
