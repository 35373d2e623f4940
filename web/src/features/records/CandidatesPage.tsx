import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import type { CandidateSummary } from '#core/wire/index'
import { candidatesQuery } from '../../api/records.ts'
import { describeCandidate, MECHANISM_TITLES } from '../../lib/describe.tsx'
import { ListPage } from './ListPage.tsx'
import { NewOnBench } from './NewOnBench.tsx'
import { recordColumns } from './recordColumns.tsx'
import { RecordTable } from './RecordTable.tsx'
import type { RecordColumn } from './RecordTable.tsx'

const mechanismTitle = (candidate: CandidateSummary): string =>
  MECHANISM_TITLES[candidate.head.input.mechanism]

const searchText = (candidate: CandidateSummary): string =>
  [
    candidate.name,
    mechanismTitle(candidate),
    candidate.head.input.statistics,
    candidate.head.author.name,
  ].join(' ')

const [NAME, ...REST] = recordColumns<CandidateSummary>('/candidates')

const COLUMNS: readonly RecordColumn<CandidateSummary>[] = [
  NAME,
  {
    id: 'particle',
    title: 'Particle',
    sortBy: (candidate) => candidate.head.input.massGeV,
    cell: (candidate) => describeCandidate(candidate.head.input),
  },
  { id: 'mechanism', title: 'Mechanism', sortBy: mechanismTitle, cell: mechanismTitle },
  ...REST,
]

/** Every dark-matter candidate of the group. */
export default function CandidatesPage() {
  const candidates = useQuery(candidatesQuery)
  return (
    <ListPage
      title="Candidates"
      purpose="Dark-matter candidates kept by your group: how each is made, and its particle numbers."
      action={<NewOnBench kind="candidate" />}
      of={candidates}
      emptyTitle="No candidate yet"
      emptyStep={
        <p>
          <Link to="/bench" className="link">
            Open the Bench
          </Link>
          , set a mass and a mechanism and save them as a candidate.
        </p>
      }
    >
      {(rows) => (
        <RecordTable
          caption="Candidates of the group"
          columns={COLUMNS}
          rows={rows}
          searchText={searchText}
          newestBy="changed"
        />
      )}
    </ListPage>
  )
}
