import type { Fault, Problem } from '#core/wire/index'

/** An error the server explained, as an RFC 9457 problem document. */
export class ApiProblem extends Error {
  /** What kind of problem, as the API names it. */
  readonly type: string
  readonly status: number
  readonly title: string
  readonly requestId: string | undefined
  readonly faults: readonly Fault[]

  constructor(problem: Problem) {
    super(problem.detail ?? problem.title)
    this.name = 'ApiProblem'
    this.type = problem.type
    this.status = problem.status
    this.title = problem.title
    this.requestId = problem.instance
    this.faults = problem.faults ?? []
  }
}

/** Whether the server answered that nobody is signed in, as when a session has ended meanwhile. */
export const saysSignedOut = (error: unknown): boolean =>
  error instanceof ApiProblem && error.type === 'urn:emberline:problem:not-signed-in'

/** The connection failed before the server could say anything. */
export class ConnectionLost extends Error {
  constructor() {
    super(
      'The server could not be reached. Nothing you entered is lost; try again when the connection is back.',
    )
    this.name = 'ConnectionLost'
  }
}
