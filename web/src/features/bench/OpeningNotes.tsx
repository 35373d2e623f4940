import { ErrorNotice } from '../../components/ui/Notice.tsx'
import type { Chosen } from './revisions.ts'
import type { Opened } from './useDraft.ts'

function missingNote(noun: string, { missing, name }: Chosen<unknown>): string | null {
  if (missing === 'record')
    return `The ${noun} this address names is not in your group; “${name}” stands instead.`
  if (missing === 'revision')
    return `The revision this address names does not exist; the newest of “${name}” stands instead.`
  return null
}

/** What the address asked for and could not be had. */
export function OpeningNotes({ opened, error }: { opened: Opened; error: Error | null }) {
  const notes = [
    missingNote('history', opened.history),
    missingNote('candidate', opened.candidate),
    opened.address.draftMissing
      ? 'The changes this address names were too long for it, and are kept by another tab or no longer; the stored revisions are shown.'
      : null,
  ].filter((note) => note !== null)
  if (notes.length === 0 && !error) return null
  return (
    <div className="grid gap-2">
      {notes.map((note) => (
        <p key={note} role="status" className="border-l-2 border-ember pl-3">
          {note}
        </p>
      ))}
      {error ? <ErrorNotice error={error}>The Bench stands as it was.</ErrorNotice> : null}
    </div>
  )
}
