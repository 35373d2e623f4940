import { useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { Link } from 'react-router-dom'
import { confirmEmail } from '../../api/account.ts'
import { TaskForm } from '../../components/ui/TaskForm.tsx'
import { useTask } from '../../lib/useTask.ts'
import { LinkNeeded } from './LinkNeeded.tsx'
import { StrangerPage } from './StrangerPage.tsx'
import { useLinkToken } from './useLinkToken.ts'

/** Opened by the link that shows an address to be one's own; pressed, for some mail programs open links by themselves. */
export default function ConfirmEmailPage() {
  const token = useLinkToken()
  const [done, setDone] = useState(false)
  const task = useTask()
  const queries = useQueryClient()
  const confirm = async (): Promise<void> => {
    await confirmEmail(token)
    queries.clear()
    setDone(true)
  }
  return (
    <StrangerPage title="Confirm your address">
      {token === '' ? (
        <LinkNeeded what="the link in the mail" />
      ) : done ? (
        <p role="status">
          The address is confirmed.{' '}
          <Link to="/account" className="link">
            Go to your account
          </Link>
        </p>
      ) : (
        <TaskForm task={task} fields={[]} submitLabel="This is my address" onSubmit={confirm}>
          <p>Your account uses this address from here on.</p>
        </TaskForm>
      )}
    </StrangerPage>
  )
}
