import { useQuery } from '@tanstack/react-query'
import { useLocation } from 'react-router-dom'
import type { GuestView } from '#core/wire/index'
import { guestViewQuery } from '../../api/guestLinks.ts'
import { Wordmark } from '../../app/Wordmark.tsx'
import { EmptyState } from '../../components/ui/Notice.tsx'
import { Loaded } from '../records/Loaded.tsx'
import { Moment } from '../records/Moment.tsx'
import { Page } from '../records/Page.tsx'
import { GuestEvaluation } from './GuestEvaluation.tsx'
import { GuestHistory } from './GuestHistory.tsx'

/** One thing of a group, shown to whoever has its link. The token stands behind #, which no server or log is told. */
export default function GuestPage() {
  const token = useLocation().hash.slice(1)
  return (
    <>
      <header className="border-b border-rule">
        <div className="flex min-h-13 items-center gap-8 px-4 sm:px-7">
          <Wordmark />
          <span className="ml-auto text-small text-soft">guest view, read only</span>
        </div>
      </header>
      {token === '' ? (
        <Page title="Guest link">
          <h1>Guest link</h1>
          <EmptyState title="A part of the link is missing">
            <p>It ends in # and 43 characters. Copy it whole, or ask whoever sent it for a new one.</p>
          </EmptyState>
        </Page>
      ) : (
        <Opened token={token} />
      )}
    </>
  )
}

function Opened({ token }: { token: string }) {
  const query = useQuery(guestViewQuery(token))
  return (
    <Page title={query.data === undefined ? 'Guest link' : titleOf(query.data)}>
      <Loaded of={query} what="what the link opens">
        {(view) => (
          <>
            {view.kind === 'evaluation' ? <GuestEvaluation view={view} /> : <GuestHistory view={view} />}
            <p className="border-t border-rule pt-3 text-small text-soft">
              Shown by {view.groupName}.{' '}
              {view.expiresAt === null ? null : (
                <>
                  This link opens until <Moment at={view.expiresAt} />.
                </>
              )}
            </p>
          </>
        )}
      </Loaded>
    </Page>
  )
}

const titleOf = (view: GuestView): string =>
  view.kind === 'evaluation'
    ? `${view.evaluation.history.name} with ${view.evaluation.candidate.name}`
    : view.name
