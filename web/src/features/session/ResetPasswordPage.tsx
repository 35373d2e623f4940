import { useState } from 'react'
import { Link } from 'react-router-dom'
import { resetPassword } from '../../api/account.ts'
import { TaskForm } from '../../components/ui/TaskForm.tsx'
import { faultAt } from '../../lib/faults.ts'
import { useTask } from '../../lib/useTask.ts'
import { LinkNeeded } from './LinkNeeded.tsx'
import { NewPasswordField } from './NewPasswordField.tsx'
import { StrangerPage } from './StrangerPage.tsx'
import { useLinkToken } from './useLinkToken.ts'

/** Opened by the link of a mail for a forgotten password. */
export default function ResetPasswordPage() {
  const token = useLinkToken()
  const [password, setPassword] = useState('')
  const [done, setDone] = useState(false)
  const task = useTask()
  const choose = async (): Promise<void> => {
    await resetPassword(token, password)
    setDone(true)
  }
  if (token === '')
    return (
      <StrangerPage title="New password">
        <LinkNeeded what="the link in the mail" />
      </StrangerPage>
    )
  return (
    <StrangerPage
      title="New password"
      purpose="Every session of yours ends, and you sign in with the new one."
    >
      {done ? (
        <p role="status">
          The new password holds.{' '}
          <Link to="/sign-in" className="link">
            Sign in
          </Link>
        </p>
      ) : (
        <TaskForm task={task} fields={['newPassword']} submitLabel="Use this password" onSubmit={choose}>
          <NewPasswordField
            label="New password"
            fault={faultAt(task.error, 'newPassword')}
            value={password}
            onChange={setPassword}
          />
        </TaskForm>
      )}
    </StrangerPage>
  )
}
