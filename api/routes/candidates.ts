import type { Router } from 'express'
import { candidateEndpoints } from '../endpoints/records.ts'
import { requireCaller } from '../middleware/caller.ts'
import type { candidateService } from '../services/records.ts'
import { mount } from './mount.ts'

export function candidateRoutes(router: Router, candidates: ReturnType<typeof candidateService>): void {
  const { list, read, create, revise } = candidateEndpoints
  mount(router, list, ({ query, res }) => candidates.list(requireCaller(res), query))
  mount(router, read, ({ params, res }) => candidates.read(requireCaller(res), params.id))
  mount(router, create, ({ body, res }) => candidates.create(requireCaller(res), body))
  mount(router, revise, ({ params, body, res }) => candidates.revise(requireCaller(res), params.id, body))
}
