import { z } from 'zod'
import { listQuery } from './records.ts'

/** One entry of the audit log: who did what to which record, when, from where. */
export const auditEntry = z
  .object({
    id: z.uuid(),
    createdAt: z.iso.datetime().describe('UTC, ISO 8601'),
    actor: z
      .object({ id: z.uuid(), name: z.string().nullable().describe('null for a former member') })
      .nullable()
      .describe('null for what the server did of itself'),
    apiKeyId: z.uuid().nullable().describe('The key the actor came by; null for a browser'),
    action: z.string().describe('As history.create'),
    subjectId: z.uuid().nullable().describe('The record it was done to'),
    detail: z.record(z.string(), z.union([z.string(), z.number(), z.boolean(), z.null()])),
    fromAddress: z.string().nullable(),
    fromAgent: z.string().nullable(),
    requestId: z.string().nullable(),
  })
  .meta({ id: 'AuditEntry' })
export type AuditEntry = z.output<typeof auditEntry>

export const auditQuery = listQuery.extend({
  actorId: z.uuid().optional().describe('Entries of one person'),
  subjectId: z.uuid().optional().describe('Entries about one record'),
  action: z
    .string()
    .regex(/^[a-z-]+(\.[a-z-]+)?$/, 'allowed: a kind of record, or kind.action')
    .optional()
    .describe('As history.create, or history for all that was done to histories'),
  from: z.iso.datetime().optional().describe('Not before, UTC'),
  until: z.iso.datetime().optional().describe('Before, UTC'),
})
