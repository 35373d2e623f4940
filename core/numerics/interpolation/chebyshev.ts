/**
 * Piecewise Chebyshev interpolation of several functions of one variable at once.
 * Pieces are bisected until the last coefficients of every function fall below the tolerance, so an analytic function costs
 * few pieces; the caller names the places where it is not analytic, and those become edges. The nodes are of the first kind
 * and lie inside the piece: a function that jumps at an edge is never asked for its value there.
 * Source: Trefethen, Approximation Theory and Approximation Practice (2013), chapters 3 and 7.
 */
import { chebyshevSeries } from './clenshaw.ts'
import { IntervalLookup } from './intervalLookup.ts'

/** Writes the values of the functions at x into `out`. */
export type VectorFunction = (x: number, out: Float64Array) => void

export interface ChebyshevTable {
  /** Number of functions. */
  readonly width: number
  /** Left edges of the pieces, and last the right end: ascending. */
  readonly edges: Float64Array
  readonly pieces: IntervalLookup
  /** Coefficients, piece by piece, function by function. */
  readonly coefficients: Float64Array
  /** How many of a piece's coefficients count: those beyond add less than a fiftieth of the tolerance. */
  readonly terms: Uint8Array
  /** Largest neglected coefficient relative to the size of its function: the estimated interpolation error. */
  readonly error: number
}

export interface ChebyshevOptions {
  /** Where a function or one of its derivatives jumps; those outside the range are left out. */
  breaks?: readonly number[]
  /** Wanted error relative to the size of the function on the piece, or to `floor` where that is larger. */
  tolerance?: number
  /** Halvings allowed. A piece still unresolved after them is kept, and `error` tells. */
  maximumDepth?: number
  /** Least size the error is held against; 1 for a function that passes through zero. */
  floor?: number
}

/** Nodes, and so coefficients, of a piece. */
export const NODES = 16

/** Share of the tolerance that the trailing terms left out of a piece may add up to. */
const UNSEEN = 0.02

const nodes = Float64Array.from({ length: NODES }, (_, k) => Math.cos((Math.PI * (k + 0.5)) / NODES))
/** cosines[j·NODES + k] turns values at the nodes into the coefficient of T_j. */
const cosines = Float64Array.from(
  { length: NODES * NODES },
  (_, i) =>
    ((i < NODES ? 1 : 2) / NODES) * Math.cos((Math.PI * Math.floor(i / NODES) * ((i % NODES) + 0.5)) / NODES),
)

/** Room for the values of every function at the nodes of a piece. */
class PieceFit {
  private readonly f: VectorFunction
  private readonly width: number
  private readonly floor: number
  private readonly values: Float64Array
  private readonly point: Float64Array

  constructor(f: VectorFunction, width: number, floor: number) {
    this.f = f
    this.width = width
    this.floor = floor
    this.values = new Float64Array(NODES * width)
    this.point = new Float64Array(width)
  }

  /** Fills `coefficients` with those of every function on [low, high]; returns the size of the neglected tail. */
  fit(low: number, high: number, coefficients: Float64Array): number {
    const { f, width, values, point } = this
    for (let k = 0; k < NODES; k++) {
      f((low + high) / 2 + ((high - low) / 2) * nodes[k]!, point)
      values.set(point, k * width)
    }
    let tail = 0
    for (let i = 0; i < width; i++) {
      for (let j = 0; j < NODES; j++) {
        let sum = 0
        for (let k = 0; k < NODES; k++) sum += cosines[j * NODES + k]! * values[k * width + i]!
        coefficients[i * NODES + j] = sum
      }
      const size = this.sizeOf(coefficients, i)
      for (let j = NODES - 3; j < NODES; j++)
        tail = Math.max(tail, Math.abs(coefficients[i * NODES + j]!) / size)
    }
    return tail
  }

  /** The number of terms that leaves out no more than `allowance` of any function. */
  terms(coefficients: Float64Array, allowance: number): number {
    let most = 1
    for (let i = 0; i < this.width; i++) {
      let left = allowance * this.sizeOf(coefficients, i)
      let terms = NODES
      while (terms > most && (left -= Math.abs(coefficients[i * NODES + terms - 1]!)) >= 0) terms--
      most = Math.max(most, terms)
    }
    return most
  }

  private sizeOf(coefficients: Float64Array, i: number): number {
    let size = this.floor
    for (let j = i * NODES; j < (i + 1) * NODES; j++) size = Math.max(size, Math.abs(coefficients[j]!))
    return size
  }
}

