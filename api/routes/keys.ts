import type { Router } from 'express'
import { createKeyEndpoint, listKeysEndpoint, revokeKeyEndpoint } from '../endpoints/keys.ts'
import { requireCaller } from '../middleware/caller.ts'
import type { KeyService } from '../services/keys.ts'
import { mount } from './mount.ts'

export function keyRoutes(router: Router, keys: KeyService): void {
  mount(router, listKeysEndpoint, ({ query, res }) => keys.list(requireCaller(res), query.of))
  mount(router, createKeyEndpoint, ({ body, res }) => keys.create(requireCaller(res), body))
  mount(router, revokeKeyEndpoint, ({ params, res }) => keys.revoke(requireCaller(res), params.id))
}
