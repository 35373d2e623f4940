import type { Problem } from '#core/wire/index'
import type { ErrorRequestHandler, Response } from 'express'
import { requestIdOf } from '../middleware/requestId.ts'
import { ProblemError } from './problemError.ts'
import { problemOf } from './problemOf.ts'
import { PROBLEMS, problemType } from './problems.ts'

/** The document of a problem met while answering the request of that id. */
export function problemDocument(error: ProblemError, requestId: string): Problem {
  const { status, title } = PROBLEMS[error.kind]
  return {
    type: problemType(error.kind),
    title,
    status,
    detail: error.message,
    instance: requestId,
    ...(error.faults === undefined ? {} : { faults: [...error.faults] }),
  }
}

/** The same for any error; what nobody foresaw is told not at all. */
export function problemDocumentOf(error: unknown, requestId: string): Problem {
  return problemDocument(problemOf(error) ?? unforeseenProblem(requestId), requestId)
}

const unforeseenProblem = (requestId: string): ProblemError =>
  new ProblemError(
    'internal',
    `Nothing was saved by this request. Try again; if it stays, report the request id ${requestId}.`,
  )

export function sendProblem(res: Response, error: ProblemError): void {
  const document = problemDocument(error, requestIdOf(res))
  if (error.retryAfterSeconds !== undefined) res.setHeader('retry-after', error.retryAfterSeconds)
  res.status(document.status).type('application/problem+json').send(JSON.stringify(document))
}

/** Last in the chain: writes every error as a problem document. What nobody foresaw is logged whole and told not at all. */
export const problemHandler: ErrorRequestHandler = (error: unknown, req, res, next) => {
  if (res.headersSent) {
    next(error)
    return
  }
  const foreseen = problemOf(error)
  if (foreseen === null) req.log.error({ err: error }, 'unforeseen error')
  sendProblem(res, foreseen ?? unforeseenProblem(requestIdOf(res)))
}
