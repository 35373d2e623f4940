import { sql } from 'drizzle-orm'
import { check, foreignKey, integer, jsonb, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core'
import { createdAt, primaryId } from './columns.ts'
import { memberships } from './memberships.ts'
import type { RecordTable } from './recordTable.ts'

/**
 * The revisions of a record. Every key carries the group, so that a revision can belong only to a record of its
 * own group, descend only from a revision of the same record, and be written only by a member.
 */
export function revisionTable(noun: string, records: RecordTable) {
  const table = `${noun}_revisions`
  return pgTable(
    table,
    {
      id: primaryId(),
      groupId: uuid('group_id').notNull(),
      recordId: uuid(`${noun}_id`).notNull(),
      number: integer('number').notNull(),
      parentId: uuid('parent_id'),
      authorId: uuid('author_id').notNull(),
      createdAt: createdAt(),
      note: text('note').notNull(),
      digest: text('digest').notNull(),
      input: jsonb('input').notNull(),
    },
    (t) => [
      unique(`${table}_number_unique`).on(t.groupId, t.recordId, t.number),
      unique(`${table}_group_id_unique`).on(t.groupId, t.id),
      unique(`${table}_record_id_unique`).on(t.groupId, t.recordId, t.id),
      foreignKey({
        name: `${table}_record_fk`,
        columns: [t.groupId, t.recordId],
        foreignColumns: [records.groupId, records.id],
      }),
      foreignKey({
        name: `${table}_parent_fk`,
        columns: [t.groupId, t.recordId, t.parentId],
        foreignColumns: [t.groupId, t.recordId, t.id],
      }),
      foreignKey({
        name: `${table}_author_fk`,
        columns: [t.groupId, t.authorId],
        foreignColumns: [memberships.groupId, memberships.userId],
      }),
      check(`${table}_number_positive`, sql`${t.number} >= 1`),
      check(`${table}_first_has_no_parent`, sql`(${t.number} = 1) = (${t.parentId} is null)`),
      check(`${table}_no_own_parent`, sql`${t.parentId} <> ${t.id}`),
      check(`${table}_digest_sha256`, sql`${t.digest} ~ '^[0-9a-f]{64}$'`),
    ],
  )
}

export type RevisionTable = ReturnType<typeof revisionTable>
