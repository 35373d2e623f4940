import { useInfiniteQuery } from '@tanstack/react-query'
import { useMemo } from 'react'
import { evaluationsQuery } from '../../api/evaluations.ts'

/** The pages of stored evaluations read so far, as one list. */
export function useEvaluations(of: { historyId?: string; candidateId?: string } = {}) {
  const query = useInfiniteQuery(evaluationsQuery(of))
  const pages = query.data?.pages
  const evaluations = useMemo(() => pages?.flatMap((page) => page.items), [pages])
  return { query, loading: { data: evaluations, error: query.error, refetch: query.refetch } }
}
