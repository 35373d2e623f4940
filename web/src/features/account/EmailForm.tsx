import { useState } from 'react'
import type { Account } from '#core/wire/index'
import { changeEmail, sendVerification } from '../../api/account.ts'
import { Button } from '../../components/ui/Button.tsx'
import { ErrorNotice } from '../../components/ui/Notice.tsx'
import { TaskForm } from '../../components/ui/TaskForm.tsx'
import { TextField } from '../../components/ui/TextField.tsx'
import { faultAt } from '../../lib/faults.ts'
import { useTask } from '../../lib/useTask.ts'

export function EmailForm({ account }: { account: Account }) {
  const [email, setEmail] = useState('')
  const [password, setPassword] = useState('')
  const [sentTo, setSentTo] = useState<string | null>(null)
  const task = useTask()
  const ask = async (): Promise<void> => {
    await changeEmail(email, password)
    setSentTo(email)
    setPassword('')
  }
  return (
    <>
      <p className="break-words">
        {account.email}, {account.emailVerified ? 'confirmed' : 'not confirmed yet'}
      </p>
      {account.emailVerified ? null : <Verification />}
      <TaskForm
        task={task}
        fields={['email', 'currentPassword']}
        submitLabel="Change address"
        variant="quiet"
        onSubmit={ask}
      >
        <TextField
          label="New address"
          hint="A link goes there; the address changes once you open it, and the old one is told."
          type="email"
          autoComplete="email"
          fault={faultAt(task.error, 'email')}
          value={email}
          onChange={setEmail}
        />
        <TextField
          label="Password, to change the address"
          type="password"
          autoComplete="current-password"
          fault={faultAt(task.error, 'currentPassword')}
          value={password}
          onChange={setPassword}
        />
      </TaskForm>
      {sentTo === null ? null : (
        <p role="status" className="break-words">
          A mail is on its way to {sentTo}. Until its link is opened you sign in as before.
        </p>
      )}
    </>
  )
}

function Verification() {
  const [sent, setSent] = useState(false)
  const task = useTask()
  const send = (): void =>
    task.run(async () => {
      await sendVerification()
      setSent(true)
    })
  if (sent) return <p role="status">A mail with a link is on its way.</p>
  return (
    <div>
      <Button variant="link" busy={task.busy} onClick={send}>
        Send a link to confirm it
      </Button>
      {task.error ? <ErrorNotice error={task.error} /> : null}
    </div>
  )
}
