import { Link } from 'react-router-dom'
import { ListPage } from '../records/ListPage.tsx'
import { EvaluationTable } from './EvaluationTable.tsx'
import { useEvaluations } from './useEvaluations.ts'

/** Every stored result of the group. */
export default function EvaluationsPage() {
  const { query, loading } = useEvaluations()
  return (
    <ListPage
      title="Evaluations"
      purpose="Stored results: one revision of a history with one of a candidate, and what came out."
      of={loading}
      emptyTitle="No evaluation yet"
      emptyStep={
        <p>
          <Link to="/bench" className="link">
            Open the Bench
          </Link>
          , choose a history and a candidate and store what it shows.
        </p>
      }
    >
      {(rows) => <EvaluationTable caption="Evaluations of the group" evaluations={rows} more={query} />}
    </ListPage>
  )
}
