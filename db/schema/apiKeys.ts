import { sql } from 'drizzle-orm'
import { check, foreignKey, index, integer, pgEnum, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt, moment, primaryId } from './columns.ts'
import { memberships } from './memberships.ts'

/** How much a key may do, each including the one before. */
export const keyScope = pgEnum('key_scope', ['read', 'compute', 'write'])

/** A member's key for scripts. Only the SHA-256 of its secret is kept: whoever reads the table can use none. */
export const apiKeys = pgTable(
  'api_keys',
  {
    id: primaryId(),
    groupId: uuid('group_id').notNull(),
    userId: uuid('user_id').notNull(),
    name: text('name').notNull(),
    scope: keyScope('scope').notNull(),
    secretHash: text('secret_hash').notNull().unique('api_keys_secret_hash_unique'),
    /** The first characters of the secret, by which its owner knows it again. */
    beginning: text('beginning').notNull(),
    createdAt: createdAt(),
    expiresAt: moment('expires_at').notNull(),
    lastUsedAt: moment('last_used_at'),
    revokedAt: moment('revoked_at'),
    /** Requests a minute; the usual number when null. Raised by hand, in the database, by whoever runs the server. */
    requestsPerMinute: integer('requests_per_minute'),
  },
  (t) => [
    foreignKey({
      name: 'api_keys_member_fk',
      columns: [t.groupId, t.userId],
      foreignColumns: [memberships.groupId, memberships.userId],
    }).onDelete('cascade'),
    index('api_keys_newest_first').on(t.groupId, t.createdAt, t.id),
    check('api_keys_secret_sha256', sql`${t.secretHash} ~ '^[0-9a-f]{64}$'`),
    check('api_keys_rate_positive', sql`${t.requestsPerMinute} > 0`),
  ],
)
