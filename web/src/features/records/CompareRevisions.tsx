import { useState } from 'react'
import { Select } from '../../components/ui/Select.tsx'
import { differences } from './fields.ts'
import type { Difference } from './fields.ts'
import { FieldText } from './FieldTable.tsx'

interface Revision {
  number: number
  input: unknown
}

/** Two revisions held side by side, field by field. */
export function CompareRevisions({ revisions }: { revisions: readonly Revision[] }) {
  const newest = revisions[0]!
  const options = revisions.map(({ number }) => ({ value: String(number), label: `revision ${number}` }))
  const [before, setBefore] = useState(String(revisions[1]?.number ?? newest.number))
  const [after, setAfter] = useState(String(newest.number))
  if (revisions.length < 2)
    return <p className="text-soft">There is one revision so far; a second can be held against it.</p>
  const inputOf = (number: string): unknown =>
    revisions.find((revision) => String(revision.number) === number)?.input
  const found = differences(inputOf(before), inputOf(after))
  return (
    <div className="grid gap-2">
      <div className="flex flex-wrap gap-x-5">
        <Select label="From" value={before} options={options} onChange={setBefore} />
        <Select label="To" value={after} options={options} onChange={setAfter} />
      </div>
      {found.length === 0 ? (
        <p className="text-soft">These two are the same in every field.</p>
      ) : (
        <DifferenceTable found={found} before={before} after={after} />
      )}
    </div>
  )
}

interface DifferenceTableProps {
  found: readonly Difference[]
  before: string
  after: string
}

function DifferenceTable({ found, before, after }: DifferenceTableProps) {
  return (
    <table className="w-full text-left text-small max-md:block">
      <caption className="sr-only">
        Fields in which revisions {before} and {after} differ
      </caption>
      <thead className="text-caption text-soft max-md:sr-only">
        <tr>
          <th scope="col" className="py-1 font-normal">
            Field
          </th>
          <th scope="col" className="py-1 font-normal">
            Revision {before}
          </th>
          <th scope="col" className="py-1 font-normal">
            Revision {after}
          </th>
        </tr>
      </thead>
      <tbody className="rows max-md:block">
        {found.map((difference) => (
          <tr key={difference.path} className="align-baseline max-md:block max-md:py-2">
            <th
              scope="row"
              className="py-1 pr-4 font-mono text-caption font-normal break-all text-soft max-md:block"
            >
              {difference.path}
            </th>
            <td className="py-1 pr-4 max-md:block">
              <FieldText path={difference.path} value={difference.before} />
            </td>
            <td className="py-1 font-semibold max-md:block">
              <span aria-hidden="true" className="md:hidden">
                →{' '}
              </span>
              <FieldText path={difference.path} value={difference.after} />
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  )
}
