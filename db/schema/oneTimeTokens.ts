import { sql } from 'drizzle-orm'
import { check, index, pgEnum, pgTable, text, uuid } from 'drizzle-orm/pg-core'
import { createdAt, moment, primaryId } from './columns.ts'
import { users } from './users.ts'

export const tokenPurpose = pgEnum('token_purpose', [
  'first-group',
  'verify-email',
  'change-email',
  'reset-password',
])

/** Leave to do one thing once, sent by mail or printed at the first start; only the secret's hash is kept. */
export const oneTimeTokens = pgTable(
  'one_time_tokens',
  {
    id: primaryId(),
    purpose: tokenPurpose('purpose').notNull(),
    userId: uuid('user_id').references(() => users.id, { onDelete: 'cascade' }),
    /** The address it was sent to, and which it proves. */
    email: text('email'),
    secretHash: text('secret_hash').notNull(),
    createdAt: createdAt(),
    expiresAt: moment('expires_at').notNull(),
    usedAt: moment('used_at'),
  },
  (t) => [
    index('one_time_tokens_person').on(t.userId),
    check('one_time_tokens_of_somebody', sql`(${t.purpose} = 'first-group') = (${t.userId} is null)`),
    check('one_time_tokens_secret_sha256', sql`${t.secretHash} ~ '^[0-9a-f]{64}$'`),
  ],
)
