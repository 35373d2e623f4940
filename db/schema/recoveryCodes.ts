import { sql } from 'drizzle-orm'
import { check, index, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt, moment, primaryId } from './columns.ts'
import { users } from './users.ts'

/** In place of a code when the device is lost, once each; only the hash is kept. */
export const recoveryCodes = pgTable(
  'recovery_codes',
  {
    id: primaryId(),
    userId: uuid('user_id')
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    codeHash: text('code_hash').notNull(),
    createdAt: createdAt(),
    usedAt: moment('used_at'),
  },
  (t) => [
    index('recovery_codes_person').on(t.userId),
    check('recovery_codes_sha256', sql`${t.codeHash} ~ '^[0-9a-f]{64}$'`),
  ],
)
