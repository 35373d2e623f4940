import { useState } from 'react'
import type { ReactNode } from 'react'
import { Button } from '../../components/ui/Button.tsx'
import { FieldText } from './FieldTable.tsx'
import type { Difference } from './fields.ts'
import { speaksOf } from './wordings.ts'
import type { Wording } from './wordings.ts'

interface Side {
  number: number
  /** Both sides in the same order. */
  wordings: readonly Wording[]
}

interface DifferenceTableProps {
  found: readonly Difference[]
  before: Side
  after: Side
}

/** What differs, part by part: first in words, then the fields behind them. */
export function DifferenceTable({ found, before, after }: DifferenceTableProps) {
  return (
    <table className="w-full text-left text-small max-md:block md:table-fixed">
      <caption className="sr-only">
        What differs between revisions {before.number} and {after.number}
      </caption>
      <thead className="text-caption text-soft max-md:sr-only">
        <tr>
          <th scope="col" className="py-1 font-normal">
            Field
          </th>
          <th scope="col" className="py-1 font-normal">
            Revision {before.number}
          </th>
          <th scope="col" className="py-1 font-normal">
            Revision {after.number}
          </th>
        </tr>
      </thead>
      {before.wordings.map((wording, index) => {
        const fields = found.filter(({ path }) => speaksOf(wording, path))
        return fields.length === 0 ? null : (
          <tbody key={wording.path} className="rows border-t border-rule max-md:block">
            <Row
              title={<span className="text-small font-semibold text-ink">{wording.title}</span>}
              before={wording.words}
              after={after.wordings[index]?.words}
            />
            <DifferingFields fields={fields} />
          </tbody>
        )
      })}
    </table>
  )
}

/** Fields shown before the rest is asked for: two tables may differ in every one of their rows. */
const AT_FIRST = 40
const MORE = 400

function DifferingFields({ fields }: { fields: readonly Difference[] }) {
  const [most, setMost] = useState(AT_FIRST)
  const hidden = fields.length - most
  return (
    <>
      {fields.slice(0, most).map((field) => (
        <Row
          key={field.path}
          title={<span className="font-mono">{field.path}</span>}
          before={<FieldText path={field.path} value={field.before} />}
          after={<FieldText path={field.path} value={field.after} />}
        />
      ))}
      {hidden > 0 ? (
        <tr className="max-md:block">
          <td colSpan={3} className="py-1 max-md:block">
            <Button variant="link" onClick={() => setMost(most + MORE)}>
              Show {Math.min(hidden, MORE)} more of {fields.length} that differ
            </Button>
          </td>
        </tr>
      ) : null}
    </>
  )
}

function Row({ title, before, after }: { title: ReactNode; before: ReactNode; after: ReactNode }) {
  return (
    <tr className="align-baseline max-md:block max-md:py-2">
      <th
        scope="row"
        className="py-1 pr-4 text-caption font-normal break-words text-soft max-md:block max-md:py-0"
      >
        {title}
      </th>
      <td className="py-1 pr-4 max-md:block max-md:py-0">{before}</td>
      <td className="py-1 font-semibold max-md:block max-md:py-0">
        <span aria-hidden="true" className="md:hidden">
          →{' '}
        </span>
        {after}
      </td>
    </tr>
  )
}
