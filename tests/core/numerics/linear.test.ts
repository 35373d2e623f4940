import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { solveInPlace } from '#core/numerics/linear/solve'

const N = 5
const entry = fc.integer({ min: -1000, max: 1000 }).map((i) => i / 1000)
const numbers = (length: number) => fc.array(entry, { minLength: length, maxLength: length })

/** Largest |A x − b| over all rows. */
function residual(matrix: Float64Array, x: Float64Array, right: Float64Array): number {
  let worst = 0
  for (let i = 0; i < N; i++) {
    let sum = 0
    for (let j = 0; j < N; j++) sum += matrix[i * N + j]! * x[j]!
    worst = Math.max(worst, Math.abs(sum - right[i]!))
  }
  return worst
}

describe('linear systems', () => {
  it('are solved to rounding when their diagonal dominates', () => {
    fc.assert(
      fc.property(numbers(N * N), numbers(N), (entries, b) => {
        const matrix = Float64Array.from(entries, (value, k) => value + (k % (N + 1) === 0 ? 6 : 0))
        const right = Float64Array.from(b)
        const x = right.slice()
        expect(solveInPlace(matrix.slice(), x, N)).toBe(true)
        // Diagonal 5 at least against at most 4 beside it: the condition number is of order one.
        expect(residual(matrix, x, right)).toBeLessThan(1e-14)
      }),
    )
  })

  it('have a small residual for any matrix that is not singular, through exchanges of rows', () => {
    fc.assert(
      fc.property(numbers(N * N), numbers(N), (entries, b) => {
        const matrix = Float64Array.from(entries)
        // The first pivot is zero: without an exchange there would be no solution.
        matrix[0] = 0
        const right = Float64Array.from(b)
        const x = right.slice()
        if (!solveInPlace(matrix.slice(), x, N)) return
        const size = Math.max(1, ...x.map(Math.abs))
        // Partial pivoting is backward stable: the residual is rounding times |A||x|, whatever the condition.
        expect(residual(matrix, x, right)).toBeLessThan(1e-13 * size)
      }),
    )
  })

  it('are solved where every pivot in order is zero, by exchanging rows', () => {
    // A cyclic shift: x moves by one place, exactly.
    const matrix = Float64Array.from({ length: N * N }, (_, k) =>
      k % N === (Math.floor(k / N) + 1) % N ? 1 : 0,
    )
    const x = Float64Array.from([1, 2, 3, 4, 5])
    expect(solveInPlace(matrix, x, N)).toBe(true)
    expect([...x]).toEqual([5, 1, 2, 3, 4])
  })

  it('are refused when singular or not finite', () => {
    expect(solveInPlace(Float64Array.from([1, 2, 2, 4]), Float64Array.from([1, 1]), 2)).toBe(false)
    expect(solveInPlace(Float64Array.from([NaN, 2, 2, 4]), Float64Array.from([1, 1]), 2)).toBe(false)
    expect(solveInPlace(Float64Array.from([Infinity, 2, 2, 4]), Float64Array.from([1, 1]), 2)).toBe(false)
  })
})
