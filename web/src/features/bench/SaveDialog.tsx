import { useState } from 'react'
import type { FormEvent } from 'react'
import { Link, useNavigate } from 'react-router-dom'
import { toast } from 'sonner'
import { Button } from '../../components/ui/Button.tsx'
import { Dialog } from '../../components/ui/Dialog.tsx'
import { Field } from '../../components/ui/Field.tsx'
import { SaveAsChoice } from './SaveAsChoice.tsx'
import { SaveTrouble } from './SaveTrouble.tsx'
import { writeAddress } from './draft.ts'
import type { BenchAddress } from './draft.ts'
import type { DraftState, Opened } from './useDraft.ts'
import { useSave } from './useSave.ts'
import type { Kept, SaveAs, Saved } from './useSave.ts'

interface SaveDialogProps {
  opened: Opened
  draft: DraftState
  shownOmegaH2: number
  onClose: () => void
}

/** Says what was stored, and whether the server found the number that was shown. */
function announce({ evaluation, shown }: Saved): void {
  if (shown && !shown.agrees) {
    toast.error(
      `Stored, but the server found another number: it differs by ${shown.relativeDifference.toExponential(1)}, allowed is ${shown.allowed.toExponential(1)}.`,
      { duration: Infinity },
    )
    return
  }
  toast.success(
    <span>
      Evaluation stored.{' '}
      <Link className="link" to={`/evaluations/${evaluation.id}`}>
        See it
      </Link>
    </span>,
  )
}

/** The address once these revisions are kept: what was kept is no change any more. */
function addressAfter(address: BenchAddress, kept: Kept): BenchAddress {
  const draft = { ...address.draft }
  if (kept.history) delete draft.history
  if (kept.candidate) delete draft.candidate
  return {
    ...address,
    draft,
    history: kept.history ?? address.history,
    candidate: kept.candidate ?? address.candidate,
  }
}

/** Keeps what is on the Bench under a note. */
export default function SaveDialog({ opened, draft, shownOmegaH2, onClose }: SaveDialogProps) {
  const { history: chosenHistory, candidate: chosenCandidate } = opened
  const [note, setNote] = useState('')
  const [history, setHistory] = useState<SaveAs>({ as: 'revision', parentId: chosenHistory.newest.id })
  const [candidate, setCandidate] = useState<SaveAs>({ as: 'revision', parentId: chosenCandidate.newest.id })
  const save = useSave()
  const navigate = useNavigate()
  const { historyChanged, candidateChanged } = draft
  const revises = historyChanged || candidateChanged

  const show = (kept: Kept): void =>
    void navigate(`/bench${writeAddress(addressAfter(draft.address, kept))}`, { replace: true })
  const submit = (asHistory: SaveAs, asCandidate: SaveAs): void =>
    save.mutate(
      {
        note,
        history: { chosen: chosenHistory, input: draft.history, changed: historyChanged, save: asHistory },
        candidate: {
          chosen: chosenCandidate,
          input: draft.candidate,
          changed: candidateChanged,
          save: asCandidate,
        },
        shownOmegaH2,
        kept: save.error?.kept ?? {},
      },
      {
        onSuccess: (saved) => {
          announce(saved)
          onClose()
          show({ history: saved.history, candidate: saved.candidate })
        },
        // A revision that was stored before the trouble stands on the Bench, so that it is not stored again.
        onError: ({ kept }) => {
          if (kept.history ?? kept.candidate) show(kept)
        },
      },
    )
  const saveOnTop = (kind: 'history' | 'candidate', parentId: string): void => {
    const onTop: SaveAs = { as: 'revision', parentId }
    if (kind === 'history') setHistory(onTop)
    else setCandidate(onTop)
    submit(kind === 'history' ? onTop : history, kind === 'candidate' ? onTop : candidate)
  }
  const onSubmit = (event: FormEvent): void => {
    event.preventDefault()
    submit(history, candidate)
  }
  return (
    <Dialog
      open
      onOpenChange={(open) => {
        if (!open) onClose()
      }}
      title={revises ? 'Save revision' : 'Save evaluation'}
      description="The server computes the number again and stores it with its inputs and the version of the core."
    >
      <form onSubmit={onSubmit} className="grid gap-3">
        {historyChanged ? (
          <SaveAsChoice what="History" chosen={chosenHistory} value={history} onChange={setHistory} />
        ) : null}
        {candidateChanged ? (
          <SaveAsChoice what="Candidate" chosen={chosenCandidate} value={candidate} onChange={setCandidate} />
        ) : null}
        {revises ? (
          <Field label="Note" hint="Why: what the group will want to know in a year.">
            {(control) => (
              <textarea
                {...control}
                className="input min-h-20"
                maxLength={2000}
                value={note}
                onChange={(event) => setNote(event.target.value)}
              />
            )}
          </Field>
        ) : null}
        {save.error ? <SaveTrouble stopped={save.error} opened={opened} onSaveOnTop={saveOnTop} /> : null}
        <div className="flex justify-end gap-2">
          <Button onClick={onClose}>Cancel</Button>
          <Button variant="primary" type="submit" busy={save.isPending}>
            Save
          </Button>
        </div>
      </form>
    </Dialog>
  )
}
