import { pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt, primaryId } from './columns.ts'

/**
 * A tenant. The foreign key from (id, baseline_revision_id) to history_revisions stands in a hand-written
 * migration: the two tables point at each other, and declaring it here would make the modules do so too.
 */
export const groups = pgTable('groups', {
  id: primaryId(),
  name: text('name').notNull(),
  baselineRevisionId: uuid('baseline_revision_id'),
  createdAt: createdAt(),
})
