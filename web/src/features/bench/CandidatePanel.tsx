import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import type { CandidateInput, CandidateRevision } from '#core/wire/index'
import { candidatesQuery } from '../../api/records.ts'
import { MECHANISM_TITLES } from '../../lib/describe.tsx'
import { CandidateForm } from './forms/CandidateForm.tsx'
import { RecordPicker } from './RecordPicker.tsx'
import type { Chosen } from './revisions.ts'

interface CandidatePanelProps {
  chosen: Chosen<CandidateRevision>
  candidate: CandidateInput
  changed: boolean
  onChange: (candidate: CandidateInput) => void
}

/** The candidate: which one, and its numbers. */
export function CandidatePanel({ chosen, candidate, changed, onChange }: CandidatePanelProps) {
  const { data: candidates = [] } = useQuery(candidatesQuery)
  return (
    <section aria-labelledby="candidate-title" className="pt-7">
      <h2 id="candidate-title" className="font-sans text-small font-semibold text-soft">
        Candidate
      </h2>
      <RecordPicker kind="candidate" chosen={chosen} changed={changed} records={candidates} />
      <p className="pb-2 text-small text-soft">
        {MECHANISM_TITLES[candidate.mechanism]},{' '}
        <Link className="hover:text-ember" to={`/candidates/${chosen.recordId}`}>
          revision {chosen.revision.number}
        </Link>
      </p>
      <div className="border-t border-rule pt-1">
        <CandidateForm value={candidate} onChange={onChange} />
      </div>
    </section>
  )
}
