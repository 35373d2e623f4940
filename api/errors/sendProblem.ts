import type { Problem } from '#core/wire/index'
import type { ErrorRequestHandler, Response } from 'express'
import { requestIdOf } from '../middleware/requestId.ts'
import { ProblemError } from './problemError.ts'
import { problemOf } from './problemOf.ts'
import { PROBLEMS, problemType } from './problems.ts'

export function sendProblem(res: Response, error: ProblemError): void {
  const { status, title } = PROBLEMS[error.kind]
  const document: Problem = {
    type: problemType(error.kind),
    title,
    status,
    detail: error.message,
    instance: requestIdOf(res),
    ...(error.faults === undefined ? {} : { faults: [...error.faults] }),
  }
  if (error.retryAfterSeconds !== undefined) res.setHeader('retry-after', error.retryAfterSeconds)
  res.status(status).type('application/problem+json').send(JSON.stringify(document))
}

/** Last in the chain: writes every error as a problem document. What nobody foresaw is logged whole and told not at all. */
export const problemHandler: ErrorRequestHandler = (error: unknown, req, res, next) => {
  if (res.headersSent) {
    next(error)
    return
  }
  const foreseen = problemOf(error)
  if (foreseen === null) req.log.error({ err: error }, 'unforeseen error')
  const unforeseen = `Nothing was saved by this request. Try again; if it stays, report the request id ${requestIdOf(res)}.`
  sendProblem(res, foreseen ?? new ProblemError('internal', unforeseen))
}
