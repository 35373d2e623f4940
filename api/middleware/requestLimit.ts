import type { Request, RequestHandler, Response } from 'express'
import { ipKeyGenerator, rateLimit } from 'express-rate-limit'
import { ProblemError } from '../errors/problemError.ts'
import { sendProblem } from '../errors/sendProblem.ts'
import { callerOf } from './caller.ts'

const WINDOW_SECONDS = 60

/** Requests a minute that are usual for one person, one key, or one address of strangers. */
export const USUAL_REQUESTS_PER_MINUTE = 1200

function whoOf(req: Request, res: Response): string {
  const caller = callerOf(res)
  if (caller === null) return `address ${ipKeyGenerator(req.ip ?? '')}`
  return caller.key === null ? `person ${caller.user.id}` : `key ${caller.key.id}`
}

const refuse = (res: Response): void =>
  sendProblem(
    res,
    new ProblemError(
      'too-many-requests',
      'More requests than are taken in a minute. Wait as long as Retry-After says, then go on.',
    ),
  )

/** Times a minute that one address may open guest links: enough to read, too few to guess. */
export const GUEST_OPENINGS_PER_MINUTE = 60

/** A narrower limit for one door, by address. */
export const addressLimit = (perMinute: number): RequestHandler =>
  rateLimit({
    windowMs: WINDOW_SECONDS * 1000,
    limit: perMinute,
    keyGenerator: (req) => ipKeyGenerator(req.ip ?? ''),
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    handler: (_req, res) => refuse(res),
  })

/** Keeps one caller from taking the server from the others. Counts in memory, so per process. */
export const requestLimit = (usual: number): RequestHandler =>
  rateLimit({
    windowMs: WINDOW_SECONDS * 1000,
    limit: (_req, res) => callerOf(res)?.key?.requestsPerMinute ?? usual,
    keyGenerator: whoOf,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    handler: (_req, res) => refuse(res),
  })
