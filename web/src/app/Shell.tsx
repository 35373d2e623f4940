import { useQuery, useQueryClient } from '@tanstack/react-query'
import { lazy, Suspense, useState } from 'react'
import { NavLink, Outlet, useNavigate } from 'react-router-dom'
import { sessionQuery, signOut } from '../api/session.ts'
import { SegmentedChoice } from '../components/ui/SegmentedChoice.tsx'
import { Wordmark } from './Wordmark.tsx'
import { chooseTheme, useThemeChoice } from './theme.ts'
import type { ThemeChoice } from './theme.ts'

const Toaster = lazy(() => import('./Toaster.tsx'))

/** A page stands here once it works. */
const PAGES = [
  ['/bench', 'Bench'],
  ['/histories', 'Histories'],
  ['/candidates', 'Candidates'],
  ['/evaluations', 'Evaluations'],
] as const

const THEMES = [
  { value: 'day', label: 'Day' },
  { value: 'night', label: 'Night' },
  { value: 'system', label: 'System' },
] as const satisfies readonly { value: ThemeChoice; label: string }[]

function Pages({ onGo }: { onGo?: () => void }) {
  return PAGES.map(([to, label]) => (
    <NavLink
      key={to}
      to={to}
      {...(onGo ? { onClick: onGo } : {})}
      className="border-b-2 border-transparent px-0.5 py-3 text-soft hover:text-ink aria-[current=page]:border-ember aria-[current=page]:font-semibold aria-[current=page]:text-ink"
    >
      {label}
    </NavLink>
  ))
}

function AccountMenu() {
  const { data: session } = useQuery(sessionQuery)
  const theme = useThemeChoice()
  const navigate = useNavigate()
  const queries = useQueryClient()
  if (!session) return null
  const leave = async (): Promise<void> => {
    await signOut()
    queries.clear()
    await navigate('/sign-in')
  }
  return (
    <details className="relative">
      <summary className="list-none py-3 text-soft hover:text-ink">
        <span className="max-sm:hidden">{session.user.name}</span>
        <span className="sm:hidden">Account</span> <span aria-hidden="true">▾</span>
      </summary>
      <div className="absolute right-0 z-30 grid w-64 gap-3 rounded-[6px] border border-rule bg-raised p-4 shadow-lg">
        <p className="text-small">
          <span className="font-semibold">{session.user.name}</span>
          <br />
          <span className="text-soft">
            {session.user.email}
            <br />
            {session.role} of {session.group.name}
          </span>
        </p>
        <SegmentedChoice label="Theme" value={theme} options={THEMES} onChange={chooseTheme} />
        <button type="button" className="link justify-self-start" onClick={() => void leave()}>
          Sign out
        </button>
      </div>
    </details>
  )
}

export function Shell() {
  const [menuOpen, setMenuOpen] = useState(false)
  const { data: session } = useQuery(sessionQuery)
  return (
    <>
      <a
        href="#main"
        className="sr-only focus:not-sr-only focus:absolute focus:z-50 focus:bg-paper focus:p-3"
      >
        Skip to content
      </a>
      <header className="border-b border-rule">
        <div className="flex min-h-13 items-center gap-x-8 px-4 sm:px-7">
          <Wordmark />
          <nav aria-label="Pages" className="hidden gap-6 md:flex">
            <Pages />
          </nav>
          <div className="ml-auto flex items-center gap-5 text-small">
            <span className="hidden text-soft lg:inline">{session?.group.name}</span>
            <AccountMenu />
            <button
              type="button"
              className="py-3 text-soft md:hidden"
              aria-expanded={menuOpen}
              aria-controls="page-menu"
              onClick={() => setMenuOpen(!menuOpen)}
            >
              Menu
            </button>
          </div>
        </div>
        {menuOpen ? (
          <nav id="page-menu" aria-label="Pages" className="grid border-t border-rule px-4 pb-2 md:hidden">
            <Pages onGo={() => setMenuOpen(false)} />
          </nav>
        ) : null}
      </header>
      <Outlet />
      <Suspense>
        <Toaster />
      </Suspense>
    </>
  )
}
