/**
 * A number together with its numerical error: the same problem solved with two efforts, of which the finer is given and the
 * difference is its estimated error. When two neighbours disagree the next finer one is tried; when the finest two still
 * disagree there is no result.
 */
import { ConvergenceError } from '../numerics/convergence.ts'

/** Relative difference between neighbouring efforts that is taken as agreement. */
const AGREEMENT = 5e-7

/** Rounding and the interpolation of special functions, which both efforts share and their difference cannot show. */
const COMMON_ERROR = 2e-10

export interface Checked<T> {
  value: T
  /** Estimated relative error. */
  error: number
}

/**
 * @param solve solves with effort i
 * @param numberOf the positive number whose convergence counts
 * @param floor relative error that the difference cannot show: what both efforts share, such as the history's table, and
 *   what the finer of them is known to leave
 */
export function checked<T>(
  efforts: number,
  solve: (effort: number) => T,
  numberOf: (result: T) => number,
  floor: (effort: number) => number,
): Checked<T> {
  let coarse = solve(0)
  for (let i = 1; i < efforts; i++) {
    const fine = solve(i)
    const difference = Math.abs(numberOf(fine) / numberOf(coarse) - 1)
    if (difference < AGREEMENT) return { value: fine, error: difference + floor(i) + COMMON_ERROR }
    coarse = fine
  }
  throw new ConvergenceError('solutions of rising accuracy do not agree to 5e-7')
}
