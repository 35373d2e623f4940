/** An initial-value problem y′ = f(t, y) with its Jacobian. */
export interface OdeProblem {
  readonly dimension: number
  /** Writes f(t, y) into `slope` and ∂f_i/∂y_j into jacobian[i·dimension + j]. */
  evaluate(t: number, y: Float64Array, slope: Float64Array, jacobian: Float64Array): void
}

export interface OdeOptions {
  /** Error allowed in each step: absolute + relative · |y|, per component. */
  absoluteTolerance: number
  relativeTolerance?: number
  firstStep?: number
  maximumSteps?: number
  /** Called after every accepted step; true ends the integration there. */
  onStep?: (step: OdeStep) => boolean | void
}

/** An accepted step, with the polynomial through it. It is valid until the callback returns. */
export interface OdeStep {
  readonly from: number
  readonly to: number
  readonly end: Float64Array
  /** Component i of the solution at t within the step. */
  at(t: number, component: number): number
  /** A copy of that polynomial to keep. */
  polynomial(): (t: number, component: number) => number
}

export interface OdeCounters {
  steps: number
  rejected: number
  evaluations: number
}

/** A failure of the numerics is a result, with its reason and place; the wording is the caller's. */
export type OdeSolution = { t: number; y: Float64Array; counters: OdeCounters } & (
  | { status: 'finished' | 'stopped' }
  | { status: 'failed'; reason: 'step-too-small' | 'too-many-steps' | 'not-finite' }
)
