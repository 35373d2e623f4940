import { isMatterEra } from '../history/expansions/earlyMatter.ts'
import { buildHistory } from '../history/thermalHistory.ts'
import type { ThermalHistory } from '../history/thermalHistory.ts'
import type { CandidateInput } from '../wire/candidate.ts'
import { abundanceRequest } from '../wire/compute.ts'
import type { AbundanceResult } from '../wire/compute.ts'
import { InputError, parseInput } from '../wire/fault.ts'
import { maximumTemperatureFault } from '../wire/history.ts'
import { ConvergenceError } from '../numerics/convergence.ts'
import { bathTableGuards, decisiveTemperatures } from './guards/tableGuards.ts'
import { mechanismOf } from './mechanisms/mechanisms.ts'

/** A history mixed from two others may contradict itself where neither of them does. */
function refuseContradiction({ input }: ThermalHistory): void {
  const message = maximumTemperatureFault(input)
  if (message !== null)
    throw new InputError([
      { path: 'history.maximumTemperatureGeV', value: input.maximumTemperatureGeV, message },
    ])
}

/**
 * Present abundance of a candidate in a history.
 * @throws ConvergenceError when no converged number was reached
 * @throws InputError when history and candidate do not go together
 */
export function abundance(history: ThermalHistory, candidate: CandidateInput): AbundanceResult {
  refuseContradiction(history)
  const result = mechanismOf(candidate).abundance(history, candidate)
  if (!(result.omegaH2 > 0 && result.omegaH2 < Infinity))
    throw new ConvergenceError('the abundance found is no positive finite number')
  const guards = [...result.guards, ...bathTableGuards(history, decisiveTemperatures(candidate, result))]
  const dilution = isMatterEra(history.expansion) ? { dilution: history.expansion.dilution } : {}
  return { ...result, ...dilution, guards }
}

/** The same from the wire: parses, fills defaults in, solves. */
export function computeAbundance(input: unknown): AbundanceResult {
  const { history, candidate } = parseInput(abundanceRequest, input)
  return abundance(buildHistory(history), candidate)
}
