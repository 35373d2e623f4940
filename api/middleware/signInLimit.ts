import type { Request, RequestHandler } from 'express'
import { ipKeyGenerator, rateLimit } from 'express-rate-limit'
import { ProblemError } from '../errors/problemError.ts'
import { sendProblem } from '../errors/sendProblem.ts'

const WINDOW_MINUTES = 15

/** Failed attempts allowed in a window; successful ones do not count. */
export interface SignInLimits {
  perAddress: number
  perAccount: number
}

export const DEFAULT_SIGN_IN_LIMITS: SignInLimits = { perAddress: 50, perAccount: 10 }

function accountOf(req: Request): string {
  const body = req.body as { email?: unknown } | undefined
  return typeof body?.email === 'string' ? body.email.trim().toLowerCase() : ''
}

const limiter = (limit: number, keyGenerator: (req: Request) => string): RequestHandler =>
  rateLimit({
    windowMs: WINDOW_MINUTES * 60_000,
    limit,
    keyGenerator,
    skipSuccessfulRequests: true,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    handler: (_req, res) => {
      const detail = `Sign-in is closed here for up to ${WINDOW_MINUTES} minutes after too many failures. Wait, then try again.`
      sendProblem(res, new ProblemError('too-many-attempts', detail))
    },
  })

/** Slows guessing down, by address and by account. Runs after the body is read, for the account stands in it. */
export const signInLimit = (limits: SignInLimits): RequestHandler[] => [
  limiter(limits.perAddress, (req) => `address ${ipKeyGenerator(req.ip ?? '')}`),
  limiter(limits.perAccount, (req) => `account ${accountOf(req)}`),
]
