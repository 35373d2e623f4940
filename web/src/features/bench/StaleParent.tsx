import { useQuery } from '@tanstack/react-query'
import { candidateQuery, historyQuery } from '../../api/records.ts'
import { Button } from '../../components/ui/Button.tsx'

interface StaleParentProps {
  kind: 'history' | 'candidate'
  recordId: string
  onSaveOnTop: (parentId: string) => void
}

/** Someone saved a revision meanwhile: who, when and why, and the way on. */
export function StaleParent({ kind, recordId, onSaveOnTop }: StaleParentProps) {
  const history = useQuery({ ...historyQuery(recordId), staleTime: 0, enabled: kind === 'history' })
  const candidate = useQuery({ ...candidateQuery(recordId), staleTime: 0, enabled: kind === 'candidate' })
  const record = kind === 'history' ? history : candidate
  if (!record.data || record.isFetching) return <p className="text-small text-soft">Asking who saved it …</p>
  const { id, number, author, createdAt, note } = record.data.head
  return (
    <div className="grid gap-2 pt-1 text-small">
      <p>
        {author.name} saved revision {number} of “{record.data.name}”,{' '}
        {new Date(createdAt).toLocaleString(undefined, { dateStyle: 'medium', timeStyle: 'short' })}
        {note === '' ? '.' : `: “${note}”`}
      </p>
      <p>
        Your changes stand on the Bench. Saved on top, they replace what that revision says, which stays in
        the record; or save them as a record of their own.
      </p>
      <Button className="justify-self-start" onClick={() => onSaveOnTop(id)}>
        Save mine on top, as revision {number + 1}
      </Button>
    </div>
  )
}
