/**
 * Inverts a square matrix, row by row in one array, by elimination with the largest pivot of each column.
 *
 * @param matrix is used up.
 * @param inverse is written only when the matrix can be inverted.
 * @returns whether it could.
 */
export function invertInto(matrix: Float64Array, size: number, inverse: Float64Array): boolean {
  const found = new Float64Array(size * size);
  for (let i = 0; i < size; i++) found[i * size + i] = 1;
  for (let column = 0; column < size; column++) {
    let pivotRow = column;
    for (let row = column + 1; row < size; row++)
      if (Math.abs(matrix[row * size + column]!) > Math.abs(matrix[pivotRow * size + column]!)) pivotRow = row;
    const pivot = matrix[pivotRow * size + column]!;
    if (Math.abs(pivot) < 1e-11) return false;
    if (pivotRow !== column)
      for (let j = 0; j < size; j++) {
        swap(matrix, pivotRow * size + j, column * size + j);
        swap(found, pivotRow * size + j, column * size + j);
      }
    const base = column * size;
    for (let j = 0; j < size; j++) {
      matrix[base + j]! /= pivot;
      found[base + j]! /= pivot;
    }
    for (let row = 0; row < size; row++) {
      const factor = matrix[row * size + column]!;
      if (row === column || factor === 0) continue;
      const other = row * size;
      for (let j = column; j < size; j++) matrix[other + j]! -= factor * matrix[base + j]!;
      for (let j = 0; j < size; j++) found[other + j]! -= factor * found[base + j]!;
    }
  }
  inverse.set(found);
  return true;
}

function swap(array: Float64Array, i: number, j: number): void {
  const kept = array[i]!;
  array[i] = array[j]!;
  array[j] = kept;
}
