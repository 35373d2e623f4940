import type { GuestView } from '#core/wire/index'
import { CopyDigest } from '../records/CopyDigest.tsx'
import { HistoryInputs } from '../records/Inputs.tsx'
import { Moment } from '../records/Moment.tsx'
import { Section } from '../records/Section.tsx'

/** One revision of a history as a guest sees it. */
export function GuestHistory({ view }: { view: Extract<GuestView, { kind: 'history-revision' }> }) {
  const { name, revision } = view
  return (
    <>
      <header className="grid gap-1">
        <h1 className="break-words">{name}</h1>
        <p className="text-soft">
          Revision {revision.number} by {revision.author.name} of {view.groupName},{' '}
          <Moment at={revision.createdAt} />.
        </p>
        {revision.note === '' ? null : <p className="max-w-prose whitespace-pre-line">{revision.note}</p>}
        <p className="text-small text-soft">
          Digest <CopyDigest digest={revision.digest} />
        </p>
      </header>
      <Section title="Assumptions">
        <HistoryInputs input={revision.input} />
      </Section>
    </>
  )
}
