/** All radiation of a history over ln T: the costly part, which depends on bath, neutrinos and extra species only. */
import { buildBath } from '../bath/buildBath.ts'
import { emptyPoint } from '../bath/bath.ts'
import type { BathPart, FollowedRows } from '../bath/bath.ts'
import { speciesApart } from '../bath/speciesApart.ts'
import type { SpeciesApart } from '../bath/speciesApart.ts'
import { ConvergenceError } from '../numerics/convergence.ts'
import { LeastRecentlyUsed } from '../numerics/leastRecentlyUsed.ts'
import { evaluate, tabulate } from '../numerics/interpolation/chebyshev.ts'
import type { ChebyshevTable, VectorFunction } from '../numerics/interpolation/chebyshev.ts'
import type { BathInput, HistoryInput } from '../wire/history.ts'
import type { BathRow } from '../wire/uploadedBath.ts'

/** Range of the tables, GeV: from well below today's temperature to the grand-unification scale. */
export const COLDEST_GEV = 1e-14
export const HOTTEST_GEV = 1e16

/** What is read of the radiation, column by column. */
export const G_RHO = 0
export const G_S = 1
export const LOG_SLOPE = 2
export const COLUMNS = 3

export interface Radiation {
  readonly bath: BathPart
  readonly apart: SpeciesApart
  /** Temperatures, GeV, ascending, where a value or a first derivative jumps. */
  readonly breaks: readonly number[]
  /** Temperatures, GeV, ascending, where a higher derivative jumps enough for an integrator to restart. */
  readonly kinks: readonly number[]
  /** Values of ln(T/GeV), ascending, between which it is smooth, as a quadrature wants it. */
  readonly edges: readonly number[]
  /** Estimated relative error of what `read` gives. */
  readonly error: number
  /** Writes g_ρ of all radiation, g_s of the bath and d ln g_s/d ln T at ln(T/GeV) into `out`. */
  read: VectorFunction
}

/** Error of a table above which no number made with it is given. */
const UNRESOLVED = 1e-7

const LN_COLDEST = Math.log(COLDEST_GEV)
const LN_HOTTEST = Math.log(HOTTEST_GEV)

/** The parts of a history that its radiation depends on. */
type RadiationInput = Pick<HistoryInput, 'bath' | 'neutrinos' | 'extraSpecies'>

/** The exact treatment as a function of ln T. */
function exactly(bath: BathPart, apart: SpeciesApart): VectorFunction {
  const point = emptyPoint()
  const other = { gRho: 0, gP: 0 }
  return (lnT, out) => {
    const temperature = Math.exp(lnT)
    bath.evaluate(temperature, point)
    apart.evaluate(temperature, point.gS, other)
    out[G_RHO] = point.gRho + other.gRho
    out[G_S] = point.gS
    out[LOG_SLOPE] = point.gSSlope / point.gS
  }
}

type Read = Pick<Radiation, 'edges' | 'error' | 'read'>

function readTable(table: ChebyshevTable): Read {
  if (!(table.error < UNRESOLVED))
    throw new ConvergenceError(
      'the bath changes too sharply, or is not defined, somewhere: its table is not resolved',
    )
  return { edges: [...table.edges], error: table.error, read: (lnT, out) => evaluate(table, lnT, out) }
}

/** Tables on either side of the rows that a bath follows; between the first and the last row the bath itself. */
function readAroundRows(
  { lowestGeV, highestGeV, edgesGeV }: FollowedRows,
  exact: VectorFunction,
  tableOn: (low: number, high: number) => Read,
): Read {
  const [first, last] = [Math.log(lowestGeV), Math.log(highestGeV)]
  const cold = first > LN_COLDEST ? tableOn(LN_COLDEST, first) : null
  const hot = last < LN_HOTTEST ? tableOn(last, LN_HOTTEST) : null
  return {
    edges: [...(cold?.edges ?? []), ...edgesGeV.map(Math.log), ...(hot?.edges ?? [])],
    error: Math.max(cold?.error ?? 0, hot?.error ?? 0),
    read(lnT, out) {
      if (cold && lnT < first) cold.read(lnT, out)
      else if (hot && lnT > last) hot.read(lnT, out)
      else exact(lnT, out)
    },
  }
}

function buildRadiation({ bath: treatment, neutrinos, extraSpecies }: RadiationInput): Radiation {
  const bath = buildBath(treatment, neutrinos, extraSpecies)
  const apart = speciesApart(extraSpecies, bath)
  const breaks = [...new Set([...bath.breaks, ...apart.breaks])].sort((a, b) => a - b)
  const exact = exactly(bath, apart)
  const cuts = [...breaks, ...(bath.sharp ?? [])].map(Math.log)
  const tableOn = (low: number, high: number): Read =>
    readTable(tabulate(exact, COLUMNS, low, high, { breaks: cuts, tolerance: 5e-10, maximumDepth: 14 }))
  const read = bath.rows ? readAroundRows(bath.rows, exact, tableOn) : tableOn(LN_COLDEST, LN_HOTTEST)
  return { bath, apart, breaks, kinks: bath.rows?.kinksGeV ?? [], ...read }
}

const memo = new LeastRecentlyUsed<Radiation>(48)

const rowTexts = new WeakMap<readonly BathRow[], string>()

/** The rows of a table as text, written once: they may be a hundred thousand. */
function rowText(points: readonly BathRow[]): string {
  const known = rowTexts.get(points)
  if (known !== undefined) return known
  const text = JSON.stringify(points)
  rowTexts.set(points, text)
  return text
}

const bathKey = (bath: BathInput): string =>
  bath.treatment === 'uploaded' ? rowText(bath.points) : JSON.stringify(bath)

/** The radiation of a history, built once for each distinct bath part among the last few dozen. */
export function radiationOf({ bath, neutrinos, extraSpecies }: RadiationInput): Radiation {
  const key = bathKey(bath) + JSON.stringify([neutrinos, extraSpecies])
  return memo.get(key, () => buildRadiation({ bath, neutrinos, extraSpecies }))
}
