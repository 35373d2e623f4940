import { useRouteError } from 'react-router-dom'
import { ErrorNotice } from '../components/ui/Notice.tsx'

/** One page failed; the rest of the product stands. */
export function PageError() {
  const thrown = useRouteError()
  const error = thrown instanceof Error ? thrown : new Error('This page could not be shown.')
  return (
    <main id="main" className="mx-auto max-w-xl px-6 py-16">
      <ErrorNotice error={error}>
        <p className="pt-2">
          Nothing stored was changed.{' '}
          <button type="button" className="link" onClick={() => location.reload()}>
            Load the page again
          </button>
        </p>
      </ErrorNotice>
    </main>
  )
}
