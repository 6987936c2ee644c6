/**
 * Solves A x = b for a symmetric positive definite matrix (row-major, lower triangle read), overwriting A with its Cholesky
 * factor and b with x. Returns false, with A and b spoiled, when A is not positive definite.
 */
export function solvePositiveDefinite(A: Float64Array, b: Float64Array, size: number): boolean {
  for (let i = 0; i < size; i++) {
    const row = i * size;
    for (let j = 0; j <= i; j++) {
      const other = j * size;
      let sum = A[row + j]!;
      for (let k = 0; k < j; k++) sum -= A[row + k]! * A[other + k]!;
      if (i === j) {
        if (!(sum > 1e-14)) return false;
        A[row + i] = Math.sqrt(sum);
      } else {
        A[row + j] = sum / A[other + j]!;
      }
    }
  }
  for (let i = 0; i < size; i++) {
    let sum = b[i]!;
    for (let k = 0; k < i; k++) sum -= A[i * size + k]! * b[k]!;
    b[i] = sum / A[i * size + i]!;
  }
  for (let i = size - 1; i >= 0; i--) {
    let sum = b[i]!;
    for (let k = i + 1; k < size; k++) sum -= A[k * size + i]! * b[k]!;
    b[i] = sum / A[i * size + i]!;
  }
  return true;
}

/**
 * Solves [A b; r c] [x; t] = [f; g] where A is symmetric positive definite of `size` and the matrix is stored row-major with
 * `size + 1` columns: Cholesky of A, then the Schur complement of the last row. Leaves the answer in `rhs`, and the matrix as it
 * was. Returns false where A is not positive definite.
 */
export function solveBordered(
  matrix: Float64Array,
  rhs: Float64Array,
  size: number,
  factor: Float64Array,
  column: Float64Array,
): boolean {
  const stride = size + 1;
  for (let i = 0; i < size; i++) {
    const row = i * size;
    for (let j = 0; j <= i; j++) {
      const other = j * size;
      let sum = matrix[i * stride + j]!;
      for (let k = 0; k < j; k++) sum -= factor[row + k]! * factor[other + k]!;
      if (i === j) {
        if (!(sum > 1e-14)) return false;
        factor[row + i] = 1 / Math.sqrt(sum);
      } else {
        factor[row + j] = sum * factor[other + j]!;
      }
    }
  }
  for (let i = 0; i < size; i++) {
    let f = rhs[i]!;
    let b = matrix[i * stride + size]!;
    for (let k = 0; k < i; k++) {
      f -= factor[i * size + k]! * rhs[k]!;
      b -= factor[i * size + k]! * column[k]!;
    }
    rhs[i] = f * factor[i * size + i]!;
    column[i] = b * factor[i * size + i]!;
  }
  for (let i = size - 1; i >= 0; i--) {
    let f = rhs[i]!;
    let b = column[i]!;
    for (let k = i + 1; k < size; k++) {
      f -= factor[k * size + i]! * rhs[k]!;
      b -= factor[k * size + i]! * column[k]!;
    }
    rhs[i] = f * factor[i * size + i]!;
    column[i] = b * factor[i * size + i]!;
  }
  let above = rhs[size]!;
  let below = matrix[size * stride + size]!;
  for (let k = 0; k < size; k++) {
    above -= matrix[size * stride + k]! * rhs[k]!;
    below -= matrix[size * stride + k]! * column[k]!;
  }
  if (below === 0) return false;
  const t = above / below;
  for (let k = 0; k < size; k++) rhs[k] = rhs[k]! - t * column[k]!;
  rhs[size] = t;
  return true;
}

/** Solves A x = b by LU with row pivoting, overwriting A and leaving x in b. Returns false when A is singular. */
export function solveLinear(A: Float64Array, b: Float64Array, size: number): boolean {
  for (let column = 0; column < size; column++) {
    let pivot = column;
    for (let i = column + 1; i < size; i++) {
      if (Math.abs(A[i * size + column]!) > Math.abs(A[pivot * size + column]!)) pivot = i;
    }
    const head = A[pivot * size + column]!;
    if (!(Math.abs(head) > 1e-300)) return false;
    if (pivot !== column) {
      for (let k = column; k < size; k++) {
        const swap = A[column * size + k]!;
        A[column * size + k] = A[pivot * size + k]!;
        A[pivot * size + k] = swap;
      }
      const swap = b[column]!;
      b[column] = b[pivot]!;
      b[pivot] = swap;
    }
    for (let i = column + 1; i < size; i++) {
      const factor = A[i * size + column]! / head;
      if (factor === 0) continue;
      for (let k = column + 1; k < size; k++) A[i * size + k] = A[i * size + k]! - factor * A[column * size + k]!;
      b[i] = b[i]! - factor * b[column]!;
    }
  }
  for (let i = size - 1; i >= 0; i--) {
    let sum = b[i]!;
    for (let k = i + 1; k < size; k++) sum -= A[i * size + k]! * b[k]!;
    b[i] = sum / A[i * size + i]!;
  }
  return true;
}
