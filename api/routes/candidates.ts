import type { Router } from 'express'
import { candidateEndpoints } from '../endpoints/records.ts'
import { requireSession } from '../middleware/session.ts'
import type { candidateService } from '../services/records.ts'
import { mount } from './mount.ts'

export function candidateRoutes(router: Router, candidates: ReturnType<typeof candidateService>): void {
  const { list, read, create, revise } = candidateEndpoints
  mount(router, list, ({ query, res }) => candidates.list(requireSession(res), query))
  mount(router, read, ({ params, res }) => candidates.read(requireSession(res), params.id))
  mount(router, create, ({ body, res }) => candidates.create(requireSession(res), body))
  mount(router, revise, ({ params, body, res }) => candidates.revise(requireSession(res), params.id, body))
}
