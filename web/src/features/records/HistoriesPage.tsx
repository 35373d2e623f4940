import { useQuery } from '@tanstack/react-query'
import { useMemo } from 'react'
import { Link } from 'react-router-dom'
import type { HistorySummary } from '#core/wire/index'
import { historiesQuery } from '../../api/records.ts'
import { sessionQuery } from '../../api/session.ts'
import { BATH_TITLES, describeAssumption } from '../../lib/describe.tsx'
import { ListPage } from './ListPage.tsx'
import { NewOnBench } from './NewOnBench.tsx'
import { recordColumns } from './recordColumns.tsx'
import { RecordTable } from './RecordTable.tsx'
import type { RecordColumn } from './RecordTable.tsx'

const bathTitle = (history: HistorySummary): string => BATH_TITLES[history.head.input.bath.treatment]

const searchText = (history: HistorySummary): string =>
  [history.name, bathTitle(history), history.head.input.expansion.kind, history.head.author.name].join(' ')

function columnsOf(baselineId: string | null): RecordColumn<HistorySummary>[] {
  const [name, ...rest] = recordColumns<HistorySummary>('/histories')
  const assumptions: RecordColumn<HistorySummary> = {
    id: 'assumptions',
    title: 'Assumptions',
    sortBy: bathTitle,
    cell: ({ head: { input } }) => (
      <>
        {describeAssumption('bath', input)}; {describeAssumption('expansion', input)}
        {input.maximumTemperatureGeV === null ? null : (
          <>; at most {describeAssumption('maximumTemperatureGeV', input)}</>
        )}
      </>
    ),
  }
  const baseline: RecordColumn<HistorySummary> = {
    id: 'baseline',
    title: 'Baseline',
    sortBy: (history) => (history.head.id === baselineId ? 1 : 0),
    cell: (history) =>
      history.head.id === baselineId ? <strong className="text-ember">baseline</strong> : '–',
  }
  return [name, assumptions, ...rest, baseline]
}

/** Every thermal history of the group. */
export default function HistoriesPage() {
  const histories = useQuery(historiesQuery)
  const session = useQuery(sessionQuery)
  const baselineId = session.data?.group.baselineRevisionId ?? null
  const columns = useMemo(() => columnsOf(baselineId), [baselineId])
  return (
    <ListPage
      title="Histories"
      purpose="Sets of thermal-history assumptions kept by your group; a saved revision never changes."
      action={<NewOnBench kind="history" />}
      of={histories}
      emptyTitle="No history yet"
      emptyStep={
        <p>
          <Link to="/bench" className="link">
            Open the Bench
          </Link>
          , choose the assumptions and save them as a history.
        </p>
      }
    >
      {(rows) => (
        <RecordTable
          caption="Histories of the group"
          columns={columns}
          rows={rows}
          searchText={searchText}
          newestBy="changed"
        />
      )}
    </ListPage>
  )
}
