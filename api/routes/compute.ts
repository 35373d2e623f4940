import { computeAbundance, computeHistory } from '#core/index'
import type { Router } from 'express'
import { computeAbundanceEndpoint, computeHistoryEndpoint } from '../endpoints/compute.ts'
import { mount } from './mount.ts'

export function computeRoutes(router: Router): void {
  mount(router, computeHistoryEndpoint, async ({ body }) => computeHistory(body))
  mount(router, computeAbundanceEndpoint, async ({ body }) => computeAbundance(body))
}