/** Tabulates `width` functions on [low, high]. */
export function tabulate(
  f: VectorFunction,
  width: number,
  low: number,
  high: number,
  options: ChebyshevOptions = {},
): ChebyshevTable {
  const { breaks = [], tolerance = 1e-12, maximumDepth = 9, floor = 1 } = options
  const inner = breaks.filter((x) => x > low && x < high)
  const cuts = [...new Set([low, ...inner, high])].sort((a, b) => a - b)
  const fitted = new PieceFit(f, width, floor)
  const edges: number[] = []
  const pieces: Float64Array[] = []
  let error = 0

  const add = (a: number, b: number, depth: number): void => {
    const coefficients = new Float64Array(NODES * width)
    const tail = fitted.fit(a, b, coefficients)
    if (tail > tolerance && depth < maximumDepth) {
      add(a, (a + b) / 2, depth + 1)
      add((a + b) / 2, b, depth + 1)
      return
    }
    error = Math.max(error, tail)
    edges.push(a)
    pieces.push(coefficients)
  }
  for (let i = 0; i + 1 < cuts.length; i++) add(cuts[i]!, cuts[i + 1]!, 0)

  const coefficients = new Float64Array(pieces.length * NODES * width)
  pieces.forEach((piece, i) => coefficients.set(piece, i * NODES * width))
  const terms = Uint8Array.from(pieces, (piece) => fitted.terms(piece, UNSEEN * tolerance))
  return tableOf(width, Float64Array.from([...edges, high]), coefficients, terms, error)
}

function tableOf(
  width: number,
  edges: Float64Array,
  coefficients: Float64Array,
  terms: Uint8Array,
  error: number,
): ChebyshevTable {
  return { width, edges, pieces: new IntervalLookup(edges), coefficients, terms, error }
}

/** Clenshaw's recurrence for two functions side by side: each step waits for the last, so two take little longer than one. */
function twoSeries(
  coefficients: Float64Array,
  start: number,
  terms: number,
  z: number,
  out: Float64Array,
  column: number,
): void {
  const twice = 2 * z
  let b1 = 0
  let b2 = 0
  let c1 = 0
  let c2 = 0
  for (let j = start + terms - 1; j > start; j--) {
    const b0 = coefficients[j]! + twice * b1 - b2
    const c0 = coefficients[j + NODES]! + twice * c1 - c2
    b2 = b1
    b1 = b0
    c2 = c1
    c1 = c0
  }
  out[column] = coefficients[start]! + z * b1 - b2
  out[column + 1] = coefficients[start + NODES]! + z * c1 - c2
}

/** Writes the interpolated functions at x into `out`; outside the range the first or last piece goes on. */
export function evaluate(table: ChebyshevTable, x: number, out: Float64Array): void {
  const { width, edges, coefficients } = table
  const piece = table.pieces.find(x)
  const low = edges[piece]!
  const high = edges[piece + 1]!
  const z = (2 * x - low - high) / (high - low)
  const terms = table.terms[piece]!
  const start = piece * width * NODES
  let i = 0
  for (; i + 1 < width; i += 2) twoSeries(coefficients, start + i * NODES, terms, z, out, i)
  if (i < width) out[i] = chebyshevSeries(coefficients, start + i * NODES, terms, z)
}

/** The interpolated function `column` alone at x. */
export function evaluateColumn(table: ChebyshevTable, column: number, x: number): number {
  const { width, edges, coefficients } = table
  const piece = table.pieces.find(x)
  const low = edges[piece]!
  const high = edges[piece + 1]!
  const z = (2 * x - low - high) / (high - low)
  return chebyshevSeries(coefficients, (piece * width + column) * NODES, table.terms[piece]!, z)
}

/** A table of the integrals of the functions from the low end of the range. */
export function integrate(table: ChebyshevTable): ChebyshevTable {
  const { width, edges, coefficients } = table
  const integral = new Float64Array(coefficients.length)
  const atEdge = new Float64Array(width)
  for (let piece = 0; piece + 1 < edges.length; piece++) {
    const half = (edges[piece + 1]! - edges[piece]!) / 2
    for (let i = 0; i < width; i++) {
      const c = coefficients.subarray((piece * width + i) * NODES, (piece * width + i + 1) * NODES)
      const d = integral.subarray((piece * width + i) * NODES, (piece * width + i + 1) * NODES)
      atEdge[i] = integrateSeries(c, half, atEdge[i]!, d)
    }
  }
  return tableOf(
    width,
    edges,
    integral,
    table.terms.map(() => NODES),
    table.error,
  )
}

/** Coefficients of the integral of one series that starts from `from` at z = −1; returns its value at z = 1. */
function integrateSeries(c: Float64Array, half: number, from: number, out: Float64Array): number {
  for (let j = 1; j < NODES; j++) {
    const before = j === 1 ? 2 * c[0]! : c[j - 1]!
    const after = j + 1 < NODES ? c[j + 1]! : 0
    out[j] = (half * (before - after)) / (2 * j)
  }
  let atLeft = 0
  let atRight = 0
  for (let j = 1; j < NODES; j++) {
    atLeft += j % 2 === 0 ? out[j]! : -out[j]!
    atRight += out[j]!
  }
  out[0] = from - atLeft
  return out[0] + atRight
}
