import type { Router } from 'express'
import { listAuditEndpoint } from '../endpoints/audit.ts'
import { requireCaller } from '../middleware/caller.ts'
import type { AuditService } from '../services/audit.ts'
import { mount } from './mount.ts'

export function auditRoutes(router: Router, audit: AuditService): void {
  mount(router, listAuditEndpoint, ({ query, res }) => audit.list(requireCaller(res), query))
}
