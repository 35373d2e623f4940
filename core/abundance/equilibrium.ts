import type { Statistics } from '../bath/speciesIntegrals.ts'
import { logNumberDensity } from '../bath/speciesTable.ts'
import { ENTROPY_FACTOR } from '../history/expansionPoint.ts'

/** What equilibrium needs to know of a particle. */
export interface EquilibriumSpecies {
  massGeV: number
  degreesOfFreedom: number
  statistics: Statistics
}

/**
 * ln Y_eq = ln(Σ n_eq/s) at x = m/T, where the bath has g_s and m is the mass x is made of.
 * The first species is taken as the reference, so that sums of underflowing numbers keep their digits.
 */
export function logEquilibriumYield(
  species: readonly EquilibriumSpecies[],
  massGeV: number,
  x: number,
  gS: number,
): number {
  const first = species[0]!
  const lead = logNumberDensity((x * first.massGeV) / massGeV, first.statistics)
  let sum = first.degreesOfFreedom
  for (let i = 1; i < species.length; i++) {
    const { massGeV: mass, degreesOfFreedom, statistics } = species[i]!
    sum += degreesOfFreedom * Math.exp(logNumberDensity((x * mass) / massGeV, statistics) - lead)
  }
  return Math.log(sum / (ENTROPY_FACTOR * gS)) + lead
}
