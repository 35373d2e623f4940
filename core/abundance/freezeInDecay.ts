/**
 * Freeze-in by decay of a parent B in equilibrium, B → n_X X + …, width Γ:
 *
 *   γ = n_X g_B m_B² T Γ/(2π²) · Σ_k (−η)^{k+1} K₁(k m_B/T)/k,
 *
 * the first term alone for Maxwell–Boltzmann. It starts at infinite temperature (numerically x = 1e-5, where what is missing
 * is below 1e-14) or at the maximum temperature.
 * Source: Hall, Jedamzik, March-Russell, West, JHEP 03 (2010) 080, eq. 4.5; the sum: exact statistics of the parent.
 */
import { decaySum } from '../bath/speciesTable.ts'
import { HOTTEST_GEV } from '../history/radiation.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import type { EquilibriumSpecies } from './equilibrium.ts'
import type { FreezeInSource } from './freezeIn.ts'

const EARLIEST_X = 1e-5
/** e^{−x} is then below 1e-19. */
const LATEST_X = 45

/** Decays as a source. @param perDecay particles of the candidate per decay */
export function decaySource(history: ThermalHistory, parent: EquilibriumSpecies, widthGeV: number, perDecay: number): FreezeInSource {
  const { massGeV, degreesOfFreedom, statistics } = parent
  const factor = (perDecay * degreesOfFreedom * massGeV ** 2 * widthGeV) / (2 * Math.PI ** 2)
  return {
    scaleGeV: massGeV,
    reactionDensity: (temperature) => factor * temperature * decaySum(massGeV / temperature, statistics),
    hottestGeV: Math.min(history.input.maximumTemperatureGeV ?? Infinity, massGeV / EARLIEST_X, HOTTEST_GEV),
    coldestGeV: massGeV / LATEST_X,
    breaks: [],
  }
}
