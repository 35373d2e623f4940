import { index, jsonb, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt, primaryId } from './columns.ts'

/**
 * Who did what to which record, when, from where. Appended to and never changed. Group, actor and
 * record are named without keys to their tables: an entry outlives them all.
 */
export const auditEntries = pgTable(
  'audit_entries',
  {
    id: primaryId(),
    groupId: uuid('group_id').notNull(),
    createdAt: createdAt(),
    /** Null for what the server did of itself. */
    actorId: uuid('actor_id'),
    /** The key the actor came by; null for a browser. */
    apiKeyId: uuid('api_key_id'),
    /** As `history.create`: what kind of record, and what was done to it. */
    action: text('action').notNull(),
    subjectId: uuid('subject_id'),
    /** What a reader needs to know beside the action, and no secret. */
    detail: jsonb('detail').$type<Record<string, string | number | boolean | null>>().notNull(),
    fromAddress: text('from_address'),
    fromAgent: text('from_agent'),
    requestId: text('request_id'),
  },
  (t) => [
    index('audit_entries_newest_first').on(t.groupId, t.createdAt, t.id),
    index('audit_entries_of_actor').on(t.groupId, t.actorId, t.createdAt, t.id),
    index('audit_entries_of_subject').on(t.groupId, t.subjectId, t.createdAt, t.id),
  ],
)
