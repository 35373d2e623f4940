import { useState } from 'react'
import type { FormEvent } from 'react'
import { Link, useNavigate } from 'react-router-dom'
import { toast } from 'sonner'
import { Button } from '../../components/ui/Button.tsx'
import { Dialog } from '../../components/ui/Dialog.tsx'
import { Field } from '../../components/ui/Field.tsx'
import { ErrorNotice } from '../../components/ui/Notice.tsx'
import { ApiProblem } from '../../lib/apiProblem.ts'
import { readAddress, writeAddress } from './draft.ts'
import { useSave } from './useSave.ts'
import type { SaveAs, SaveRequest, Saved } from './useSave.ts'

type Part = SaveRequest['history'] | SaveRequest['candidate']

function SaveAsChoice({
  what,
  part,
  value,
  onChange,
}: {
  what: string
  part: Part
  value: SaveAs
  onChange: (value: SaveAs) => void
}) {
  if (!part.changed) return null
  const { name, newest } = part.chosen
  return (
    <fieldset className="grid gap-1 border-t border-rule pt-2">
      <legend className="text-small font-semibold">{what}</legend>
      <label className="flex gap-2">
        <input
          type="radio"
          name={what}
          checked={value.as === 'revision'}
          onChange={() => onChange({ as: 'revision' })}
          className="accent-[var(--ember)]"
        />
        Revision {newest + 1} of “{name}”
      </label>
      <label className="flex gap-2">
        <input
          type="radio"
          name={what}
          checked={value.as === 'new'}
          onChange={() => onChange({ as: 'new', name: `${name}, changed` })}
          className="accent-[var(--ember)]"
        />
        A record of its own
      </label>
      {value.as === 'new' ? (
        <Field label={`Name of the new ${what.toLowerCase()}`}>
          {(control) => (
            <input
              {...control}
              className="input"
              required
              maxLength={120}
              value={value.name}
              onChange={(event) => onChange({ as: 'new', name: event.target.value })}
            />
          )}
        </Field>
      ) : null}
    </fieldset>
  )
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

/** Keeps what is on the Bench under a note. */
export default function SaveDialog({
  request,
  onClose,
}: {
  request: Omit<SaveRequest, 'note'>
  onClose: () => void
}) {
  const [note, setNote] = useState('')
  const [history, setHistory] = useState<SaveAs>({ as: 'revision' })
  const [candidate, setCandidate] = useState<SaveAs>({ as: 'revision' })
  const save = useSave()
  const navigate = useNavigate()
  const revises = request.history.changed || request.candidate.changed

  const submit = (event: FormEvent): void => {
    event.preventDefault()
    save.mutate(
      {
        ...request,
        note,
        history: { ...request.history, save: history },
        candidate: { ...request.candidate, save: candidate },
      },
      {
        onSuccess: (saved) => {
          announce(saved)
          onClose()
          const { window } = readAddress(location.search)
          void navigate(
            `/bench${writeAddress({ history: saved.history, candidate: saved.candidate, draft: {}, window })}`,
            { replace: true },
          )
        },
      },
    )
  }
  const stale = save.error instanceof ApiProblem && save.error.status === 409
  return (
    <Dialog
      open
      onOpenChange={(open) => {
        if (!open) onClose()
      }}
      title={revises ? 'Save revision' : 'Save evaluation'}
      description="The server computes the number again and stores it with its inputs and the version of the core."
    >
      <form onSubmit={submit} className="grid gap-3">
        <SaveAsChoice what="History" part={request.history} value={history} onChange={setHistory} />
        <SaveAsChoice what="Candidate" part={request.candidate} value={candidate} onChange={setCandidate} />
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
        {save.error ? (
          <ErrorNotice error={save.error}>
            <p className="pt-1 text-small">
              {stale
                ? 'Your changes stand on the Bench. Save them as a record of their own, or open the newest revision and make them there.'
                : 'Your changes stand on the Bench; try again.'}
            </p>
          </ErrorNotice>
        ) : null}
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
