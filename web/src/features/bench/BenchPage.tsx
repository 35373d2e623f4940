import { useQuery, useQueryClient } from '@tanstack/react-query'
import { lazy, Suspense, useMemo, useState } from 'react'
import { Link, useLocation } from 'react-router-dom'
import type { BenchRequest } from '#core/bench/types'
import type { CandidateRevision, HistoryRevision, SessionInfo } from '#core/wire/index'
import { sessionQuery } from '../../api/session.ts'
import { EmberLine } from '../../components/ember-line/EmberLine.tsx'
import { Button } from '../../components/ui/Button.tsx'
import { EmptyState, ErrorNotice, Skeleton } from '../../components/ui/Notice.tsx'
import { Answer, Guards, Workings } from './Answer.tsx'
import { BenchCharts } from './BenchCharts.tsx'
import { CandidatePanel } from './CandidatePanel.tsx'
import { FaultProvider } from './faults.tsx'
import { HistoryPanel } from './HistoryPanel.tsx'
import { Problems } from './Problems.tsx'
import { SaveBar } from './SaveBar.tsx'
import { Trail } from './Trail.tsx'
import { Facts, WhatMovedIt } from './WhatMovedIt.tsx'
import { readAddress } from './draft.ts'
import type { BenchAddress } from './draft.ts'
import { baselineQuery, chosenCandidateQuery, chosenHistoryQuery } from './revisions.ts'
import type { Chosen } from './revisions.ts'
import { useBenchAnswer } from './useBenchAnswer.ts'
import { LAST_ADDRESS, useDraft } from './useDraft.ts'
import { useUndoKeys } from './useUndoKeys.ts'

const SaveDialog = lazy(() => import('./SaveDialog.tsx'))

/** Temperatures the ember line spans, GeV: wider than any window is likely to be. */
const EMBER_RANGE = { hotGeV: 1e4, coldGeV: 1e-4 }

/** Opens at the address; without one, where the last look ended. */
export default function BenchPage() {
  const { search, key } = useLocation()
  const address = useMemo(
    () => readAddress(search === '' ? (sessionStorage.getItem(LAST_ADDRESS) ?? '') : search),
    [search],
  )
  const { data: session } = useQuery(sessionQuery)
  if (!session) return <BenchSkeleton />
  return <BenchLoader key={key} address={address} session={session} />
}

function BenchSkeleton() {
  return (
    <main id="main" className="p-7">
      <title>Bench · Emberline</title>
      <Skeleton label="The Bench is loading" className="h-96" />
    </main>
  )
}

function BenchLoader({ address, session }: { address: BenchAddress; session: SessionInfo }) {
  const queries = useQueryClient()
  const { baselineRevisionId } = session.group
  const history = useQuery(chosenHistoryQuery(queries, address.history, baselineRevisionId))
  const candidate = useQuery(chosenCandidateQuery(queries, address.candidate))
  const baseline = useQuery(baselineQuery(queries, baselineRevisionId))
  const error = history.error ?? candidate.error ?? baseline.error
  if (error)
    return (
      <main id="main" className="mx-auto max-w-xl p-10">
        <ErrorNotice error={error} />
      </main>
    )
  if (history.isPending || candidate.isPending || baseline.isPending) return <BenchSkeleton />
  if (!history.data || !candidate.data)
    return (
      <main id="main">
        <EmptyState title="The Bench needs a history and a candidate">
          The group has none yet.{' '}
          <Link className="link" to="/histories">
            See the histories
          </Link>
        </EmptyState>
      </main>
    )
  return (
    <Bench
      address={address}
      session={session}
      chosenHistory={history.data}
      chosenCandidate={candidate.data}
      baseline={baseline.data ?? null}
    />
  )
}

interface BenchProps {
  address: BenchAddress
  session: SessionInfo
  chosenHistory: Chosen<HistoryRevision>
  chosenCandidate: Chosen<CandidateRevision>
  baseline: Chosen<HistoryRevision> | null
}

