import type { ReactNode } from 'react'
import { Field } from './Field.tsx'

export interface Option<T extends string> {
  value: T
  label: string
}

interface SelectProps<T extends string> {
  label: ReactNode
  value: T
  options: readonly Option<T>[]
  hint?: ReactNode
  fault?: string | undefined
  onChange: (value: T) => void
}

/** One of a few choices. The browser's own list: it works everywhere, on a phone as with a keyboard. */
export function Select<T extends string>({ label, value, options, hint, fault, onChange }: SelectProps<T>) {
  return (
    <Field label={label} hint={hint} fault={fault}>
      {(control) => (
        <select
          {...control}
          className="input"
          value={value}
          onChange={(event) => {
            const chosen = options.find((option) => option.value === event.target.value)
            if (chosen) onChange(chosen.value)
          }}
        >
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
      )}
    </Field>
  )
}
