import { useMutation, useQueryClient } from '@tanstack/react-query'
import { useMemo, useState } from 'react'
import { toast } from 'sonner'
import type { ApiKey } from '#core/wire/index'
import { revokeKey } from '../../api/keys.ts'
import { Button } from '../../components/ui/Button.tsx'
import { Dialog } from '../../components/ui/Dialog.tsx'
import { ErrorNotice } from '../../components/ui/Notice.tsx'
import { Moment } from '../records/Moment.tsx'
import { RecordTable } from '../records/RecordTable.tsx'
import type { RecordColumn } from '../records/RecordTable.tsx'
import { keyState } from './keyState.ts'

const columnsFor = (
  showOwners: boolean,
  now: number,
  onRevoke: (key: ApiKey) => void,
): RecordColumn<ApiKey>[] => [
  { id: 'name', title: 'Name', sortBy: ({ name }) => name, cell: ({ name }) => name },
  ...(showOwners
    ? [
        {
          id: 'owner',
          title: 'Holder',
          sortBy: ({ owner }: ApiKey) => owner.name,
          cell: ({ owner }: ApiKey) => owner.name,
        },
      ]
    : []),
  {
    id: 'beginning',
    title: 'Begins with',
    sortBy: ({ beginning }) => beginning,
    cell: ({ beginning }) => <code className="font-mono text-caption">{beginning}…</code>,
  },
  { id: 'scope', title: 'May', sortBy: ({ scope }) => scope, cell: ({ scope }) => scope },
  {
    id: 'created',
    title: 'Made',
    sortBy: ({ createdAt }) => createdAt,
    cell: ({ createdAt }) => <Moment at={createdAt} />,
  },
  {
    id: 'used',
    title: 'Last used',
    sortBy: ({ lastUsedAt }) => lastUsedAt ?? '',
    cell: ({ lastUsedAt }) => (lastUsedAt === null ? 'never' : <Moment at={lastUsedAt} />),
  },
  {
    id: 'state',
    title: 'State',
    sortBy: (key) => keyState(key, now),
    cell: (key) => {
      const state = keyState(key, now)
      if (state === 'revoked') return 'revoked'
      if (state === 'expired') return 'expired'
      return (
        <span className="flex flex-wrap gap-x-3">
          <span>
            until <Moment at={key.expiresAt} />
          </span>
          <button
            type="button"
            className="link"
            aria-label={`Revoke ${key.name}`}
            onClick={() => onRevoke(key)}
          >
            revoke
          </button>
        </span>
      )
    },
  },
]

/** Keys with what each may do, when it was used and the way to end it. */
export function KeyTable({ keys, showOwners }: { keys: ApiKey[]; showOwners: boolean }) {
  const [ending, setEnding] = useState<ApiKey | null>(null)
  const [now] = useState(() => Date.now())
  const columns = useMemo(() => columnsFor(showOwners, now, setEnding), [showOwners, now])
  return (
    <>
      <RecordTable
        caption="API keys"
        columns={columns}
        rows={keys}
        searchText={(key) =>
          [key.name, key.owner.name, key.beginning, key.scope, keyState(key, now)].join(' ')
        }
        newestBy="created"
      />
      {ending ? <RevokeDialog apiKey={ending} onClose={() => setEnding(null)} /> : null}
    </>
  )
}

/** Revoking cannot be undone, so it is asked for. */
function RevokeDialog({ apiKey, onClose }: { apiKey: ApiKey; onClose: () => void }) {
  const queries = useQueryClient()
  const revoke = useMutation({
    mutationFn: () => revokeKey(apiKey.id),
    onSuccess: async () => {
      await queries.invalidateQueries({ queryKey: ['keys'] })
      toast.success(`“${apiKey.name}” is revoked.`)
      onClose()
    },
  })
  return (
    <Dialog
      open
      onOpenChange={(open) => {
        if (!open) onClose()
      }}
      title={`Revoke “${apiKey.name}”?`}
      description={`Scripts of ${apiKey.owner.name} that use it are refused from now on. This cannot be undone.`}
    >
      {revoke.error ? <ErrorNotice error={revoke.error} /> : null}
      <div className="flex justify-end gap-2">
        <Button onClick={onClose}>Keep it</Button>
        <Button variant="primary" busy={revoke.isPending} onClick={() => revoke.mutate()}>
          Revoke
        </Button>
      </div>
    </Dialog>
  )
}
