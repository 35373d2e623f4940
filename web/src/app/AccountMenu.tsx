import { useQueryClient } from '@tanstack/react-query'
import { useCallback, useId, useRef, useState } from 'react'
import { Link, useNavigate } from 'react-router-dom'
import { signOut } from '../api/session.ts'
import type { KnownSession } from '../api/session.ts'
import { Button } from '../components/ui/Button.tsx'
import { ErrorNotice } from '../components/ui/Notice.tsx'
import { SegmentedChoice } from '../components/ui/SegmentedChoice.tsx'
import { saysSignedOut } from '../lib/apiProblem.ts'
import { chooseTheme, useThemeChoice } from './theme.ts'
import type { ThemeChoice } from './theme.ts'
import { useDismissal } from './useDismissal.ts'

const THEMES = [
  { value: 'day', label: 'Day' },
  { value: 'night', label: 'Night' },
  { value: 'system', label: 'System' },
] as const satisfies readonly { value: ThemeChoice; label: string }[]

/** Who is signed in, the theme, and the way out. */
export function AccountMenu({ session }: { session: KnownSession }) {
  const [open, setOpen] = useState(false)
  const around = useRef<HTMLDivElement>(null)
  const button = useRef<HTMLButtonElement>(null)
  const close = useCallback(() => setOpen(false), [])
  useDismissal(open, close, around, button)
  const id = useId()
  return (
    <div ref={around} className="relative">
      <button
        ref={button}
        type="button"
        className="py-3 text-soft hover:text-ink"
        aria-expanded={open}
        aria-controls={id}
        onClick={() => setOpen(!open)}
      >
        <span className="max-sm:hidden">{session.user.name}</span>
        <span className="sm:hidden">Account</span> <span aria-hidden="true">▾</span>
      </button>
      {open ? (
        <div
          id={id}
          className="absolute right-0 z-30 grid w-64 justify-items-start gap-3 rounded-[6px] border border-rule bg-raised p-4 shadow-lg"
        >
          <p className="w-full text-small break-words">
            <span className="font-semibold">{session.user.name}</span>
            <br />
            <span className="text-soft">
              {session.user.email}
              <br />
              {session.role} of {session.group.name}
            </span>
          </p>
          <nav aria-label="Account" className="grid w-full justify-items-start gap-1">
            <Link to="/account" className="link" onClick={close}>
              Account
            </Link>
            <Link to="/choose-group" className="link" onClick={close}>
              Another group
            </Link>
            <Link to="/keys" className="link" onClick={close}>
              API keys
            </Link>
            <Link to="/reference" className="link" onClick={close}>
              API reference
            </Link>
            {session.role === 'lead' ? (
              <>
                <Link to="/invitations" className="link" onClick={close}>
                  Invitations
                </Link>
                <Link to="/audit" className="link" onClick={close}>
                  Audit log
                </Link>
              </>
            ) : null}
          </nav>
          <ThemeSwitch />
          <SignOut />
        </div>
      ) : null}
    </div>
  )
}

function ThemeSwitch() {
  const theme = useThemeChoice()
  return <SegmentedChoice label="Theme" value={theme} options={THEMES} onChange={chooseTheme} />
}

function SignOut() {
  const [busy, setBusy] = useState(false)
  const [error, setError] = useState<Error | null>(null)
  const navigate = useNavigate()
  const queries = useQueryClient()
  const leave = async (): Promise<void> => {
    setBusy(true)
    try {
      await signOut()
    } catch (thrown) {
      if (!saysSignedOut(thrown)) {
        setError(thrown instanceof Error ? thrown : new Error('Signing out failed.'))
        setBusy(false)
        return
      }
    }
    queries.clear()
    await navigate('/sign-in')
  }
  return (
    <>
      <Button variant="link" busy={busy} onClick={() => void leave()}>
        Sign out
      </Button>
      {error ? (
        <ErrorNotice error={error}>
          <p className="text-soft">You are still signed in.</p>
        </ErrorNotice>
      ) : null}
    </>
  )
}
