import type { KeyHolder } from '#db/queries/apiKeys'
import type { LiveSession } from '#db/queries/sessions'
import type { Request, RequestHandler, Response } from 'express'
import { ProblemError } from '../errors/problemError.ts'
import { keyMay, may, rolesThatMay, scopeFor } from '../permissions.ts'
import type { Action } from '../permissions.ts'
import { requestIdOf } from './requestId.ts'
import type { SessionCookie } from './sessionCookie.ts'

/** Whence a request came, for the audit log. */
export interface RequestOrigin {
  address: string | null
  agent: string | null
  requestId: string
}

/** Who asks: a member in a browser, or a member's key. */
export interface Caller extends LiveSession {
  key: KeyHolder['key'] | null
  from: RequestOrigin
}

interface Finders {
  session: (token: string) => Promise<LiveSession | null>
  key: (secret: string) => Promise<KeyHolder | null>
}

const LONGEST_AGENT = 300

export const originOf = (req: Request, res: Response): RequestOrigin => ({
  address: req.ip ?? null,
  agent: req.get('user-agent')?.slice(0, LONGEST_AGENT) ?? null,
  requestId: requestIdOf(res),
})

/** The secret of `Authorization: Bearer …`; null without the header. */
function bearerOf(req: Request): string | null {
  const header = req.get('authorization')
  if (header === undefined) return null
  const secret = /^Bearer +(\S+)$/i.exec(header)?.[1]
  if (secret === undefined)
    throw new ProblemError('bad-key', 'Send the key as “Authorization: Bearer SECRET”.')
  return secret
}

/**
 * Finds who asks, if anyone; refusing is left to `requireAction`. A key that is sent decides alone: a wrong one is never
 * passed over for a cookie.
 */
export const findCaller =
  (cookie: SessionCookie, find: Finders): RequestHandler =>
  async (req, res, next) => {
    const secret = bearerOf(req)
    if (secret !== null) {
      const holder = await find.key(secret)
      if (holder === null) {
        res.setHeader('www-authenticate', 'Bearer error="invalid_token"')
        throw new ProblemError(
          'bad-key',
          'This key is not known here, has been revoked or has expired. Nothing was changed; make a new one under API keys.',
        )
      }
      setCaller(res, { ...holder, from: originOf(req, res) })
    } else {
      const token = cookie.read(req)
      const session = token === null ? null : await find.session(token)
      setCaller(res, session === null ? null : { ...session, key: null, from: originOf(req, res) })
    }
    next()
  }

function setCaller(res: Response, caller: Caller | null): void {
  res.locals['caller'] = caller
}

/** Who asks with this request, if anyone. */
export const callerOf = (res: Response): Caller | null =>
  (res.locals['caller'] as Caller | null | undefined) ?? null

export function requireCaller(res: Response): Caller {
  const caller = callerOf(res)
  if (caller === null) {
    throw new ProblemError(
      'not-signed-in',
      'You have not signed in, or your session has ended. Nothing was changed; sign in and try again.',
    )
  }
  return caller
}

function refuseKey(action: Action): never {
  const scope = scopeFor(action)
  throw new ProblemError(
    'key-scope',
    scope === null
      ? 'This is done by a person in a browser, never with a key. Nothing was changed.'
      : `This needs a key with the scope ${scope}. Nothing was changed.`,
  )
}

/** Lets through only those whose role, and whose key if they come by one, may do `action`. */
export const requireAction =
  (action: Action): RequestHandler =>
  (_req, res, next) => {
    const { role, key } = requireCaller(res)
    if (!may(role, action)) {
      const roles = rolesThatMay(action).join(' or ')
      throw new ProblemError(
        'not-allowed',
        `This needs the role ${roles}; you are a ${role}. Nothing was changed.`,
      )
    }
    if (key !== null && !keyMay(key.scope, action)) refuseKey(action)
    next()
  }
