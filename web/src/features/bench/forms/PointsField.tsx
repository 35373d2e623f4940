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
  const [typed, setTyped] = useState<string | null>(null)
  const read = typed === null ? null : readPoints(typed)
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
          value={typed ?? textOf(value)}
          onChange={(event) => {
            setTyped(event.target.value)
            const result = readPoints(event.target.value)
            if ('points' in result) onChange(result.points)
          }}
        />
      )}
    </Field>
  )
}
