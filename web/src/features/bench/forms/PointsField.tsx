import { useState } from 'react'
import { Field } from '../../../components/ui/Field.tsx'
import { useFaultWithin } from '../faults.tsx'
import { readColumns } from './columns.ts'

type Points = [number, number][]

const textOf = (points: Points): string => points.map((row) => row.join('  ')).join('\n')

function readPoints(text: string): { points: Points } | { message: string } {
  const read = readColumns(text, 'two numbers. “91.2  3.4e-9” would do.', (numbers) => numbers === 2)
  if ('message' in read) return read
  const points = read.rows.map(([first, second]): Points[number] => [first!, second!])
  return points.length < 2 ? { message: 'At least two rows are needed.' } : { points }
}

/** A small table typed or pasted. */
export function PointsField({
  path,
  label,
  value,
  onChange,
}: {
  path: string
  label: string
  value: Points
  onChange: (points: Points) => void
}) {
  const [typed, setTyped] = useState<{ text: string; points: Points | null } | null>(null)
  // The text counts only while it stands for the rows shown: undo or reset replace it.
  const text = typed !== null && (typed.points === null || typed.points === value) ? typed.text : null
  const read = text === null ? null : readPoints(text)
  const fault = useFaultWithin(path)
  return (
    <Field
      label={label}
      hint="Pasted columns do, with or without their names; lines that begin with # are left out."
      fault={read && 'message' in read ? read.message : fault}
    >
      {(control) => (
        <textarea
          {...control}
          className="input min-h-28 font-mono text-small"
          spellCheck={false}
          value={text ?? textOf(value)}
          onChange={(event) => {
            const result = readPoints(event.target.value)
            const points = 'points' in result ? result.points : null
            setTyped({ text: event.target.value, points })
            if (points) onChange(points)
          }}
        />
      )}
    </Field>
  )
}
