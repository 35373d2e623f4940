import type { UseInfiniteQueryResult } from '@tanstack/react-query'
import type { Evaluation } from '#core/wire/index'
import { Button } from '../../components/ui/Button.tsx'
import { RecordTable } from '../records/RecordTable.tsx'
import { EVALUATION_COLUMNS, evaluationWords } from './evaluationColumns.tsx'

interface EvaluationTableProps {
  caption: string
  evaluations: Evaluation[]
  more: Pick<UseInfiniteQueryResult, 'hasNextPage' | 'isFetchingNextPage' | 'fetchNextPage'>
}

/** Stored evaluations, with a way to the older ones while there are any. */
export function EvaluationTable({ caption, evaluations, more }: EvaluationTableProps) {
  return (
    <RecordTable
      caption={caption}
      columns={EVALUATION_COLUMNS}
      rows={evaluations}
      searchText={evaluationWords}
      newestBy="time"
    >
      {more.hasNextPage ? (
        <p>
          <Button busy={more.isFetchingNextPage} onClick={() => void more.fetchNextPage()}>
            Load older evaluations
          </Button>
        </p>
      ) : null}
    </RecordTable>
  )
}
