import { createBrowserRouter, redirect } from 'react-router-dom'
import type { LoaderFunctionArgs, RouteObject } from 'react-router-dom'
import { sessionQuery } from '../api/session.ts'
import { Loading } from './Loading.tsx'
import { NotFoundPage } from './NotFoundPage.tsx'
import { signInFor } from './ownAddress.ts'
import { PageError } from './PageError.tsx'
import { queryClient } from './queryClient.ts'
import { Shell } from './Shell.tsx'

/** Pages behind the sign-in send a stranger there, and back to where they wanted to go. */
async function signedIn({ request }: LoaderFunctionArgs) {
  const known = await queryClient.ensureQueryData(sessionQuery)
  // It may have been renewed in another tab.
  const session = known?.ended ? await queryClient.fetchQuery(sessionQuery) : known
  if (session && !session.ended) return null
  const { pathname, search } = new URL(request.url)
  return redirect(signInFor(pathname + search))
}

type PageModule = { default: React.ComponentType }
const page = (path: string, load: () => Promise<PageModule>): RouteObject => ({
  path,
  lazy: async () => ({ Component: (await load()).default }),
  ErrorBoundary: PageError,
})

/** A page that needs no session. */
const stranger = (path: string, load: () => Promise<PageModule>): RouteObject => ({
  ...page(path, load),
  HydrateFallback: Loading,
})

export const router = createBrowserRouter([
  { ...page('/sign-in', () => import('../features/session/SignInPage.tsx')), HydrateFallback: Loading },
  stranger('/forgotten-password', () => import('../features/session/ForgottenPasswordPage.tsx')),
  stranger('/reset-password', () => import('../features/session/ResetPasswordPage.tsx')),
  stranger('/confirm-email', () => import('../features/session/ConfirmEmailPage.tsx')),
  stranger('/invitation', () => import('../features/session/InvitationPage.tsx')),
  stranger('/first-group', () => import('../features/session/FirstGroupPage.tsx')),
  {
    ...stranger('/choose-group', () => import('../features/session/ChooseGroupPage.tsx')),
    loader: signedIn,
  },
  { ...page('/guest', () => import('../features/guest/GuestPage.tsx')), HydrateFallback: Loading },
  {
    path: '/',
    Component: Shell,
    loader: signedIn,
    HydrateFallback: Loading,
    ErrorBoundary: PageError,
    children: [
      { index: true, loader: () => redirect('/bench') },
      page('bench', () => import('../features/bench/BenchPage.tsx')),
      page('histories', () => import('../features/records/HistoriesPage.tsx')),
      page('histories/:id', () => import('../features/records/HistoryPage.tsx')),
      page('candidates', () => import('../features/records/CandidatesPage.tsx')),
      page('candidates/:id', () => import('../features/records/CandidatePage.tsx')),
      page('evaluations', () => import('../features/evaluations/EvaluationsPage.tsx')),
      page('evaluations/:id', () => import('../features/evaluations/EvaluationPage.tsx')),
      page('account', () => import('../features/account/AccountPage.tsx')),
      page('invitations', () => import('../features/invitations/InvitationsPage.tsx')),
      page('keys', () => import('../features/keys/KeysPage.tsx')),
      page('audit', () => import('../features/audit/AuditPage.tsx')),
      page('reference', () => import('../features/reference/ReferencePage.tsx')),
      { path: '*', Component: NotFoundPage },
    ],
  },
])
