import { useState } from 'react'
import { toast } from 'sonner'
import { giveUpSecondFactor, renewRecoveryCodes } from '../../api/account.ts'
import { Button } from '../../components/ui/Button.tsx'
import { TaskForm } from '../../components/ui/TaskForm.tsx'
import { TextField } from '../../components/ui/TextField.tsx'
import { faultAt } from '../../lib/faults.ts'
import { useTask } from '../../lib/useTask.ts'

interface FactorInForceProps {
  left: number
  onRenewed: (recoveryCodes: readonly string[]) => Promise<void>
  onGivenUp: () => Promise<void>
}

/** What can be done with a second factor: get new recovery codes, or give it up; both by password and code. */
export function FactorInForce({ left, onRenewed, onGivenUp }: FactorInForceProps) {
  const [wanted, setWanted] = useState<'renew' | 'give up' | null>(null)
  return (
    <>
      <p>
        In force. {left === 1 ? 'One recovery code is' : `${left} recovery codes are`} left.
        {left < 3 ? ' Get new ones before the last is gone.' : ''}
      </p>
      <div className="flex flex-wrap gap-3">
        <Button aria-expanded={wanted === 'renew'} onClick={() => setWanted('renew')}>
          New recovery codes
        </Button>
        <Button aria-expanded={wanted === 'give up'} onClick={() => setWanted('give up')}>
          Give it up
        </Button>
      </div>
      {wanted === 'renew' ? (
        <ByPasswordAndCode
          submitLabel="Get new recovery codes"
          onSubmit={async (password, code) =>
            onRenewed((await renewRecoveryCodes(password, code)).recoveryCodes)
          }
        />
      ) : null}
      {wanted === 'give up' ? (
        <ByPasswordAndCode
          submitLabel="Give up the second factor"
          onSubmit={async (password, code) => {
            await giveUpSecondFactor(password, code)
            await onGivenUp()
            toast.success('The password alone is asked for from now on.')
          }}
        />
      ) : null}
    </>
  )
}

interface ByPasswordAndCodeProps {
  submitLabel: string
  onSubmit: (password: string, code: string) => Promise<void>
}

function ByPasswordAndCode({ submitLabel, onSubmit }: ByPasswordAndCodeProps) {
  const [password, setPassword] = useState('')
  const [code, setCode] = useState('')
  const task = useTask()
  return (
    <TaskForm
      task={task}
      fields={['currentPassword', 'code']}
      submitLabel={submitLabel}
      variant="quiet"
      onSubmit={() => onSubmit(password, code)}
    >
      <TextField
        label="Password, for the second factor"
        type="password"
        autoComplete="current-password"
        fault={faultAt(task.error, 'currentPassword')}
        value={password}
        onChange={setPassword}
      />
      <TextField
        label="Code of the app, or a recovery code"
        autoComplete="one-time-code"
        fault={faultAt(task.error, 'code')}
        value={code}
        onChange={setCode}
      />
    </TaskForm>
  )
}
