import { useState } from 'react'
import type { KeyboardEvent, ReactNode } from 'react'
import type { Dimension } from '#core/units/units'
import { inputText } from '../../lib/number.ts'
import { parseQuantity, stepLastDigit } from '../../lib/quantity.ts'
import { Field } from './Field.tsx'

interface QuantityInputProps {
  label: ReactNode
  value: number | undefined
  dimension: Dimension
  /** Unit of a bare number, shown beside the field; the value handed out is in the base unit of the dimension. */
  unit: string
  hint?: ReactNode
  /** What the core found wrong with the number. */
  fault?: string | undefined
  onCommit: (value: number) => void
}

/**
 * A number with its unit, committed at every keystroke that makes sense. What is typed stays as typed; a text that is no
 * quantity is answered beside the field and leaves the last good value standing.
 */
export function QuantityInput({ label, value, dimension, unit, hint, fault, onCommit }: QuantityInputProps) {
  const [typed, setTyped] = useState<{ text: string; value: number | undefined } | null>(null)
  // The text counts only while it stands for the value shown: undo, reset or a pick elsewhere replace it.
  const current = typed !== null && (typed.value === undefined || typed.value === value) ? typed : null
  const text = current?.text ?? (value === undefined ? '' : inputText(value))
  const parsed = current === null ? null : parseQuantity(text, dimension, unit)

  const commit = (next: string): void => {
    const result = parseQuantity(next, dimension, unit)
    setTyped({ text: next, value: result.ok ? result.value : undefined })
    if (result.ok) onCommit(result.value)
  }
  const step = (event: KeyboardEvent<HTMLInputElement>): void => {
    if (event.key !== 'ArrowUp' && event.key !== 'ArrowDown') return
    event.preventDefault()
    commit(stepLastDigit(text, event.key === 'ArrowUp' ? 1 : -1))
  }
  return (
    <Field label={label} hint={hint} fault={parsed && !parsed.ok ? parsed.message : fault}>
      {(control) => (
        <div className="relative">
          <input
            {...control}
            className="input number pr-16"
            inputMode="text"
            autoComplete="off"
            spellCheck={false}
            value={text}
            onChange={(event) => commit(event.target.value)}
            onBlur={() => setTyped((was) => (was !== null && was.value === undefined ? was : null))}
            onKeyDown={step}
          />
          {dimension === 'pure' ? null : (
            <span
              aria-hidden="true"
              className="pointer-events-none absolute inset-y-0 right-2 flex items-center text-small text-soft"
            >
              {unitText(unit)}
            </span>
          )}
        </div>
      )}
    </Field>
  )
}

const unitText = (unit: string): string => (unit === 'cm3/s' ? 'cm³/s' : unit)
