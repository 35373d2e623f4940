import { index, pgEnum, pgTable, primaryKey, uuid } from 'drizzle-orm/pg-core'
import { createdAt } from './columns.ts'
import { groups } from './groups.ts'
import { users } from './users.ts'

export const memberRole = pgEnum('member_role', ['lead', 'author', 'reader'])

/** Who belongs to which group, as what. */
export const memberships = pgTable(
  'memberships',
  {
    groupId: uuid('group_id')
      .notNull()
      .references(() => groups.id),
    userId: uuid('user_id')
      .notNull()
      .references(() => users.id),
    role: memberRole('role').notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ name: 'memberships_pk', columns: [t.groupId, t.userId] }),
    index('memberships_user').on(t.userId),
  ],
)
