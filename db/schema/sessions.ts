import { foreignKey, index, pgTable, uuid } from 'drizzle-orm/pg-core'
import { createdAt, moment, primaryId } from './columns.ts'
import { memberships } from './memberships.ts'

/** One signed-in browser of one member of one group. */
export const sessions = pgTable(
  'sessions',
  {
    id: primaryId(),
    groupId: uuid('group_id').notNull(),
    userId: uuid('user_id').notNull(),
    createdAt: createdAt(),
    expiresAt: moment('expires_at').notNull(),
    lastUsedAt: moment('last_used_at').notNull().defaultNow(),
    revokedAt: moment('revoked_at'),
  },
  (t) => [
    foreignKey({
      name: 'sessions_member_fk',
      columns: [t.groupId, t.userId],
      foreignColumns: [memberships.groupId, memberships.userId],
    }).onDelete('cascade'),
    index('sessions_member').on(t.groupId, t.userId),
  ],
)
