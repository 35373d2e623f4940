import { useEffect, useRef } from 'react'
import { TextField } from '../../components/ui/TextField.tsx'

interface CodeFieldProps {
  value: string
  onChange: (value: string) => void
}

/** Asks for the second factor, and takes the focus as it appears. */
export function CodeField({ value, onChange }: CodeFieldProps) {
  const around = useRef<HTMLDivElement>(null)
  useEffect(() => around.current?.querySelector('input')?.focus(), [])
  return (
    <div ref={around}>
      <TextField
        label="Code of your second factor"
        hint="Six figures from your app, or one of your recovery codes."
        inputMode="text"
        autoComplete="one-time-code"
        value={value}
        onChange={onChange}
      />
    </div>
  )
}
