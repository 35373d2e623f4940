import { useState } from 'react'
import { foundFirstGroup } from '../../api/account.ts'
import { TaskForm } from '../../components/ui/TaskForm.tsx'
import { TextField } from '../../components/ui/TextField.tsx'
import { faultAt } from '../../lib/faults.ts'
import { useTask } from '../../lib/useTask.ts'
import { LinkNeeded } from './LinkNeeded.tsx'
import { NewPasswordField } from './NewPasswordField.tsx'
import { StrangerPage } from './StrangerPage.tsx'
import { useEntrance } from './useEntrance.ts'
import { useLinkToken } from './useLinkToken.ts'

const FIELDS = ['groupName', 'name', 'email', 'password'] as const

/** Opened by the link the server prints at its first start, on an empty database. */
export default function FirstGroupPage() {
  const token = useLinkToken()
  return (
    <StrangerPage title="The first group" purpose="You become its lead, and invite everybody else.">
      {token === '' ? <LinkNeeded what="the link the server printed" /> : <Found token={token} />}
    </StrangerPage>
  )
}

function Found({ token }: { token: string }) {
  const [groupName, setGroupName] = useState('')
  const [name, setName] = useState('')
  const [email, setEmail] = useState('')
  const [password, setPassword] = useState('')
  const task = useTask()
  const enter = useEntrance()
  const found = async (): Promise<void> =>
    enter(await foundFirstGroup({ token, groupName, name, email, password }), '/bench')
  const fault = (field: (typeof FIELDS)[number]) => faultAt(task.error, field)
  return (
    <TaskForm task={task} fields={FIELDS} submitLabel="Make the group" onSubmit={found}>
      <TextField
        label="Name of the group"
        maxLength={120}
        fault={fault('groupName')}
        value={groupName}
        onChange={setGroupName}
      />
      <TextField
        label="Your name"
        autoComplete="name"
        maxLength={120}
        fault={fault('name')}
        value={name}
        onChange={setName}
      />
      <TextField
        label="E-mail"
        type="email"
        autoComplete="username"
        fault={fault('email')}
        value={email}
        onChange={setEmail}
      />
      <NewPasswordField label="Password" fault={fault('password')} value={password} onChange={setPassword} />
    </TaskForm>
  )
}
