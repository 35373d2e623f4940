import { ErrorNotice } from '../../components/ui/Notice.tsx'
import { ApiProblem } from '../../lib/apiProblem.ts'
import { StaleParent } from './StaleParent.tsx'
import type { Opened } from './useDraft.ts'
import type { SaveStopped } from './useSave.ts'

interface SaveTroubleProps {
  stopped: SaveStopped
  opened: Opened
  onSaveOnTop: (kind: 'history' | 'candidate', parentId: string) => void
}

/** Why saving ended early, what is stored all the same, and what to do. */
export function SaveTrouble({ stopped, opened, onSaveOnTop }: SaveTroubleProps) {
  const { step, reason, kept } = stopped
  if (step !== 'evaluation' && reason instanceof ApiProblem && reason.status === 409)
    return (
      <div role="alert" className="border-l-2 border-fault py-1 pl-3">
        <p className="font-semibold">{reason.title}</p>
        <StaleParent
          kind={step}
          recordId={opened[step].recordId}
          onSaveOnTop={(parentId) => onSaveOnTop(step, parentId)}
        />
      </div>
    )
  const stored =
    step === 'evaluation'
      ? `History revision ${kept.history?.number} and candidate revision ${kept.candidate?.number} are stored; the evaluation is not. Save again to store it alone.`
      : step === 'candidate'
        ? `History revision ${kept.history?.number} is stored; your candidate stands on the Bench. Save again for the rest.`
        : 'Your changes stand on the Bench; try again.'
  return (
    <ErrorNotice error={reason}>
      <p className="pt-1 text-small">{stored}</p>
    </ErrorNotice>
  )
}
