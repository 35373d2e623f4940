/**
 * The Chebyshev series of a costly function on [−1, 1] from as few of its values as it takes: at 9, 17 or 33 extrema of T_n, each
 * set holding the one before.
 * Source: Trefethen, Approximation Theory and Approximation Practice (2013), chapters 3 and 4.
 */
export interface ChebyshevFit {
  readonly coefficients: Float64Array
  /** Size of the last coefficients: about the error of the series. */
  readonly tail: number
}

const COARSEST = 8
const FINEST = 32

/** cos(πm/32). */
const cosine = Float64Array.from({ length: 2 * FINEST }, (_, m) => Math.cos((Math.PI * m) / FINEST))

/** Coefficients from the values at cos(πk/n), of which every `FINEST/n`th is given. */
function transform(values: Float64Array, n: number): Float64Array {
  const stride = FINEST / n
  return Float64Array.from({ length: n + 1 }, (_, j) => {
    let sum = (values[0]! + (j % 2 === 0 ? 1 : -1) * values[FINEST]!) / 2
    for (let k = 1; k < n; k++) sum += values[k * stride]! * cosine[(j * k * stride) % (2 * FINEST)]!
    return sum * (j === 0 || j === n ? 1 / n : 2 / n)
  })
}

/** Fits f until the last three coefficients are below the tolerance, or the 33 values are used up; `tail` tells. */
export function nestedFit(f: (z: number) => number, tolerance: number): ChebyshevFit {
  const values = new Float64Array(FINEST + 1)
  for (let n = COARSEST; ; n *= 2) {
    const stride = FINEST / n
    for (let k = 0; k <= n; k++)
      if (n === COARSEST || k % 2 === 1) values[k * stride] = f(cosine[k * stride]!)
    const coefficients = transform(values, n)
    const tail = Math.max(...coefficients.subarray(n - 2).map(Math.abs))
    if (tail < tolerance || n === FINEST) return { coefficients, tail }
  }
}
