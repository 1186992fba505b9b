/**
 * Solves A x = b for several b at once, by elimination with row pivoting. Both arguments are overwritten, `vectors` by
 * the solutions.
 *
 * @param matrix   A, row after row, `size` numbers each
 * @param size     number of unknowns
 * @param vectors  row after row, one number of each b; of each x on return
 * @param columns  how many b there are
 * @returns        whether there is a solution: false if A is singular or anything is not a number
 *
 * @source [GolubVanLoan2013], section 3.4
 */
export function solveLinear(
  matrix: Float64Array,
  size: number,
  vectors: Float64Array,
  columns: number,
): boolean {
  for (let j = 0; j < size; j += 1) {
    let best = j;
    for (let i = j + 1; i < size; i += 1) {
      if (Math.abs(matrix[i * size + j]) > Math.abs(matrix[best * size + j])) best = i;
    }
    const pivot = matrix[best * size + j];
    if (!(Math.abs(pivot) > 0 && Math.abs(pivot) < Infinity)) return false;
    if (best !== j) {
      exchangeRows(matrix, size, j, best);
      exchangeRows(vectors, columns, j, best);
    }
    for (let i = j + 1; i < size; i += 1) {
      const factor = matrix[i * size + j] / pivot;
      if (factor === 0) continue;
      for (let k = j + 1; k < size; k += 1) matrix[i * size + k] -= factor * matrix[j * size + k];
      for (let c = 0; c < columns; c += 1) vectors[i * columns + c] -= factor * vectors[j * columns + c];
    }
  }
  let sum = 0;
  for (let i = size - 1; i >= 0; i -= 1) {
    for (let k = i + 1; k < size; k += 1) {
      const factor = matrix[i * size + k];
      for (let c = 0; c < columns; c += 1) vectors[i * columns + c] -= factor * vectors[k * columns + c];
    }
    const inverse = 1 / matrix[i * size + i];
    for (let c = 0; c < columns; c += 1) {
      vectors[i * columns + c] *= inverse;
      sum += Math.abs(vectors[i * columns + c]);
    }
  }
  return Number.isFinite(sum);
}

function exchangeRows(rows: Float64Array, length: number, one: number, other: number): void {
  for (let k = 0; k < length; k += 1) {
    const kept = rows[one * length + k];
    rows[one * length + k] = rows[other * length + k];
    rows[other * length + k] = kept;
  }
}
