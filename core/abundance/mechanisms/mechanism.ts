import type { ThermalHistory } from '../../history/thermalHistory.ts'
import type { AbundanceResult } from '../../wire/compute.ts'
import type { CandidateInput } from '../../wire/candidate.ts'
import type { EquilibriumSpecies } from '../equilibrium.ts'
import type { YieldSamples } from '../yieldSamples.ts'

/** What every mechanism answers for its candidates. */
export interface Mechanism<C extends CandidateInput> {
  /** @throws ConvergenceError, InputError */
  abundance(history: ThermalHistory, candidate: C): AbundanceResult
  /** ln Y at the wanted ln x (ascending), x = scaleGeV/T. */
  yields(history: ThermalHistory, candidate: C, lnX: Float64Array): YieldSamples
  /** The mass in x = m/T, GeV. */
  scaleGeV(history: ThermalHistory, candidate: C): number
  /** Whose equilibrium is drawn beside the yield. */
  equilibrium(candidate: C): { of: 'candidate' | 'parent'; species: readonly EquilibriumSpecies[] }
  /** The rate that decides, over H, at temperature T, GeV: annihilation, or production per candidate in equilibrium. */
  rateOverHubble(history: ThermalHistory, candidate: C): (temperatureGeV: number) => number
}
