import { sql } from 'drizzle-orm'
import { check, pgTable, text } from 'drizzle-orm/pg-core'
import { createdAt, moment, primaryId } from './columns.ts'

/** A person, in however many groups. The server's role may read name and e-mail, never the password's hash. */
export const users = pgTable(
  'users',
  {
    id: primaryId(),
    email: text('email').notNull().unique('users_email_unique'),
    name: text('name').notNull(),
    /** Null when its owner signs in elsewhere. */
    passwordHash: text('password_hash'),
    /** When a link sent to the address was opened; null before. */
    emailVerifiedAt: moment('email_verified_at'),
    createdAt: createdAt(),
  },
  (t) => [
    check('users_email_lower_case', sql`${t.email} = lower(${t.email})`),
    check('users_password_argon2id', sql`${t.passwordHash} like '$argon2id$%'`),
  ],
)
