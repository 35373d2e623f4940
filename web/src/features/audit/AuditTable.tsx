import type { UseInfiniteQueryResult } from '@tanstack/react-query'
import { useMemo } from 'react'
import { Link } from 'react-router-dom'
import type { AuditEntry } from '#core/wire/index'
import { Button } from '../../components/ui/Button.tsx'
import { Moment } from '../records/Moment.tsx'
import { RecordTable } from '../records/RecordTable.tsx'
import type { RecordColumn } from '../records/RecordTable.tsx'
import { QUIET_LINK } from '../records/quietLink.ts'
import { actionWords } from './actionWords.ts'

const actorName = ({ actor }: AuditEntry): string =>
  actor === null ? 'Emberline' : (actor.name ?? 'former member')

const PAGES: Record<string, string> = {
  history: '/histories',
  candidate: '/candidates',
  evaluation: '/evaluations',
}

const detailWords = ({ detail }: AuditEntry): string =>
  [detail['name'], detail['revision'] === undefined ? '' : `revision ${String(detail['revision'])}`]
    .filter((part) => part !== undefined && part !== '')
    .join(', ')

function Subject({ entry }: { entry: AuditEntry }) {
  const page = PAGES[entry.action.split('.')[0] ?? '']
  const words = detailWords(entry)
  if (page === undefined || entry.subjectId === null) return words
  return (
    <Link to={`${page}/${entry.subjectId}`} className={QUIET_LINK}>
      {words === '' ? 'open it' : words}
    </Link>
  )
}

const columnsFor = (onPerson: (id: string) => void): RecordColumn<AuditEntry>[] => [
  {
    id: 'time',
    title: 'Time',
    sortBy: ({ createdAt }) => createdAt,
    cell: ({ createdAt }) => <Moment at={createdAt} />,
  },
  {
    id: 'person',
    title: 'Person',
    sortBy: actorName,
    cell: (entry) =>
      entry.actor === null ? (
        actorName(entry)
      ) : (
        <button
          type="button"
          className={QUIET_LINK}
          title="Only this person’s entries"
          onClick={() => onPerson(entry.actor!.id)}
        >
          {actorName(entry)}
        </button>
      ),
  },
  {
    id: 'action',
    title: 'Did what',
    sortBy: ({ action }) => actionWords(action),
    cell: ({ action, apiKeyId }) => `${actionWords(action)}${apiKeyId === null ? '' : ', by key'}`,
  },
  { id: 'subject', title: 'To which', sortBy: detailWords, cell: (entry) => <Subject entry={entry} /> },
  {
    id: 'from',
    title: 'From',
    sortBy: ({ fromAddress }) => fromAddress ?? '',
    cell: ({ fromAddress, fromAgent }) => (
      <span className="text-small text-soft" title={fromAgent ?? undefined}>
        {fromAddress ?? ''}
      </span>
    ),
  },
]

interface AuditTableProps {
  entries: AuditEntry[]
  more: Pick<UseInfiniteQueryResult, 'hasNextPage' | 'isFetchingNextPage' | 'fetchNextPage'>
  onPerson: (id: string) => void
}

/** Entries of the log, with a way to the older ones while there are any. */
export function AuditTable({ entries, more, onPerson }: AuditTableProps) {
  const columns = useMemo(() => columnsFor(onPerson), [onPerson])
  return (
    <RecordTable
      caption="Audit log"
      columns={columns}
      rows={entries}
      searchText={(entry) =>
        [actorName(entry), actionWords(entry.action), detailWords(entry), entry.fromAddress].join(' ')
      }
      newestBy="time"
    >
      {more.hasNextPage ? (
        <p>
          <Button busy={more.isFetchingNextPage} onClick={() => void more.fetchNextPage()}>
            Load older entries
          </Button>
        </p>
      ) : null}
    </RecordTable>
  )
}
