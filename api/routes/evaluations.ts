import type { Router } from 'express'
import {
  createEvaluationEndpoint,
  listEvaluationsEndpoint,
  readEvaluationEndpoint,
} from '../endpoints/evaluations.ts'
import { requireSession } from '../middleware/session.ts'
import type { evaluationService } from '../services/evaluations.ts'
import { mount } from './mount.ts'

export function evaluationRoutes(router: Router, evaluations: ReturnType<typeof evaluationService>): void {
  mount(router, listEvaluationsEndpoint, ({ query, res }) => evaluations.list(requireSession(res), query))
  mount(router, readEvaluationEndpoint, ({ params, res }) => evaluations.read(requireSession(res), params.id))
  mount(router, createEvaluationEndpoint, ({ body, res }) => evaluations.create(requireSession(res), body))
}
