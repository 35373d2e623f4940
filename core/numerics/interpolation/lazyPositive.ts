/**
 * A costly positive function of ln x, tabulated as its logarithm cell by cell when a cell is first asked for.
 * A memo of a pure function: what it returns does not depend on what was asked before.
 */
import { evaluateColumn, tabulate } from './chebyshev.ts'
import type { ChebyshevTable } from './chebyshev.ts'

/** Stands for zero, whose logarithm does not exist. */
const NOTHING = 1e-300

const CELL = 0.75

/** @param tolerance wanted error of the logarithm */
export function lazyPositive(f: (x: number) => number, tolerance: number): (x: number) => number {
  const cells = new Map<number, ChebyshevTable>()
  return (x) => {
    const lnX = Math.log(x)
    const index = Math.floor(lnX / CELL)
    let cell = cells.get(index)
    if (!cell) {
      const low = index * CELL
      cell = tabulate(
        (at, out) => (out[0] = Math.log(Math.max(f(Math.exp(at)), NOTHING))),
        1,
        low,
        low + CELL,
        { tolerance, maximumDepth: 5 },
      )
      cells.set(index, cell)
    }
    return Math.exp(evaluateColumn(cell, 0, lnX))
  }
}
