import { useState } from 'react'

/** Something asked of the server by a press: whether it is under way, and how it failed. */
export interface Task {
  busy: boolean
  error: Error | null
  /** Runs `work`; what it throws is kept as the error, and what was typed stays. */
  run(work: () => Promise<void>): void
}

export function useTask(): Task {
  const [busy, setBusy] = useState(false)
  const [error, setError] = useState<Error | null>(null)
  const start = async (work: () => Promise<void>): Promise<void> => {
    setBusy(true)
    setError(null)
    try {
      await work()
    } catch (thrown) {
      setError(thrown instanceof Error ? thrown : new Error('That failed. Nothing was changed.'))
    } finally {
      setBusy(false)
    }
  }
  return { busy, error, run: (work) => void start(work) }
}
