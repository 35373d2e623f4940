/**
 * A table of the whole bath that a group brings along, made into functions of L = ln T by monotone cubic splines.
 *
 * With g_ρ and g_s both given each is joined for itself, and what they miss of dρ = T ds between them is reported, not mended. With
 * one of them the other follows from p, of which s = dp/dT and ρ = Ts − p: in effective numbers, with g_p = p/(π²T⁴/90),
 *
 *   dg_p/dL = 4(g_s − g_p),   g_ρ = (4g_s − g_p)/3,      or      dg_p/dL = 3(g_ρ − g_p),   g_s = (3g_ρ + g_p)/4,
 *
 * solved in closed form on each cubic piece q, with k = 4 or 3 in front of the bracket:
 *
 *   g_p = q − q′/k + q″/k² − q‴/k³ + c e^{−kL}.
 *
 * The constant is chosen at the coldest row, where p over s (or ρ) is taken from the ideal gases that go on below it; a wrong choice
 * fades as T^{−k}, in ρ and s alike. Spline: numerics/interpolation/monotoneSpline.ts. The treatment is this project's own.
 */
import {
  emptyCubic,
  evaluatePiece,
  monotoneSpline,
  pieceOf,
  roughness,
} from '../../numerics/interpolation/monotoneSpline.ts'
import type { CubicJet, MonotoneSpline } from '../../numerics/interpolation/monotoneSpline.ts'
import type { BathColumn, BathRow } from '../../wire/uploadedBath.ts'

/** g_ρ, g_s and their derivatives in ln T. */
export interface RowsPoint {
  gRho: number
  gRhoSlope: number
  gS: number
  gSSlope: number
}

export const emptyRowsPoint = (): RowsPoint => ({ gRho: 0, gRhoSlope: 0, gS: 0, gSSlope: 0 })

/** The table as functions of ln(T/GeV), between its first and last row. */
export interface JoinedRows {
  /** ln(T/GeV) of the rows. */
  readonly lnT: Float64Array
  /** Rows, ascending, between which a quadrature finds it smooth. */
  readonly edges: readonly number[]
  /** Rows, ascending, at whose kink in a higher derivative an integrator does better to restart. */
  readonly kinks: readonly number[]
  /** Writes both numbers, and their slopes, at ln(T/GeV) into `out`. At a row, the piece above it. */
  evaluate(lnT: number, out: RowsPoint): void
}

/** g_p/g_s and g_p/g_ρ that a single column starts from at the coldest row. */
export interface PressureShares {
  ofEntropy: number
  ofEnergy: number
}

const columnOf = (rows: readonly BathRow[], lnT: Float64Array, column: BathColumn): MonotoneSpline =>
  monotoneSpline(
    lnT,
    Float64Array.from(rows, (row) => row[column]!),
  )

/** q − q′/k + q″/k² − q‴/k³. */
const particular = (q: CubicJet, k: number): number => q.value - (q.first - (q.second - q.third / k) / k) / k

/** c e^{−kL} at the lower end of every piece, for a pressure that is `start` at the first row. */
function homogeneousParts(spline: MonotoneSpline, k: number, start: number): Float64Array {
  const { x } = spline
  const parts = new Float64Array(x.length - 1)
  const jet = emptyCubic()
  let pressure = start
  for (let i = 0; i < parts.length; i++) {
    evaluatePiece(spline, i, x[i]!, jet)
    parts[i] = pressure - particular(jet, k)
    evaluatePiece(spline, i, x[i + 1]!, jet)
    pressure = particular(jet, k) + parts[i]! * Math.exp(-k * (x[i + 1]! - x[i]!))
  }
  return parts
}

/** Roughness of a column, relative, that a quadrature does not see, and that an integrator does not. */
const SMOOTH = 1e-8
const NEARLY_SMOOTH = 1e-5

/** Distance in ln T over which rows that hide their kinks may still bend the curve they follow. */
const FARTHEST_EDGE = 0.1

/** The rows at which a quadrature and an integrator have to look. */
function roughRows(columns: readonly MonotoneSpline[]): Pick<JoinedRows, 'edges' | 'kinks'> {
  const { x } = columns[0]!
  const edges: number[] = []
  const kinks: number[] = []
  x.forEach((lnT, i) => {
    const rough = Math.max(...columns.map((column) => roughness(column, i) / column.y[i]!))
    if (rough > SMOOTH || i === 0 || lnT - x[edges.at(-1)!]! > FARTHEST_EDGE) edges.push(i)
    if (rough > NEARLY_SMOOTH) kinks.push(i)
  })
  return { edges, kinks }
}

/** Both columns given. */
function joinBoth(lnT: Float64Array, energy: MonotoneSpline, entropy: MonotoneSpline): JoinedRows {
  const jet = emptyCubic()
  return {
    lnT,
    ...roughRows([energy, entropy]),
    evaluate(at, out) {
      const piece = pieceOf(energy, at)
      evaluatePiece(energy, piece, at, jet)
      out.gRho = jet.value
      out.gRhoSlope = jet.first
      evaluatePiece(entropy, piece, at, jet)
      out.gS = jet.value
      out.gSSlope = jet.first
    },
  }
}

/** One column given, k the power of its differential equation for the pressure. */
function joinOne(
  spline: MonotoneSpline,
  k: number,
  start: number,
  complete: (column: CubicJet, pressure: number, out: RowsPoint) => void,
): JoinedRows {
  const homogeneous = homogeneousParts(spline, k, start)
  const jet = emptyCubic()
  return {
    lnT: spline.x,
    ...roughRows([spline]),
    evaluate(at, out) {
      const piece = pieceOf(spline, at)
      evaluatePiece(spline, piece, at, jet)
      const pressure = particular(jet, k) + homogeneous[piece]! * Math.exp(-k * (at - spline.x[piece]!))
      complete(jet, pressure, out)
    },
  }
}

function fromEntropy({ value, first }: CubicJet, pressure: number, out: RowsPoint): void {
  out.gS = value
  out.gSSlope = first
  out.gRho = (4 * value - pressure) / 3
  out.gRhoSlope = (4 * first - 4 * (value - pressure)) / 3
}

function fromEnergy({ value, first }: CubicJet, pressure: number, out: RowsPoint): void {
  out.gRho = value
  out.gRhoSlope = first
  out.gS = (3 * value + pressure) / 4
  out.gSSlope = (3 * first + 3 * (value - pressure)) / 4
}

/** Joins the rows. @param shares what a single column starts from */
export function joinRows(rows: readonly BathRow[], shares: PressureShares): JoinedRows {
  const lnT = Float64Array.from(rows, (row) => Math.log(row.temperatureGeV))
  const first = rows[0]!
  if (first.gRho === undefined)
    return joinOne(columnOf(rows, lnT, 'gS'), 4, shares.ofEntropy * first.gS!, fromEntropy)
  const energy = columnOf(rows, lnT, 'gRho')
  if (first.gS === undefined) return joinOne(energy, 3, shares.ofEnergy * first.gRho, fromEnergy)
  return joinBoth(lnT, energy, columnOf(rows, lnT, 'gS'))
}
