import type { RequestHandler, Router } from 'express'
import { signInEndpoint, signOutEndpoint, whoAmIEndpoint } from '../endpoints/session.ts'
import { requireSession, sessionOf } from '../middleware/session.ts'
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
    async ({ body, res }) => {
      const { info, token, expiresAt } = await sessions.signIn(body.email, body.password)
      cookie.set(res, token, expiresAt)
      return info
    },
    limits,
  )

  mount(router, whoAmIEndpoint, async ({ res }) => sessionInfoOf(requireSession(res)))

  mount(router, signOutEndpoint, async ({ res }) => {
    const session = sessionOf(res)
    if (session !== null) await sessions.signOut(session)
    cookie.clear(res)
  })
}
