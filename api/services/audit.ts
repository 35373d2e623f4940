import type { AuditEntry } from '#core/wire/index'
import { withGroup } from '#db/database'
import type { Database, GroupTransaction } from '#db/database'
import { insertAuditEntry, listAuditEntries } from '#db/queries/auditEntries'
import type { AuditDetail, StoredAuditEntry } from '#db/queries/auditEntries'
import type { Caller, RequestOrigin } from '../middleware/caller.ts'
import { pageAnswer, pageRequest } from './cursor.ts'

/** What is written into the log: a kind of record, and what was done to it. */
export type AuditAction =
  | 'history.create'
  | 'history.revise'
  | 'candidate.create'
  | 'candidate.revise'
  | 'evaluation.create'
  | 'key.create'
  | 'key.revoke'
  | 'guest-link.create'
  | 'guest-link.revoke'
  | 'session.open'
  | 'session.close'
  | 'session.turn'
  | 'session.end'
  | 'account.rename'
  | 'account.password'
  | 'account.email'
  | 'account.second-factor'
  | 'invitation.create'
  | 'invitation.withdraw'
  | 'invitation.accept'
  | 'group.create'

/** What the log has to know of who did it. */
export interface AuditedCaller {
  user: { id: string }
  group: { id: string }
  key: { id: string } | null
  from: RequestOrigin
}

/** Notes what `caller` did, in the transaction that does it: neither stands without the other. */
export const audit = (
  tx: GroupTransaction,
  caller: AuditedCaller,
  action: AuditAction,
  subjectId: string | null,
  detail: AuditDetail = {},
): Promise<void> =>
  insertAuditEntry(tx, {
    groupId: caller.group.id,
    actorId: caller.user.id,
    apiKeyId: caller.key?.id ?? null,
    action,
    subjectId,
    detail,
    fromAddress: caller.from.address,
    fromAgent: caller.from.agent,
    requestId: caller.from.requestId,
  })

const writeEntry = (stored: StoredAuditEntry): AuditEntry => ({
  ...stored,
  createdAt: stored.createdAt.toISOString(),
})

interface AuditRequest {
  limit: number
  cursor?: string | undefined
  actorId?: string | undefined
  subjectId?: string | undefined
  action?: string | undefined
  from?: string | undefined
  until?: string | undefined
}

const dateOf = (text: string | undefined): Date | undefined =>
  text === undefined ? undefined : new Date(text)

export function auditService(db: Database) {
  return {
    async list(caller: Caller, { from, until, ...query }: AuditRequest) {
      const request = pageRequest(query)
      const filter = { ...query, from: dateOf(from), until: dateOf(until) }
      const page = await withGroup(db, caller.group.id, (tx) => listAuditEntries(tx, filter, request))
      return pageAnswer(page, writeEntry)
    },
  }
}

export type AuditService = ReturnType<typeof auditService>
