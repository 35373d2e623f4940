import type { FormEvent, ReactNode } from 'react'
import { isSaidBeside } from '../../lib/faults.ts'
import type { Task } from '../../lib/useTask.ts'
import { Button } from './Button.tsx'
import { ErrorNotice } from './Notice.tsx'

interface TaskFormProps {
  task: Task
  /** Paths of the fields that say themselves what is wrong with them. */
  fields: readonly string[]
  submitLabel: string
  onSubmit: () => Promise<void>
  variant?: 'primary' | 'quiet'
  children: ReactNode
}

/** Fields and one button. What goes wrong is said beside the field, or above the button; what was typed stays. */
export function TaskForm({ task, fields, submitLabel, onSubmit, variant, children }: TaskFormProps) {
  const submit = (event: FormEvent): void => {
    event.preventDefault()
    task.run(onSubmit)
  }
  const { error } = task
  return (
    <form onSubmit={submit} className="grid max-w-md gap-1">
      {children}
      {error !== null && !isSaidBeside(error, fields) ? <ErrorNotice error={error} /> : null}
      <Button
        variant={variant ?? 'primary'}
        type="submit"
        busy={task.busy}
        className="mt-3 justify-self-start"
      >
        {submitLabel}
      </Button>
    </form>
  )
}
