import type { Fault, Problem } from '#core/wire/index'

/** An error the server explained, as an RFC 9457 problem document. */
export class ApiProblem extends Error {
  readonly status: number
  readonly title: string
  readonly requestId: string | undefined
  readonly faults: readonly Fault[]

  constructor(problem: Problem) {
    super(problem.detail ?? problem.title)
    this.name = 'ApiProblem'
    this.status = problem.status
    this.title = problem.title
    this.requestId = problem.instance
    this.faults = problem.faults ?? []
  }
}

/** The connection failed before the server could say anything. */
export class ConnectionLost extends Error {
  constructor() {
    super(
      'The server could not be reached. Nothing you entered is lost; try again when the connection is back.',
    )
    this.name = 'ConnectionLost'
  }
}
