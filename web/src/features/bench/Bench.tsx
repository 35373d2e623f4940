import { lazy, Suspense, useMemo, useState } from 'react'
import { useNavigate } from 'react-router-dom'
import type { BenchRequest } from '#core/bench/types'
import type { SessionInfo } from '#core/wire/index'
import { usePageCursor } from '../../components/charts/cursor.ts'
import { EmberLine } from '../../components/ember-line/EmberLine.tsx'
import { Skeleton } from '../../components/ui/Notice.tsx'
import { Answer, Guards, Workings } from './Answer.tsx'
import { BenchCharts } from './BenchCharts.tsx'
import { InputDrawer } from './InputDrawer.tsx'
import { Inputs } from './Inputs.tsx'
import { OpeningNotes } from './OpeningNotes.tsx'
import { Problems } from './Problems.tsx'
import { Trail } from './Trail.tsx'
import { Facts, WhatMovedIt } from './WhatMovedIt.tsx'
import { writeAddress } from './draft.ts'
import { equal } from './equal.ts'
import { FaultProvider } from './faults.tsx'
import type { Baseline } from './revisions.ts'
import type { Sitting } from './sitting.ts'
import { useTrail } from './trail.ts'
import type { TrailStep } from './trail.ts'
import { useBenchAnswer } from './useBenchAnswer.ts'
import { useDraft } from './useDraft.ts'
import type { Opened } from './useDraft.ts'
import { useUndoKeys } from './useUndoKeys.ts'

const SaveDialog = lazy(() => import('./SaveDialog.tsx'))

/** Temperatures the ember line spans, GeV: wider than any window is likely to be. */
const EMBER_RANGE = { hotGeV: 1e4, coldGeV: 1e-4 }

interface BenchProps {
  session: SessionInfo
  sitting: Sitting
  opened: Opened
  baseline: Baseline | null
  /** What could not be fetched, while what was found before stays. */
  error: Error | null
}

/** History and candidate at the left, the answer in the middle, what moved it at the right. */
export function Bench({ session, sitting, opened, baseline, error }: BenchProps) {
  const draft = useDraft(opened, sitting)
  const navigate = useNavigate()
  const cursor = usePageCursor()
  const [saving, setSaving] = useState(false)
  const { history, candidate, window } = draft
  const baselineInput = baseline?.revision.input ?? history
  const request = useMemo<BenchRequest>(
    () => ({ history, baseline: baselineInput, candidate, window }),
    [history, baselineInput, candidate, window],
  )
  const view = useBenchAnswer(request)
  const { report } = view
  const standing = useMemo(
    () => ({
      history,
      candidate,
      address: draft.address,
      names: { history: opened.history.name, candidate: opened.candidate.name },
    }),
    [history, candidate, draft.address, opened.history.name, opened.candidate.name],
  )
  const steps = useTrail(view, standing)
  useUndoKeys(draft.undo, draft.redo)

  const returnTo = ({ address, ...step }: TrailStep): void => {
    const here = draft.address
    if (equal([address.history, address.candidate], [here.history, here.candidate]))
      draft.jump({ history: step.history, candidate: step.candidate })
    else void navigate(`/bench${writeAddress({ ...address, window: draft.address.window })}`)
  }
  return (
    <FaultProvider faults={view.faults}>
      <title>Bench · Emberline</title>
      <EmberLine
        range={EMBER_RANGE}
        window={window}
        onWindow={(hotGeV, coldGeV) => draft.setWindow({ hotGeV, coldGeV })}
        cursor={cursor}
        epochs={report?.epochs ?? []}
        times={report?.times ?? []}
        mark={report?.mark ?? null}
      />
      <main
        id="main"
        className="grid max-md:pb-16 md:grid-cols-[minmax(17rem,20.5rem)_minmax(0,1fr)] xl:grid-cols-[20.5rem_minmax(0,1fr)_18.5rem]"
      >
        <InputDrawer report={report}>
          <Inputs
            session={session}
            opened={opened}
            draft={draft}
            baseline={baseline}
            baselineInput={baselineInput}
            view={view}
            onSave={() => setSaving(true)}
          />
        </InputDrawer>
        <div className="grid min-w-0 content-start gap-5 px-4 py-6 sm:px-7">
          <OpeningNotes opened={opened} error={error} />
          <Problems view={view} />
          {report ? (
            <>
              <Answer report={report} stale={view.faults.length > 0} />
              <Guards report={report} />
              <BenchCharts
                report={report}
                window={window}
                onWindow={draft.setWindow}
                cursor={cursor}
                differs={report.factors.some((factor) => factor.differs)}
              />
              <Workings report={report} />
            </>
          ) : view.failure === null && view.faults.length === 0 ? (
            <Skeleton label="Computing" className="h-[46rem]" />
          ) : null}
        </div>
        <aside
          className="grid content-start gap-x-10 gap-y-7 border-rule px-4 py-6 sm:grid-cols-2 sm:px-7 md:col-span-2 md:border-t xl:col-span-1 xl:grid-cols-1 xl:border-t-0 xl:border-l"
          aria-label="What moved the abundance"
        >
          {report ? (
            <>
              <WhatMovedIt report={report} />
              <Facts report={report} />
            </>
          ) : null}
          <Trail steps={steps} onReturn={returnTo} />
        </aside>
      </main>
      {saving && report ? (
        <Suspense>
          <SaveDialog
            opened={opened}
            draft={draft}
            shownOmegaH2={report.result.omegaH2}
            onClose={() => setSaving(false)}
          />
        </Suspense>
      ) : null}
    </FaultProvider>
  )
}
