import type { InputHTMLAttributes, ReactNode } from 'react'
import { Field } from './Field.tsx'

interface TextFieldProps extends Omit<InputHTMLAttributes<HTMLInputElement>, 'onChange' | 'value'> {
  label: ReactNode
  hint?: ReactNode
  fault?: string | undefined
  value: string
  onChange: (value: string) => void
}

/** One line of text under its label. */
export function TextField({ label, hint, fault, value, onChange, ...rest }: TextFieldProps) {
  return (
    <Field label={label} hint={hint} fault={fault}>
      {(control) => (
        <input
          required
          {...rest}
          {...control}
          className="input"
          value={value}
          onChange={(event) => onChange(event.target.value)}
        />
      )}
    </Field>
  )
}
