/** A table of the whole bath that a group brings along, and what makes it one that can be computed from. */
import { z } from 'zod'
import { temperatureGeV } from './numbers.ts'

/** Photons alone are two. */
const effectiveNumber = z.number().min(2).max(1e4)

const bathRow = z
  .strictObject({
    temperatureGeV,
    gRho: effectiveNumber.optional().describe('g_ρ of the whole bath, neutrinos included'),
    gS: effectiveNumber.optional().describe('g_s of the whole bath, neutrinos included'),
  })
  .meta({ id: 'BathRow' })

export type BathRow = z.output<typeof bathRow>

/** Columns of a table beside the temperature. */
export const BATH_COLUMNS = ['gRho', 'gS'] as const
export type BathColumn = (typeof BATH_COLUMNS)[number]

/** Widest step from row to row, a factor in T: that of the table of Borsanyi et al., Nature 539 (2016) 69. */
const WIDEST_STEP = 10

/** Room for rounding in quotients of temperatures. */
const ROUNDING = 1 + 1e-12

/** The rows must hold the strong-interaction crossover between them: outside of them the bath is one of ideal gases. GeV. */
export const HIGHEST_FIRST_ROW_GEV = 0.1
export const LOWEST_LAST_ROW_GEV = 1

/** Below this temperature, 10^0.5 MeV in GeV, neutrinos may have a temperature of their own, and dρ = T ds need not hold. */
export const ONE_TEMPERATURE_GEV = 10 ** -2.5

/** Powers of T in ρ ∝ g_ρ T⁴ and s ∝ g_s T³. */
const POWER: Record<BathColumn, number> = { gRho: 4, gS: 3 }
const DENSITY: Record<BathColumn, string> = { gRho: 'energy', gS: 'entropy' }

/** Faults of one table that are told; one more would teach nothing. */
const MOST_FAULTS = 20

type Report = (path: (string | number)[], message: string) => void

/** Every row has the columns of the first. */
function checkColumns(points: readonly BathRow[], report: Report): boolean {
  const columns = BATH_COLUMNS.filter((column) => points[0]![column] !== undefined)
  if (columns.length === 0) report([0, 'gS'], 'missing; allowed: at least one of gRho and gS')
  let same = columns.length > 0
  points.forEach((row, i) => {
    for (const column of BATH_COLUMNS) {
      const wanted = columns.includes(column)
      if ((row[column] !== undefined) === wanted) continue
      same = false
      report(
        [i, column],
        wanted
          ? 'missing; allowed: a number in every row, as in the first'
          : 'allowed: none, as in the first row',
      )
    }
  })
  return same
}

/** Temperatures ascend, without gaps. */
function checkTemperatures(points: readonly BathRow[], report: Report): boolean {
  let ascending = true
  points.forEach(({ temperatureGeV: here }, i) => {
    const before = points[i - 1]?.temperatureGeV ?? here / 2
    if (here > before && here <= before * WIDEST_STEP * ROUNDING) return
    ascending = false
    const message =
      here > before
        ? `allowed: at most ${before * WIDEST_STEP}, ten times the row before; across a wider gap nothing is known`
        : `allowed: above ${before}, the row before; rows ascend`
    report([i, 'temperatureGeV'], message)
  })
  return ascending
}

/** Density rises, and by at least as much as c_s² ≤ 1 demands: s ∝ T, ρ ∝ T (its pressure being positive). */
function checkRise(points: readonly BathRow[], column: BathColumn, report: Report): void {
  for (let i = 1; i < points.length; i++) {
    const [before, here] = [points[i - 1]!, points[i]!]
    const ratio = before.temperatureGeV / here.temperatureGeV
    const [was, is] = [before[column]!, here[column]!]
    const least = was * ratio ** (POWER[column] - 1)
    if (is >= least) continue
    const falls = is <= was * ratio ** POWER[column]
    report(
      [i, column],
      falls
        ? `allowed: above ${was * ratio ** POWER[column]}, or the ${DENSITY[column]} density falls as T rises`
        : `allowed: at least ${least}, or the speed of sound is above that of light`,
    )
  }
}

/** 0 ≤ p ≤ ρ with p = Ts − ρ. */
function checkPressure(points: readonly BathRow[], report: Report): void {
  points.forEach(({ gRho, gS }, i) => {
    if (gRho! > (4 / 3) * gS!)
      report([i, 'gRho'], `allowed: at most ${(4 / 3) * gS!}, or the pressure Ts − ρ is negative`)
    if (gRho! < (2 / 3) * gS!)
      report([i, 'gRho'], `allowed: at least ${(2 / 3) * gS!}, or the pressure Ts − ρ is above ρ`)
  })
}

function checkReach(points: readonly BathRow[], report: Report): void {
  const [first, last] = [points[0]!, points.at(-1)!]
  if (first.temperatureGeV > HIGHEST_FIRST_ROW_GEV)
    report(
      [0, 'temperatureGeV'],
      `allowed: at most ${HIGHEST_FIRST_ROW_GEV}; the rows must hold the strong-interaction crossover, for ideal gases go on below them`,
    )
  if (last.temperatureGeV < LOWEST_LAST_ROW_GEV)
    report(
      [points.length - 1, 'temperatureGeV'],
      `allowed: at least ${LOWEST_LAST_ROW_GEV}; the rows must hold the strong-interaction crossover, for ideal gases go on above them`,
    )
  const single = first.gRho === undefined || first.gS === undefined
  if (single && first.temperatureGeV < ONE_TEMPERATURE_GEV)
    report(
      [0, 'temperatureGeV'],
      `allowed: at least ${ONE_TEMPERATURE_GEV}; colder, neutrinos have a temperature of their own, and one of gRho and gS does not follow from the other: leave colder rows out, or give both`,
    )
}

/** Rows of T with g_ρ, g_s or both: ascending, without gaps, of a bath that can exist. */
export const bathRows = z
  .array(bathRow)
  .min(4)
  .max(100_000)
  .describe(
    'Rows of the whole bath, T ascending by at most a factor of ten from row to row, from at most 0.1 GeV to at least 1 GeV; every row with g_ρ, with g_s, or with both',
  )
  .superRefine((points, context) => {
    if (points.length === 0) return
    let told = 0
    const report: Report = (path, message) => {
      if (told++ < MOST_FAULTS) context.addIssue({ code: 'custom', path, message })
    }
    const readable = [checkColumns(points, report), checkTemperatures(points, report)]
    if (readable.includes(false)) return
    checkReach(points, report)
    const columns = BATH_COLUMNS.filter((column) => points[0]![column] !== undefined)
    for (const column of columns) checkRise(points, column, report)
    if (columns.length === 2) checkPressure(points, report)
  })
