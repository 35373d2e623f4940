import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { Link, useSearchParams } from 'react-router-dom'
import type { PublicInfo } from '#core/wire/index'
import { infoQuery, signIn } from '../../api/session.ts'
import { ownAddress } from '../../app/ownAddress.ts'
import { TaskForm } from '../../components/ui/TaskForm.tsx'
import { TextField } from '../../components/ui/TextField.tsx'
import { isProblem } from '../../lib/faults.ts'
import { useTask } from '../../lib/useTask.ts'
import { CodeField } from './CodeField.tsx'
import { StrangerPage } from './StrangerPage.tsx'
import { useAfterSignIn } from './useEntrance.ts'

export default function SignInPage() {
  const [email, setEmail] = useState('')
  const [password, setPassword] = useState('')
  const [code, setCode] = useState('')
  const [asksCode, setAsksCode] = useState(false)
  const task = useTask()
  const { data: info } = useQuery(infoQuery)
  const [search] = useSearchParams()
  const goOn = useAfterSignIn()

  const enter = async (asEmail: string, withPassword: string): Promise<void> => {
    try {
      const session = await signIn(asEmail, withPassword, asksCode ? code : undefined)
      await goOn(session, ownAddress(search.get('to')))
    } catch (thrown) {
      if (!(thrown instanceof Error) || !isProblem(thrown, 'second-factor-needed')) throw thrown
      setEmail(asEmail)
      setPassword(withPassword)
      setAsksCode(true)
    }
  }

  return (
    <StrangerPage title="Sign in" purpose="Where a group keeps the assumptions its abundances rest on.">
      <TaskForm task={task} fields={[]} submitLabel="Sign in" onSubmit={() => enter(email, password)}>
        <TextField label="E-mail" type="email" autoComplete="username" value={email} onChange={setEmail} />
        <TextField
          label="Password"
          type="password"
          autoComplete="current-password"
          value={password}
          onChange={setPassword}
        />
        {asksCode ? <CodeField value={code} onChange={setCode} /> : null}
      </TaskForm>
      <p className="text-small">
        <Link to="/forgotten-password" className="link">
          Forgotten your password?
        </Link>
      </p>
      {info?.awaitsFirstGroup ? (
        <p>
          There is no group here yet. Whoever started the server finds in its output the link that makes the
          first.
        </p>
      ) : null}
      {info?.demo ? (
        <DemoSignIns
          people={info.demoSignIns}
          busy={task.busy}
          onChoose={(person) => task.run(() => enter(person.email, person.password))}
        />
      ) : null}
    </StrangerPage>
  )
}

type DemoPerson = PublicInfo['demoSignIns'][number]

interface DemoSignInsProps {
  people: readonly DemoPerson[]
  busy: boolean
  onChoose: (person: DemoPerson) => void
}

const DemoSignIns = ({ people, busy, onChoose }: DemoSignInsProps) => (
  <section aria-labelledby="demo">
    <h2 id="demo">Demo group</h2>
    <p className="pb-2 text-small text-soft">Made-up people with made-up work. Pick one to look around as.</p>
    <ul className="rows border-y border-rule">
      {people.map((person) => (
        <li key={person.email} className="flex flex-wrap items-baseline gap-x-3 py-2.5">
          <button
            type="button"
            className="link font-semibold"
            disabled={busy}
            onClick={() => onChoose(person)}
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
)
