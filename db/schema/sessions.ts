import { foreignKey, index, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt, moment, primaryId } from './columns.ts'
import { memberships } from './memberships.ts'

/** One signed-in browser of one person, in one of their groups at a time. */
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
    /** What the browser said of itself, and where it signed in from: for its owner to know it by. */
    userAgent: text('user_agent').notNull().default(''),
    address: text('address').notNull().default(''),
  },
  (t) => [
    foreignKey({
      name: 'sessions_member_fk',
      columns: [t.groupId, t.userId],
      foreignColumns: [memberships.groupId, memberships.userId],
    }).onDelete('cascade'),
    index('sessions_person').on(t.userId),
  ],
)
