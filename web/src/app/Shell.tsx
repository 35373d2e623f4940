import { useQuery } from '@tanstack/react-query'
import { lazy, Suspense } from 'react'
import { Outlet, ScrollRestoration, useNavigate, useNavigation } from 'react-router-dom'
import { sessionQuery } from '../api/session.ts'
import { Button } from '../components/ui/Button.tsx'
import { AccountMenu } from './AccountMenu.tsx'
import { signInFor } from './ownAddress.ts'
import { PageMenu, PageRow } from './PageMenu.tsx'
import { focusMain, useArrival } from './useArrival.ts'
import { Wordmark } from './Wordmark.tsx'

const Toaster = lazy(() => import('./Toaster.tsx'))

/** The frame of every page behind the sign-in. */
export function Shell() {
  const { data: session } = useQuery(sessionQuery)
  const onTheWay = useNavigation().state === 'loading'
  useArrival()
  return (
    <>
      <a
        href="#main"
        className="sr-only focus:not-sr-only focus:absolute focus:z-50 focus:bg-paper focus:p-3"
        onClick={(event) => {
          // The address is the page's own: a fragment in it would be carried into every link copied.
          event.preventDefault()
          focusMain()
        }}
      >
        Skip to content
      </a>
      <header
        aria-busy={onTheWay}
        className="relative border-b border-rule transition-colors delay-200 duration-(--moment) aria-busy:border-ember"
      >
        <div className="flex min-h-13 items-center gap-x-8 px-4 sm:px-7">
          <Wordmark />
          <PageRow />
          <div className="ml-auto flex items-center gap-5 text-small">
            <span className="hidden text-soft lg:inline">{session?.group.name}</span>
            {session ? <AccountMenu session={session} /> : null}
            <PageMenu />
          </div>
        </div>
      </header>
      {session?.ended ? <SessionEnded /> : null}
      <Outlet />
      <Suspense>
        <Toaster />
      </Suspense>
      <ScrollRestoration />
    </>
  )
}

function SessionEnded() {
  const navigate = useNavigate()
  // The Bench writes its address past the router, so it is read when the button is pressed.
  const signIn = (): void => void navigate(signInFor(location.pathname + location.search))
  return (
    <p role="alert" className="border-b border-rule bg-ember-wash px-4 py-2.5 sm:px-7">
      <strong>Your session has ended.</strong> What stands on this page is kept.{' '}
      <Button variant="link" onClick={signIn}>
        Sign in and go on
      </Button>
    </p>
  )
}
