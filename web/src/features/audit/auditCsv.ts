import type { AuditEntry } from '#core/wire/index'
import { csvText } from '../../lib/csv.ts'

const HEAD = [
  'time (UTC)',
  'person',
  'person id',
  'key id',
  'action',
  'record id',
  'detail',
  'address',
  'agent',
  'request id',
]

/** The log as a table for a spreadsheet or a script. */
export const auditCsv = (entries: readonly AuditEntry[]): string =>
  csvText([
    HEAD,
    ...entries.map((entry) => [
      entry.createdAt,
      entry.actor === null ? 'Emberline' : (entry.actor.name ?? 'former member'),
      entry.actor?.id ?? null,
      entry.apiKeyId,
      entry.action,
      entry.subjectId,
      Object.keys(entry.detail).length === 0 ? null : JSON.stringify(entry.detail),
      entry.fromAddress,
      entry.fromAgent,
      entry.requestId,
    ]),
  ])
