import type { LiveSession } from '#db/queries/sessions'
import type { RequestHandler, Response } from 'express'
import { ProblemError } from '../errors/problemError.ts'
import { may, rolesThatMay } from '../permissions.ts'
import type { Action } from '../permissions.ts'
import type { SessionCookie } from './sessionCookie.ts'

type FindSession = (token: string) => Promise<LiveSession | null>

/** Finds who is signed in, if anyone; refusing is left to `requireAction`. */
export const findSession =
  (cookie: SessionCookie, find: FindSession): RequestHandler =>
  async (req, res, next) => {
    const token = cookie.read(req)
    res.locals['session'] = token === null ? null : await find(token)
    next()
  }

/** Who is signed in on this request, if anyone. */
export const sessionOf = (res: Response): LiveSession | null =>
  (res.locals['session'] as LiveSession | null | undefined) ?? null

export function requireSession(res: Response): LiveSession {
  const session = sessionOf(res)
  if (session === null) {
    throw new ProblemError(
      'not-signed-in',
      'You have not signed in, or your session has ended. Nothing was changed; sign in and try again.',
    )
  }
  return session
}

/** Lets through only those whose role may do `action`. */
export const requireAction =
  (action: Action): RequestHandler =>
  (_req, res, next) => {
    const { role } = requireSession(res)
    if (!may(role, action)) {
      const roles = rolesThatMay(action).join(' or ')
      throw new ProblemError(
        'not-allowed',
        `This needs the role ${roles}; you are a ${role}. Nothing was changed.`,
      )
    }
    next()
  }
