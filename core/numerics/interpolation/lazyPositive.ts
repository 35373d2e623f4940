/**
 * A costly positive function f, tabulated as ln f against ln x cell by cell when a cell is first asked for. A cell that its series
 * does not resolve is halved. Where f comes to follow a power of x, f → x^p (c₀ + c₁/x + …), a last cell over 1/x reaches from there
 * to infinity.
 * A memo of a pure function: what it returns does not depend on what was asked before.
 */
import { ConvergenceError } from '../convergence.ts'
import { chebyshevSeries } from './clenshaw.ts'
import { nestedFit } from './nestedFit.ts'

export interface LazyOptions {
  /** Wanted absolute error of ln f. */
  tolerance: number
  /** p, when f follows a power of x for large x. */
  coldPower?: number
}

/** Cells are two e-folds wide about x = 1, where things happen, and eight beyond six e-folds from it. */
const NEAR = 6
const NEAR_CELL = 2
const FAR_CELL = 8

const MAXIMUM_DEPTH = 9

/** Error of ln f above which no number made with the table is given. */
const UNRESOLVED = 1e-6

/** Stands for zero, whose logarithm does not exist. */
const NOTHING = 1e-300

/** 1/x of a last cell, relative to its largest, that stands for zero. */
const INFINITELY_COLD = 1e-12

/** A stretch of ln x and its series. */
interface Piece {
  readonly low: number
  readonly high: number
  readonly coefficients: Float64Array
}

interface LastCell {
  readonly startsAt: number
  readonly coefficients: Float64Array
}

/** Edges of the cell that holds ln x: whole numbers. */
function cellOf(lnX: number): { low: number; high: number } {
  const near = lnX >= -NEAR && lnX < NEAR
  const width = near ? NEAR_CELL : FAR_CELL
  const start = lnX < 0 ? -NEAR : near ? 0 : NEAR
  const low = start + width * Math.floor((lnX - start) / width)
  return { low, high: low + width }
}

class LazyPositive {
  private readonly lnF: (lnX: number) => number
  private readonly tolerance: number
  private readonly coldPower: number | undefined
  /** Pieces of each cell, by its low edge. */
  private readonly cells = new Map<number, Piece[]>()
  /** Where a last cell was tried, and the one that was found. */
  private triedTo = NEAR - FAR_CELL
  private last: LastCell | null = null
  private piece: Piece | null = null

  constructor(f: (x: number) => number, { tolerance, coldPower }: LazyOptions) {
    this.lnF = (lnX) => Math.log(Math.max(f(Math.exp(lnX)), NOTHING))
    this.tolerance = tolerance
    this.coldPower = coldPower
  }

  at(x: number): number {
    const lnX = Math.log(x)
    const last = this.lastCell(lnX)
    if (last) return this.inLastCell(last, lnX)
    const piece = this.pieceAt(lnX)
    const z = (2 * lnX - piece.low - piece.high) / (piece.high - piece.low)
    return Math.exp(chebyshevSeries(piece.coefficients, 0, piece.coefficients.length, z))
  }

  private pieceAt(lnX: number): Piece {
    const known = this.piece
    if (known && lnX >= known.low && lnX < known.high) return known
    const { low, high } = cellOf(lnX)
    let pieces = this.cells.get(low)
    if (!pieces) {
      pieces = []
      this.tabulate(low, high, 0, pieces)
      this.cells.set(low, pieces)
    }
    let i = pieces.length - 1
    while (i > 0 && lnX < pieces[i]!.low) i--
    return (this.piece = pieces[i]!)
  }

  private tabulate(low: number, high: number, depth: number, pieces: Piece[]): void {
    const middle = (low + high) / 2
    const { coefficients, tail } = nestedFit((z) => this.lnF(middle + ((high - low) / 2) * z), this.tolerance)
    if (tail < this.tolerance || (depth === MAXIMUM_DEPTH && tail < UNRESOLVED)) {
      pieces.push({ low, high, coefficients })
      return
    }
    if (depth === MAXIMUM_DEPTH || Number.isNaN(tail))
      throw new ConvergenceError(
        `a thermal average changes too sharply, or is not defined, near x = m/T = ${Math.exp(middle).toPrecision(4)}`,
      )
    this.tabulate(low, middle, depth + 1, pieces)
    this.tabulate(middle, high, depth + 1, pieces)
  }

  /** The last cell, if it holds ln x: the first of those beginning at the edges of far cells that a series resolves. */
  private lastCell(lnX: number): LastCell | null {
    if (this.coldPower === undefined || lnX < NEAR) return null
    while (!this.last && this.triedTo + FAR_CELL <= lnX) this.tryLastCell((this.triedTo += FAR_CELL))
    return this.last && lnX >= this.last.startsAt ? this.last : null
  }

  private tryLastCell(startsAt: number): void {
    const { coefficients, tail } = nestedFit((z) => {
      const lnX = startsAt - Math.log(Math.max((1 + z) / 2, INFINITELY_COLD))
      return this.lnF(lnX) - this.coldPower! * lnX
    }, this.tolerance)
    if (tail < this.tolerance) this.last = { startsAt, coefficients }
  }

  private inLastCell({ startsAt, coefficients }: LastCell, lnX: number): number {
    const z = 2 * Math.exp(startsAt - lnX) - 1
    return Math.exp(chebyshevSeries(coefficients, 0, coefficients.length, z) + this.coldPower! * lnX)
  }
}

/** f, from tables made when they are first needed. */
export function lazyPositive(f: (x: number) => number, options: LazyOptions): (x: number) => number {
  const table = new LazyPositive(f, options)
  return (x) => table.at(x)
}
