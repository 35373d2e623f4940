import { historyRequest } from '../wire/compute.ts'
import type { HistoryResult } from '../wire/compute.ts'
import { parseInput } from '../wire/fault.ts'
import { entropyTodayPerCm3, historyRowSteps, pressureUndefinedBecause } from './rows.ts'
import { effectiveNeutrinos } from './effectiveNeutrinos.ts'
import { complete, part } from '../steps/steps.ts'
import type { Steps } from '../steps/steps.ts'
import { temperatureSteps } from './temperatureAtAge.ts'
import { buildHistory } from './thermalHistory.ts'

/** Gauss–Legendre with 16 points on panels of 0.3 in ln T, and matter eras solved to 1e-10. */
const AGE_QUADRATURE_ERROR = 5e-10

/** Rows of a derived history from the wire: parses, fills defaults in, computes. Rows come in the order asked for. */
export function* historySteps(input: unknown): Steps<HistoryResult> {
  const { history: historyParts, temperaturesGeV, timesS, contributions } = parseInput(historyRequest, input)
  const history = buildHistory(historyParts)
  const why = pressureUndefinedBecause(history)
  const temperatures = temperaturesGeV ?? (yield* part(temperatureSteps(history, timesS!), 0, 1, 2))
  return {
    rows: yield* part(historyRowSteps(history, temperatures, contributions), 1, 1, 2),
    entropyTodayPerCm3: entropyTodayPerCm3(history),
    effectiveNeutrinos: effectiveNeutrinos(history),
    numericalError: history.tableError + AGE_QUADRATURE_ERROR,
    ...(why === undefined ? {} : { pressureUndefinedBecause: why }),
  }
}

/** The same at once. */
export const computeHistory = (input: unknown): HistoryResult => complete(historySteps(input))
