import type { Fault } from '#core/wire/index'
import type { ProblemKind } from './problems.ts'

interface ProblemExtras {
  faults?: readonly Fault[]
  /** After how long it is worth trying again. */
  retryAfterSeconds?: number
}

/** An error with an answer: thrown anywhere below a route, written as a problem document by the error handler. */
export class ProblemError extends Error {
  readonly kind: ProblemKind
  readonly faults: readonly Fault[] | undefined
  readonly retryAfterSeconds: number | undefined
  constructor(kind: ProblemKind, detail: string, { faults, retryAfterSeconds }: ProblemExtras = {}) {
    super(detail)
    this.name = 'ProblemError'
    this.kind = kind
    this.faults = faults
    this.retryAfterSeconds = retryAfterSeconds
  }
}

export const notFound = (what: string): ProblemError =>
  new ProblemError(
    'not-found',
    `There is no ${what} at this address in your group. Check the link, or look for it in the list.`,
  )

/** A link sent by mail or printed, whatever is wrong with it: telling more would tell a guesser more. */
export const linkNotValid = (next: string): ProblemError =>
  new ProblemError('link-not-valid', `It was used already, has expired, or is not whole. ${next}`)
