import { useQuery } from '@tanstack/react-query'
import { useMemo } from 'react'
import { Link, useLocation } from 'react-router-dom'
import type { SessionInfo } from '#core/wire/index'
import { sessionQuery } from '../../api/session.ts'
import { EmptyState, ErrorNotice, Skeleton } from '../../components/ui/Notice.tsx'
import { Bench } from './Bench.tsx'
import { sittingOf } from './sitting.ts'
import { useOpened } from './useOpened.ts'

export default function BenchPage() {
  const { data: session } = useQuery(sessionQuery)
  return session ? <OpenedBench session={session} /> : <BenchSkeleton />
}

function BenchSkeleton() {
  return (
    <main id="main" className="p-7">
      <title>Bench · Emberline</title>
      <Skeleton label="The Bench is loading" className="h-96" />
    </main>
  )
}

/** Opens at the address; without one, where the last look ended. */
function OpenedBench({ session }: { session: SessionInfo }) {
  const { search, key } = useLocation()
  const userId = session.user.id
  const { sitting, address } = useMemo(() => {
    const found = sittingOf(userId)
    return { sitting: found, address: found.open(search) }
  }, [search, userId])
  const { opened, baseline, error, empty } = useOpened(key, address, session)
  if (opened)
    return <Bench session={session} sitting={sitting} opened={opened} baseline={baseline} error={error} />
  if (error)
    return (
      <main id="main" className="mx-auto max-w-xl p-10">
        <ErrorNotice error={error} />
      </main>
    )
  if (!empty) return <BenchSkeleton />
  return (
    <main id="main">
      <EmptyState title="The Bench needs a history and a candidate">
        The group has none yet.{' '}
        <Link className="link" to="/histories">
          See the histories
        </Link>
      </EmptyState>
    </main>
  )
}
