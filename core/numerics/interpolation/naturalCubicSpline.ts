/** A cubic spline with zero second derivative at both ends. */
export interface CubicSpline {
  readonly x: readonly number[]
  readonly y: readonly number[]
  /** Second derivative at each knot. */
  readonly curvature: readonly number[]
}

/**
 * Natural cubic spline through (x_i, y_i), x ascending.
 * Source: de Boor, A Practical Guide to Splines (1978), chapter IV; the tridiagonal system is solved by elimination.
 */
export function naturalCubicSpline(x: readonly number[], y: readonly number[]): CubicSpline {
  const n = x.length
  const curvature = new Array<number>(n).fill(0)
  const upper = new Array<number>(n).fill(0)
  for (let i = 1; i < n - 1; i++) {
    const left = x[i]! - x[i - 1]!
    const right = x[i + 1]! - x[i]!
    const slopes = (y[i + 1]! - y[i]!) / right - (y[i]! - y[i - 1]!) / left
    const pivot = 2 * (left + right) - left * upper[i - 1]!
    upper[i] = right / pivot
    curvature[i] = (6 * slopes - left * curvature[i - 1]!) / pivot
  }
  for (let i = n - 2; i > 0; i--) curvature[i]! -= upper[i]! * curvature[i + 1]!
  return { x, y, curvature }
}

/** Value and first derivative of the spline at `at`; the end pieces go on outside. */
export function evaluateSpline(spline: CubicSpline, at: number): { value: number; slope: number } {
  const { x, y, curvature } = spline
  let i = 0
  while (i < x.length - 2 && at >= x[i + 1]!) i++
  const h = x[i + 1]! - x[i]!
  const b = (at - x[i]!) / h
  const a = 1 - b
  const value =
    a * y[i]! +
    b * y[i + 1]! +
    (((a ** 3 - a) * curvature[i]! + (b ** 3 - b) * curvature[i + 1]!) * h * h) / 6
  const slope =
    (y[i + 1]! - y[i]!) / h +
    (h / 6) * ((3 * b * b - 1) * curvature[i + 1]! - (3 * a * a - 1) * curvature[i]!)
  return { value, slope }
}
