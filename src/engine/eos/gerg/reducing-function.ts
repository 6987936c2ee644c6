/**
 * A reducing function of GERG-2008 in mole numbers, with first and second derivatives:
 *
 *   Y(n) = Σ n_i² Y_i + Σ_{i<j} 2 n_i n_j β γ (n_i + n_j)/(β² n_i + n_j) Y_ij,   Y/n² = T_r or 1/ρ_r
 *
 * Source   Kunz and Wagner, J. Chem. Eng. Data 57 (2012) 3032, eqs. 16 and 17. Y is homogeneous of degree two in n.
 */
export class ReducingFunction {
  value = 0;
  readonly first: Float64Array;
  readonly second: Float64Array;

  constructor(
    private readonly own: Float64Array,
    /** 2 β γ Y_ij and β² for i < j, row-major; anything elsewhere. */
    private readonly cross: Float64Array,
    private readonly betaSquared: Float64Array,
  ) {
    this.first = new Float64Array(own.length);
    this.second = new Float64Array(own.length ** 2);
  }

  evaluate(x: Float64Array, order: 0 | 1 | 2): void {
    const { own, cross, betaSquared, first, second } = this;
    const count = own.length;
    let value = 0;
    if (order > 0) first.fill(0);
    if (order > 1) second.fill(0);
    for (let i = 0; i < count; i++) {
      const xi = x[i]!;
      value += xi * xi * own[i]!;
      if (order > 0) first[i] = first[i]! + 2 * xi * own[i]!;
      if (order > 1) second[i * count + i] = second[i * count + i]! + 2 * own[i]!;
      for (let j = i + 1; j < count; j++) {
        const xj = x[j]!;
        if (xi + xj === 0) continue; // the limit is zero, and so are all derivatives that reach an answer
        const c = cross[i * count + j]!;
        const b = betaSquared[i * count + j]!;
        const sum = xi + xj;
        const bottom = b * xi + xj;
        // f = xi xj (xi + xj)/(b xi + xj)
        const ratio = sum / bottom;
        value += c * xi * xj * ratio;
        if (order === 0) continue;
        const ratio_i = (1 - b * ratio) / bottom;
        const ratio_j = (1 - ratio) / bottom;
        first[i] = first[i]! + c * (xj * ratio + xi * xj * ratio_i);
        first[j] = first[j]! + c * (xi * ratio + xi * xj * ratio_j);
        if (order === 1) continue;
        const ratio_ii = (-2 * b * ratio_i) / bottom;
        const ratio_jj = (-2 * ratio_j) / bottom;
        const ratio_ij = (-b * ratio_j - ratio_i) / bottom;
        second[i * count + i] = second[i * count + i]! + c * xj * (2 * ratio_i + xi * ratio_ii);
        second[j * count + j] = second[j * count + j]! + c * xi * (2 * ratio_j + xj * ratio_jj);
        const mixed = c * (ratio + xj * ratio_j + xi * ratio_i + xi * xj * ratio_ij);
        second[i * count + j] = second[i * count + j]! + mixed;
        second[j * count + i] = second[j * count + i]! + mixed;
      }
    }
    this.value = value;
  }
}
