/** Finds the revisions the Bench rests on. */
import { queryOptions } from '@tanstack/react-query'
import type { QueryClient } from '@tanstack/react-query'
import type { CandidateRevision, CandidateSummary, HistoryRevision, HistorySummary } from '#core/wire/index'
import { candidateQuery, candidatesQuery, historiesQuery, historyQuery } from '../../api/records.ts'
import type { RevisionChoice } from './draft.ts'

/** A revision with the record it belongs to. */
export interface Chosen<R> {
  recordId: string
  name: string
  revision: R
  /** The newest revision of the record. */
  newest: { id: string; number: number }
  /** What the address named and the group does not have; this revision stands instead. */
  missing: 'record' | 'revision' | null
}

interface Revision {
  id: string
  number: number
}

interface Summary<R> {
  id: string
  name: string
  head: R
}

/** Where records are found: every one with its newest revision, and the older ones of one. */
interface Shelf<R> {
  /** As known, or asked for anew. */
  list(anew: boolean): Promise<readonly Summary<R>[]>
  revisions(recordId: string): Promise<readonly R[]>
  /** What to open when nothing is chosen. */
  usual(list: readonly Summary<R>[]): Summary<R> | undefined
}

const isKnown = (list: readonly Summary<Revision>[], { recordId, number }: RevisionChoice): boolean =>
  list.some(({ id, head }) => id === recordId && number <= head.number)

async function find<R extends Revision>(
  shelf: Shelf<R>,
  choice: RevisionChoice | null,
): Promise<Chosen<R> | null> {
  const known = await shelf.list(false)
  // A record or revision newer than the list: someone may have saved it since.
  const list = choice && !isKnown(known, choice) ? await shelf.list(true) : known
  const named = list.find((item) => item.id === choice?.recordId)
  const wanted = named ?? shelf.usual(list)
  if (!wanted) return null
  const { id: recordId, name, head } = wanted
  const found = {
    recordId,
    name,
    revision: head,
    newest: { id: head.id, number: head.number },
    missing: null,
  }
  if (!choice) return found
  if (!named) return { ...found, missing: 'record' }
  if (choice.number === head.number) return found
  const revision = (await shelf.revisions(recordId)).find((each) => each.number === choice.number)
  return revision ? { ...found, revision } : { ...found, missing: 'revision' }
}

/** A history that shows what the Bench is for: the best-known bath, differing from the baseline in it. */
function firstLook(list: readonly Summary<HistoryRevision>[], baselineId: string | null) {
  const others = list.filter((item) => item.head.id !== baselineId)
  const fits = others.filter(({ head: { input } }) => input.bath.treatment === 'fit-2018')
  return fits.find(({ head: { input } }) => input.expansion.kind === 'radiation') ?? fits[0] ?? list[0]
}

/** The freeze-out by s-wave nearest to 100 GeV, which everyone knows. */
function firstCandidate(list: readonly Summary<CandidateRevision>[]) {
  const away = ({ head: { input } }: Summary<CandidateRevision>): number =>
    input.mechanism === 'freeze-out' &&
    input.annihilation.kind === 'partial-waves' &&
    input.annihilation.sWaveCm3PerS > 0
      ? Math.abs(Math.log(input.massGeV / 100))
      : Infinity
  return [...list].sort((a, b) => away(a) - away(b))[0]
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
    queryFn: () =>
      find<HistoryRevision>(
        {
          list: (anew): Promise<HistorySummary[]> =>
            anew
              ? client.fetchQuery({ ...historiesQuery, staleTime: 0 })
              : client.ensureQueryData(historiesQuery),
          revisions: async (id) => (await client.fetchQuery(historyQuery(id))).revisions,
          usual: (list) => firstLook(list, baselineId),
        },
        choice,
      ),
  })

/** The chosen revision of a candidate, or a well-known one when none is chosen. */
export const chosenCandidateQuery = (client: QueryClient, choice: RevisionChoice | null) =>
  queryOptions({
    queryKey: ['bench', 'candidate', choice],
    staleTime: Infinity,
    queryFn: () =>
      find<CandidateRevision>(
        {
          list: (anew): Promise<CandidateSummary[]> =>
            anew
              ? client.fetchQuery({ ...candidatesQuery, staleTime: 0 })
              : client.ensureQueryData(candidatesQuery),
          revisions: async (id) => (await client.fetchQuery(candidateQuery(id))).revisions,
          usual: firstCandidate,
        },
        choice,
      ),
  })

/** A revision that is known by its own id, and the name of its record. */
export interface Baseline {
  name: string
  revision: HistoryRevision
}

/** The group's baseline; null when none is adopted. */
export const baselineQuery = (client: QueryClient, baselineId: string | null) =>
  queryOptions({
    queryKey: ['bench', 'baseline', baselineId],
    staleTime: 60_000,
    queryFn: async (): Promise<Baseline | null> => {
      if (baselineId === null) return null
      const list = await client.ensureQueryData(historiesQuery)
      const head = list.find((item) => item.head.id === baselineId)
      if (head) return { name: head.name, revision: head.head }
      for (const item of list) {
        const record = await client.ensureQueryData(historyQuery(item.id))
        const revision = record.revisions.find((each) => each.id === baselineId)
        if (revision) return { name: item.name, revision }
      }
      return null
    },
  })
