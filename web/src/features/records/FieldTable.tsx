import { useState } from 'react'
import { Button } from '../../components/ui/Button.tsx'
import { Num } from '../../components/ui/Num.tsx'
import { unitOf } from './fields.ts'
import type { FieldEntry, FieldValue, NamedRow } from './fields.ts'

/** Digits that show an input as it was given, whatever it was. */
const AS_GIVEN = 15

const isNumbers = (value: readonly number[] | NamedRow): value is readonly number[] => Array.isArray(value)

/** One value of a field: numbers with the unit in the field's name, words as they are. */
export function FieldText({ path, value }: { path: string; value: FieldValue | undefined }) {
  if (value === undefined)
    return (
      <span className="font-normal text-soft">
        <span aria-hidden="true">–</span>
        <span className="sr-only">not part of it</span>
      </span>
    )
  if (value === null) return <span className="text-soft">not set</span>
  if (typeof value === 'boolean') return value ? 'yes' : 'no'
  if (typeof value === 'string') return value
  if (typeof value === 'number') {
    const unit = unitOf(path)
    return <Num value={value} digits={AS_GIVEN} {...(unit === undefined ? {} : { unit })} />
  }
  if (isNumbers(value))
    return value.map((number, index) => (
      <span key={index} className="pr-3">
        <Num value={number} digits={AS_GIVEN} />
      </span>
    ))
  return Object.entries(value).map(([name, number]) => (
    <span key={name} className="pr-3">
      <span className="font-mono text-caption text-soft">{name}</span>{' '}
      <Num value={number} digits={AS_GIVEN} />
    </span>
  ))
}

/** Tables of a hundred thousand rows are inputs too: more than this is shown on demand. */
const AT_FIRST = 40
const MORE = 400

/** Fields with their paths, values and units. */
export function FieldTable({ caption, fields }: { caption: string; fields: readonly FieldEntry[] }) {
  const [most, setMost] = useState(AT_FIRST)
  const hidden = fields.length - most
  return (
    <>
      <table className="w-full text-small">
        <caption className="sr-only">{caption}</caption>
        <thead className="sr-only">
          <tr>
            <th scope="col">Field</th>
            <th scope="col">Value</th>
          </tr>
        </thead>
        <tbody className="rows">
          {fields.slice(0, most).map(({ path, value }) => (
            <tr key={path} className="align-baseline">
              <th
                scope="row"
                className="py-1 pr-4 text-left font-mono text-caption font-normal break-all text-soft"
              >
                {path}
              </th>
              <td className="py-1 text-right">
                <FieldText path={path} value={value} />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      {hidden > 0 ? (
        <p className="text-small">
          <Button variant="link" onClick={() => setMost(most + MORE)}>
            Show {Math.min(hidden, MORE)} more of {fields.length} fields
          </Button>
        </p>
      ) : null}
    </>
  )
}
