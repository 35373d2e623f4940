import type { SessionInfo } from '#core/wire/index'
import { Button } from '../../components/ui/Button.tsx'
import type { DraftState } from './useDraft.ts'

interface SaveBarProps {
  session: SessionInfo
  draft: DraftState
  ready: boolean
  onSave: () => void
}

/** Keeps what is on the Bench, or goes back on it. */
export function SaveBar({ session, draft, ready, onSave }: SaveBarProps) {
  const changed = draft.historyChanged || draft.candidateChanged
  const reader = session.role === 'reader'
  return (
    <div className="flex flex-wrap items-center gap-x-4 gap-y-2 pt-6">
      <Button variant="primary" disabled={reader || !ready} onClick={onSave}>
        {changed ? 'Save revision' : 'Save evaluation'}
      </Button>
      <Button variant="link" disabled={!draft.canUndo} onClick={draft.undo}>
        Undo
      </Button>
      <Button variant="link" disabled={!draft.canRedo} onClick={draft.redo}>
        Redo
      </Button>
      {changed ? (
        <Button variant="link" onClick={draft.reset}>
          Drop changes
        </Button>
      ) : null}
      {reader ? (
        <p className="basis-full text-small text-soft">Readers compute freely; authors and leads save.</p>
      ) : null}
    </div>
  )
}
