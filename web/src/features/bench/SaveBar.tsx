import { toast } from 'sonner'
import type { SessionInfo } from '#core/wire/index'
import { Button } from '../../components/ui/Button.tsx'
import { isKeptByTab } from './draft.ts'
import type { DraftState } from './useDraft.ts'

interface SaveBarProps {
  session: SessionInfo
  draft: DraftState
  ready: boolean
  onSave: () => void
}

async function copyLink(search: string): Promise<void> {
  const link = `${location.origin}/bench${search}`
  try {
    await navigator.clipboard.writeText(link)
    toast.success('Link copied: it opens the Bench as it stands, for members of the group.')
  } catch {
    toast.error(`The browser does not let a page copy here. The link is ${link}`)
  }
}

/** Keeps what is on the Bench, hands it on, or goes back on it. */
export function SaveBar({ session, draft, ready, onSave }: SaveBarProps) {
  const changed = draft.historyChanged || draft.candidateChanged
  const reader = session.role === 'reader'
  const tooLong = isKeptByTab(draft.search)
  return (
    <div className="flex flex-wrap items-center gap-x-4 gap-y-2 pt-6">
      <Button variant="primary" disabled={reader || !ready} onClick={onSave}>
        {changed ? 'Save revision' : 'Save evaluation'}
      </Button>
      <Button disabled={tooLong} onClick={() => void copyLink(draft.search)}>
        Copy link
      </Button>
      <div className="flex gap-4">
        <Button variant="link" className="disabled:text-soft" disabled={!draft.canUndo} onClick={draft.undo}>
          Undo
        </Button>
        <Button variant="link" className="disabled:text-soft" disabled={!draft.canRedo} onClick={draft.redo}>
          Redo
        </Button>
        {changed ? (
          <Button variant="link" onClick={draft.reset}>
            Drop changes
          </Button>
        ) : null}
      </div>
      {tooLong ? (
        <p className="basis-full text-small text-soft">
          These changes are too long for a link. This tab keeps them; save them to hand them on.
        </p>
      ) : null}
      {reader ? (
        <p className="basis-full text-small text-soft">Readers compute freely; authors and leads save.</p>
      ) : null}
    </div>
  )
}
