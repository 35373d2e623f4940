/**
 * A cubic spline that is monotone wherever its rows are.
 *
 * Slopes are those of the cubic spline with not-a-knot ends, limited in size to three times the flatter chord beside the row, which
 * suffices for monotone cubic pieces, and to zero at a row that is a local extreme. A true extreme, between rows, is told from an
 * accident by five rows that bend the same way: there the slope may be one and a half times that of the flattest parabola through
 * three of them, which among rows that rise throughout is no more than before. Smooth rows are thus met with an error of fourth
 * order in their distance, twice continuously differentiable; where a slope is limited it is so once.
 *
 * Sources: de Boor, A Practical Guide to Splines (1978), chapter IV (slopes); Fritsch & Carlson, SIAM J. Numer. Anal. 17 (1980)
 * 238 (the condition); Hyman, SIAM J. Sci. Stat. Comput. 4 (1983) 645 (limiting the slopes of a spline by it); Dougherty, Edelman,
 * Hyman, Math. Comp. 52 (1989) 471 (extremes), from memory.
 */
export interface MonotoneSpline {
  /** Places of the rows, ascending. */
  readonly x: Float64Array
  readonly y: Float64Array
  /** Slope at each row. */
  readonly slope: Float64Array
}

/** Steepest slope, in units of the flatter chord beside it, that keeps a cubic piece monotone. */
const STEEPEST = 3

/** Slopes of the cubic spline with not-a-knot ends through at least four rows: a tridiagonal system, by elimination. */
function splineSlopes(x: Float64Array, width: Float64Array, chord: Float64Array): Float64Array {
  const n = x.length
  const slope = new Float64Array(n)
  const upper = new Float64Array(n)
  const [firstTwo, lastTwo] = [x[2]! - x[0]!, x[n - 1]! - x[n - 3]!]
  const [w0, w1] = [width[0]!, width[1]!]
  upper[0] = firstTwo / w1
  slope[0] = ((w0 + 2 * firstTwo) * w1 * chord[0]! + w0 * w0 * chord[1]!) / firstTwo / w1
  for (let i = 1; i < n - 1; i++) {
    const [left, right] = [width[i - 1]!, width[i]!]
    const pivot = 2 * (left + right) - right * upper[i - 1]!
    upper[i] = left / pivot
    slope[i] = (3 * (right * chord[i - 1]! + left * chord[i]!) - right * slope[i - 1]!) / pivot
  }
  const [v0, v1] = [width[n - 2]!, width[n - 3]!]
  const end = ((v0 + 2 * lastTwo) * v1 * chord[n - 2]! + v0 * v0 * chord[n - 3]!) / lastTwo
  slope[n - 1] = (end - lastTwo * slope[n - 2]!) / (v1 - lastTwo * upper[n - 2]!)
  for (let i = n - 2; i >= 0; i--) slope[i]! -= upper[i]! * slope[i + 1]!
  return slope
}

/** Steepest slope, in units of the parabola's, where rows bend the same way around a row. */
const STEEPEST_BENT = 1.5

/**
 * Slope at row i of the flattest of three parabolas, through the row and the two before it, beside it, after it, where the five rows
 * bend the same way and the three rise the same way; otherwise zero.
 */
function parabolaSlope(i: number, width: Float64Array, chord: Float64Array): number {
  if (i < 2 || i > width.length - 2) return 0
  const [w0, w1, w2, w3] = [width[i - 2]!, width[i - 1]!, width[i]!, width[i + 1]!]
  const [c0, c1, c2, c3] = [chord[i - 2]!, chord[i - 1]!, chord[i]!, chord[i + 1]!]
  const bends = [c1 - c0, c2 - c1, c3 - c2]
  const sameWay = bends.every((bend) => bend > 0) || bends.every((bend) => bend < 0)
  if (!sameWay) return 0
  const slopes = [
    c1 + ((c1 - c0) * w1) / (w0 + w1),
    (w2 * c1 + w1 * c2) / (w1 + w2),
    c2 - ((c3 - c2) * w2) / (w2 + w3),
  ]
  if (slopes.every((slope) => slope > 0)) return Math.min(...slopes)
  return slopes.every((slope) => slope < 0) ? Math.max(...slopes) : 0
}

/** The slope nearest to the wanted one that is allowed between these chords. */
function limited(slope: number, left: number, right: number, parabola: number): number {
  const monotone = left * right > 0 ? STEEPEST * Math.min(Math.abs(left), Math.abs(right)) : 0
  const bent = STEEPEST_BENT * Math.abs(parabola)
  const sign = bent > monotone ? Math.sign(parabola) : Math.sign(left)
  return sign * Math.min(Math.max(sign * slope, 0), Math.max(monotone, bent))
}

/** @param x ascending, at least four @param y as many */
export function monotoneSpline(x: Float64Array, y: Float64Array): MonotoneSpline {
  const n = x.length
  const width = new Float64Array(n - 1)
  const chord = new Float64Array(n - 1)
  for (let i = 0; i + 1 < n; i++) {
    width[i] = x[i + 1]! - x[i]!
    chord[i] = (y[i + 1]! - y[i]!) / width[i]!
  }
  const slope = splineSlopes(x, width, chord)
  for (let i = 0; i < n; i++) {
    const [left, right] = [chord[Math.max(i - 1, 0)]!, chord[Math.min(i, n - 2)]!]
    slope[i] = limited(slope[i]!, left, right, parabolaSlope(i, width, chord))
  }
  return { x, y, slope }
}

/** Index i of the piece from x_i to x_{i+1} that holds `at`; the first or last one outside. At a row, the piece to its right. */
export function pieceOf({ x }: MonotoneSpline, at: number): number {
  let low = 0
  let high = x.length - 2
  while (low < high) {
    const middle = (low + high + 1) >> 1
    if (x[middle]! <= at) low = middle
    else high = middle - 1
  }
  return low
}

/** Value and the three derivatives of the piece i at `at`. */
export interface CubicJet {
  value: number
  first: number
  second: number
  third: number
}

export const emptyCubic = (): CubicJet => ({ value: 0, first: 0, second: 0, third: 0 })

/** Writes the piece i, which goes on outside its rows, at `at` into `out`. */
export function evaluatePiece({ x, y, slope }: MonotoneSpline, i: number, at: number, out: CubicJet): void {
  const h = x[i + 1]! - x[i]!
  const t = at - x[i]!
  const chord = (y[i + 1]! - y[i]!) / h
  const [from, to] = [slope[i]!, slope[i + 1]!]
  // y + t (from + t (c₂ + t c₃))
  const c2 = (3 * chord - 2 * from - to) / h
  const c3 = (from + to - 2 * chord) / (h * h)
  out.value = y[i]! + t * (from + t * (c2 + t * c3))
  out.first = from + t * (2 * c2 + 3 * t * c3)
  out.second = 2 * c2 + 6 * t * c3
  out.third = 6 * c3
}

/**
 * How far from smooth the slope is at row i: about the largest distance of the spline's slope from that of a smooth curve through
 * the same rows, by the jumps of the second and third derivative there.
 */
export function roughness(spline: MonotoneSpline, i: number): number {
  const { x } = spline
  if (i === 0 || i === x.length - 1) return 0
  const [below, above] = [emptyCubic(), emptyCubic()]
  evaluatePiece(spline, i - 1, x[i]!, below)
  evaluatePiece(spline, i, x[i]!, above)
  const h = Math.max(x[i]! - x[i - 1]!, x[i + 1]! - x[i]!)
  return (Math.abs(above.second - below.second) * h) / 4 + (Math.abs(above.third - below.third) * h * h) / 24
}
