import { queryOptions } from '@tanstack/react-query'
import type { CreateGuestLinkResult, GuestLink, GuestLinkKind, GuestView } from '#core/wire/index'
import { api } from '../lib/api.ts'

/** Guest links, newest first; those to one thing when named. */
export const guestLinksQuery = (subjectId?: string) =>
  queryOptions({
    queryKey: ['guest-links', subjectId ?? 'all'],
    queryFn: async () => {
      const search = subjectId === undefined ? '' : `?subjectId=${subjectId}`
      return (await api<{ items: GuestLink[] }>('GET', `/guest-links${search}`)).items
    },
  })

export const createGuestLink = (request: {
  kind: GuestLinkKind
  subjectId: string
  note: string
  days: number | null
}): Promise<CreateGuestLinkResult> => api('POST', '/guest-links', request)

export const revokeGuestLink = (id: string): Promise<GuestLink> => api('DELETE', `/guest-links/${id}`)

/** What a guest sees. A link that opens nothing is not asked again. */
export const guestViewQuery = (token: string) =>
  queryOptions({
    queryKey: ['guest-view', token],
    queryFn: () => api<GuestView>('POST', '/guest', { token }),
    retry: false,
    staleTime: Infinity,
  })
