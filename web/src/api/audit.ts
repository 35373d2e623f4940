import { infiniteQueryOptions } from '@tanstack/react-query'
import type { AuditEntry } from '#core/wire/index'
import { api } from '../lib/api.ts'

/** What the log is narrowed to; all of it when empty. */
export interface AuditFilter {
  action?: string
  actorId?: string
  from?: string
  until?: string
}

interface AuditPage {
  items: AuditEntry[]
  next: string | null
}

const pageOf = (filter: AuditFilter, limit: number, cursor: string | null): Promise<AuditPage> => {
  const search = new URLSearchParams({
    limit: String(limit),
    ...filter,
    ...(cursor === null ? {} : { cursor }),
  })
  return api<AuditPage>('GET', `/audit?${search.toString()}`)
}

/** Who did what, newest first. */
export const auditQuery = (filter: AuditFilter) =>
  infiniteQueryOptions({
    queryKey: ['audit', filter],
    queryFn: ({ pageParam }) => pageOf(filter, 50, pageParam),
    initialPageParam: null as string | null,
    getNextPageParam: (page) => page.next,
  })

/** Everything the filter lets through, for a file. */
export async function wholeAudit(filter: AuditFilter): Promise<AuditEntry[]> {
  const entries: AuditEntry[] = []
  let cursor: string | null = null
  do {
    const page: AuditPage = await pageOf(filter, 200, cursor)
    entries.push(...page.items)
    cursor = page.next
  } while (cursor !== null)
  return entries
}
