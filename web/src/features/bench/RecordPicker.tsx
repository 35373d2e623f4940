import { useId } from 'react'
import { useNavigate } from 'react-router-dom'
import { readAddress, writeAddress } from './draft.ts'

interface RecordPickerProps {
  kind: 'history' | 'candidate'
  chosen: { recordId: string; name: string; revision: { number: number } }
  changed: boolean
  records: readonly { id: string; name: string; head: { number: number } }[]
}

/** The name of the record on the Bench; picking another keeps the rest of the Bench and drops this record's changes. */
export function RecordPicker({ kind, chosen, changed, records }: RecordPickerProps) {
  const id = useId()
  const navigate = useNavigate()
  const pick = (recordId: string): void => {
    const record = records.find((each) => each.id === recordId)
    if (!record) return
    const address = readAddress(location.search)
    const draft = { ...address.draft }
    delete draft[kind]
    void navigate(
      `/bench${writeAddress({ ...address, draft, [kind]: { recordId, number: record.head.number } })}`,
    )
  }
  return (
    <div className="flex items-baseline gap-2">
      <label htmlFor={id} className="sr-only">
        {kind === 'history' ? 'History on the Bench' : 'Candidate on the Bench'}
      </label>
      <select
        id={id}
        className="-ml-1 w-full min-w-0 truncate rounded border border-transparent bg-transparent py-1 font-serif text-title font-medium hover:border-rule"
        value={chosen.recordId}
        onChange={(event) => pick(event.target.value)}
      >
        {records.map((record) => (
          <option key={record.id} value={record.id}>
            {record.name}
          </option>
        ))}
      </select>
      {changed ? <span className="shrink-0 text-small text-ember">changed, not saved</span> : null}
    </div>
  )
}
