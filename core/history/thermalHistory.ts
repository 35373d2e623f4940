/**
 * A thermal history: entropy density and expansion rate as functions of the bath's temperature.
 *
 *   s = (2π²/45) g_s T³,   ρ_R = (π²/30) g_ρ T⁴,   H = √(8πρ/3)/M_Pl,   δ_s = (1/3) d ln g_s/d ln T.
 *
 * Source: Kolb & Turner, The Early Universe (1990), §3.3–3.5.
 */
import { entropyNumberToday } from '../bath/neutrinos.ts'
import { GEV_PER_KELVIN } from '../constants/natural.ts'
import type { HistoryInput } from '../wire/history.ts'
import { ENTROPY_FACTOR, setRadiation } from './expansionPoint.ts'
import type { ExpansionPoint } from './expansionPoint.ts'
import { expansionOf } from './expansions/expansionOf.ts'
import type { Expansion } from './expansions/expansion.ts'
import { COLUMNS, G_RHO, G_S, LOG_SLOPE, radiationOf } from './radiation.ts'
import type { Radiation } from './radiation.ts'

export interface ThermalHistory {
  readonly input: HistoryInput
  readonly radiation: Radiation
  readonly expansion: Expansion
  /** Photon temperature today, GeV. */
  readonly temperatureToday: number
  /** Entropy density today, GeV³. */
  readonly entropyToday: number
  /** Temperatures, GeV, ascending, where integrators must restart. */
  readonly breaks: readonly number[]
  /** Temperatures, GeV, ascending, where a higher derivative jumps enough for an integrator to restart. */
  readonly kinks: readonly number[]
  /** Relative error of the tabulated numbers. */
  readonly tableError: number
  /** Writes the state at ln(T/GeV) into `out`; no allocation. */
  at(lnT: number, out: ExpansionPoint): void
}

/** Builds the history of a parsed input. The bath's tables are shared with other histories of the same bath. */
export function buildHistory(input: HistoryInput): ThermalHistory {
  const radiation = radiationOf(input)
  const expansion = expansionOf(input, radiation)
  const columns = new Float64Array(COLUMNS)
  const temperatureToday = input.today.temperatureK * GEV_PER_KELVIN
  return {
    input,
    radiation,
    expansion,
    temperatureToday,
    entropyToday: ENTROPY_FACTOR * entropyNumberToday(input.neutrinos) * temperatureToday ** 3,
    breaks: [...new Set([...radiation.breaks, ...expansion.breaks])].sort((a, b) => a - b),
    kinks: radiation.kinks,
    tableError: radiation.error,
    at(lnT, out) {
      radiation.read(lnT, columns)
      setRadiation(out, Math.exp(lnT), columns[G_RHO]!, columns[G_S]!, columns[LOG_SLOPE]!)
      expansion.complete(lnT, out)
    },
  }
}
