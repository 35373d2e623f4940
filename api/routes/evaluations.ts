import type { Router } from 'express'
import {
  createEvaluationEndpoint,
  listEvaluationsEndpoint,
  readEvaluationEndpoint,
  readEvidenceEndpoint,
} from '../endpoints/evaluations.ts'
import { requireCaller } from '../middleware/caller.ts'
import type { evaluationService } from '../services/evaluations.ts'
import { mount } from './mount.ts'

export function evaluationRoutes(router: Router, evaluations: ReturnType<typeof evaluationService>): void {
  mount(router, listEvaluationsEndpoint, ({ query, res }) => evaluations.list(requireCaller(res), query))
  mount(router, readEvaluationEndpoint, ({ params, res }) => evaluations.read(requireCaller(res), params.id))
  mount(router, readEvidenceEndpoint, ({ params, res }) =>
    evaluations.evidence(requireCaller(res), params.id),
  )
  mount(router, createEvaluationEndpoint, ({ body, res }) => evaluations.create(requireCaller(res), body))
}
