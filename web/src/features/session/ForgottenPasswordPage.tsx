import { useState } from 'react'
import { Link } from 'react-router-dom'
import { forgotPassword } from '../../api/account.ts'
import { TaskForm } from '../../components/ui/TaskForm.tsx'
import { TextField } from '../../components/ui/TextField.tsx'
import { faultAt } from '../../lib/faults.ts'
import { useTask } from '../../lib/useTask.ts'
import { StrangerPage } from './StrangerPage.tsx'

export default function ForgottenPasswordPage() {
  const [email, setEmail] = useState('')
  const [sent, setSent] = useState(false)
  const task = useTask()
  const ask = async (): Promise<void> => {
    await forgotPassword(email)
    setSent(true)
  }
  return (
    <StrangerPage title="Forgotten password" purpose="A link to choose a new one is sent to your address.">
      {sent ? (
        <p role="status">
          If <strong className="break-words">{email}</strong> has an account, a mail is on its way. Its link
          works once and for two hours.
        </p>
      ) : (
        <TaskForm task={task} fields={['email']} submitLabel="Send the link" onSubmit={ask}>
          <TextField
            label="E-mail"
            type="email"
            autoComplete="username"
            fault={faultAt(task.error, 'email')}
            value={email}
            onChange={setEmail}
          />
        </TaskForm>
      )}
      <p className="text-small">
        <Link to="/sign-in" className="link">
          Back to the sign-in
        </Link>
      </p>
    </StrangerPage>
  )
}
