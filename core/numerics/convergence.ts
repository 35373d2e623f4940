/** A result that could not be reached: the input makes sense, the numerics did not arrive. Never returned as a number. */
export class ConvergenceError extends Error {
  readonly reason: string
  constructor(reason: string) {
    super(reason)
    this.name = 'ConvergenceError'
    this.reason = reason
  }
}

const WORDS = {
  'step-too-small': 'the step of the integrator fell below what double precision can resolve',
  'too-many-steps': 'the integrator used up its budget of steps',
  'not-finite': 'the equations gave a number that is not finite',
} as const

/** The error for an integration that failed at x = m/T. */
export function integrationFailure(reason: keyof typeof WORDS, x: number): ConvergenceError {
  return new ConvergenceError(`${WORDS[reason]} at x = m/T = ${x.toPrecision(4)}`)
}
