import { auditEntry, auditQuery, pageOf } from '#core/wire/index'
import { endpoint } from './endpoint.ts'

export const listAuditEndpoint = endpoint({
  id: 'listAuditEntries',
  method: 'get',
  path: '/audit',
  tag: 'audit',
  summary: 'List who did what to which record, newest first',
  may: 'read-audit-log',
  query: auditQuery,
  status: 200,
  answer: pageOf(auditEntry),
  answerIs: 'One page of the audit log',
})
