import type { ThermalHistory } from '../history/thermalHistory.ts'
import { buildHistory } from '../history/thermalHistory.ts'
import type { CandidateInput } from '../wire/candidate.ts'
import { abundanceRequest } from '../wire/compute.ts'
import type { AbundanceResult } from '../wire/compute.ts'
import { parseInput } from '../wire/fault.ts'
import { freezeInDecayAbundance } from './freezeInDecayCandidate.ts'
import { freezeOutAbundance } from './freezeOutCandidate.ts'

/**
 * Present abundance of a candidate in a history.
 * @throws ConvergenceError when no converged number was reached
 * @throws InputError when history and candidate do not go together
 */
export function abundance(history: ThermalHistory, candidate: CandidateInput): AbundanceResult {
  switch (candidate.mechanism) {
    case 'freeze-out':
      return freezeOutAbundance(history, candidate)
    case 'freeze-in-decay':
      return freezeInDecayAbundance(history, candidate)
  }
}

/** The same from the wire: parses, fills defaults in, solves. */
export function computeAbundance(input: unknown): AbundanceResult {
  const { history, candidate } = parseInput(abundanceRequest, input)
  return abundance(buildHistory(history), candidate)
}
