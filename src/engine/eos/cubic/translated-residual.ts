import type { ResidualDerivatives, ResidualModel, Root } from "../fluid-model";

/**
 * An equation of state with its volumes shifted: v = v' − c, c = Σ x_i c_i, the c_i independent of temperature.
 *
 *   p(T, V, n) = p'(T, V + C, n),  C = Σ n_i c_i      F(T, V, n) = F'(T, V + C, n) + n ln[V/(V + C)]
 *
 * Everything else follows from F: at given (T, p) ln φ_i shifts by −c_i p/(R T) in every phase, so phase equilibria stay; h shifts by −c p; u, s
 * and heat capacities at constant pressure stay. Volumes, densities and with them the phases in a vessel of given volume change.
 *
 * Source   Peneloux, Rauzy and Freze, Fluid Phase Equilib. 8 (1982) 7-23; F by integrating the shifted pressure from infinite volume.
 */
export class TranslatedResidual implements ResidualModel {
  readonly hasFalseBranches: boolean;
  private n = 0;
  private C = 0;

  constructor(
    private readonly inner: ResidualModel,
    /** c_i [m³/mol] */
    private readonly shift: Float64Array,
  ) {
    this.hasFalseBranches = inner.hasFalseBranches;
  }

  setComposition(n: ArrayLike<number>): void {
    const { shift } = this;
    let total = 0;
    let C = 0;
    for (let i = 0; i < shift.length; i++) {
      total += n[i]!;
      C += n[i]! * shift[i]!;
    }
    this.n = total;
    this.C = C;
    this.inner.setComposition(n);
  }

  minimumVolume(): number {
    return this.inner.minimumVolume() - this.C;
  }

  volumeAtPressure(T: number, p: number, root: Root): number {
    return this.inner.volumeAtPressure(T, p, root) - this.C / this.n;
  }

  evaluate(T: number, V: number, order: 0 | 1 | 2, out: ResidualDerivatives): void {
    const { shift, n } = this;
    const count = shift.length;
    const W = V + this.C;
    const perV = 1 / V;
    const perW = 1 / W;
    this.inner.evaluate(T, W, order, out);
    const { FV, FVV, FTV } = out;
    const ln = Math.log(V * perW);
    out.F += n * ln;
    out.FV = FV + n * (perV - perW);
    out.FVV = FVV + n * (perW * perW - perV * perV);
    if (order === 0) return;
    const { Fn, FnT, FnV, Fnn } = out;
    for (let i = 0; i < count; i++) Fn[i] = Fn[i]! + (FV - n * perW) * shift[i]! + ln;
    if (order === 1) return;
    const both = FVV + n * perW * perW;
    for (let i = 0; i < count; i++) {
      for (let j = 0; j <= i; j++) {
        const value =
          Fnn[i * count + j]! + (FnV[i]! - perW) * shift[j]! + (FnV[j]! - perW) * shift[i]! + both * shift[i]! * shift[j]!;
        Fnn[i * count + j] = value;
        Fnn[j * count + i] = value;
      }
    }
    for (let i = 0; i < count; i++) {
      FnT[i] = FnT[i]! + FTV * shift[i]!;
      FnV[i] = FnV[i]! + both * shift[i]! + perV - perW;
    }
  }
}
