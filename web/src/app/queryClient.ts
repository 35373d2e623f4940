import { QueryClient } from '@tanstack/react-query'
import { ApiProblem } from '../lib/apiProblem.ts'

/** An answer that says what is wrong will say it again; only a lost connection is worth another try. */
const worthRetrying = (failures: number, error: Error): boolean =>
  !(error instanceof ApiProblem) && failures < 2

export const queryClient = new QueryClient({
  defaultOptions: { queries: { retry: worthRetrying, staleTime: 15_000 } },
})
