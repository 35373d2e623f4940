import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useState } from 'react'
import type { FormEvent } from 'react'
import type { CreateKeyResult, KeyScope } from '#core/wire/index'
import { createKey } from '../../api/keys.ts'
import { Button } from '../../components/ui/Button.tsx'
import { Dialog } from '../../components/ui/Dialog.tsx'
import { Field } from '../../components/ui/Field.tsx'
import { ErrorNotice } from '../../components/ui/Notice.tsx'
import { Select } from '../../components/ui/Select.tsx'
import { SCOPES } from './keyState.ts'

const TIMES = [
  { value: '7', label: 'a week' },
  { value: '30', label: '30 days' },
  { value: '90', label: '90 days' },
  { value: '366', label: 'a year' },
] as const

interface NewKeyDialogProps {
  mayWrite: boolean
  onClose: () => void
  onMade: (result: CreateKeyResult) => void
}

/** Asks what a new key is for, how far it reaches and how long. */
export function NewKeyDialog({ mayWrite, onClose, onMade }: NewKeyDialogProps) {
  const [name, setName] = useState('')
  const [scope, setScope] = useState<KeyScope>('read')
  const [days, setDays] = useState<(typeof TIMES)[number]['value']>('90')
  const queries = useQueryClient()
  const make = useMutation({
    mutationFn: () => createKey({ name, scope, days: Number(days) }),
    onSuccess: async (result) => {
      await queries.invalidateQueries({ queryKey: ['keys'] })
      onMade(result)
    },
  })
  const submit = (event: FormEvent): void => {
    event.preventDefault()
    make.mutate()
  }
  const scopes = SCOPES.filter(({ value }) => mayWrite || value !== 'write')
  return (
    <Dialog
      open
      onOpenChange={(open) => {
        if (!open) onClose()
      }}
      title="New API key"
      description="Its secret is shown once, right after it is made."
    >
      <form onSubmit={submit} className="grid gap-1">
        <Field label="What it is for" hint="Such as “tables for the paper”.">
          {(control) => (
            <input
              {...control}
              className="input"
              required
              maxLength={80}
              autoComplete="off"
              value={name}
              onChange={(event) => setName(event.target.value)}
            />
          )}
        </Field>
        <Select
          label="It may"
          value={scope}
          options={scopes}
          hint={scopes.find(({ value }) => value === scope)?.hint}
          onChange={setScope}
        />
        <Select label="For" value={days} options={TIMES} onChange={setDays} />
        {make.error ? <ErrorNotice error={make.error} /> : null}
        <div className="flex justify-end gap-2 pt-2">
          <Button onClick={onClose}>Cancel</Button>
          <Button variant="primary" type="submit" busy={make.isPending} disabled={name.trim() === ''}>
            Make the key
          </Button>
        </div>
      </form>
    </Dialog>
  )
}
