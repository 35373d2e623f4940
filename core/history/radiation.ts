/** All radiation of a history, tabulated over ln T: the costly part, which depends on bath, neutrinos and extra species only. */
import { buildBath } from '../bath/buildBath.ts'
import { emptyPoint } from '../bath/bath.ts'
import type { BathPart } from '../bath/bath.ts'
import { speciesApart } from '../bath/speciesApart.ts'
import type { SpeciesApart } from '../bath/speciesApart.ts'
import { ConvergenceError } from '../numerics/convergence.ts'
import { LeastRecentlyUsed } from '../numerics/leastRecentlyUsed.ts'
import { tabulate } from '../numerics/interpolation/chebyshev.ts'
import type { ChebyshevTable } from '../numerics/interpolation/chebyshev.ts'
import type { HistoryInput } from '../wire/history.ts'

/** Range of the tables, GeV: from well below today's temperature to the grand-unification scale. */
export const COLDEST_GEV = 1e-14
export const HOTTEST_GEV = 1e16

/** Columns of the table. */
export const G_RHO = 0
export const G_S = 1
export const LOG_SLOPE = 2

export interface Radiation {
  readonly bath: BathPart
  readonly apart: SpeciesApart
  /** Temperatures, GeV, ascending, where a value or a first derivative jumps. */
  readonly breaks: readonly number[]
  /** g_ρ of all radiation, g_s of the bath, d ln g_s/d ln T, against ln(T/GeV). */
  readonly table: ChebyshevTable
}

/** Error of the table above which no number made with it is given. */
const UNRESOLVED = 1e-7

/** The parts of a history that its radiation depends on. */
type RadiationInput = Pick<HistoryInput, 'bath' | 'neutrinos' | 'extraSpecies'>

function buildRadiation({ bath: treatment, neutrinos, extraSpecies }: RadiationInput): Radiation {
  const bath = buildBath(treatment, neutrinos, extraSpecies)
  const apart = speciesApart(extraSpecies, bath)
  const breaks = [...new Set([...bath.breaks, ...apart.breaks])].sort((a, b) => a - b)
  const point = emptyPoint()
  const other = { gRho: 0, gP: 0 }
  const table = tabulate(
    (lnT, out) => {
      const temperature = Math.exp(lnT)
      bath.evaluate(temperature, point)
      apart.evaluate(temperature, point.gS, other)
      out[G_RHO] = point.gRho + other.gRho
      out[G_S] = point.gS
      out[LOG_SLOPE] = point.gSSlope / point.gS
    },
    3,
    Math.log(COLDEST_GEV),
    Math.log(HOTTEST_GEV),
    { breaks: [...breaks, ...(bath.sharp ?? [])].map(Math.log), tolerance: 5e-10, maximumDepth: 14 },
  )
  if (!(table.error < UNRESOLVED))
    throw new ConvergenceError(
      'the bath changes too sharply, or is not defined, somewhere: its table is not resolved',
    )
  return { bath, apart, breaks, table }
}

const memo = new LeastRecentlyUsed<Radiation>(48)

/** The radiation of a history, built once for each distinct bath part among the last few dozen. */
export function radiationOf({ bath, neutrinos, extraSpecies }: RadiationInput): Radiation {
  const key = JSON.stringify([bath, neutrinos, extraSpecies])
  return memo.get(key, () => buildRadiation({ bath, neutrinos, extraSpecies }))
}
