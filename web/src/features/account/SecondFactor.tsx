import { useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import type { Account, NewSecondFactor } from '#core/wire/index'
import { accountQuery, beginSecondFactor, confirmSecondFactor } from '../../api/account.ts'
import { TaskForm } from '../../components/ui/TaskForm.tsx'
import { TextField } from '../../components/ui/TextField.tsx'
import { faultAt } from '../../lib/faults.ts'
import { useTask } from '../../lib/useTask.ts'
import { FactorInForce } from './FactorInForce.tsx'
import { RecoveryCodes } from './RecoveryCodes.tsx'

/** Codes from an app beside the password: set up, renewed, given up. */
export function SecondFactor({ account }: { account: Account }) {
  const [begun, setBegun] = useState<NewSecondFactor | null>(null)
  const [codes, setCodes] = useState<readonly string[] | null>(null)
  const queries = useQueryClient()
  const refresh = (): Promise<void> => queries.invalidateQueries({ queryKey: accountQuery.queryKey })
  const show = async (recoveryCodes: readonly string[]): Promise<void> => {
    setBegun(null)
    setCodes(recoveryCodes)
    await refresh()
  }
  if (codes !== null) return <RecoveryCodes codes={codes} onKept={() => setCodes(null)} />
  if (account.secondFactor.inForce)
    return (
      <FactorInForce left={account.secondFactor.recoveryCodesLeft} onRenewed={show} onGivenUp={refresh} />
    )
  if (begun !== null) return <Confirm begun={begun} onConfirmed={show} />
  if (!account.hasPassword) return <p>You sign in elsewhere; the second factor is asked for there.</p>
  return <Begin onBegun={setBegun} />
}

function Begin({ onBegun }: { onBegun: (begun: NewSecondFactor) => void }) {
  const [password, setPassword] = useState('')
  const task = useTask()
  return (
    <TaskForm
      task={task}
      fields={['currentPassword']}
      submitLabel="Set up a second factor"
      variant="quiet"
      onSubmit={async () => onBegun(await beginSecondFactor(password))}
    >
      <p>Signing in then takes a code of an app on your phone beside the password.</p>
      <TextField
        label="Password, to set up the second factor"
        type="password"
        autoComplete="current-password"
        fault={faultAt(task.error, 'currentPassword')}
        value={password}
        onChange={setPassword}
      />
    </TaskForm>
  )
}

interface ConfirmProps {
  begun: NewSecondFactor
  onConfirmed: (recoveryCodes: readonly string[]) => Promise<void>
}

function Confirm({ begun, onConfirmed }: ConfirmProps) {
  const [code, setCode] = useState('')
  const task = useTask()
  return (
    <TaskForm
      task={task}
      fields={['code']}
      submitLabel="Put it in force"
      onSubmit={async () => onConfirmed((await confirmSecondFactor(code)).recoveryCodes)}
    >
      <p>Read this with an app for one-time codes, then give the code it shows.</p>
      <img
        src={`data:image/svg+xml,${encodeURIComponent(begun.qrSvg)}`}
        alt="QR code with the secret that also stands below it"
        width="200"
        height="200"
        className="my-2 bg-white"
      />
      <p className="text-small">
        Or type the secret: <code className="font-mono break-all">{begun.secret}</code>
      </p>
      <TextField
        label="Code the app shows"
        inputMode="numeric"
        autoComplete="one-time-code"
        fault={faultAt(task.error, 'code')}
        value={code}
        onChange={setCode}
      />
    </TaskForm>
  )
}
