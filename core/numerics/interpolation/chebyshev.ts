/**
 * Piecewise Chebyshev interpolation of several functions of one variable at once.
 * Pieces are bisected until the last coefficients of every function fall below the tolerance, so an analytic function costs
 * few pieces; the caller names the places where it is not analytic, and those become edges. The nodes are of the first kind
 * and lie inside the piece: a function that jumps at an edge is never asked for its value there.
 * Source: Trefethen, Approximation Theory and Approximation Practice (2013), chapters 3 and 7.
 */

/** Writes the values of the functions at x into `out`. */
export type VectorFunction = (x: number, out: Float64Array) => void

export interface ChebyshevTable {
  /** Number of functions. */
  readonly width: number
  /** Left edges of the pieces, and last the right end: ascending. */
  readonly edges: Float64Array
  /** Coefficients, piece by piece, function by function. */
  readonly coefficients: Float64Array
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

const nodes = Float64Array.from({ length: NODES }, (_, k) => Math.cos((Math.PI * (k + 0.5)) / NODES))
/** cosines[j·NODES + k] turns values at the nodes into the coefficient of T_j. */
const cosines = Float64Array.from(
  { length: NODES * NODES },
  (_, i) =>
    ((i < NODES ? 1 : 2) / NODES) * Math.cos((Math.PI * Math.floor(i / NODES) * ((i % NODES) + 0.5)) / NODES),
)

/** Fills `coefficients` with those of every function on [low, high]; returns the size of the neglected tail. */
function fitPiece(
  f: VectorFunction,
  width: number,
  low: number,
  high: number,
  coefficients: Float64Array,
  floor: number,
): number {
  const values = new Float64Array(NODES * width)
  const point = new Float64Array(width)
  for (let k = 0; k < NODES; k++) {
    f((low + high) / 2 + ((high - low) / 2) * nodes[k]!, point)
    values.set(point, k * width)
  }
  let tail = 0
  for (let i = 0; i < width; i++) {
    let size = floor
    for (let j = 0; j < NODES; j++) {
      let sum = 0
      for (let k = 0; k < NODES; k++) sum += cosines[j * NODES + k]! * values[k * width + i]!
      coefficients[i * NODES + j] = sum
      size = Math.max(size, Math.abs(sum))
    }
    for (let j = NODES - 3; j < NODES; j++)
      tail = Math.max(tail, Math.abs(coefficients[i * NODES + j]!) / size)
  }
  return tail
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
  const edges: number[] = []
  const pieces: Float64Array[] = []
  let error = 0

  const add = (a: number, b: number, depth: number): void => {
    const coefficients = new Float64Array(NODES * width)
    const tail = fitPiece(f, width, a, b, coefficients, floor)
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
  return { width, edges: Float64Array.from([...edges, high]), coefficients, error }
}

/** Index of the piece that holds x; the first or last one outside the range. At an edge, the piece to its right. */
export function pieceAt(table: ChebyshevTable, x: number): number {
  const { edges } = table
  let low = 0
  let high = edges.length - 2
  while (low < high) {
    const middle = (low + high + 1) >> 1
    if (edges[middle]! <= x) low = middle
    else high = middle - 1
  }
  return low
}

/** Clenshaw's recurrence for the series that begins at `start`. */
function series(coefficients: Float64Array, start: number, z: number): number {
  const twice = 2 * z
  let b1 = coefficients[start + NODES - 1]!
  let b2 = 0
  for (let j = start + NODES - 2; j > start; j--) {
    const b0 = coefficients[j]! + twice * b1 - b2
    b2 = b1
    b1 = b0
  }
  return coefficients[start]! + z * b1 - b2
}

/** Writes the interpolated functions at x into `out`. */
export function evaluate(table: ChebyshevTable, x: number, out: Float64Array): void {
  const { width, edges, coefficients } = table
  const piece = pieceAt(table, x)
  const low = edges[piece]!
  const high = edges[piece + 1]!
  const z = (2 * x - low - high) / (high - low)
  for (let i = 0; i < width; i++) out[i] = series(coefficients, (piece * width + i) * NODES, z)
}

/** The interpolated function `column` alone at x. */
export function evaluateColumn(table: ChebyshevTable, column: number, x: number): number {
  const { width, edges, coefficients } = table
  const piece = pieceAt(table, x)
  const low = edges[piece]!
  const high = edges[piece + 1]!
  return series(coefficients, (piece * width + column) * NODES, (2 * x - low - high) / (high - low))
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
  return { width, edges, coefficients: integral, error: table.error }
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
