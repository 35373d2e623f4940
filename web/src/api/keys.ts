import { queryOptions } from '@tanstack/react-query'
import type { ApiKey, CreateKeyResult, KeyScope } from '#core/wire/index'
import { api } from '../lib/api.ts'

export type KeysOf = 'me' | 'group'

/** API keys, newest first; the whole group's are for its lead. */
export const keysQuery = (of: KeysOf) =>
  queryOptions({
    queryKey: ['keys', of],
    queryFn: async () => (await api<{ items: ApiKey[] }>('GET', `/keys?of=${of}`)).items,
  })

export const createKey = (request: {
  name: string
  scope: KeyScope
  days: number
}): Promise<CreateKeyResult> => api('POST', '/keys', request)

export const revokeKey = (id: string): Promise<ApiKey> => api('DELETE', `/keys/${id}`)
