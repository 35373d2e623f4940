/**
 * The integrals of one species tabulated over ln x, for the sums over dozens of species that a bath needs.
 * Interpolation error 1e-13 relative to each scaled function; built once for each statistics, when first wanted.
 */
import { evaluate, evaluateColumn, tabulate } from '../numerics/interpolation/chebyshev.ts'
import type { ChebyshevTable } from '../numerics/interpolation/chebyshev.ts'
import { MASSLESS, scaledIntegrals } from './speciesIntegrals.ts'
import type { Statistics } from './speciesIntegrals.ts'

/** Below this x the first correction to the massless limit, of order x², is all there is to 1e-13. */
const LEAST_X = 1e-5
const LARGEST_X = 1000

/** Columns of the table: the integrals times e^x. */
const NUMBER = 0
const PRESSURE = 1
const I1 = 2
const I0 = 3
const COLUMNS = 4

const tables = new Map<Statistics, ChebyshevTable>()
const columns = new Float64Array(COLUMNS)

function tableOf(statistics: Statistics): ChebyshevTable {
  const known = tables.get(statistics)
  if (known) return known
  const table = tabulate(
    (lnX, out) => {
      const scaled = scaledIntegrals(Math.exp(lnX), statistics)
      out[NUMBER] = scaled.number
      out[PRESSURE] = scaled.pressure
      out[I1] = scaled.i1
      out[I0] = scaled.i0
    },
    COLUMNS,
    Math.log(LEAST_X),
    Math.log(LARGEST_X),
    { tolerance: 1e-14, maximumDepth: 7, floor: 0 },
  )
  tables.set(statistics, table)
  return table
}

/** p/T⁴ and its first two derivatives in ln T, of whatever they are added up from. */
export interface PressureJet {
  value: number
  first: number
  second: number
}

/** Beyond this x a species adds less than 1e-24 of a massless one: nothing to a bath. */
const NOTHING_LEFT = 60

/** Adds g times the pressure jet of one species at x = m/T to `jet`; what lies beyond x = 60 is left out. */
export function addSpecies(
  jet: PressureJet,
  x: number,
  degreesOfFreedom: number,
  statistics: Statistics,
): void {
  if (x < NOTHING_LEFT) addSpeciesAt(jet, x, degreesOfFreedom, statistics)
}

/** The same without the cut: for a species alone, up to x = 700. */
export function addSpeciesAt(
  jet: PressureJet,
  x: number,
  degreesOfFreedom: number,
  statistics: Statistics,
): void {
  if (x < LEAST_X) {
    const { pressure, i1 } = MASSLESS[statistics]
    const x2 = x * x
    jet.value += degreesOfFreedom * (pressure - (x2 * i1) / 2)
    jet.first += degreesOfFreedom * x2 * i1
    jet.second -= 2 * degreesOfFreedom * x2 * i1
    return
  }
  evaluate(tableOf(statistics), Math.log(x), columns)
  const x2 = x * x
  const weight = degreesOfFreedom * Math.exp(-x)
  const i1 = x2 * columns[I1]!
  jet.value += weight * columns[PRESSURE]!
  jet.first += weight * i1
  jet.second += weight * (x2 * x2 * columns[I0]! - 2 * i1)
}

/** ln(n/T³) of one internal state at x = m/T; Maxwell–Boltzmann's asymptotic form takes over above x = 1000. */
export function logNumberDensity(x: number, statistics: Statistics): number {
  if (x < LEAST_X) return Math.log(MASSLESS[statistics].number)
  if (x > LARGEST_X) {
    const inverse = 1 / x
    const series = 1 + inverse * (15 / 8 + inverse * (105 / 128 - inverse * (315 / 1024)))
    return -x + 1.5 * Math.log(x / (2 * Math.PI)) + Math.log(series)
  }
  return Math.log(evaluateColumn(tableOf(statistics), NUMBER, Math.log(x))) - x
}

/** Σ_k (−η)^{k+1} K₁(kx)/k = 2π² I₁/x, the source of freeze-in by decay; g = 1. */
export function decaySum(x: number, statistics: Statistics): number {
  if (x < LEAST_X) return (2 * Math.PI ** 2 * MASSLESS[statistics].i1) / x
  if (x > LARGEST_X) return 0
  return (2 * Math.PI ** 2 * evaluateColumn(tableOf(statistics), I1, Math.log(x)) * Math.exp(-x)) / x
}
