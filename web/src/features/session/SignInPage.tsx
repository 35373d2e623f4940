import { useQuery, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import type { FormEvent } from 'react'
import { useNavigate, useSearchParams } from 'react-router-dom'
import { infoQuery, sessionQuery, signIn } from '../../api/session.ts'
import { ownAddress } from '../../app/ownAddress.ts'
import { Wordmark } from '../../app/Wordmark.tsx'
import { Button } from '../../components/ui/Button.tsx'
import { Field } from '../../components/ui/Field.tsx'
import { ErrorNotice } from '../../components/ui/Notice.tsx'

export default function SignInPage() {
  const [email, setEmail] = useState('')
  const [password, setPassword] = useState('')
  const [error, setError] = useState<Error | null>(null)
  const [busy, setBusy] = useState(false)
  const { data: info } = useQuery(infoQuery)
  const [search] = useSearchParams()
  const navigate = useNavigate()
  const queries = useQueryClient()

  const enter = async (asEmail: string, withPassword: string): Promise<void> => {
    setBusy(true)
    setError(null)
    try {
      const session = await signIn(asEmail, withPassword)
      queries.clear()
      queries.setQueryData(sessionQuery.queryKey, session)
      await navigate(ownAddress(search.get('to')), { replace: true })
    } catch (thrown) {
      setError(thrown instanceof Error ? thrown : new Error('Signing in failed. Nothing was changed.'))
    } finally {
      setBusy(false)
    }
  }
  const submit = (event: FormEvent): void => {
    event.preventDefault()
    void enter(email, password)
  }

  return (
    <main id="main" className="mx-auto grid w-full max-w-md gap-6 px-5 py-14">
      <title>Sign in · Emberline</title>
      <Wordmark />
      <div>
        <h1>Sign in</h1>
        <p className="text-soft">Where a group keeps the assumptions its abundances rest on.</p>
      </div>
      <form onSubmit={submit} className="grid gap-1">
        <Field label="E-mail">
          {(control) => (
            <input
              {...control}
              className="input"
              type="email"
              autoComplete="username"
              required
              value={email}
              onChange={(event) => setEmail(event.target.value)}
            />
          )}
        </Field>
        <Field label="Password">
          {(control) => (
            <input
              {...control}
              className="input"
              type="password"
              autoComplete="current-password"
              required
              value={password}
              onChange={(event) => setPassword(event.target.value)}
            />
          )}
        </Field>
        {error ? <ErrorNotice error={error} /> : null}
        <Button variant="primary" type="submit" busy={busy} className="mt-3 justify-self-start">
          Sign in
        </Button>
      </form>
      {info?.demo ? (
        <section aria-labelledby="demo">
          <h2 id="demo">Demo group</h2>
          <p className="pb-2 text-small text-soft">
            Made-up people with made-up work. Pick one to look around as.
          </p>
          <ul className="rows border-y border-rule">
            {info.demoSignIns.map((person) => (
              <li key={person.email} className="flex flex-wrap items-baseline gap-x-3 py-2.5">
                <button
                  type="button"
                  className="link font-semibold"
                  disabled={busy}
                  onClick={() => void enter(person.email, person.password)}
                >
                  {person.name}
                </button>
                <span className="text-small">{person.role}</span>
                <span className="basis-full font-mono text-caption text-soft">
                  {person.email} · {person.password}
                </span>
              </li>
            ))}
          </ul>
        </section>
      ) : null}
    </main>
  )
}
