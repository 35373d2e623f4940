import type { SessionInfo } from '#core/wire/index'
import type { CookieOptions, Request, Response } from 'express'
import { ipKeyGenerator } from 'express-rate-limit'
import { DEVICE_LIFETIME_DAYS } from '../services/knownDevices.ts'
import type { SignedIn } from '../services/sessions.ts'
import type { Visitor } from '../services/visitor.ts'
import { originOf } from './caller.ts'
import type { SessionCookie } from './sessionCookie.ts'

const DAY_MS = 86_400_000

/** Between a request and the services: who asks, and what their browser keeps once they have signed in. */
export interface Visitors {
  of(req: Request, res: Response): Visitor
  enter(res: Response, signedIn: SignedIn): SessionInfo
}

export function visitors(cookie: SessionCookie, https: boolean): Visitors {
  const name = https ? '__Host-emberline_device' : 'emberline_device'
  const options: CookieOptions = {
    httpOnly: true,
    sameSite: 'lax',
    secure: https,
    path: '/',
    maxAge: DEVICE_LIFETIME_DAYS * DAY_MS,
  }
  return {
    of(req, res) {
      const value = (req.cookies as Record<string, unknown>)[name]
      return {
        address: ipKeyGenerator(req.ip ?? ''),
        userAgent: req.get('user-agent') ?? '',
        from: originOf(req, res),
        deviceToken: typeof value === 'string' ? value : null,
      }
    },
    enter(res, { info, token, expiresAt, deviceToken }) {
      cookie.set(res, token, expiresAt)
      res.cookie(name, deviceToken, options)
      return info
    },
  }
}
