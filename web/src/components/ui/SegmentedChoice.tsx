import { useId } from 'react'
import type { Option } from './Select.tsx'

/** Two to four choices side by side; one is always taken. */
export function SegmentedChoice<T extends string>({
  label,
  value,
  options,
  onChange,
}: {
  label: string
  value: T
  options: readonly Option<T>[]
  onChange: (value: T) => void
}) {
  const name = useId()
  return (
    <fieldset className="inline-flex rounded-[5px] border border-rule">
      <legend className="sr-only">{label}</legend>
      {options.map((option) => (
        <label
          key={option.value}
          className="cursor-pointer px-2.5 py-1 text-small text-soft has-checked:bg-sunk has-checked:font-semibold has-checked:text-ink has-focus-visible:outline-2 has-focus-visible:outline-ember"
        >
          <input
            type="radio"
            name={name}
            className="sr-only"
            checked={option.value === value}
            onChange={() => onChange(option.value)}
          />
          {option.label}
        </label>
      ))}
    </fieldset>
  )
}
