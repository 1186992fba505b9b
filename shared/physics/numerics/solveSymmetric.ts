/**
 * Solves N x = s for a symmetric, positive definite N, by N = L D Lᵀ without pivoting. Only the lower
 * triangle is read; both arguments are overwritten, `vector` by the solution. No allocation.
 *
 * No guard: it runs in the innermost loop, and what is not positive definite shows as NaN or Infinity.
 *
 * @param matrix  N, row after row, `stride` numbers each
 * @param stride  distance from row to row
 * @param size    number of unknowns
 * @param vector  s on entry, x on return
 *
 * @source [GolubVanLoan2013], section 4.1
 */
export function solveSymmetric(
  matrix: Float64Array,
  stride: number,
  size: number,
  vector: Float64Array,
): void {
  for (let j = 0; j < size; j += 1) {
    const rowJ = j * stride;
    // Row j: first u = L D in place, then L, the pivot and the forward substitution from it.
    let pivot = matrix[rowJ + j];
    let forward = vector[j];
    for (let k = 0; k < j; k += 1) {
      const rowK = k * stride;
      let u = matrix[rowJ + k];
      for (let l = 0; l < k; l += 1) u -= matrix[rowJ + l] * matrix[rowK + l];
      matrix[rowJ + k] = u;
    }
    for (let k = 0; k < j; k += 1) {
      const u = matrix[rowJ + k];
      const factor = u * inversePivots[k];
      pivot -= u * factor;
      forward -= factor * vector[k];
      matrix[rowJ + k] = factor;
    }
    inversePivots[j] = 1 / pivot;
    vector[j] = forward;
  }
  for (let j = size - 1; j >= 0; j -= 1) {
    let sum = vector[j] * inversePivots[j];
    for (let k = j + 1; k < size; k += 1) sum -= matrix[k * stride + j] * vector[k];
    vector[j] = sum;
  }
}

const inversePivots = new Float64Array(64);
