import { useQuery, useQueryClient } from '@tanstack/react-query'
import { toast } from 'sonner'
import type { OwnSession } from '#core/wire/index'
import { endOtherSessions, endSession, ownSessionsQuery } from '../../api/account.ts'
import { Button } from '../../components/ui/Button.tsx'
import { ErrorNotice } from '../../components/ui/Notice.tsx'
import { useTask } from '../../lib/useTask.ts'
import type { Task } from '../../lib/useTask.ts'
import { Loaded } from '../records/Loaded.tsx'
import { Moment } from '../records/Moment.tsx'
import { deviceName } from './deviceName.ts'

/** The browsers one is signed in with, and the way to sign them out from here. */
export function SessionList() {
  const query = useQuery(ownSessionsQuery)
  const queries = useQueryClient()
  const task = useTask()
  const end = (work: () => Promise<void>, said: string): void =>
    task.run(async () => {
      await work()
      await queries.invalidateQueries({ queryKey: ownSessionsQuery.queryKey })
      toast.success(said)
    })
  return (
    <Loaded of={query} what="your sessions">
      {(sessions) => (
        <>
          <ul className="rows">
            {sessions.map((session) => (
              <SessionRow
                key={session.id}
                session={session}
                task={task}
                onEnd={() => end(() => endSession(session.id), 'That session has ended.')}
              />
            ))}
          </ul>
          {task.error ? <ErrorNotice error={task.error} /> : null}
          {sessions.length > 1 ? (
            <Button
              className="justify-self-start"
              busy={task.busy}
              onClick={() => end(endOtherSessions, 'Every other session has ended.')}
            >
              Sign out everywhere else
            </Button>
          ) : null}
        </>
      )}
    </Loaded>
  )
}

interface SessionRowProps {
  session: OwnSession
  task: Task
  onEnd: () => void
}

function SessionRow({ session, task, onEnd }: SessionRowProps) {
  const device = deviceName(session.userAgent)
  return (
    <li className="grid gap-0.5 py-2.5">
      <p className="flex flex-wrap items-baseline gap-x-3">
        <span className="font-semibold">{device}</span>
        {session.current ? (
          <span className="text-caption text-soft">this one</span>
        ) : (
          <Button
            variant="link"
            className="ml-auto text-small"
            disabled={task.busy}
            aria-label={`Sign out ${device} at ${session.address}`}
            onClick={onEnd}
          >
            Sign out
          </Button>
        )}
      </p>
      <p className="text-small text-soft">
        {session.group}, from {session.address === '' ? 'an unknown address' : session.address}, last used{' '}
        <Moment at={session.lastUsedAt} />
      </p>
    </li>
  )
}
