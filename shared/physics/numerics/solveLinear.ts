/**
 * Solves A x = b by elimination with row pivoting. Both arguments are overwritten, `vector` by the solution.
 *
 * @param matrix  A, row after row, `size` numbers each
 * @param size    number of unknowns
 * @param vector  b on entry, x on return
 * @returns       whether there is one: false if A is singular or holds what is not a number
 *
 * @source [GolubVanLoan2013], section 3.4
 */
export function solveLinear(matrix: Float64Array, size: number, vector: Float64Array): boolean {
  for (let j = 0; j < size; j += 1) {
    let best = j;
    for (let i = j + 1; i < size; i += 1) {
      if (Math.abs(matrix[i * size + j]) > Math.abs(matrix[best * size + j])) best = i;
    }
    const pivot = matrix[best * size + j];
    if (!(Math.abs(pivot) > 0 && Math.abs(pivot) < Infinity)) return false;
    if (best !== j) exchangeRows(matrix, size, vector, j, best);
    for (let i = j + 1; i < size; i += 1) {
      const factor = matrix[i * size + j] / pivot;
      if (factor === 0) continue;
      for (let k = j + 1; k < size; k += 1) matrix[i * size + k] -= factor * matrix[j * size + k];
      vector[i] -= factor * vector[j];
    }
  }
  for (let i = size - 1; i >= 0; i -= 1) {
    let sum = vector[i];
    for (let k = i + 1; k < size; k += 1) sum -= matrix[i * size + k] * vector[k];
    vector[i] = sum / matrix[i * size + i];
    if (!Number.isFinite(vector[i])) return false;
  }
  return true;
}

function exchangeRows(
  matrix: Float64Array,
  size: number,
  vector: Float64Array,
  one: number,
  other: number,
): void {
  for (let k = 0; k < size; k += 1) {
    const kept = matrix[one * size + k];
    matrix[one * size + k] = matrix[other * size + k];
    matrix[other * size + k] = kept;
  }
  const kept = vector[one];
  vector[one] = vector[other];
  vector[other] = kept;
}
