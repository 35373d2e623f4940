import { useQuery } from '@tanstack/react-query'
import type { ReactNode } from 'react'
import { Link, useSearchParams } from 'react-router-dom'
import type { CandidateRecord, HistoryRecord } from '#core/wire/index'
import { sessionQuery } from '../../api/session.ts'
import { EvaluationTable } from '../evaluations/EvaluationTable.tsx'
import { useEvaluations } from '../evaluations/useEvaluations.ts'
import { CompareRevisions } from './CompareRevisions.tsx'
import { Loaded } from './Loaded.tsx'
import { Moment } from './Moment.tsx'
import { RevisionList } from './RevisionList.tsx'
import { Section } from './Section.tsx'
import type { Wording } from './wordings.ts'

interface RecordPageProps<R extends HistoryRecord | CandidateRecord> {
  record: R
  /** The list it is on. */
  list: { title: string; path: string }
  uses: { historyId: string } | { candidateId: string }
  benchLinkOf: (number: number) => string
  inputTitle: string
  wordings: (input: R['head']['input']) => Wording[]
  /** What stands beside the revisions, about the one that is shown. */
  beside?: (shown: R['head']) => ReactNode
  children: (input: R['head']['input']) => ReactNode
}

/** A history or a candidate: its revisions, what one of them says, what changed, and what was computed with it. */
export function RecordPage<R extends HistoryRecord | CandidateRecord>(props: RecordPageProps<R>) {
  const { record, list, uses, benchLinkOf, inputTitle, wordings, beside, children } = props
  const { data: session } = useQuery(sessionQuery)
  const [search] = useSearchParams()
  const wanted = Number(search.get('revision'))
  const shown = record.revisions.find(({ number }) => number === wanted) ?? record.head
  return (
    <>
      <header className="grid gap-1">
        <p className="text-small">
          <Link to={list.path} className="link">
            {list.title}
          </Link>
        </p>
        <h1 className="break-words">{record.name}</h1>
        <p className="text-soft">
          Created <Moment at={record.createdAt} />, now at revision {record.head.number}.
        </p>
      </header>
      <div className="grid grid-cols-[minmax(0,1fr)] gap-x-12 gap-y-7 lg:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
        <Section title={`${inputTitle} of revision ${shown.number}`}>{children(shown.input)}</Section>
        <div className="grid grid-cols-[minmax(0,1fr)] content-start gap-7">
          <Section title="Revisions">
            <RevisionList
              revisions={record.revisions}
              shown={shown.number}
              baselineId={session?.group.baselineRevisionId ?? null}
              benchLinkOf={benchLinkOf}
            />
          </Section>
          {beside?.(shown)}
        </div>
      </div>
      <Section title="What changed">
        <CompareRevisions<R['head']['input']> revisions={record.revisions} wordings={wordings} />
      </Section>
      <Section title="Evaluations that use it">
        <Uses of={uses} name={record.name} />
      </Section>
    </>
  )
}

function Uses({ of, name }: { of: RecordPageProps<HistoryRecord>['uses']; name: string }) {
  const { query, loading } = useEvaluations(of)
  return (
    <Loaded of={loading} what="evaluations">
      {(rows) =>
        rows.length === 0 ? (
          <p className="text-soft">None yet. Open a revision on the Bench and store what it shows.</p>
        ) : (
          <EvaluationTable caption={`Evaluations that use ${name}`} evaluations={rows} more={query} />
        )
      }
    </Loaded>
  )
}
