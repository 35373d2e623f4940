import { useQuery } from '@tanstack/react-query'
import { Link, useParams } from 'react-router-dom'
import type { Evaluation } from '#core/wire/index'
import { evaluationQuery } from '../../api/evaluations.ts'
import { numberParts } from '../../lib/number.ts'
import { GuestLinks } from '../guest/GuestLinks.tsx'
import { benchLink } from '../records/benchLink.ts'
import { Loaded } from '../records/Loaded.tsx'
import { Moment } from '../records/Moment.tsx'
import { Page } from '../records/Page.tsx'
import { QUIET_LINK } from '../records/quietLink.ts'
import { Section } from '../records/Section.tsx'
import { revisionText } from './evaluationColumns.tsx'
import { EvaluatedInputs } from './EvaluatedInputs.tsx'
import { KeptWith } from './KeptWith.tsx'
import { Outputs, StoredAnswer, StoredGuards } from './Outcome.tsx'

function titleOf({ result, history, candidate }: Evaluation): string {
  const { mantissa, exponent } = numberParts(result.omegaH2, 4)
  const number = exponent === null ? mantissa : `${mantissa}e${exponent}`
  return `${number}, ${revisionText(history)}, ${revisionText(candidate)}`
}

/** One stored result: what went in, what came out, and whether it still does. */
export default function EvaluationPage() {
  const { id = '' } = useParams()
  const evaluation = useQuery(evaluationQuery(id))
  return (
    <Page title={evaluation.data ? titleOf(evaluation.data) : 'Evaluation'}>
      <Loaded of={evaluation} what="the evaluation">
        {(loaded) => <EvaluationDetail evaluation={loaded} />}
      </Loaded>
    </Page>
  )
}

function EvaluationDetail({ evaluation }: { evaluation: Evaluation }) {
  const { result } = evaluation
  return (
    <>
      <Heading evaluation={evaluation} />
      <StoredAnswer result={result} />
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
          <Section title="Guest links">
            <GuestLinks kind="evaluation" subjectId={evaluation.id} what="this evaluation" />
          </Section>
        </div>
      </div>
      <EvaluatedInputs evaluation={evaluation} />
    </>
  )
}

function Heading({ evaluation: { history, candidate, author, createdAt } }: { evaluation: Evaluation }) {
  const onBench = benchLink({ history, candidate })
  return (
    <header className="grid gap-1">
      <p className="text-small">
        <Link to="/evaluations" className="link">
          Evaluations
        </Link>
      </p>
      <h1 className="break-words">
        <Link to={`/histories/${history.recordId}?revision=${history.number}`} className={QUIET_LINK}>
          {revisionText(history)}
        </Link>
        {' with '}
        <Link to={`/candidates/${candidate.recordId}?revision=${candidate.number}`} className={QUIET_LINK}>
          {revisionText(candidate)}
        </Link>
      </h1>
      <p className="text-soft">
        Stored by {author.name}, <Moment at={createdAt} />.{' '}
        <Link to={onBench} className="link">
          Open these revisions on the Bench
        </Link>
      </p>
    </header>
  )
}
