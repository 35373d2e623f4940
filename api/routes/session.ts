import type { RequestHandler, Router } from 'express'
import { signInEndpoint, signOutEndpoint, whoAmIEndpoint } from '../endpoints/session.ts'
import { callerOf, originOf, requireCaller } from '../middleware/caller.ts'
import type { SessionCookie } from '../middleware/sessionCookie.ts'
import { sessionInfoOf } from '../services/sessions.ts'
import type { SessionService } from '../services/sessions.ts'
import { mount } from './mount.ts'

export function sessionRoutes(
  router: Router,
  sessions: SessionService,
  cookie: SessionCookie,
  limits: RequestHandler[],
): void {
  mount(
    router,
    signInEndpoint,
    async ({ body, req, res }) => {
      const { info, token, expiresAt } = await sessions.signIn(body.email, body.password, originOf(req, res))
      cookie.set(res, token, expiresAt)
      return info
    },
    limits,
  )

  mount(router, whoAmIEndpoint, async ({ res }) => sessionInfoOf(requireCaller(res)))

  mount(router, signOutEndpoint, async ({ res }) => {
    const caller = callerOf(res)
    // A key is ended where keys are; it has no session to close.
    if (caller !== null && caller.key === null) await sessions.signOut(caller)
    cookie.clear(res)
  })
}
