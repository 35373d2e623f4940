import type { GuestView } from '#core/wire/index'
import { revisionText } from '../evaluations/evaluationColumns.tsx'
import { EvidenceFile } from '../evaluations/EvidenceFile.tsx'
import { KeptWith } from '../evaluations/KeptWith.tsx'
import { Outputs, StoredAnswer, StoredGuards } from '../evaluations/Outcome.tsx'
import { RecomputeHere } from '../evaluations/RecomputeHere.tsx'
import { CandidateInputs, HistoryInputs } from '../records/Inputs.tsx'
import { Moment } from '../records/Moment.tsx'
import { Section } from '../records/Section.tsx'

/** An evaluation as a guest sees it: the number, what it rests on, and the means to check it. */
export function GuestEvaluation({ view }: { view: Extract<GuestView, { kind: 'evaluation' }> }) {
  const { evaluation, history, candidate, evidence } = view
  const { result } = evaluation
  return (
    <>
      <header className="grid gap-1">
        <h1 className="break-words">
          {revisionText(evaluation.history)} with {revisionText(evaluation.candidate)}
        </h1>
        <p className="text-soft">
          Evaluated by {evaluation.author.name} of {view.groupName}, <Moment at={evaluation.createdAt} />.
        </p>
      </header>
      <StoredAnswer result={result} />
      <div className="flex flex-wrap items-start gap-3">
        <RecomputeHere request={{ history, candidate }} stored={result} />
        <EvidenceFile bundle={evidence} />
      </div>
      <div className="grid grid-cols-[minmax(0,1fr)] gap-x-12 gap-y-7 lg:grid-cols-2">
        <Section title="What came out">
          <Outputs result={result} />
        </Section>
        <div className="grid content-start gap-7">
          <Section title="Guards">
            <StoredGuards guards={result.guards} />
          </Section>
          <Section title="Kept with it">
            <KeptWith evaluation={evaluation} />
          </Section>
        </div>
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
  )
}