function Bench({ address, session, chosenHistory, chosenCandidate, baseline }: BenchProps) {
  const draft = useDraft(address, chosenHistory, chosenCandidate)
  const [cursorGeV, setCursorGeV] = useState<number | null>(null)
  const [saving, setSaving] = useState(false)
  const [drawer, setDrawer] = useState(false)
  const { history, candidate, window } = draft
  const baselineInput = baseline?.revision.input ?? history
  const request = useMemo<BenchRequest>(
    () => ({ history, baseline: baselineInput, candidate, window }),
    [history, baselineInput, candidate, window],
  )
  const view = useBenchAnswer(request)
  const { report } = view
  useUndoKeys(draft.undo, draft.redo)

  const inputs = (
    <>
      <HistoryPanel
        chosen={chosenHistory}
        history={history}
        changed={draft.historyChanged}
        baseline={baselineInput}
        baselineName={baseline?.name ?? null}
        factors={report?.factors ?? []}
        onChange={(changed) => draft.change({ history: changed })}
      />
      <CandidatePanel
        chosen={chosenCandidate}
        candidate={candidate}
        changed={draft.candidateChanged}
        onChange={(changed) => draft.change({ candidate: changed })}
      />
      <SaveBar
        session={session}
        draft={draft}
        ready={report !== null && view.faults.length === 0 && view.failure === null}
        onSave={() => setSaving(true)}
      />
    </>
  )
  return (
    <FaultProvider faults={view.faults}>
      <title>Bench · Emberline</title>
      <EmberLine
        range={EMBER_RANGE}
        window={window}
        onWindow={(hotGeV, coldGeV) => draft.setWindow({ hotGeV, coldGeV })}
        cursorGeV={cursorGeV}
        onCursor={setCursorGeV}
        epochs={report?.epochs ?? []}
        times={report?.times ?? []}
        mark={report?.mark ?? null}
      />
      <main
        id="main"
        className="grid md:grid-cols-[minmax(17rem,20.5rem)_minmax(0,1fr)] xl:grid-cols-[20.5rem_minmax(0,1fr)_18.5rem]"
      >
        <div className="order-2 border-rule px-4 py-5 md:order-1 md:border-r md:pr-5 md:pl-7">
          <div className="md:hidden">
            <Button onClick={() => setDrawer(!drawer)} aria-expanded={drawer} className="w-full">
              {drawer ? 'Hide assumptions and candidate' : 'Assumptions and candidate'}
            </Button>
          </div>
          <div className={drawer ? 'pt-4' : 'max-md:hidden'}>{inputs}</div>
        </div>
        <div className="order-1 grid min-w-0 content-start gap-5 px-4 py-6 sm:px-7 md:order-2">
          <Problems view={view} />
          {report ? (
            <>
              <Answer report={report} stale={view.faults.length > 0} />
              <Guards report={report} />
              <BenchCharts
                report={report}
                window={window}
                onWindow={draft.setWindow}
                cursorGeV={cursorGeV}
                onCursor={setCursorGeV}
                differs={report.factors.some((factor) => factor.differs)}
              />
              <Workings report={report} />
            </>
          ) : view.failure === null && view.faults.length === 0 ? (
            <Skeleton label="Computing" className="h-[46rem]" />
          ) : null}
        </div>
        <aside
          className="order-3 grid content-start gap-7 border-rule px-4 py-6 sm:px-7 md:col-span-2 md:border-t xl:col-span-1 xl:border-t-0 xl:border-l"
          aria-label="What moved the abundance"
        >
          {report ? (
            <>
              <WhatMovedIt report={report} />
              <Facts report={report} />
            </>
          ) : null}
          <Trail
            view={view}
            onReturn={(inputs) => draft.change({ history: inputs.history, candidate: inputs.candidate })}
          />
        </aside>
      </main>
      {saving && report ? (
        <Suspense>
          <SaveDialog
            request={{
              history: {
                chosen: chosenHistory,
                input: history,
                changed: draft.historyChanged,
                save: { as: 'revision' },
              },
              candidate: {
                chosen: chosenCandidate,
                input: candidate,
                changed: draft.candidateChanged,
                save: { as: 'revision' },
              },
              shownOmegaH2: report.result.omegaH2,
            }}
            onClose={() => setSaving(false)}
          />
        </Suspense>
      ) : null}
    </FaultProvider>
  )
}
