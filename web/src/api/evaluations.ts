import { infiniteQueryOptions, queryOptions } from '@tanstack/react-query'
import type { CreateEvaluationResult, Evaluation, EvidenceBundle } from '#core/wire/index'
import { api } from '../lib/api.ts'

interface EvaluationPage {
  items: Evaluation[]
  next: string | null
}

/** Stored evaluations, newest first; of one history or candidate when named. */
export const evaluationsQuery = (of: { historyId?: string; candidateId?: string } = {}) =>
  infiniteQueryOptions({
    queryKey: ['evaluations', of],
    queryFn: ({ pageParam }) => {
      const search = new URLSearchParams({
        limit: '50',
        ...of,
        ...(pageParam === null ? {} : { cursor: pageParam }),
      })
      return api<EvaluationPage>('GET', `/evaluations?${search.toString()}`)
    },
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.next,
  })

export const evaluationQuery = (id: string) =>
  queryOptions({
    queryKey: ['evaluations', 'one', id],
    queryFn: () => api<Evaluation>('GET', `/evaluations/${id}`),
  })

export const evidenceQuery = (id: string) =>
  queryOptions({
    queryKey: ['evaluations', 'evidence', id],
    queryFn: () => api<EvidenceBundle>('GET', `/evaluations/${id}/evidence`),
    staleTime: Infinity,
  })

export const createEvaluation = (
  historyRevisionId: string,
  candidateRevisionId: string,
  shownOmegaH2?: number,
): Promise<CreateEvaluationResult> =>
  api('POST', '/evaluations', {
    historyRevisionId,
    candidateRevisionId,
    ...(shownOmegaH2 === undefined ? {} : { shownOmegaH2 }),
  })
