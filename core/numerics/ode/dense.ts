/** A solution kept whole: the collocation polynomials of every step, over both directions from the start. */
import type { OdeProblem } from './problem.ts'
import { solveOde } from './radau.ts'

export interface DenseSolution {
  readonly low: number
  readonly high: number
  /** Component i at t, low ≤ t ≤ high. */
  at(t: number, component: number): number
}

interface Piece {
  readonly low: number
  readonly high: number
  at(t: number, component: number): number
}

/** An integration that did not arrive. */
export class OdeFailure extends Error {
  readonly reason: string
  readonly t: number
  constructor(reason: string, t: number) {
    super(`${reason} at ${t}`)
    this.name = 'OdeFailure'
    this.reason = reason
    this.t = t
  }
}

/** Distance from a break, relative to its size, at which the equations are asked on either side of it. */
const EDGE = 1e-13

function solveTo(
  problem: OdeProblem,
  from: number,
  y: ArrayLike<number>,
  to: number,
  tolerance: number,
  pieces: Piece[],
): Float64Array {
  const low = Math.min(from, to)
  const high = Math.max(from, to)
  const inside = (t: number): number =>
    Math.min(Math.max(t, low + EDGE * Math.max(1, Math.abs(low))), high - EDGE * Math.max(1, Math.abs(high)))
  const solution = solveOde(
    {
      dimension: problem.dimension,
      evaluate: (t, state, slope, jacobian) => problem.evaluate(inside(t), state, slope, jacobian),
    },
    from,
    y,
    to,
    {
      absoluteTolerance: tolerance,
      firstStep: Math.min(0.05, high - low),
      onStep: (step) =>
        void pieces.push({
          low: Math.min(step.from, step.to),
          high: Math.max(step.from, step.to),
          at: step.polynomial(),
        }),
    },
  )
  if (solution.status === 'failed') throw new OdeFailure(solution.reason, solution.t)
  return solution.y
}

/**
 * Solves from t₀ down to `low` and up to `high`, restarting at the breaks, and keeps the polynomials.
 * The polynomial of a step is of the order that its error estimate measures, so between the ends it is as good as `tolerance`.
 * @throws OdeFailure
 */
export function denseOde(
  problem: OdeProblem,
  t0: number,
  y0: ArrayLike<number>,
  range: { low: number; high: number },
  breaks: readonly number[],
  tolerance: number,
): DenseSolution {
  const pieces: Piece[] = []
  const inner = (a: number, b: number): number[] =>
    breaks.filter((t) => t > a + 1e-12 && t < b - 1e-12).sort((x, z) => x - z)
  const follow = (ends: readonly number[]): void => {
    let from = t0
    let y: ArrayLike<number> = y0
    for (const to of ends) {
      y = solveTo(problem, from, y, to, tolerance, pieces)
      from = to
    }
  }
  if (range.high > t0) follow([...inner(t0, range.high), range.high])
  if (range.low < t0) follow([...inner(range.low, t0).reverse(), range.low])
  pieces.sort((a, b) => a.low - b.low)
  const lows = Float64Array.from(pieces, (piece) => piece.low)
  return {
    ...range,
    at(t, component) {
      let first = 0
      let last = lows.length - 1
      while (first < last) {
        const middle = (first + last + 1) >> 1
        if (lows[middle]! <= t) first = middle
        else last = middle - 1
      }
      return pieces[first]!.at(t, component)
    },
  }
}
