/** Finds the revisions the Bench rests on. */
import { queryOptions } from '@tanstack/react-query'
import type { QueryClient } from '@tanstack/react-query'
import type { CandidateRevision, HistoryRevision, HistorySummary } from '#core/wire/index'
import { candidateQuery, candidatesQuery, historiesQuery, historyQuery } from '../../api/records.ts'
import type { RevisionChoice } from './draft.ts'

/** A revision with the record it belongs to. */
export interface Chosen<R> {
  recordId: string
  name: string
  revision: R
  /** Number of the newest revision of the record. */
  newest: number
}

/** A history that shows what the Bench is for: the best-known bath, differing from the baseline in it. */
function firstLook(list: readonly HistorySummary[], baselineId: string | null): HistorySummary | undefined {
  const others = list.filter((item) => item.head.id !== baselineId)
  const fits = others.filter(({ head: { input } }) => input.bath.treatment === 'fit-2018')
  return fits.find(({ head: { input } }) => input.expansion.kind === 'radiation') ?? fits[0] ?? list[0]
}

/** The chosen revision of a history, or one worth looking at when none is chosen. */
export const chosenHistoryQuery = (
  client: QueryClient,
  choice: RevisionChoice | null,
  baselineId: string | null,
) =>
  queryOptions({
    queryKey: ['bench', 'history', choice],
    staleTime: Infinity,
    queryFn: async (): Promise<Chosen<HistoryRevision> | null> => {
      const list = await client.ensureQueryData(historiesQuery)
      const wanted = choice ? list.find((item) => item.id === choice.recordId) : firstLook(list, baselineId)
      if (!wanted) return null
      const of = { recordId: wanted.id, name: wanted.name, newest: wanted.head.number }
      if (!choice || choice.number === wanted.head.number) return { ...of, revision: wanted.head }
      const record = await client.ensureQueryData(historyQuery(wanted.id))
      return {
        ...of,
        revision: record.revisions.find((revision) => revision.number === choice.number) ?? wanted.head,
      }
    },
  })

/** The chosen revision of a candidate, or an s-wave freeze-out when none is chosen. */
export const chosenCandidateQuery = (client: QueryClient, choice: RevisionChoice | null) =>
  queryOptions({
    queryKey: ['bench', 'candidate', choice],
    staleTime: Infinity,
    queryFn: async (): Promise<Chosen<CandidateRevision> | null> => {
      const list = await client.ensureQueryData(candidatesQuery)
      const sWave = list.find(
        ({ head: { input } }) =>
          input.mechanism === 'freeze-out' &&
          input.massGeV === 100 &&
          input.annihilation.kind === 'partial-waves' &&
          input.annihilation.sWaveCm3PerS > 0,
      )
      const wanted = choice ? list.find((item) => item.id === choice.recordId) : (sWave ?? list[0])
      if (!wanted) return null
      const of = { recordId: wanted.id, name: wanted.name, newest: wanted.head.number }
      if (!choice || choice.number === wanted.head.number) return { ...of, revision: wanted.head }
      const record = await client.ensureQueryData(candidateQuery(wanted.id))
      return {
        ...of,
        revision: record.revisions.find((revision) => revision.number === choice.number) ?? wanted.head,
      }
    },
  })

/** The group's baseline; null when none is adopted. */
export const baselineQuery = (client: QueryClient, baselineId: string | null) =>
  queryOptions({
    queryKey: ['bench', 'baseline', baselineId],
    staleTime: 60_000,
    queryFn: async (): Promise<Chosen<HistoryRevision> | null> => {
      if (baselineId === null) return null
      const list = await client.ensureQueryData(historiesQuery)
      const head = list.find((item) => item.head.id === baselineId)
      if (head) return { recordId: head.id, name: head.name, revision: head.head, newest: head.head.number }
      for (const item of list) {
        const record = await client.ensureQueryData(historyQuery(item.id))
        const revision = record.revisions.find((each) => each.id === baselineId)
        if (revision) return { recordId: item.id, name: item.name, revision, newest: item.head.number }
      }
      return null
    },
  })
