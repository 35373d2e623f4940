import { Link } from 'react-router-dom'
import type { CandidateRevision, HistoryRevision } from '#core/wire/index'
import { CopyDigest } from './CopyDigest.tsx'
import { Moment } from './Moment.tsx'
import { QUIET_LINK } from './quietLink.ts'

interface RevisionListProps {
  revisions: readonly (HistoryRevision | CandidateRevision)[]
  shown: number
  baselineId: string | null
  benchLinkOf: (number: number) => string
}

/** Every revision of a record, newest first. */
export function RevisionList({ revisions, shown, baselineId, benchLinkOf }: RevisionListProps) {
  return (
    <ol className="rows" reversed>
      {revisions.map((revision) => (
        <li key={revision.id} className="grid gap-0.5 py-2.5">
          <p className="flex flex-wrap items-baseline gap-x-3">
            <Link
              to={`?revision=${revision.number}`}
              preventScrollReset
              className={`font-semibold ${QUIET_LINK}`}
              aria-current={revision.number === shown ? 'true' : undefined}
            >
              Revision {revision.number}
            </Link>
            {revision.number === shown ? <span className="text-caption text-soft">shown</span> : null}
            {revision.id === baselineId ? (
              <strong className="text-caption text-ember">baseline of the group</strong>
            ) : null}
            <Link to={benchLinkOf(revision.number)} className="link ml-auto text-small">
              open on the Bench
            </Link>
          </p>
          {revision.note === '' ? null : <p className="break-words whitespace-pre-line">{revision.note}</p>}
          <p className="flex flex-wrap items-baseline gap-x-3 text-small text-soft">
            <span>
              {revision.author.name}, <Moment at={revision.createdAt} />
            </span>
            <CopyDigest digest={revision.digest} />
          </p>
        </li>
      ))}
    </ol>
  )
}
