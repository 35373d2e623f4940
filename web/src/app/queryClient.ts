import { QueryCache, QueryClient } from '@tanstack/react-query'
import { sessionQuery } from '../api/session.ts'
import { ApiProblem, saysSignedOut } from '../lib/apiProblem.ts'

/** An answer that says what is wrong will say it again; only a lost connection is worth another try. */
const worthRetrying = (failures: number, error: Error): boolean =>
  !(error instanceof ApiProblem) && failures < 2

export const queryClient: QueryClient = new QueryClient({
  // A page that is refused for want of a session has the session asked for anew, and with it the frame told.
  queryCache: new QueryCache({
    onError: (error) => {
      if (saysSignedOut(error)) void queryClient.invalidateQueries({ queryKey: sessionQuery.queryKey })
    },
  }),
  defaultOptions: { queries: { retry: worthRetrying, staleTime: 15_000 } },
})
