import { useId } from 'react'
import { Link } from 'react-router-dom'
import type { Chosen } from './revisions.ts'

interface RecordPickerProps {
  kind: 'history' | 'candidate'
  chosen: Pick<Chosen<unknown>, 'recordId' | 'name'>
  records: readonly { id: string; name: string; head: { number: number } }[]
  onPick: (recordId: string, number: number) => void
}

/** The name of the record on the Bench; picking another keeps the rest of the Bench and drops this record's changes. */
export function RecordPicker({ kind, chosen, records, onPick }: RecordPickerProps) {
  const id = useId()
  const pick = (recordId: string): void => {
    const record = records.find((each) => each.id === recordId)
    if (record) onPick(recordId, record.head.number)
  }
  return (
    <>
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
    </>
  )
}

interface RevisionWordsProps {
  kind: 'history' | 'candidate'
  chosen: Chosen<{ number: number }>
  changed: boolean
}

/** Which revision the Bench stands on, whether it is the newest, and whether the Bench has left it. */
export function RevisionWords({ kind, chosen, changed }: RevisionWordsProps) {
  const { number } = chosen.revision
  const page = kind === 'history' ? 'histories' : 'candidates'
  return (
    <>
      <Link className="hover:text-ember" to={`/${page}/${chosen.recordId}`}>
        revision {number}
        {number === chosen.newest.number ? '' : ` of ${chosen.newest.number}`}
      </Link>
      {changed ? <span className="text-ember"> · changed, not saved</span> : null}
    </>
  )
}
