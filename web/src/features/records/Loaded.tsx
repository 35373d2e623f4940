import type { ReactNode } from 'react'
import { ApiProblem } from '../../lib/apiProblem.ts'
import { Button } from '../../components/ui/Button.tsx'
import { ErrorNotice, Skeleton } from '../../components/ui/Notice.tsx'

/** What a page needs to know of a query to show it waiting, failed or answered. */
export interface Loading<T> {
  data: T | undefined
  error: Error | null
  refetch: () => unknown
}

interface LoadedProps<T> {
  of: Loading<T>
  what: string
  children: (data: T) => ReactNode
}

/** What is not there will not be there on asking again. */
const isAbsent = (error: Error): boolean => error instanceof ApiProblem && error.status === 404

/** Waiting, failed, or there. What was already there stays when a later question fails. */
export function Loaded<T>({ of, what, children }: LoadedProps<T>) {
  return (
    <>
      {of.error === null ? null : (
        <ErrorNotice error={of.error}>
          {isAbsent(of.error) ? null : (
            <p className="pt-1">
              <Button variant="link" onClick={() => void of.refetch()}>
                Try again
              </Button>
            </p>
          )}
        </ErrorNotice>
      )}
      {of.data === undefined ? of.error === null ? <Rows what={what} /> : null : children(of.data)}
    </>
  )
}

const Rows = ({ what }: { what: string }) => (
  <div className="grid gap-3">
    <Skeleton label={`Loading ${what}`} />
    <div aria-hidden="true" className="h-6 rounded bg-sunk" />
    <div aria-hidden="true" className="h-6 w-3/4 rounded bg-sunk" />
  </div>
)
