import { queryOptions } from '@tanstack/react-query'
import type { PublicInfo, SessionInfo } from '#core/wire/index'
import { api } from '../lib/api.ts'
import { ApiProblem } from '../lib/apiProblem.ts'

/** The session known last; `ended` once the server no longer knows it, so that the page under it can stay. */
export type KnownSession = SessionInfo & { ended?: true }

const SESSION = ['session'] as const

/** Who is signed in; null when nobody was. */
export const sessionQuery = queryOptions({
  queryKey: SESSION,
  queryFn: async ({ client }): Promise<KnownSession | null> => {
    try {
      return await api<SessionInfo>('GET', '/session')
    } catch (error) {
      if (!(error instanceof ApiProblem && error.status === 401)) throw error
      const before = client.getQueryData<KnownSession | null>(SESSION)
      return before ? { ...before, ended: true } : null
    }
  },
  staleTime: (query) => (query.state.data?.ended ? 0 : 60_000),
})

export const infoQuery = queryOptions({
  queryKey: ['info'],
  queryFn: () => api<PublicInfo>('GET', '/info'),
  staleTime: Infinity,
})

/** `code` is that of the second factor, once it has been asked for. */
export const signIn = (email: string, password: string, code?: string): Promise<SessionInfo> =>
  api('POST', '/session', code === undefined ? { email, password } : { email, password, code })

export const signOut = (): Promise<void> => api('DELETE', '/session')
