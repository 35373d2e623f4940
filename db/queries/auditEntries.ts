import { and, eq, gte, lt, sql } from 'drizzle-orm'
import type { GroupTransaction } from '../database.ts'
import { auditEntries } from '../schema/auditEntries.ts'
import { users } from '../schema/users.ts'
import { cutPage, newestFirst, older } from './page.ts'
import type { Page, PageRequest } from './page.ts'

export type AuditDetail = Record<string, string | number | boolean | null>

export interface AuditDraft {
  groupId: string
  actorId: string | null
  apiKeyId: string | null
  action: string
  subjectId: string | null
  detail: AuditDetail
  fromAddress: string | null
  fromAgent: string | null
  requestId: string | null
}

export interface StoredAuditEntry extends Omit<AuditDraft, 'groupId' | 'actorId'> {
  id: string
  createdAt: Date
  /** Null for what the server did of itself; the name is null for who is no member any more. */
  actor: { id: string; name: string | null } | null
}

export interface AuditFilter {
  actorId?: string | undefined
  subjectId?: string | undefined
  /** As `history.create`, or `history` for all that was done to histories. */
  action?: string | undefined
  from?: Date | undefined
  until?: Date | undefined
}

export const insertAuditEntry = async (tx: GroupTransaction, draft: AuditDraft): Promise<void> => {
  await tx.insert(auditEntries).values(draft)
}

function matches({ actorId, subjectId, action, from, until }: AuditFilter) {
  return and(
    actorId === undefined ? undefined : eq(auditEntries.actorId, actorId),
    subjectId === undefined ? undefined : eq(auditEntries.subjectId, subjectId),
    action === undefined
      ? undefined
      : sql`(${auditEntries.action} = ${action} or starts_with(${auditEntries.action}, ${`${action}.`}))`,
    from === undefined ? undefined : gte(auditEntries.createdAt, from),
    until === undefined ? undefined : lt(auditEntries.createdAt, until),
  )
}

export async function listAuditEntries(
  tx: GroupTransaction,
  filter: AuditFilter,
  page: PageRequest,
): Promise<Page<StoredAuditEntry>> {
  const rows = await tx
    .select({
      id: auditEntries.id,
      createdAt: auditEntries.createdAt,
      actorId: auditEntries.actorId,
      actorName: users.name,
      apiKeyId: auditEntries.apiKeyId,
      action: auditEntries.action,
      subjectId: auditEntries.subjectId,
      detail: auditEntries.detail,
      fromAddress: auditEntries.fromAddress,
      fromAgent: auditEntries.fromAgent,
      requestId: auditEntries.requestId,
    })
    .from(auditEntries)
    .leftJoin(users, eq(users.id, auditEntries.actorId))
    .where(and(matches(filter), older(auditEntries, page.after)))
    .orderBy(...newestFirst(auditEntries))
    .limit(page.limit + 1)
  return cutPage(
    rows.map(({ actorId, actorName, ...row }) => ({
      ...row,
      actor: actorId === null ? null : { id: actorId, name: actorName },
    })),
    page.limit,
  )
}
