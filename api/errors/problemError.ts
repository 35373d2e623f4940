import type { Fault } from '#core/wire/index'
import type { ProblemKind } from './problems.ts'

/** An error with an answer: thrown anywhere below a route, written as a problem document by the error handler. */
export class ProblemError extends Error {
  readonly kind: ProblemKind
  readonly faults: readonly Fault[] | undefined
  constructor(kind: ProblemKind, detail: string, faults?: readonly Fault[]) {
    super(detail)
    this.name = 'ProblemError'
    this.kind = kind
    this.faults = faults
  }
}

export const notFound = (what: string): ProblemError =>
  new ProblemError(
    'not-found',
    `There is no ${what} at this address in your group. Check the link, or look for it in the list.`,
  )
