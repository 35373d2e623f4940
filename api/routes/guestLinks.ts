import type { RequestHandler, Router } from 'express'
import {
  createGuestLinkEndpoint,
  listGuestLinksEndpoint,
  openGuestLinkEndpoint,
  revokeGuestLinkEndpoint,
} from '../endpoints/guestLinks.ts'
import { requireCaller } from '../middleware/caller.ts'
import type { GuestLinkService } from '../services/guestLinks.ts'
import { mount } from './mount.ts'

export function guestLinkRoutes(router: Router, links: GuestLinkService, limit: RequestHandler): void {
  mount(router, listGuestLinksEndpoint, ({ query, res }) => links.list(requireCaller(res), query.subjectId))
  mount(router, createGuestLinkEndpoint, ({ body, res }) => links.create(requireCaller(res), body))
  mount(router, revokeGuestLinkEndpoint, ({ params, res }) => links.revoke(requireCaller(res), params.id))
  mount(router, openGuestLinkEndpoint, ({ body }) => links.open(body.token), [limit])
}
