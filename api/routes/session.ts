import type { Router } from 'express'
import {
  chooseGroupEndpoint,
  listOwnGroupsEndpoint,
  signInEndpoint,
  signOutEndpoint,
  whoAmIEndpoint,
} from '../endpoints/session.ts'
import { callerOf, requireCaller } from '../middleware/caller.ts'
import type { SessionCookie } from '../middleware/sessionCookie.ts'
import type { Visitors } from '../middleware/visitor.ts'
import { sessionInfoOf } from '../services/sessions.ts'
import type { SessionService } from '../services/sessions.ts'
import { mount } from './mount.ts'

export function sessionRoutes(
  router: Router,
  sessions: SessionService,
  cookie: SessionCookie,
  visitors: Visitors,
): void {
  mount(router, signInEndpoint, async ({ body, req, res }) =>
    visitors.enter(res, await sessions.signIn(body, visitors.of(req, res))),
  )

  mount(router, whoAmIEndpoint, async ({ res }) => sessionInfoOf(requireCaller(res)))

  mount(router, listOwnGroupsEndpoint, async ({ res }) => ({
    items: await sessions.groups(requireCaller(res)),
  }))

  mount(router, chooseGroupEndpoint, ({ body, res }) =>
    sessions.chooseGroup(requireCaller(res), body.groupId),
  )

  mount(router, signOutEndpoint, async ({ res }) => {
    const caller = callerOf(res)
    // A key is ended where keys are; it has no session to close.
    if (caller !== null && caller.key === null) await sessions.signOut(caller)
    cookie.clear(res)
  })
}
