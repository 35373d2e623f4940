import { sql } from 'drizzle-orm'
import { check, index, integer, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core'
import { createdAt, moment, primaryId } from './columns.ts'
import { groups } from './groups.ts'

/** A named record of a group whose content lives in its revisions; the row is locked while a number is allotted. */
export function recordTable(plural: string) {
  return pgTable(
    plural,
    {
      id: primaryId(),
      groupId: uuid('group_id')
        .notNull()
        .references(() => groups.id),
      name: text('name').notNull(),
      createdAt: createdAt(),
      updatedAt: moment('updated_at').notNull().defaultNow(),
      latestNumber: integer('latest_number').notNull(),
    },
    (t) => [
      unique(`${plural}_group_id_unique`).on(t.groupId, t.id),
      index(`${plural}_newest_first`).on(t.groupId, t.createdAt, t.id),
      check(`${plural}_latest_number_positive`, sql`${t.latestNumber} >= 1`),
    ],
  )
}

export type RecordTable = ReturnType<typeof recordTable>
