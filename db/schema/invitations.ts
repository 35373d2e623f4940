import { sql } from 'drizzle-orm'
import { check, foreignKey, index, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt, moment, primaryId } from './columns.ts'
import { groups } from './groups.ts'
import { memberRole, memberships } from './memberships.ts'
import { users } from './users.ts'

/** An address invited into a group; only the hash of the secret sent there is kept. */
export const invitations = pgTable(
  'invitations',
  {
    id: primaryId(),
    groupId: uuid('group_id')
      .notNull()
      .references(() => groups.id),
    email: text('email').notNull(),
    role: memberRole('role').notNull(),
    invitedBy: uuid('invited_by').notNull(),
    secretHash: text('secret_hash').notNull(),
    createdAt: createdAt(),
    expiresAt: moment('expires_at').notNull(),
    withdrawnAt: moment('withdrawn_at'),
    acceptedAt: moment('accepted_at'),
    acceptedBy: uuid('accepted_by').references(() => users.id),
  },
  (t) => [
    foreignKey({
      name: 'invitations_inviter_fk',
      columns: [t.groupId, t.invitedBy],
      foreignColumns: [memberships.groupId, memberships.userId],
    }),
    index('invitations_newest_first').on(t.groupId, t.createdAt, t.id),
    check('invitations_email_lower_case', sql`${t.email} = lower(${t.email})`),
    check('invitations_secret_sha256', sql`${t.secretHash} ~ '^[0-9a-f]{64}$'`),
    check('invitations_accepted_by_somebody', sql`(${t.acceptedAt} is null) = (${t.acceptedBy} is null)`),
  ],
)
