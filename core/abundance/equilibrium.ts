import type { Statistics } from '../bath/speciesIntegrals.ts'
import { logNumberDensity } from '../bath/speciesTable.ts'
import { ENTROPY_FACTOR } from '../history/thermalHistory.ts'

/** What equilibrium needs to know of a particle. */
export interface EquilibriumSpecies {
  massGeV: number
  degreesOfFreedom: number
  statistics: Statistics
}

/** ln Y_eq = ln(n_eq/s) at x = m/T, where the bath has g_s. */
export function logEquilibriumYield(species: EquilibriumSpecies, x: number, gS: number): number {
  return Math.log(species.degreesOfFreedom / (ENTROPY_FACTOR * gS)) + logNumberDensity(x, species.statistics)
}
