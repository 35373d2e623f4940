import { historyRequest } from '../wire/compute.ts'
import type { HistoryResult } from '../wire/compute.ts'
import { parseInput } from '../wire/fault.ts'
import { entropyTodayPerCm3, historyRows, pressureUndefinedBecause } from './rows.ts'
import { buildHistory } from './thermalHistory.ts'

/** Rows of a derived history from the wire: parses, fills defaults in, computes. Rows come in the order of the temperatures. */
export function computeHistory(input: unknown): HistoryResult {
  const { history: historyParts, temperaturesGeV } = parseInput(historyRequest, input)
  const history = buildHistory(historyParts)
  const why = pressureUndefinedBecause(history)
  return {
    rows: historyRows(history, temperaturesGeV),
    entropyTodayPerCm3: entropyTodayPerCm3(history),
    ...(why === undefined ? {} : { pressureUndefinedBecause: why }),
  }
}
