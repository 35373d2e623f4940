import { useId } from 'react'
import type { ReactNode } from 'react'

/** Something that is so or not. */
export function Switch({
  label,
  hint,
  checked,
  onChange,
}: {
  label: ReactNode
  hint?: ReactNode
  checked: boolean
  onChange: (checked: boolean) => void
}) {
  const id = useId()
  return (
    <div className="grid gap-1 py-1.5">
      <label htmlFor={id} className="flex items-start gap-2.5">
        <input
          id={id}
          type="checkbox"
          role="switch"
          checked={checked}
          aria-describedby={hint === undefined ? undefined : `${id}-hint`}
          onChange={(event) => onChange(event.target.checked)}
          className="mt-1 size-4 accent-[var(--ember)]"
        />
        <span>{label}</span>
      </label>
      {hint === undefined ? null : (
        <p id={`${id}-hint`} className="pl-6.5 text-caption text-soft">
          {hint}
        </p>
      )}
    </div>
  )
}
