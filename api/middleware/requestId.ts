import { randomUUID } from 'node:crypto'
import type { RequestHandler, Response } from 'express'

const HEADER = 'x-request-id'
const ACCEPTABLE = /^[A-Za-z0-9._-]{8,64}$/

/** Gives each request an id, or keeps the proxy's, and says it in the answer. */
export const requestId: RequestHandler = (req, res, next) => {
  const given = req.get(HEADER)
  res.setHeader(HEADER, given !== undefined && ACCEPTABLE.test(given) ? given : randomUUID())
  next()
}

export const requestIdOf = (res: Pick<Response, 'getHeader'>): string => String(res.getHeader(HEADER))
