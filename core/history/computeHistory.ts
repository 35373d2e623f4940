import { historyRequest } from '../wire/compute.ts'
import type { HistoryResult } from '../wire/compute.ts'
import { parseInput } from '../wire/fault.ts'
import { entropyTodayPerCm3, historyRows, pressureUndefinedBecause } from './rows.ts'
import { effectiveNeutrinos } from './effectiveNeutrinos.ts'
import { temperaturesAtAges } from './temperatureAtAge.ts'
import { buildHistory } from './thermalHistory.ts'

/** Gauss–Legendre with 16 points on panels of 0.3 in ln T, and matter eras solved to 1e-10. */
const AGE_QUADRATURE_ERROR = 5e-10

/** Rows of a derived history from the wire: parses, fills defaults in, computes. Rows come in the order asked for. */
export function computeHistory(input: unknown): HistoryResult {
  const { history: historyParts, temperaturesGeV, timesS, contributions } = parseInput(historyRequest, input)
  const history = buildHistory(historyParts)
  const why = pressureUndefinedBecause(history)
  return {
    rows: historyRows(history, temperaturesGeV ?? temperaturesAtAges(history, timesS!), contributions),
    entropyTodayPerCm3: entropyTodayPerCm3(history),
    effectiveNeutrinos: effectiveNeutrinos(history),
    numericalError: history.tableError + AGE_QUADRATURE_ERROR,
    ...(why === undefined ? {} : { pressureUndefinedBecause: why }),
  }
}
