/**
 * Clenshaw's recurrence: Σ c_j T_j(z) of the series of `terms` coefficients that begins at `start`.
 * Source: Trefethen, Approximation Theory and Approximation Practice (2013), chapter 19.
 */
export function chebyshevSeries(coefficients: Float64Array, start: number, terms: number, z: number): number {
  const twice = 2 * z
  let b1 = 0
  let b2 = 0
  for (let j = start + terms - 1; j > start; j--) {
    const b0 = coefficients[j]! + twice * b1 - b2
    b2 = b1
    b1 = b0
  }
  return coefficients[start]! + z * b1 - b2
}
