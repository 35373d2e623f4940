import { queryOptions } from '@tanstack/react-query'
import type { PublicInfo, SessionInfo } from '#core/wire/index'
import { api } from '../lib/api.ts'
import { ApiProblem } from '../lib/apiProblem.ts'

/** Who is signed in; null when nobody is. */
export const sessionQuery = queryOptions({
  queryKey: ['session'],
  queryFn: async (): Promise<SessionInfo | null> => {
    try {
      return await api<SessionInfo>('GET', '/session')
    } catch (error) {
      if (error instanceof ApiProblem && error.status === 401) return null
      throw error
    }
  },
  staleTime: 60_000,
})

export const infoQuery = queryOptions({
  queryKey: ['info'],
  queryFn: () => api<PublicInfo>('GET', '/info'),
  staleTime: Infinity,
})

export const signIn = (email: string, password: string): Promise<SessionInfo> =>
  api('POST', '/session', { email, password })

export const signOut = (): Promise<void> => api('DELETE', '/session')
