import { useQuery } from '@tanstack/react-query'
import { useSearchParams } from 'react-router-dom'
import { chooseGroup, ownGroupsQuery } from '../../api/account.ts'
import { sessionQuery } from '../../api/session.ts'
import { ownAddress } from '../../app/ownAddress.ts'
import { Button } from '../../components/ui/Button.tsx'
import { EmptyState, ErrorNotice } from '../../components/ui/Notice.tsx'
import { useTask } from '../../lib/useTask.ts'
import { Loaded } from '../records/Loaded.tsx'
import { StrangerPage } from './StrangerPage.tsx'
import { useEntrance } from './useEntrance.ts'

/** For people in several groups: which one to work in. */
export default function ChooseGroupPage() {
  const { data: session } = useQuery(sessionQuery)
  const groups = useQuery(ownGroupsQuery)
  const [search] = useSearchParams()
  const task = useTask()
  const enter = useEntrance()
  const to = ownAddress(search.get('to'))
  const choose = (id: string): void => task.run(async () => enter(await chooseGroup(id), to))
  return (
    <StrangerPage title="Choose a group" purpose="You work in one at a time, and can turn to another later.">
      {task.error ? <ErrorNotice error={task.error} /> : null}
      <Loaded of={groups} what="your groups">
        {(found) =>
          found.length === 0 ? (
            <EmptyState title="You are in no group">Ask a lead to invite you.</EmptyState>
          ) : (
            <ul className="rows border-y border-rule">
              {found.map((group) => (
                <li key={group.id} className="flex flex-wrap items-baseline gap-x-3 py-2.5">
                  <Button variant="link" disabled={task.busy} onClick={() => choose(group.id)}>
                    {group.name}
                  </Button>
                  <span className="text-small text-soft">
                    {group.role}
                    {group.id === session?.group.id ? ', used last' : ''}
                  </span>
                </li>
              ))}
            </ul>
          )
        }
      </Loaded>
    </StrangerPage>
  )
}
