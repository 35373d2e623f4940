/**
 * The 2018 fit moved within the spread of the two published determinations of the whole bath:
 *
 *   g(T; band) = g_fit (1 + band · (g_table/g_fit − 1)),
 *
 * inside the 2016 table, for g_ρ and g_s alike. Beyond an end T_e the relative difference keeps its value there and fades out
 * over a decade, times 1 − (10z³ − 15z⁴ + 6z⁵) with z = |log₁₀(T/T_e)|. So band = +1 is the 2016 table inside its range.
 * This project's own measure of how well the bath is known; no publication gives one.
 */
import { fit2018 } from './fit2018.ts'
import type { WholeBathPoint } from './fit2018.ts'
import {
  LATTICE_2016_KNOTS_GEV,
  LATTICE_2016_LAST,
  LATTICE_2016_LOWEST_GEV,
  lattice2016,
} from './lattice2016.ts'

/** Temperatures, GeV, where a derivative of the band jumps. */
export const BAND_BREAKS_GEV: readonly number[] = [
  LATTICE_2016_LOWEST_GEV / 10,
  ...LATTICE_2016_KNOTS_GEV,
  LATTICE_2016_LAST.temperatureGeV * 10,
]

const emptyWhole = (): WholeBathPoint => ({ gRho: 0, gS: 0, logSlope: 0 })
const tableThere = emptyWhole()
const fitThere = emptyWhole()

/** The fit with its band at temperature T, GeV. */
export function fitWithBand(temperatureGeV: number, band: number, out: WholeBathPoint): void {
  fit2018(temperatureGeV, out)
  if (band === 0) return
  const end = Math.min(Math.max(temperatureGeV, LATTICE_2016_LOWEST_GEV), LATTICE_2016_LAST.temperatureGeV)
  const z = Math.abs(Math.log10(temperatureGeV / end))
  if (z >= 1) return
  lattice2016(end, tableThere)
  fit2018(end, fitThere)
  const fade = 1 - z ** 3 * (10 - 15 * z + 6 * z * z)
  const fadeSlope = ((-30 * z * z * (1 - z) ** 2) / Math.LN10) * (temperatureGeV > end ? 1 : -1)
  const inS = tableThere.gS / fitThere.gS
  const inSSlope = temperatureGeV === end ? inS * (tableThere.logSlope - fitThere.logSlope) : 0
  const factor = 1 + band * (inS - 1) * fade
  out.gRho *= 1 + band * (tableThere.gRho / fitThere.gRho - 1) * fade
  out.gS *= factor
  out.logSlope += (band * (inSSlope * fade + (inS - 1) * fadeSlope)) / factor
}
