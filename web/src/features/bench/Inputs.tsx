import { useNavigate } from 'react-router-dom'
import type { HistoryInput, SessionInfo } from '#core/wire/index'
import { CandidatePanel } from './CandidatePanel.tsx'
import { HistoryPanel } from './HistoryPanel.tsx'
import { SaveBar } from './SaveBar.tsx'
import { writeAddress } from './draft.ts'
import type { Draft } from './draft.ts'
import type { Baseline } from './revisions.ts'
import type { BenchView } from './useBenchAnswer.ts'
import type { DraftState, Opened } from './useDraft.ts'

interface InputsProps {
  session: SessionInfo
  opened: Opened
  draft: DraftState
  baseline: Baseline | null
  baselineInput: HistoryInput
  view: BenchView
  onSave: () => void
}

/** Everything that goes into the answer, and what can be done with it. */
export function Inputs({ session, opened, draft, baseline, baselineInput, view, onSave }: InputsProps) {
  const navigate = useNavigate()
  const pick =
    (kind: keyof Draft) =>
    (recordId: string, number: number): void => {
      const kept = { ...draft.draft }
      delete kept[kind]
      // Another candidate is decided at other temperatures: its usual window comes with it.
      const window = kind === 'candidate' ? null : draft.address.window
      void navigate(
        `/bench${writeAddress({ ...draft.address, draft: kept, window, [kind]: { recordId, number } })}`,
      )
    }
  return (
    <>
      <HistoryPanel
        chosen={opened.history}
        history={draft.history}
        changed={draft.historyChanged}
        baseline={baselineInput}
        baselineName={baseline?.name ?? null}
        factors={view.report?.factors ?? []}
        onPick={pick('history')}
        onChange={(history) => draft.change({ history })}
      />
      <CandidatePanel
        chosen={opened.candidate}
        candidate={draft.candidate}
        changed={draft.candidateChanged}
        onPick={pick('candidate')}
        onChange={(candidate) => draft.change({ candidate })}
      />
      <SaveBar
        session={session}
        draft={draft}
        ready={view.report !== null && view.faults.length === 0 && view.failure === null}
        onSave={onSave}
      />
    </>
  )
}
