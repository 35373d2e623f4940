import { useQueryClient } from '@tanstack/react-query'
import { useNavigate } from 'react-router-dom'
import type { SessionInfo } from '#core/wire/index'
import { ownGroupsQuery } from '../../api/account.ts'
import { sessionQuery } from '../../api/session.ts'

/** Goes in after signing in, or after the session was turned to another group: nothing of before is kept. */
export function useEntrance(): (session: SessionInfo, to: string) => Promise<void> {
  const navigate = useNavigate()
  const queries = useQueryClient()
  return async (session, to) => {
    queries.clear()
    queries.setQueryData(sessionQuery.queryKey, session)
    await navigate(to, { replace: true })
  }
}

/** Where to go after signing in: to choose a group first, when there are several. */
export function useAfterSignIn(): (session: SessionInfo, to: string) => Promise<void> {
  const enter = useEntrance()
  const queries = useQueryClient()
  return async (session, to) => {
    // Whoever is in one group only, or cannot be asked just now, goes straight on.
    const groups = await queries.fetchQuery({ ...ownGroupsQuery, staleTime: 0 }).catch(() => [])
    await enter(session, groups.length > 1 ? `/choose-group?to=${encodeURIComponent(to)}` : to)
  }
}
