/**
 * Solves A x = b in place by Gaussian elimination with partial pivoting: A (n × n, row by row) is destroyed, b becomes x.
 * Returns false when a pivot is zero or not finite.
 */
export function solveInPlace(matrix: Float64Array, b: Float64Array, n: number): boolean {
  for (let k = 0; k < n; k++) {
    const pivot = pivotRow(matrix, n, k)
    const size = Math.abs(matrix[pivot * n + k]!)
    if (!(size > 0) || !Number.isFinite(size)) return false
    if (pivot !== k) swapRows(matrix, b, n, k, pivot)
    const inverse = 1 / matrix[k * n + k]!
    for (let i = k + 1; i < n; i++) {
      const factor = matrix[i * n + k]! * inverse
      if (factor === 0) continue
      for (let j = k + 1; j < n; j++) matrix[i * n + j]! -= factor * matrix[k * n + j]!
      b[i]! -= factor * b[k]!
    }
  }
  for (let i = n - 1; i >= 0; i--) {
    let sum = b[i]!
    for (let j = i + 1; j < n; j++) sum -= matrix[i * n + j]! * b[j]!
    b[i] = sum / matrix[i * n + i]!
  }
  return true
}

function pivotRow(matrix: Float64Array, n: number, column: number): number {
  let best = column
  for (let i = column + 1; i < n; i++)
    if (Math.abs(matrix[i * n + column]!) > Math.abs(matrix[best * n + column]!)) best = i
  return best
}

function swapRows(matrix: Float64Array, b: Float64Array, n: number, i: number, j: number): void {
  for (let k = 0; k < n; k++) {
    const held = matrix[i * n + k]!
    matrix[i * n + k] = matrix[j * n + k]!
    matrix[j * n + k] = held
  }
  const held = b[i]!
  b[i] = b[j]!
  b[j] = held
}
