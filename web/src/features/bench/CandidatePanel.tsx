import { useQuery } from '@tanstack/react-query'
import type { CandidateInput, CandidateRevision } from '#core/wire/index'
import { candidatesQuery } from '../../api/records.ts'
import { MECHANISM_TITLES } from '../../lib/describe.tsx'
import { RULED } from './forms/ruled.ts'
import { CandidateForm } from './forms/CandidateForm.tsx'
import { RecordPicker, RevisionWords } from './RecordPicker.tsx'
import type { Chosen } from './revisions.ts'

interface CandidatePanelProps {
  chosen: Chosen<CandidateRevision>
  candidate: CandidateInput
  changed: boolean
  onPick: (recordId: string, number: number) => void
  onChange: (candidate: CandidateInput) => void
}

/** The candidate: which one, and its numbers. */
export function CandidatePanel({ chosen, candidate, changed, onPick, onChange }: CandidatePanelProps) {
  const { data: candidates = [] } = useQuery(candidatesQuery)
  return (
    <section aria-labelledby="candidate-title" className="pt-7">
      <h2 id="candidate-title" className="font-sans text-small font-semibold text-soft">
        Candidate
      </h2>
      <RecordPicker kind="candidate" chosen={chosen} records={candidates} onPick={onPick} />
      <p className="pb-2 text-small text-soft">
        {MECHANISM_TITLES[candidate.mechanism]},{' '}
        <RevisionWords kind="candidate" chosen={chosen} changed={changed} />
      </p>
      <div className={`border-t border-rule pt-1 ${RULED}`}>
        <CandidateForm key={chosen.revision.id} value={candidate} onChange={onChange} />
      </div>
    </section>
  )
}
