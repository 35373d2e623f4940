import { useQuery, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import type { SessionInfo } from '#core/wire/index'
import type { BenchAddress } from './draft.ts'
import { baselineQuery, chosenCandidateQuery, chosenHistoryQuery } from './revisions.ts'
import type { Baseline } from './revisions.ts'
import type { Opened } from './useDraft.ts'

type Found = Omit<Opened, 'settled'>

export interface Opening {
  /** What to show: what the address names, or while that is on its way what it named before. */
  opened: Opened | null
  baseline: Baseline | null
  error: Error | null
  /** The group has no history or no candidate. */
  empty: boolean
}

const isSame = (a: Found | null, b: Found): boolean =>
  a?.key === b.key && a.history === b.history && a.candidate === b.candidate

/** Fetches what an address names. The last that was found stays, so that picking another blanks nothing. */
export function useOpened(key: string, address: BenchAddress, session: SessionInfo): Opening {
  const queries = useQueryClient()
  const baselineId = session.group.baselineRevisionId
  const history = useQuery(chosenHistoryQuery(queries, address.history, baselineId))
  const candidate = useQuery(chosenCandidateQuery(queries, address.candidate))
  const baseline = useQuery(baselineQuery(queries, baselineId))
  const [last, setLast] = useState<Found | null>(null)

  const found =
    history.data && candidate.data && baseline.data !== undefined
      ? { key, address, history: history.data, candidate: candidate.data }
      : null
  if (found && !isSame(last, found)) setLast(found)
  const shown = found ?? last
  return {
    opened: shown && { ...shown, settled: found !== null },
    baseline: baseline.data ?? null,
    error: history.error ?? candidate.error ?? baseline.error,
    empty: history.data === null || candidate.data === null,
  }
}
