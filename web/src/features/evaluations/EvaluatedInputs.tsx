import { useQuery } from '@tanstack/react-query'
import type { CandidateInput, Evaluation, HistoryInput } from '#core/wire/index'
import { evidenceQuery } from '../../api/evaluations.ts'
import { candidateQuery, historyQuery } from '../../api/records.ts'
import { CandidateInputs, HistoryInputs } from '../records/Inputs.tsx'
import { Loaded } from '../records/Loaded.tsx'
import { Section } from '../records/Section.tsx'
import { EvidenceFile } from './EvidenceFile.tsx'
import { RecomputeHere } from './RecomputeHere.tsx'

interface Inputs {
  history: HistoryInput
  candidate: CandidateInput
}

interface Revisions<T> {
  revisions: readonly { id: string; input: T }[]
}

const inputOf = <T,>(record: Revisions<T>, id: string): T | undefined =>
  record.revisions.find((revision) => revision.id === id)?.input

/** The two inputs an evaluation names, from the records that hold them. */
function useInputs({ history, candidate }: Evaluation) {
  const histories = useQuery(historyQuery(history.recordId))
  const candidates = useQuery(candidateQuery(candidate.recordId))
  const historyInput = histories.data && inputOf<HistoryInput>(histories.data, history.id)
  const candidateInput = candidates.data && inputOf<CandidateInput>(candidates.data, candidate.id)
  const data: Inputs | undefined =
    historyInput && candidateInput ? { history: historyInput, candidate: candidateInput } : undefined
  return {
    data,
    error: histories.error ?? candidates.error,
    refetch: () => Promise.all([histories.refetch(), candidates.refetch()]),
  }
}

/** What went in, in words and in numbers, and the way to compute it again. */
export function EvaluatedInputs({ evaluation }: { evaluation: Evaluation }) {
  const inputs = useInputs(evaluation)
  return (
    <Loaded of={inputs} what="what went in">
      {({ history, candidate }) => (
        <>
          <div className="flex flex-wrap items-start gap-3">
            <RecomputeHere request={{ history, candidate }} stored={evaluation.result} />
            <StoredEvidence evaluation={evaluation} />
          </div>
          <div className="grid grid-cols-[minmax(0,1fr)] gap-x-12 gap-y-7 lg:grid-cols-2">
            <Section title="History">
              <HistoryInputs input={history} root="history." />
            </Section>
            <Section title="Candidate">
              <CandidateInputs input={candidate} root="candidate." />
            </Section>
          </div>
        </>
      )}
    </Loaded>
  )
}

function StoredEvidence({ evaluation }: { evaluation: Evaluation }) {
  const evidence = useQuery(evidenceQuery(evaluation.id))
  return evidence.data === undefined ? null : <EvidenceFile bundle={evidence.data} />
}
