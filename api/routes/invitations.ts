import type { Router } from 'express'
import {
  acceptInvitationEndpoint,
  foundFirstGroupEndpoint,
  inviteEndpoint,
  listInvitationsEndpoint,
  readInvitationEndpoint,
  withdrawInvitationEndpoint,
} from '../endpoints/invitations.ts'
import { requireCaller } from '../middleware/caller.ts'
import type { Visitors } from '../middleware/visitor.ts'
import type { FirstGroupService } from '../services/firstGroup.ts'
import type { InvitationService } from '../services/invitations.ts'
import { mount } from './mount.ts'

export function invitationRoutes(
  router: Router,
  invitations: InvitationService,
  firstGroup: FirstGroupService,
  visitors: Visitors,
): void {
  mount(router, listInvitationsEndpoint, ({ query, res }) => invitations.list(requireCaller(res), query))
  mount(router, inviteEndpoint, ({ body, res }) => invitations.invite(requireCaller(res), body))
  mount(router, withdrawInvitationEndpoint, ({ params, res }) =>
    invitations.withdraw(requireCaller(res), params.id),
  )
  mount(router, readInvitationEndpoint, ({ body }) => invitations.read(body.token))
  mount(router, acceptInvitationEndpoint, async ({ body, req, res }) =>
    visitors.enter(res, await invitations.accept(body, visitors.of(req, res))),
  )
  mount(router, foundFirstGroupEndpoint, async ({ body, req, res }) =>
    visitors.enter(res, await firstGroup.found(body, visitors.of(req, res))),
  )
}
