import { useState } from 'react'
import { Select } from '../../components/ui/Select.tsx'
import { differences } from './fields.ts'
import { DifferenceTable } from './DifferenceTable.tsx'
import type { Wording } from './wordings.ts'

interface CompareRevisionsProps<T> {
  revisions: readonly { number: number; input: T }[]
  wordings: (input: T) => Wording[]
}

/** Two revisions held side by side, in words and field by field. */
export function CompareRevisions<T>({ revisions, wordings }: CompareRevisionsProps<T>) {
  const newest = revisions[0]!
  const options = revisions.map(({ number }) => ({ value: String(number), label: `revision ${number}` }))
  const [from, setFrom] = useState(String(revisions[1]?.number ?? newest.number))
  const [to, setTo] = useState(String(newest.number))
  if (revisions.length < 2)
    return <p className="text-soft">There is one revision so far; a second can be held against it.</p>
  const numbered = (number: string) =>
    revisions.find((revision) => String(revision.number) === number) ?? newest
  const before = numbered(from)
  const after = numbered(to)
  const found = differences(before.input, after.input)
  return (
    <div className="grid gap-2">
      <div className="flex flex-wrap gap-x-5">
        <Select label="From" value={from} options={options} onChange={setFrom} />
        <Select label="To" value={to} options={options} onChange={setTo} />
      </div>
      {found.length === 0 ? (
        <p className="text-soft">These two are the same in every field.</p>
      ) : (
        <DifferenceTable
          found={found}
          before={{ number: before.number, wordings: wordings(before.input) }}
          after={{ number: after.number, wordings: wordings(after.input) }}
        />
      )}
    </div>
  )
}
