import { queryOptions } from '@tanstack/react-query'
import type {
  CandidateInput,
  CandidateRecord,
  CandidateSummary,
  HistoryInput,
  HistoryRecord,
  HistorySummary,
} from '#core/wire/index'
import { api } from '../lib/api.ts'

interface Page<T> {
  items: T[]
  next: string | null
}

/** Every page of a list, one after the other: groups keep dozens of records, not thousands. */
async function everyPage<T>(path: string): Promise<T[]> {
  const items: T[] = []
  let next: string | null = ''
  while (next !== null) {
    const page: Page<T> = await api<Page<T>>(
      'GET',
      `${path}?limit=200${next === '' ? '' : `&cursor=${encodeURIComponent(next)}`}`,
    )
    items.push(...page.items)
    next = page.next
  }
  return items
}

export const historiesQuery = queryOptions({
  queryKey: ['histories'],
  queryFn: () => everyPage<HistorySummary>('/histories'),
})

export const candidatesQuery = queryOptions({
  queryKey: ['candidates'],
  queryFn: () => everyPage<CandidateSummary>('/candidates'),
})

export const historyQuery = (id: string) =>
  queryOptions({ queryKey: ['histories', id], queryFn: () => api<HistoryRecord>('GET', `/histories/${id}`) })

export const candidateQuery = (id: string) =>
  queryOptions({
    queryKey: ['candidates', id],
    queryFn: () => api<CandidateRecord>('GET', `/candidates/${id}`),
  })

export const createHistory = (name: string, note: string, input: HistoryInput): Promise<HistoryRecord> =>
  api('POST', '/histories', { name, note, input })

export const reviseHistory = (
  id: string,
  parentId: string,
  note: string,
  input: HistoryInput,
): Promise<HistoryRecord> => api('POST', `/histories/${id}/revisions`, { parentId, note, input })

export const createCandidate = (
  name: string,
  note: string,
  input: CandidateInput,
): Promise<CandidateRecord> => api('POST', '/candidates', { name, note, input })

export const reviseCandidate = (
  id: string,
  parentId: string,
  note: string,
  input: CandidateInput,
): Promise<CandidateRecord> => api('POST', `/candidates/${id}/revisions`, { parentId, note, input })
