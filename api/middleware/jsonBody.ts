import express from 'express'
import type { RequestHandler } from 'express'
import { ProblemError } from '../errors/problemError.ts'

/** Largest body taken, bytes. */
const BODY_LIMIT = 1_048_576

const requireJson: RequestHandler = (req, _res, next) => {
  const isJson = req.is('application/json') !== false && req.get('content-type') !== undefined
  next(
    isJson ? undefined : new ProblemError('not-json', 'Send the body with Content-Type: application/json.'),
  )
}

/** Reads a JSON body of at most BODY_LIMIT bytes into `req.body`. */
export const jsonBody: RequestHandler[] = [requireJson, express.json({ limit: BODY_LIMIT })]
