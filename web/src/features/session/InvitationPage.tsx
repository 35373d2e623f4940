import { useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import type { ReceivedInvitation } from '#core/wire/index'
import { acceptInvitation, receivedInvitationQuery } from '../../api/account.ts'
import { TaskForm } from '../../components/ui/TaskForm.tsx'
import { TextField } from '../../components/ui/TextField.tsx'
import { faultAt, isProblem } from '../../lib/faults.ts'
import { useTask } from '../../lib/useTask.ts'
import { Loaded } from '../records/Loaded.tsx'
import { CodeField } from './CodeField.tsx'
import { LinkNeeded } from './LinkNeeded.tsx'
import { NewPasswordField } from './NewPasswordField.tsx'
import { StrangerPage } from './StrangerPage.tsx'
import { useEntrance } from './useEntrance.ts'
import { useLinkToken } from './useLinkToken.ts'

/** Opened by the link of an invitation. */
export default function InvitationPage() {
  const token = useLinkToken()
  const query = useQuery({ ...receivedInvitationQuery(token), enabled: token !== '' })
  return (
    <StrangerPage title="Invitation">
      {token === '' ? (
        <LinkNeeded what="the link in an invitation" />
      ) : (
        <Loaded of={query} what="the invitation">
          {(received) => <Accept token={token} received={received} />}
        </Loaded>
      )}
    </StrangerPage>
  )
}

function Accept({ token, received }: { token: string; received: ReceivedInvitation }) {
  const { email, role, groupName, inviterName, hasAccount } = received
  const [name, setName] = useState('')
  const [password, setPassword] = useState('')
  const [code, setCode] = useState('')
  const [asksCode, setAsksCode] = useState(false)
  const task = useTask()
  const enter = useEntrance()
  const accept = async (): Promise<void> => {
    const person = hasAccount ? (asksCode ? { code } : {}) : { name }
    try {
      await enter(await acceptInvitation({ token, password, ...person }), '/bench')
    } catch (thrown) {
      if (!(thrown instanceof Error) || !isProblem(thrown, 'second-factor-needed')) throw thrown
      setAsksCode(true)
    }
  }
  return (
    <>
      <p>
        {inviterName} invites you to <strong>{groupName}</strong> as {role === 'author' ? 'an' : 'a'} {role}.{' '}
        {hasAccount
          ? 'Your account is asked for its password.'
          : 'Choose a name and a password, and you are in.'}
      </p>
      <TaskForm task={task} fields={['name', 'password']} submitLabel="Accept" onSubmit={accept}>
        <TextField
          label="E-mail"
          type="email"
          autoComplete="username"
          readOnly
          value={email}
          onChange={() => undefined}
        />
        {hasAccount ? (
          <TextField
            label="Password"
            type="password"
            autoComplete="current-password"
            fault={faultAt(task.error, 'password')}
            value={password}
            onChange={setPassword}
          />
        ) : (
          <>
            <TextField
              label="Your name"
              hint="As your group knows you; it stands beside what you save."
              autoComplete="name"
              maxLength={120}
              fault={faultAt(task.error, 'name')}
              value={name}
              onChange={setName}
            />
            <NewPasswordField
              label="Password"
              fault={faultAt(task.error, 'password')}
              value={password}
              onChange={setPassword}
            />
          </>
        )}
        {asksCode ? <CodeField value={code} onChange={setCode} /> : null}
      </TaskForm>
    </>
  )
}
