import { Link } from 'react-router-dom'
import type { CandidateSummary, HistorySummary } from '#core/wire/index'
import { Moment } from './Moment.tsx'
import { QUIET_LINK } from './quietLink.ts'
import type { RecordColumn } from './RecordTable.tsx'

/** The columns histories and candidates share; the name leads. */
export function recordColumns<T extends HistorySummary | CandidateSummary>(
  folder: string,
): [RecordColumn<T>, ...RecordColumn<T>[]] {
  return [
    {
      id: 'name',
      title: 'Name',
      sortBy: (record) => record.name,
      cell: (record) => (
        <Link to={`${folder}/${record.id}`} className={`font-serif text-[1.05em] ${QUIET_LINK}`}>
          {record.name}
        </Link>
      ),
    },
    {
      id: 'revision',
      title: 'Revision',
      sortBy: (record) => record.head.number,
      cell: (record) => <span className="number">{record.head.number}</span>,
    },
    {
      id: 'author',
      title: 'Author',
      sortBy: (record) => record.head.author.name,
      cell: (record) => record.head.author.name,
    },
    {
      id: 'changed',
      title: 'Last change',
      sortBy: (record) => record.updatedAt,
      cell: (record) => <Moment at={record.updatedAt} />,
    },
  ]
}
