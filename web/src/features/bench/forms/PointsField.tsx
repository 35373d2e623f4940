import { useState } from 'react'
import { Field } from '../../../components/ui/Field.tsx'
import { useFault } from '../faults.tsx'

type Points = [number, number][]

const textOf = (points: Points): string => points.map((row) => row.join('  ')).join('\n')

/** Rows of two numbers apart by space, comma, semicolon or tab; the first row that is not so is named. */
function readPoints(text: string): { points: Points } | { message: string } {
  const points: Points = []
  const lines = text.split('\n')
  for (const [index, line] of lines.entries()) {
    if (line.trim() === '' || line.trim().startsWith('#')) continue
    const numbers = line
      .trim()
      .split(/[\s,;]+/)
      .map(Number)
    if (numbers.length !== 2 || numbers.some((number) => !Number.isFinite(number)))
      return { message: `Line ${index + 1} is not two numbers. “91.2  3.4e-9” would do.` }
    points.push([numbers[0]!, numbers[1]!])
  }
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
  const fault = useFault(path)
  return (
    <Field
      label={label}
      hint="Pasted columns do; lines that begin with # are left out."
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
