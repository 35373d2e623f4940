import { useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import { toast } from 'sonner'
import type { Account } from '#core/wire/index'
import { accountQuery, rename } from '../../api/account.ts'
import { sessionQuery } from '../../api/session.ts'
import { TaskForm } from '../../components/ui/TaskForm.tsx'
import { TextField } from '../../components/ui/TextField.tsx'
import { faultAt } from '../../lib/faults.ts'
import { useTask } from '../../lib/useTask.ts'

export function NameForm({ account }: { account: Account }) {
  const [name, setName] = useState(account.name)
  const task = useTask()
  const queries = useQueryClient()
  const save = async (): Promise<void> => {
    const changed = await rename(name)
    queries.setQueryData(accountQuery.queryKey, changed)
    setName(changed.name)
    void queries.invalidateQueries({ queryKey: sessionQuery.queryKey, exact: true })
    toast.success('Your name is changed.')
  }
  return (
    <TaskForm task={task} fields={['name']} submitLabel="Change name" variant="quiet" onSubmit={save}>
      <TextField
        label="Name"
        hint="It stands beside what you save, before and after."
        autoComplete="name"
        maxLength={120}
        fault={faultAt(task.error, 'name')}
        value={name}
        onChange={setName}
      />
    </TaskForm>
  )
}
