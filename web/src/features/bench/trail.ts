/** The steps tried in this sitting: kept with the server's data, and gone with it when someone signs out. */
import { queryOptions, skipToken, useQuery, useQueryClient } from '@tanstack/react-query'
import { useEffect } from 'react'
import type { BenchAddress } from './draft.ts'
import { equal } from './equal.ts'
import type { BenchView } from './useBenchAnswer.ts'
import type { BenchInputs } from './useDraft.ts'

/** One thing tried: what stood on the Bench, and what came out. */
export interface TrailStep extends BenchInputs {
  address: BenchAddress
  names: { history: string; candidate: string }
  omegaH2: number
}

/** Changes that stand for less long are on the way to another one. */
const SETTLED_MS = 1200
const MOST_STEPS = 8

const NONE: readonly TrailStep[] = []

const trailQuery = queryOptions<readonly TrailStep[]>({
  queryKey: ['bench', 'trail'],
  queryFn: skipToken,
  staleTime: Infinity,
  gcTime: Infinity,
})

const whatStood = ({ history, candidate, names }: TrailStep) => ({ history, candidate, names })

/** The trail with a step before it, unless that is where it already ends. */
export function extended(steps: readonly TrailStep[], step: TrailStep): readonly TrailStep[] {
  const last = steps[0]
  if (last && equal(whatStood(last), whatStood(step))) return steps
  return [step, ...steps].slice(0, MOST_STEPS)
}

/** The trail, newest first, which grows by what stands on the Bench once it has stood a moment. */
export function useTrail(view: BenchView, standing: Omit<TrailStep, 'omegaH2'>): readonly TrailStep[] {
  const queries = useQueryClient()
  const { data: steps = NONE } = useQuery(trailQuery)
  const { report, request } = view
  useEffect(() => {
    // The answer on screen may still be that to an earlier question.
    if (!report || request?.history !== standing.history || request.candidate !== standing.candidate) return
    const step = { ...standing, omegaH2: report.result.omegaH2 }
    const timer = setTimeout(
      () => queries.setQueryData(trailQuery.queryKey, (before = []) => extended(before, step)),
      SETTLED_MS,
    )
    return () => clearTimeout(timer)
  }, [queries, report, request, standing])
  return steps
}
