import { useId } from 'react'
import type { ReactNode } from 'react'

/** What a control inside a field must carry, so that its label, hint and fault are read with it. */
export interface FieldControl {
  id: string
  'aria-describedby': string | undefined
  'aria-invalid': boolean
}

interface FieldProps {
  label: ReactNode
  hint?: ReactNode
  fault?: string | undefined
  children: (control: FieldControl) => ReactNode
}

/** A labelled control with its hint and, when something is wrong with it, what is wrong and what would do. */
export function Field({ label, hint, fault, children }: FieldProps) {
  const id = useId()
  const described = [hint === undefined ? '' : `${id}-hint`, fault === undefined ? '' : `${id}-fault`]
    .join(' ')
    .trim()
  return (
    <div className="grid gap-1 py-1.5">
      <label htmlFor={id} className="text-small text-soft">
        {label}
      </label>
      {children({
        id,
        'aria-describedby': described === '' ? undefined : described,
        'aria-invalid': fault !== undefined,
      })}
      {hint === undefined ? null : (
        <p id={`${id}-hint`} className="text-caption text-soft">
          {hint}
        </p>
      )}
      {fault === undefined ? null : (
        <p id={`${id}-fault`} role="alert" className="text-caption text-fault">
          {fault}
        </p>
      )}
    </div>
  )
}
