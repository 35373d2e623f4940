import { useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { Link } from 'react-router-dom'
import { toast } from 'sonner'
import type { Account } from '#core/wire/index'
import { changePassword, ownSessionsQuery } from '../../api/account.ts'
import { TaskForm } from '../../components/ui/TaskForm.tsx'
import { TextField } from '../../components/ui/TextField.tsx'
import { faultAt } from '../../lib/faults.ts'
import { useTask } from '../../lib/useTask.ts'
import { NewPasswordField } from '../session/NewPasswordField.tsx'

export function PasswordForm({ account }: { account: Account }) {
  const [current, setCurrent] = useState('')
  const [next, setNext] = useState('')
  const task = useTask()
  const queries = useQueryClient()
  const change = async (): Promise<void> => {
    await changePassword(current, next)
    setCurrent('')
    setNext('')
    void queries.invalidateQueries({ queryKey: ownSessionsQuery.queryKey })
    toast.success('Your password is changed, and every other session has ended.')
  }
  if (!account.hasPassword)
    return (
      <p>
        You have none: you sign in elsewhere.{' '}
        <Link to="/forgotten-password" className="link">
          Have a link sent to choose one
        </Link>
      </p>
    )
  return (
    <TaskForm
      task={task}
      fields={['currentPassword', 'newPassword']}
      submitLabel="Change password"
      variant="quiet"
      onSubmit={change}
    >
      <TextField
        label="Present password"
        type="password"
        autoComplete="current-password"
        fault={faultAt(task.error, 'currentPassword')}
        value={current}
        onChange={setCurrent}
      />
      <NewPasswordField
        label="New password"
        fault={faultAt(task.error, 'newPassword')}
        value={next}
        onChange={setNext}
      />
    </TaskForm>
  )
}
