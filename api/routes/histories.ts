import type { Router } from 'express'
import { historyEndpoints } from '../endpoints/records.ts'
import { requireCaller } from '../middleware/caller.ts'
import type { historyService } from '../services/records.ts'
import { mount } from './mount.ts'

export function historyRoutes(router: Router, histories: ReturnType<typeof historyService>): void {
  const { list, read, create, revise } = historyEndpoints
  mount(router, list, ({ query, res }) => histories.list(requireCaller(res), query))
  mount(router, read, ({ params, res }) => histories.read(requireCaller(res), params.id))
  mount(router, create, ({ body, res }) => histories.create(requireCaller(res), body))
  mount(router, revise, ({ params, body, res }) => histories.revise(requireCaller(res), params.id, body))
}
