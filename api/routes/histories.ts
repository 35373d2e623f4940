import type { Router } from 'express'
import { historyEndpoints } from '../endpoints/records.ts'
import { requireSession } from '../middleware/session.ts'
import type { historyService } from '../services/records.ts'
import { mount } from './mount.ts'

export function historyRoutes(router: Router, histories: ReturnType<typeof historyService>): void {
  const { list, read, create, revise } = historyEndpoints
  mount(router, list, ({ query, res }) => histories.list(requireSession(res), query))
  mount(router, read, ({ params, res }) => histories.read(requireSession(res), params.id))
  mount(router, create, ({ body, res }) => histories.create(requireSession(res), body))
  mount(router, revise, ({ params, body, res }) => histories.revise(requireSession(res), params.id, body))
}
